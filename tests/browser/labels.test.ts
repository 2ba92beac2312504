// What only a browser knows: how wide text really is. Every text of every drawing, measured as it is laid out.
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { textWidth } from '../../src/presentation/page/drawing/text-width.js';
import { plotsOf } from '../../src/presentation/page/plots/index.js';
import { schematicOf } from '../../src/presentation/page/schematic/index.js';
import type { Part } from '../../src/parts/part.js';
import { launchBrowser } from '../support/browser.js';
import { PAGE_PARTS, pageInput } from '../support/page.js';
import { BENCHES, built } from '../support/twelve.js';

let browser: Browser;
let page: Page;

beforeAll(async () => {
  browser = await launchBrowser();
  page = await browser.newPage({ viewport: { width: 1000, height: 900 } });
});
afterAll(async () => {
  await browser.close();
});

interface Measured {
  readonly text: string;
  readonly size: number;
  readonly box: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
}

interface Laid {
  readonly width: number;
  readonly height: number;
  readonly texts: readonly Measured[];
}

/** All texts of one drawing in its own units, as laid out. */
async function laidOut(svg: string, family = ''): Promise<Laid> {
  await page.setContent(`<style>body{margin:0}svg{display:block}${family === '' ? '' : `svg{font-family:${family}}`}</style>${svg}`);
  return page.evaluate<Laid>(MEASURE);
}

/** Run in the page: every text with its box against the drawing's corner. */
const MEASURE = `(() => {
  const frame = document.querySelector('svg').getBoundingClientRect();
  const texts = [...document.querySelectorAll('svg text')].map((text) => {
    const { left, right, top, bottom } = text.getBoundingClientRect();
    const box = { left: left - frame.left, right: right - frame.left, top: top - frame.top, bottom: bottom - frame.top };
    return { text: text.textContent, size: Number.parseFloat(getComputedStyle(text).fontSize), box };
  });
  return { width: frame.width, height: frame.height, texts };
})()`;

/** The box a line of text is laid out in is taller than its letters. */
const AIR = 2.5;

function collisions({ texts }: Laid): string[] {
  return texts.flatMap((one, at) =>
    texts.slice(at + 1).flatMap((other) => {
      const apart = one.box.right <= other.box.left || other.box.right <= one.box.left || one.box.bottom - AIR <= other.box.top + AIR || other.box.bottom - AIR <= one.box.top + AIR;
      return apart ? [] : [`${one.text} × ${other.text}`];
    }),
  );
}

const clipped = ({ texts, width, height }: Laid): string[] => texts.filter(({ box }) => box.left < 0 || box.top < -AIR || box.right > width || box.bottom > height + AIR).map(({ text }) => text);

async function expectClear(svg: string): Promise<void> {
  const laid = await laidOut(svg);
  expect(laid.texts.length).toBeGreaterThan(0);
  expect(collisions(laid)).toEqual([]);
  expect(clipped(laid)).toEqual([]);
  expect(laid.texts.filter(({ size }) => size < 12).map(({ text }) => text)).toEqual([]);
}

const LONG: readonly Part[] = PAGE_PARTS.map((part, at) => (at < 3 ? { ...part, id: `${'WIDE-'.repeat(8)}${at}` } : part));

describe('plots', () => {
  const inputs = [
    ['of the first that fits', pageInput()],
    ['of one that cannot be decided', pageInput({}, { about: 'TEAM-0031' })],
    ['of one that does not fit', pageInput({ 'signal.input': '25 mV..380 mV' }, { about: 'TEAM-0007' })],
    ['with long names', pageInput({}, { parts: LONG, about: LONG[0]!.id })],
    ['with one supply and one temperature', pageInput({ supply: '5 V', temperature: '25..25 °C' })],
  ] as const;
  const drawn = inputs.flatMap(([name, input]) => plotsOf(input).map(({ id, svg }) => ({ id, name, svg })));
  it.each(drawn)('$id $name: no text covers another, none is cut off', async ({ svg }) => {
    await expectClear(svg);
  });
});

describe('schematics', () => {
  const drawn = BENCHES.flatMap((bench) => ['', 'load: {resistance: 10 kΩ, to: supply, capacitance: 100 pF, isolation: 47 Ω}'].map((load) => ({ topology: bench.topology, name: `${bench.name}, ${load === '' ? 'bare' : 'loaded'}`, stage: built(bench, '', ...(load === '' ? [] : [load])) })));
  it.each(drawn)('$topology $name: no text covers another, none is cut off', async ({ stage }) => {
    await expectClear(schematicOf(stage, 'iec'));
  });
});

describe('text', () => {
  it('is never wider than it is reckoned, in faces a page is read in', async () => {
    const shown = plotsOf(pageInput()).map(({ svg }) => svg).join('');
    for (const family of ['DejaVu Sans', 'sans-serif', 'system-ui']) {
      const { texts } = await laidOut(`<svg xmlns="http://www.w3.org/2000/svg" width="9000" height="9000" font-size="13">${shown.replaceAll(/<\/?svg[^>]*>|font-weight="bold"/gu, '')}</svg>`, `'${family}'`.replace("'sans-serif'", 'sans-serif').replace("'system-ui'", 'system-ui'));
      const wider = texts.filter(({ text, size, box }) => box.right - box.left > textWidth(text, size) + 0.5).map(({ text }) => `${family}: ${text}`);
      expect(wider).toEqual([]);
    }
  });

  it('names an image for those who do not see it', async () => {
    await page.setContent(plotsOf(pageInput())[0]!.svg);
    expect(await page.locator('body').ariaSnapshot()).toContain('img "Swing window"');
  });
});
