import { describe, expect, it } from 'vitest';
import { codeMarkdown, plainMarkdown, tableMarkdown } from '../../../src/presentation/page/markdown-signs.js';
import { reportCsv } from '../../../src/presentation/page/report-csv.js';
import { reportMarkdown } from '../../../src/presentation/page/report-markdown.js';
import { SAMPLE_PARTS, sampleReport } from '../../support/sample-report.js';
import { HOSTILE, hostileReport, sampleReview, sampleReviewed } from '../../support/sample-review.js';

describe('Markdown for a pull request', () => {
  it('escapes what means something there, and keeps foreign words as code', () => {
    expect(plainMarkdown('a|b *c* <d> [e](f) _g_ `h` #1')).toBe('a\\|b \\*c\\* \\<d\\> \\[e\\](f) \\_g\\_ \\`h\\` \\#1');
    expect(codeMarkdown('@team `x` | y')).toBe('``@team `x` \\| y``');
    expect(codeMarkdown('`')).toBe('`` ` ``');
    expect(tableMarkdown(['A'], [])).toEqual([]);
  });

  it('answers first, then margins, shortlist, near misses, assumptions, how to get it again', () => {
    const text = reportMarkdown(sampleReview());
    expect([...text.matchAll(/^#+ (.*)$/gmu)].map(([, title]) => title)).toEqual(['Design review: Soil-moisture probe', 'Margins, worst case', 'Shortlist', 'Nearest of those that do not fit', 'Reproduce']);
    expect(text).toContain('**`TEAM-0005` ✓ fits.** First in the order of the shortlist; nobody has chosen it yet.');
    expect(text).toContain('| supply current | ✓ pass | 35 µA | 90 µA | 61 % spare |');
    expect(text).toContain('`railfit report probe.yaml -o review.html`');
  });

  it('has a summary of several stages', () => {
    const text = reportMarkdown(sampleReview({ stages: [sampleReviewed(), sampleReviewed(sampleReport({ 'limits.supplyCurrent': '1 nA' }))] }));
    expect(text).toContain('| `Soil-moisture probe` | `TEAM-0005` | ✓ fits | 3 | 1 | 2 |');
    expect(text).toContain('| `Soil-moisture probe` | none | nothing fits | 0 | 0 | 6 |');
    expect(text).toContain('**No part fits.**');
  });

  it('keeps hostile words out of markup and inside one line', () => {
    const text = reportMarkdown(sampleReview({ stages: [sampleReviewed(hostileReport(), HOSTILE.id)] }));
    const outsideCode = text.replaceAll(/(`+)(?!`)[^\n]*?(?<!`)\1(?!`)/gu, '');
    expect(outsideCode).not.toMatch(/(?<!\\)[<>]/u);
    expect(outsideCode).not.toContain('onerror');
    expect(text.includes('\u202e')).toBe(false);
  });
});

describe('CSV of a review', () => {
  const rows = reportCsv(sampleReview()).split('\r\n').filter((row) => row !== '');

  it('has one row for every verdict of every part', () => {
    const report = sampleReport();
    const verdicts = [...report.fit, ...report.undecided, ...report.rejected].reduce((sum, one) => sum + one.verdicts.length, 0);
    expect(rows).toHaveLength(verdicts + 1);
    expect(new Set(rows.slice(1).map((row) => row.split(',')[3]))).toEqual(new Set(SAMPLE_PARTS.map(({ id }) => id)));
  });

  it('has SI numbers, unrounded, and says which part is chosen', () => {
    expect(rows[0]).toBe('stage,file,rank,part,tier,outcome,chosen,check,verdict,required,offered,unit,sense,spare,margin,basis,reason,worst case,text');
    const row = rows.find((one) => one.includes('TEAM-0005') && one.includes('supply-current'));
    expect(row).toMatch(/^Soil-moisture probe,probe\.yaml,1,TEAM-0005,approved,fits,yes,supply-current,pass,0\.00009,0\.000035,A,at-most,/u);
  });

  it('disarms formulas of a list', () => {
    expect(reportCsv(sampleReview({ stages: [sampleReviewed(sampleReport({ name: '=1+1' }))] }))).toContain("\r\n'=1+1,");
  });
});
