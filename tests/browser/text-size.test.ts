// The page as readers set it: text at 200 %, their own spacing of lines, words and letters, narrow windows (WCAG 2.2: 1.4.4, 1.4.10, 1.4.12).
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { withPages } from '../support/browser.js';
import { PAGE_PARTS, PREDICTION, SWEEP } from '../support/page.js';
import { sampleReport } from '../support/sample-report.js';
import { HOSTILE, hostileReport, pageOf, sampleReview, sampleReviewed } from '../support/sample-review.js';

const PATIENCE = 180_000;
const [first, ...rest] = PAGE_PARTS;
const long = sampleReport({ name: 'N'.repeat(120) }, [{ ...first!, id: `TEAM-${'W'.repeat(90)}`, description: 'x'.repeat(200) }, ...rest]);
const full = { ...sampleReviewed(sampleReport({ 'limits.outputNoise': '300 µVrms' }, PAGE_PARTS)), prediction: PREDICTION, sweep: SWEEP };
const PAGES: Readonly<Record<string, string>> = {
  'full.html': pageOf(sampleReview({ stages: [full] })),
  'several.html': pageOf(sampleReview({ stages: [full, sampleReviewed(sampleReport(), 'TEAM-0031')] })),
  'long.html': pageOf(sampleReview({ stages: [sampleReviewed(long)] })),
  'hostile.html': pageOf(sampleReview({ stages: [sampleReviewed(hostileReport(), HOSTILE.id)] })),
};

/** What a reader may set, as a style sheet of the reader's own. The spacing is that of success criterion 1.4.12. */
const SETTINGS = {
  'as it comes': '',
  'text at 200 %': 'html{font-size:200% !important}',
  'text spacing': '*{line-height:1.5 !important;letter-spacing:.12em !important;word-spacing:.16em !important}p{margin-bottom:2em !important}',
} as const;

const opened = withPages(PAGES, PATIENCE);

async function shown(name: string, width: number, style: string): Promise<Page> {
  const { page } = await opened().folder.show(name, { width });
  await page.evaluate("document.querySelectorAll('details').forEach((one) => { one.open = true; })");
  if (style !== '') await page.addStyleTag({ content: style });
  return page;
}

/** Run in the page. What scrolls in a region of its own may be wide there; all else stays in the window and in its own box. */
const FAULTS = `(() => {
  const faults = [];
  const own = (one) => one.closest('.scroll, pre:not(.wrap)') !== null;
  const name = (one) => one.tagName + (one.id ? '#' + one.id : '') + ' ' + one.textContent.trim().slice(0, 40);
  const shown = [...document.querySelectorAll('h1,h2,h3,h4,p,li,dt,dd,summary,caption,figcaption,th,td,pre,nav a,thead button')].filter((one) => !one.matches('.out, .out *, .skip'));
  for (const one of shown) {
    const box = one.getBoundingClientRect();
    if (box.width === 0) continue;
    if (!own(one) && (box.left < -0.5 || box.right > innerWidth + 0.5)) faults.push('outside the window: ' + name(one));
    const style = getComputedStyle(one);
    if (style.overflowX !== 'visible' && style.overflowX !== 'auto') faults.push('clips: ' + name(one));
    const range = document.createRange();
    range.selectNodeContents(one);
    for (const line of range.getClientRects()) if (line.width > 0 && (line.left < box.left - 1.5 || line.right > box.right + 1.5) && style.overflowX !== 'auto') { faults.push('text leaves its box: ' + name(one)); break; }
  }
  const rows = [...document.querySelectorAll('h1,h2,h3,h4,main p,main li,dt,dd,summary,figcaption,tr')].filter((one) => one.querySelector('p,li,tr') === null && one.getBoundingClientRect().height > 0);
  rows.slice(1).forEach((one, at) => {
    const [above, below] = [rows[at].getBoundingClientRect(), one.getBoundingClientRect()];
    const apart = above.bottom <= below.top + 1 || below.bottom <= above.top + 1 || above.right <= below.left + 1 || below.right <= above.left + 1;
    if (!apart) faults.push('overlap: ' + name(rows[at]) + ' × ' + name(one));
  });
  return faults;
})()`;

describe.each(Object.keys(PAGES))('%s', (name) => {
  describe.each(Object.entries(SETTINGS))('%s', (_words, style) => {
    it.each([320, 640, 1600])('at %i px nothing is cut, covered or to be scrolled sideways', { timeout: PATIENCE }, async (width) => {
      const page = await shown(name, width, style);
      expect(await page.evaluate('document.documentElement.scrollWidth - document.documentElement.clientWidth')).toBeLessThanOrEqual(0);
      expect(await page.evaluate(FAULTS)).toEqual([]);
    });
  });
});

describe('figures', () => {
  it('grow with the text of the reader', { timeout: PATIENCE }, async () => {
    const sizes: number[] = [];
    for (const style of [SETTINGS['as it comes'], SETTINGS['text at 200 %']]) {
      const page = await shown('full.html', 1600, style);
      sizes.push(await page.evaluate<number>("document.querySelector('#s1-plot-margins svg text').getBoundingClientRect().height"));
    }
    expect(sizes[1]! / sizes[0]!).toBeCloseTo(2, 1);
  });

  it.each([320, 360])('at %i px keep their text at 12 px or more and scroll by keyboard in a region of their own', { timeout: PATIENCE }, async (width) => {
    const page = await shown('full.html', width, '');
    const figures = await page.evaluate<{ id: string; smallest: number }[]>(`[...document.querySelectorAll('figure')].map((one) => {
      const svg = one.querySelector('svg');
      const scale = svg.getBoundingClientRect().width / svg.viewBox.baseVal.width;
      return { id: one.id, smallest: Math.min(...[...svg.querySelectorAll('text')].map((text) => Number.parseFloat(getComputedStyle(text).fontSize) * scale)) };
    })`);
    expect(figures.length).toBeGreaterThan(8);
    expect(figures.filter(({ smallest }) => smallest < 11.99)).toEqual([]);
    const region = page.locator('#s1-plot-margins > .scroll');
    expect(await region.getAttribute('tabindex')).toBe('0');
    await region.focus();
    expect(await page.evaluate('getComputedStyle(document.activeElement).outlineStyle')).toBe('solid');
    for (let press = 0; press < 20; press += 1) await page.keyboard.press('ArrowRight');
    await expect.poll(() => page.evaluate<number>('document.activeElement.scrollLeft')).toBeGreaterThan(100);
  });
});
