// The page in the browser people use. A missing browser fails here, with the command that installs one.
import { execFileSync } from 'node:child_process';
import axe from 'axe-core';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { withPages } from '../support/browser.js';
import { sampleReport } from '../support/sample-report.js';
import { HOSTILE, hostileReport, pageOf, sampleReview, sampleReviewed } from '../support/sample-review.js';

const PATIENCE = 180_000;
const one = pageOf(sampleReview({ stages: [sampleReviewed(sampleReport(), 'TEAM-0012')] }));
const none = sampleReviewed(sampleReport({ 'limits.supplyCurrent': '1 nA' }));
const PAGES: Readonly<Record<string, string>> = {
  'one.html': one,
  'several.html': pageOf(sampleReview({ stages: [sampleReviewed(), none, sampleReviewed(sampleReport(), 'TEAM-0031')] })),
  'hostile.html': pageOf(sampleReview({ stages: [sampleReviewed(hostileReport(), HOSTILE.id)], name: HOSTILE.id })),
};
const NAMES = Object.keys(PAGES);

const opened = withPages(PAGES, PATIENCE);

const overflow = (page: Page): Promise<number> => page.evaluate('document.documentElement.scrollWidth - window.innerWidth');

describe.each(NAMES)('%s', (name) => {
  it.each([[320, 'light'], [320, 'dark'], [768, 'light'], [1600, 'dark']] as const)('at %i px, %s: no message, no request, nothing to scroll sideways', { timeout: PATIENCE }, async (width, scheme) => {
    const { page, said, asked } = await opened().folder.show(name, { width, scheme });
    expect(await overflow(page)).toBeLessThanOrEqual(0);
    await page.locator('summary').first().click();
    expect(await overflow(page)).toBeLessThanOrEqual(0);
    expect(said).toEqual([]);
    expect(asked).toEqual([]);
  });

  it.each(['light', 'dark'] as const)('%s: axe finds nothing to blame', { timeout: PATIENCE }, async (scheme) => {
    const { page } = await opened().folder.show(name, { width: 1024, scheme });
    await page.evaluate("document.querySelectorAll('details').forEach((one) => { one.open = true; })");
    await page.evaluate(axe.source);
    const { violations, passes } = await page.evaluate<axe.AxeResults>('axe.run({ runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"], resultTypes: ["violations"] })');
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html ?? ''}`)).toEqual([]);
    expect(passes.map(({ id }) => id)).toEqual(expect.arrayContaining(['color-contrast', 'heading-order', 'landmark-one-main', 'document-title', 'td-headers-attr']));
  });
});

describe('hostile words', () => {
  it('do nothing: no script runs, no element comes of them, the line direction of others stays', { timeout: PATIENCE }, async () => {
    const { page } = await opened().folder.show('hostile.html', { width: 1024 });
    expect(await page.title()).toMatch(/^Design review: <\/title><script>/u);
    expect(await page.evaluate('[document.images.length, document.querySelectorAll("svg:not(.figure)").length, document.scripts.length]')).toEqual([0, 0, 2]);
    expect(await page.evaluate('[...document.querySelectorAll("*")].filter((one) => one.getAttributeNames().some((name) => name.startsWith("on"))).length')).toBe(0);
    const shown = await page.locator('#s1-fit tbody bdi').nth(1).innerText();
    expect(shown).toContain('مكبر عمليات');
  });
});

describe('by keyboard alone', () => {
  it('the skip link comes first, focus is seen, details open', { timeout: PATIENCE }, async () => {
    const { page } = await opened().folder.show('one.html', { width: 1024 });
    await page.keyboard.press('Tab');
    expect(await page.evaluate('document.activeElement.textContent')).toBe('Skip to the answer');
    expect(await page.evaluate('getComputedStyle(document.activeElement).outlineStyle')).toBe('solid');
    await page.keyboard.press('Enter');
    expect(await page.evaluate('location.hash')).toBe('#main');
    await page.locator('summary').first().focus();
    await page.keyboard.press('Enter');
    expect(await page.locator('details').first().getAttribute('open')).toBe('');
  });

  it('a table is sorted by its heads, up and down, and says so', { timeout: PATIENCE }, async () => {
    const { page } = await opened().folder.show('one.html', { width: 1024 });
    const first = (): Promise<string> => page.locator('#s1-fit tbody tr').first().getAttribute('id').then(String);
    const price = page.locator('#s1-fit thead button', { hasText: 'Price' });
    await price.focus();
    await page.keyboard.press('Enter');
    expect(await first()).toBe('s1-part-GX-LV-1M');
    expect(await page.locator('#s1-fit th[aria-sort=ascending]').innerText()).toContain('Price');
    expect(await page.locator('[role=status]').innerText()).toBe('Sorted by Price, ascending.');
    await page.keyboard.press('Space');
    expect(await first()).toBe('s1-part-TEAM-0005');
    expect(await page.locator('[role=status]').innerText()).toBe('Sorted by Price, descending.');
  });

  it('everything that can be reached is large enough to hit', { timeout: PATIENCE }, async () => {
    const { page } = await opened().folder.show('one.html', { width: 1024 });
    const small = await page.evaluate(`[...document.querySelectorAll('button, summary, nav a, .csv a')].filter((one) => { const box = one.getBoundingClientRect(); return box.width > 0 && (box.width < 24 || box.height < 24); }).map((one) => one.outerHTML)`);
    expect(small).toEqual([]);
  });
});

describe('without its script', () => {
  it('the page reads the same, only the heads are no buttons', { timeout: PATIENCE }, async () => {
    const context = await opened().browser.newContext({ javaScriptEnabled: false });
    const page = await context.newPage();
    await page.goto(`file://${opened().folder.path('one.html')}`);
    expect(await page.locator('thead button').count()).toBe(0);
    expect(await page.locator('#s1-answer .verdict').innerText()).toBe('TEAM-0012 ✓ fits');
    await context.close();
  });
});

describe.each([['A4', 210], ['Letter', 215.9]] as const)('printed on %s', (format, millimetres) => {
  it('cuts no table', { timeout: PATIENCE }, async () => {
    // Paper less the margins of the style sheet, at 96 px to the inch.
    const { page } = await opened().folder.show('several.html', { width: Math.floor(((millimetres - 26) / 25.4) * 96) });
    await page.emulateMedia({ media: 'print' });
    await page.evaluate("dispatchEvent(new Event('beforeprint'))");
    const wide = await page.evaluate("[...document.querySelectorAll('table, pre')].filter((one) => one.getBoundingClientRect().right > document.documentElement.clientWidth + 1).map((one) => one.id)");
    expect(wide).toEqual([]);
    expect(await page.evaluate("[...document.querySelectorAll('details')].every((one) => one.open)")).toBe(true);
  });

  it('names file, hash and page in the margin, and repeats the heads of long tables', { timeout: PATIENCE }, async () => {
    const { page } = await opened().folder.show('one.html', { width: 1024 });
    const file = opened().folder.path(`${format}.pdf`);
    await page.pdf({ path: file, format });
    const pages = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' }).split('\f').filter((text) => text.trim() !== '');
    expect(pages.length).toBeGreaterThan(4);
    for (const [at, text] of pages.entries()) {
      expect(text).toMatch(/review\.html · [0-9a-f]{16}/u);
      expect(text).toMatch(new RegExp(`${at + 1} ?/ ?${pages.length}\\b`, 'u'));
    }
    const rows = pages.filter((text) => /^(?:supply|input|output|slew|DC error)[^\n]*approved\.csv/mu.test(text));
    expect(rows.length).toBeGreaterThan(0);
    for (const text of rows) expect(text).toMatch(/Check and term|Where each figure|Figure +Kind/u);
  });
});
