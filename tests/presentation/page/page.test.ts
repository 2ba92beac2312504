import { describe, expect, it } from 'vitest';
import { shortlistJson } from '../../../src/presentation/json.js';
import { embeddedIn } from '../../../src/presentation/page/embedded.js';
import { DOCUMENTS } from '../../../src/presentation/schemas/index.js';
import { PAGE_PARTS, PREDICTION, SWEEP } from '../../support/page.js';
import { SAMPLE_PARTS, sampleReport } from '../../support/sample-report.js';
import { HOSTILE, hostileReport, pageOf, sampleReview, sampleReviewed } from '../../support/sample-review.js';

const page = pageOf(sampleReview());
const several = pageOf(sampleReview({ stages: [sampleReviewed(), sampleReviewed(sampleReport({ 'limits.supplyCurrent': '1 nA' }))] }));
const headings = (text: string): string[] => [...text.matchAll(/<h[1-4][^>]*>(.*?)<\/h[1-4]>/gu)].map(([, title = '']) => title.replaceAll(/<[^>]*>/gu, ''));
const idsIn = (text: string): string[] => [...text.matchAll(/ id="([^"]*)"/gu)].map(([, id = '']) => id);

describe('the page of one stage', () => {
  it('answers first, and keeps the order a reviewer reads in', () => {
    const wanted = ['Answer', 'Stage', 'Margins', 'Shortlist', 'Budgets', 'Assumptions', 'Method', 'What does not fit', 'Sources', 'Reproduce', 'Sign-off'];
    expect(headings(page).filter((title) => wanted.includes(title))).toEqual(wanted);
    expect(headings(page)[0]).toBe('Design review: Soil-moisture probe');
  });

  it('has one h1, and headings that skip no level', () => {
    const levels = [...page.matchAll(/<h([1-6])/gu)].map(([, level]) => Number(level));
    expect(levels.filter((level) => level === 1)).toEqual([1]);
    for (const [at, level] of levels.entries()) expect(level).toBeLessThanOrEqual((levels[at - 1] ?? 0) + 1);
  });

  it('has no id twice, and no link to an id that is not there', () => {
    for (const text of [page, several]) {
      const ids = idsIn(text);
      expect(ids.filter((id, at) => ids.indexOf(id) !== at)).toEqual([]);
      expect([...text.matchAll(/href="#([^"]*)"/gu)].map(([, id = '']) => id).filter((id) => !ids.includes(id))).toEqual([]);
    }
  });

  it('asks for nothing: a policy without sources, no address but its own data', () => {
    expect(page).toMatch(/content="default-src 'none'; style-src 'unsafe-inline'; img-src data:; script-src 'sha256-[\w+/=]{44}'; base-uri 'none'; form-action 'none'"/u);
    const targets = [...page.matchAll(/ (?:src|srcset|href|action|poster|data)="([^"]*)"/gu)].map(([, target = '']) => target);
    expect(targets.length).toBeGreaterThan(20);
    expect(targets.filter((target) => !/^(?:#|data:text\/csv;)/u.test(target))).toEqual([]);
    // The name of a vocabulary is no address.
    expect(page.replaceAll('xmlns="http://www.w3.org/2000/svg"', '')).not.toMatch(/url\(|@import|https?:\/\//u);
    expect(page).not.toMatch(/<(?:link|iframe|object|embed|form|base)\b/u);
  });

  it('gives the same bytes for the same review', () => { expect(pageOf(sampleReview())).toBe(page); });

  it('embeds what shortlist --json prints, and the document is as its schema says', () => {
    const document = JSON.parse(embeddedIn(page) ?? '') as { readonly stages: readonly { readonly shortlist: unknown; readonly outcomes: readonly unknown[] }[] };
    expect(document.stages[0]?.shortlist).toEqual(JSON.parse(shortlistJson(sampleReviewed().report, { top: 20, all: false })));
    expect(document.stages[0]?.outcomes).toHaveLength(SAMPLE_PARTS.length);
    expect(DOCUMENTS.report.safeParse(document).error?.issues ?? []).toEqual([]);
  });

  it('says in the answer who chose the part, how sure it is, and every caution that stands further down', () => {
    const answer = page.slice(page.indexOf('id="s1-answer"'), page.indexOf('id="s1-stage"'));
    expect(answer).toContain('First in the order of the shortlist; nobody has chosen it yet.');
    expect(answer).toMatch(/All 17 checks pass in the worst case, all of them on limits\./u);
    const typical = pageOf(sampleReview({ stages: [sampleReviewed(sampleReport(), 'TEAM-0012')] }));
    const box = typical.slice(typical.indexOf('id="s1-answer"'), typical.indexOf('id="s1-stage"'));
    expect(box).toContain('1 of 2 sections idle');
    expect(box).toContain('Named for this review.');
    expect(box).toContain('Confirm before release');
  });

  it('marks every figure with its kind and its origin', () => {
    const made = page.slice(page.indexOf('id="s1-terms"'), page.indexOf('id="s1-shortlist"'));
    const rows = [...made.matchAll(/<tr id="s1-term-[^"]*"[^>]*>(.*?)<\/tr>/gu)].map(([, row = '']) => row);
    expect(rows.length).toBeGreaterThan(10);
    const traced = rows.filter((row) => row.includes('approved.csv row'));
    expect(traced.length).toBeGreaterThan(8);
    for (const row of traced) expect(row).toMatch(/>(?:minimum|maximum|typical)</u);
  });
});

describe('the page when nothing fits, or the part does not', () => {
  it('says so first, and why', () => {
    const none = pageOf(sampleReview({ stages: [sampleReviewed(sampleReport({ 'limits.supplyCurrent': '1 nA' }))] }));
    const answer = none.slice(none.indexOf('id="s1-answer"'), none.indexOf('id="s1-stage"'));
    expect(answer).toContain('✕ no part fits');
    expect(answer).toContain('No part of 6 fits.');
    expect(none).toContain('there are no margins to show');
  });

  it('shows a named part that fails with what it misses', () => {
    const failing = pageOf(sampleReview({ stages: [sampleReviewed(sampleReport(), 'TEAM-0007')] }));
    expect(failing).toMatch(/TEAM-0007<\/bdi> <span class="bad"><span class="w">✕ does not fit/u);
    expect(failing).toMatch(/<tr id="s1-check-slew-rate" class="bad">/u);
  });

  it('shows an open one as open', () => {
    const open = pageOf(sampleReview({ stages: [sampleReviewed(sampleReport(), 'TEAM-0031')] }));
    expect(open).toContain('? cannot be decided');
    expect(open).toContain('Open for the chosen part');
  });
});

describe('several stages', () => {
  it('have a contents list, a summary and a section each', () => {
    expect(headings(several).filter((title) => /^(?:Summary|\d\. |Reproduce|Sign-off)/u.test(title))).toEqual(['Summary', '1. Soil-moisture probe', '2. Soil-moisture probe', 'Reproduce', 'Sign-off']);
    expect(several).toContain('<a href="#s2">');
    expect(several).toContain('<tr id="s2-summary">');
  });
});

describe('hostile words of a list or a stage', () => {
  const report = hostileReport();
  const hostile = pageOf(sampleReview({ stages: [sampleReviewed(report, HOSTILE.id)], name: 'a"</style><script>.html', command: 'railfit <b>' }));

  it('stay words: no element, attribute or end of the embedded document comes from them', () => {
    expect([...hostile.matchAll(/<script/gu)]).toHaveLength(2);
    expect(hostile).not.toMatch(/<img|<svg onload|<b>document/u);
    expect(hostile).not.toMatch(/\son(?:error|load)=(?!&#34;)"/u);
    expect(hostile.includes('\u202e')).toBe(false);
    expect([...hostile.matchAll(/<\/style>/gu)]).toHaveLength(1);
  });

  it('are shown, written out where they would deceive', () => {
    expect(hostile).toContain('&#60;script&#62;document.title=&#34;owned&#34;&#60;/script&#62;');
    expect(hostile).toMatch(/characters\)/u);
  });

  it('come back unchanged from the embedded document', () => {
    const document = JSON.parse(embeddedIn(hostile) ?? '') as { readonly stages: readonly { readonly chosen: { readonly part: string } }[] };
    expect(document.stages[0]?.chosen.part).toBe(HOSTILE.id);
  });
});

it('sixty parts in full stay below a megabyte', () => {
  const [first] = SAMPLE_PARTS;
  if (first === undefined) throw new Error('no sample part');
  const parts = Array.from({ length: 60 }, (_, at) => ({ ...first, id: `TEAM-${1000 + at}` }));
  const report = sampleReport({}, parts);
  expect(report.fit).toHaveLength(60);
  const text = pageOf(sampleReview({ stages: [sampleReviewed(report)], top: 60 }));
  expect(Buffer.byteLength(text)).toBeLessThan(1_000_000);
});

it('sixty parts of all kinds with every figure stay below a megabyte too', () => {
  const parts = Array.from({ length: 10 }, (_, at) => PAGE_PARTS.map((part) => ({ ...part, id: `${part.id}-${at}` }))).flat();
  const report = sampleReport({ 'limits.outputNoise': '300 µVrms' }, parts);
  expect(report.counts.parts).toBe(60);
  const stage = { ...sampleReviewed(report), prediction: PREDICTION, sweep: SWEEP };
  const text = pageOf(sampleReview({ stages: [stage], top: 60, all: true }));
  expect([...text.matchAll(/<svg /gu)].length).toBeGreaterThan(8);
  expect(Buffer.byteLength(text)).toBeLessThan(1_000_000);
});
