import { describe, expect, it } from 'vitest';
import { tightestVerdict } from '../../src/presentation/tightest.js';
import { checkWords } from '../../src/presentation/words.js';
import { SAMPLE_PARTS, sampleReport } from '../support/sample-report.js';
import { pageOf, sampleReview, sampleReviewed } from '../support/sample-review.js';

describe('the tightest check', () => {
  const report = sampleReport();

  it('is that of the order of the shortlist', () => {
    const [first] = report.fit;
    expect(tightestVerdict(report, first!)?.check).toBe(first!.tightest);
    expect(first!.tightest).not.toBeNull();
  });

  it('is that of its line for another package of the same die', () => {
    const [one, ...rest] = SAMPLE_PARTS;
    const family = sampleReport({}, [{ ...one!, family: 'die' }, { ...one!, id: 'TEAM-0005-B', package: 'SC-70-5', family: 'die' }, ...rest]);
    const line = family.fit.find(({ variants }) => variants.length > 0)!;
    expect(tightestVerdict(family, line.variants[0]!)?.check).toBe(line.tightest);
  });

  it('is none of a part that does not fit', () => {
    expect(tightestVerdict(report, report.rejected[0]!)).toBeNull();
    expect(tightestVerdict(report, report.undecided[0]!)).toBeNull();
  });

  it.each(report.fit.map(({ part }) => part.id))('is named the same in the answer, the shortlist and the margins of %s', (id) => {
    const line = report.fit.find(({ part }) => part.id === id)!;
    const page = pageOf(sampleReview({ stages: [sampleReviewed(report, id)] }));
    const answer = page.slice(page.indexOf('id="s1-answer"'), page.indexOf('id="s1-stage"'));
    const figure = page.slice(page.indexOf('id="s1-plot-margins"'), page.indexOf('<svg', page.indexOf('id="s1-plot-margins"')));
    const name = checkWords(line.tightest!);
    expect(answer).toContain(`Tightest: ${name} `);
    expect(figure).toContain(`the tightest is ${name} with `);
  });
});
