import { describe, expect, it } from 'vitest';
import { differencesOf } from '../../../src/presentation/page/differences.js';
import { readRecorded, type RecordedReport } from '../../../src/presentation/page/recorded.js';
import { reportLine } from '../../../src/presentation/page/report-json.js';
import { renderVerification } from '../../../src/presentation/page/verification.js';
import type { Review } from '../../../src/presentation/page/review.js';
import { SAMPLE_PARTS, sampleReport, styleOf } from '../../support/sample-report.js';
import { sampleReview, sampleReviewed } from '../../support/sample-review.js';

function recorded(review: Review): RecordedReport {
  const read = readRecorded(reportLine(review));
  if (!read.ok) throw new Error(read.why);
  return read.report;
}

const of = (...parts: typeof SAMPLE_PARTS): RecordedReport => recorded(sampleReview({ stages: [sampleReviewed(sampleReport({}, parts))] }));
const was = of(...SAMPLE_PARTS);

describe('what differs between two reports', () => {
  it('is nothing for the same', () => { expect(differencesOf(was, of(...SAMPLE_PARTS))).toEqual([]); });

  it('names a part that is gone, and the chosen one that is another now', () => {
    const [, ...rest] = SAMPLE_PARTS;
    const found = differencesOf(was, of(...rest));
    expect(found.find(({ what }) => what === 'chosen')).toMatchObject({ subject: 'first in order', was: 'TEAM-0005 fits (limits), place 1', is: 'TEAM-0012 fits (typical), place 1' });
    expect(found.find(({ what, subject }) => what === 'outcome' && subject === 'TEAM-0005')).toMatchObject({ stage: 'probe.yaml', was: 'fits', is: 'not in the catalog' });
    expect(found.find(({ what }) => what === 'catalog')).toMatchObject({ was: expect.stringContaining('6 parts') as string, is: expect.stringContaining('5 parts') as string });
  });

  it('names the number of a check that moved, also where the verdict stays', () => {
    const moved = SAMPLE_PARTS.map((part) => (part.id === 'TEAM-0005' ? { ...part, figures: part.figures.map((figure) => (figure.parameter === 'quiescentCurrent' ? { ...figure, value: 36e-6 } : figure)) } : part));
    const found = differencesOf(was, of(...moved));
    expect(found.map(({ what, subject }) => `${what}: ${subject}`)).toEqual(['verdict: TEAM-0005, supply current']);
    expect(found[0]).toMatchObject({ was: expect.stringContaining('35 µA') as string, is: expect.stringContaining('36 µA') as string });
  });

  it('finds a field nobody compares by name', () => {
    const stages = was.stages.map((stage) => ({ ...stage, shortlist: { ...stage.shortlist, ahead: null } }));
    expect(differencesOf({ ...was, stages }, was)).toMatchObject([{ what: 'detail', subject: 'shortlist.ahead', was: 'null' }]);
  });

  it('tells a demand and a field of the stage', () => {
    const other = recorded(sampleReview({ stages: [sampleReviewed(sampleReport({ 'signal.frequency': '2.5 kHz' }))] }));
    const whats = new Set(differencesOf(was, other).map(({ what, subject }) => `${what}: ${subject}`));
    expect([...whats]).toEqual(expect.arrayContaining(['demand: slew rate', 'stage: frequency']));
  });
});

describe('a document that is none', () => {
  it.each([
    ['{"schema":', 'the embedded document is broken off or damaged: it is no JSON'],
    ['{"schema":"railfit/shortlist","schemaVersion":1}', 'the embedded document is no railfit report'],
    ['{"schema":"railfit/report","schemaVersion":2}', 'the report has schema version 2, this railfit reads version 1'],
    ['{"schema":"railfit/report","schemaVersion":1}', 'the embedded document is damaged at name'],
    [reportLine(sampleReview()).replace('"part":"TEAM-0005"', '"part":5'), 'the embedded document is damaged at stages[0].chosen'],
    [reportLine(sampleReview()).replace('"stages":[{', '"stages":[null,{'), 'the embedded document is damaged at stages'],
  ])('%.60s is refused in words', (text, why) => { expect(readRecorded(text)).toEqual({ ok: false, why }); });
});

it('a rerun is told in lines no wider than the terminal, the catalog first', () => {
  const [, ...rest] = SAMPLE_PARTS;
  const differences = differencesOf(was, of(...rest));
  const text = renderVerification({ file: 'review.html', time: was.time, tool: { was: was.tool, is: was.tool }, stages: 1, differences }, styleOf(60));
  for (const line of text.split('\n')) expect(line.length, line).toBeLessThanOrEqual(60);
  expect(text.replaceAll(/\s+/gu, ' ')).toMatch(/^review\.html: differs\. 1 stage, made 2026-03-14T09:30:00Z by railfit 0\.1\.0 \(rules 1\); judged again, \d+ differences: it was made with another catalog than the one in force\./u);
});
