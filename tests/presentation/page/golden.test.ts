// The page as a reviewer reads it, and the bytes of every section: a change that is meant shows here as words, one that is not as a hash.
import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { PAGE_PARTS, PREDICTION, SWEEP } from '../../support/page.js';
import { sampleReport } from '../../support/sample-report.js';
import { pageOf, sampleReview, sampleReviewed } from '../../support/sample-review.js';

const fits = { ...sampleReviewed(sampleReport({ 'limits.outputNoise': '300 µVrms' }, PAGE_PARTS)), prediction: PREDICTION, sweep: SWEEP };
const nothing = sampleReviewed(sampleReport({ 'limits.supplyCurrent': '1 nA' }));
const gone = sampleReviewed(sampleReport(), 'TEAM-0031');
const withdrawn = { ...gone, chosen: { ...gone.chosen!, by: 'saved' as const, rank: null, withdrawn: 'was withdrawn: next.csv no longer has it' } };

const PAGES = {
  one: pageOf(sampleReview({ stages: [fits] })),
  several: pageOf(sampleReview({ stages: [nothing, withdrawn] })),
};

/** Elements that end a line of reading; the cells of a row stay in one. */
const ENDS = /<\/(?:p|li|h\d|tr|caption|figcaption|summary|dd|pre|title)>/gu;
const ENTITIES = /&#(\d+);/gu;

/** What is read, line by line; drawings give their title and finding, the embedded document and the style their names alone. */
function read(page: string): string {
  return page
    .replace(/<style>.*?<\/style>/su, '')
    .replace(/<script[^>]*>.*?<\/script>/gsu, '')
    .replace(/<svg[^>]*><title>(.*?)<\/title><desc>.*?<\/svg>/gsu, '<p>[drawing: $1]</p>')
    .replaceAll('\n', ' ')
    .replace(/<h(\d)[^>]*>/gu, (_tag, level: string) => `\n${'#'.repeat(Number(level))} `)
    .replace(/<\/t[hd]>/gu, ' | ')
    .replace(ENDS, '\n')
    .replace(/<[^>]*>/gu, '')
    .replace(ENTITIES, (_entity, code: string) => String.fromCodePoint(Number(code)))
    .replaceAll('\u00a0', ' ')
    .split('\n')
    .map((line) => line.replace(/\s+/gu, ' ').replace(/ \|$/u, '').trim())
    .filter((line) => line !== '')
    .join('\n');
}

/** SHA-256 of the markup of every section, 12 digits, and of what stands round them. */
function marks(page: string): string {
  const pieces = page.split(/(?=<section id=")|(?=<footer>)|(?=<script)/u);
  return pieces.map((piece, at) => `${createHash('sha256').update(piece).digest('hex').slice(0, 12)}  ${/^<section id="([^"]*)"/u.exec(piece)?.[1] ?? (at === 0 ? 'head' : piece.startsWith('<footer') ? 'footer' : piece.startsWith('<script type') ? 'document' : 'script')}`).join('\n');
}

describe.each(Object.entries(PAGES))('the page of %s', (name, page) => {
  it('reads as it did', async () => {
    const text = read(page);
    expect(text.length).toBeGreaterThan(5000);
    expect(text).not.toMatch(/<\/?(?:p|td|div|span)\b/u);
    await expect(`${text}\n`).toMatchFileSnapshot(`golden/page-${name}.txt`);
  });

  it('has the same bytes, section by section', async () => {
    await expect(`${marks(page)}\n`).toMatchFileSnapshot(`golden/page-${name}.sha256`);
  });
});

describe('a part that was withdrawn', () => {
  const answer = PAGES.several.slice(PAGES.several.indexOf('id="s2-answer"'), PAGES.several.indexOf('id="s2-stage"'));
  it('is said to be so with its name, in the summary and as the first caution', () => {
    expect(answer).toContain('>withdrawn since</span>');
    expect(answer).toContain('The part kept with this stage. No longer on the approved list.');
    expect(answer).toMatch(/<b>Cautions<\/b><\/p><ul class="caution-list"><li>TEAM-0031 was withdrawn/u);
    expect(PAGES.several).toMatch(/<tr id="s2-summary".*TEAM-0031<\/bdi> <span class="also">\(withdrawn since\)/u);
  });
});
