// The page on paper: what a browser prints on A4 and on Letter, read back from the PDF.
import { execFileSync } from 'node:child_process';
import { beforeAll, describe, expect, it } from 'vitest';
import { withPages } from '../support/browser.js';
import { PAGE_PARTS, PREDICTION, SWEEP } from '../support/page.js';
import { sampleReport } from '../support/sample-report.js';
import { pageOf, sampleReview, sampleReviewed } from '../support/sample-review.js';

const PATIENCE = 180_000;
const full = { ...sampleReviewed(sampleReport({ 'limits.outputNoise': '300 µVrms' }, PAGE_PARTS)), prediction: PREDICTION, sweep: SWEEP };
const PAGE = pageOf(sampleReview({ stages: [full, sampleReviewed(sampleReport(), 'TEAM-0031')] }));

const opened = withPages({ 'review.html': PAGE }, PATIENCE);

interface Word {
  readonly text: string;
  readonly right: number;
  readonly bottom: number;
}

interface Sheet {
  readonly width: number;
  readonly height: number;
  readonly words: readonly Word[];
}

/** Every word of every page with the place it is printed at, points. */
function sheetsOf(file: string): Sheet[] {
  const xml = execFileSync('pdftotext', ['-bbox', file, '-'], { encoding: 'utf8', maxBuffer: 64e6 });
  return xml.split('<page ').slice(1).map((page) => {
    const [, width = '', height = ''] = /^width="([\d.]+)" height="([\d.]+)"/u.exec(page) ?? [];
    const words = [...page.matchAll(/xMax="([\d.]+)" yMax="([\d.]+)">([^<]*)</gu)].map(([, right, bottom, text = '']): Word => ({ text, right: Number(right), bottom: Number(bottom) }));
    return { width: Number(width), height: Number(height), words };
  });
}

/** Letters and digits alone: what is left of a text whatever its markup, blanks and line breaks. */
const letters = (text: string): string => text.replace(/<[^>]*>/gu, '').replace(/&(?:#\d+|\w+);/gu, '').replace(/[^\p{L}\p{N}]/gu, '');

const POINTS_PER_MM = 72 / 25.4;

describe.each([['A4', 595, 842], ['Letter', 612, 792]] as const)('printed on %s', (format, width, height) => {
  let sheets: Sheet[];
  beforeAll(async () => {
    const { page } = await opened().folder.show('review.html', { width: 1024 });
    const file = opened().folder.path(`${format}.pdf`);
    await page.pdf({ path: file, format, preferCSSPageSize: false });
    sheets = sheetsOf(file);
  }, PATIENCE);
  const texts = (): string[] => sheets.map(({ words }) => words.map(({ text }) => text).join(' '));

  it('is that paper, with nothing in or beyond the margin at the right', () => {
    expect(sheets.length).toBeGreaterThan(10);
    for (const sheet of sheets) {
      expect(Math.abs(sheet.width - width) + Math.abs(sheet.height - height)).toBeLessThan(3);
      expect(sheet.words.filter(({ right, bottom }) => right > width - 12 * POINTS_PER_MM || bottom > height).map(({ text }) => text)).toEqual([]);
    }
  });

  it('keeps every figure on one page with its title and its axis', () => {
    const pages = texts().map(letters);
    const figures = [...PAGE.matchAll(/<figcaption id="[^"]*-plot-[^"]*"><b>([^<]*)<\/b> (.*?)<\/figcaption>.*?<svg(.*?)<\/svg>/gsu)];
    expect(figures.length).toBeGreaterThan(12);
    for (const [, title = '', finding = '', svg = ''] of figures) {
      const drawn = [...svg.matchAll(/<text[^>]*>([^<]*)</gu)].map(([, text = '']) => text).flatMap((text) => text.split(/[ \u00a0]/u)).map(letters).filter((word) => word.length > 2);
      const caption = letters(`${title} ${finding}`).slice(0, 60);
      const together = pages.filter((text) => text.includes(caption) && drawn.every((words) => text.includes(words)));
      expect(together.length, `${title} on one page`).toBeGreaterThan(0);
    }
  });

  it('shows the data behind every figure, which the screen folds away', () => {
    const all = texts().join(' ');
    const folded = [...PAGE.matchAll(/<summary>Data of this figure<\/summary>/gu)].length;
    expect(folded).toBeGreaterThan(8);
    expect(all.match(/Data of this figure/gu)?.length).toBe(folded);
    expect(all).toContain('first TEAM-0012');
  });

  it('starts the answer on the first page and keeps the lines to sign together', () => {
    const pages = texts();
    expect(pages[0]).toContain('TEAM-0012 ✓ fits');
    const signed = pages.find((text) => text.includes('Prepared by:'));
    for (const words of ['Sign-off', 'Approved by:', 'Revision history', 'Revision 2:']) expect(signed).toContain(words);
  });

  it('fills its pages: hardly one is left more than half empty', () => {
    const foot = height - 17 * POINTS_PER_MM;
    const empty = sheets.slice(0, -1).filter(({ words }) => Math.max(...words.map(({ bottom }) => bottom).filter((bottom) => bottom < foot)) < height / 2);
    expect(empty.length).toBeLessThanOrEqual(Math.ceil(sheets.length / 10));
  });

  it('leaves no heading alone at the foot of a page', () => {
    const headings = ['Answer', 'Stage', 'Margins', 'Shortlist', 'Budgets', 'Plots', 'Assumptions', 'Method', 'Sources'];
    for (const { words } of sheets) {
      const printed = words.filter(({ bottom }) => bottom < height - 17 * POINTS_PER_MM);
      expect(headings).not.toContain(printed.at(-1)?.text);
    }
  });

  it('does without links, skip link and contents list', () => {
    expect(texts()[0]).not.toContain('Skip to the answer');
    expect(texts().join(' ')).not.toContain('CSV:');
  });
});
