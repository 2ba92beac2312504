import fc from 'fast-check';
import stringWidth from 'string-width';
import { describe, expect, it } from 'vitest';
import type { SwingWindow } from '../../../src/curves/index.js';
import { marginBars } from '../../../src/presentation/bars/margin-bars.js';
import { swingBars } from '../../../src/presentation/bars/swing-bars.js';
import { renderExplanation } from '../../../src/presentation/explain-text.js';
import { fitLines } from '../../../src/presentation/fit-table.js';
import { renderShortlist } from '../../../src/presentation/shortlist-text.js';
import type { Style } from '../../../src/presentation/style.js';
import { CONTEXT, SAMPLE_PARTS, sampleExplanation, sampleReport, styleOf } from '../../support/sample-report.js';

const explanations = SAMPLE_PARTS.map(({ id }) => sampleExplanation(id));
const anyOne = fc.constantFrom(...explanations);
const anyWidth = fc.integer({ min: 40, max: 200 });
const withBars = (width: number, more: Partial<Style> = {}): Style => styleOf(width, { bars: true, ...more });
const stripped = (text: string): string => text.replace(/\u001b\[\d+m/gu, '');
const factsOf = (one: (typeof explanations)[number]) => ({ swing: one.curves().swing, verdicts: one.judged.verdicts });

describe('margins', () => {
  it('stand on one scale: limits under each other, words behind a gap, nothing wider than the terminal', () => {
    fc.assert(fc.property(anyOne, anyWidth, fc.boolean(), ({ judged }, width, ascii) => {
      const { lines, told } = marginBars(judged.verdicts, withBars(width, { ascii }));
      for (const line of lines) expect(stringWidth(line), line).toBeLessThanOrEqual(width);
      const rows = lines.slice(lines.length - told.size);
      expect(new Set(rows.map((row) => row.indexOf('|'))).size).toBeLessThanOrEqual(1);
      for (const row of rows) expect(row).toMatch(/^(?:PASS|FAIL|\?) +.+\|.* {2}\S/u);
    }), { numRuns: 40 });
  });

  it('tell every check that has a share once, with its outcome in a word or sign and its words', () => {
    for (const { judged } of explanations) {
      const { lines, told } = marginBars(judged.verdicts, withBars(100));
      const rows = lines.slice(lines.length - told.size);
      expect(rows.filter((row) => row.startsWith('FAIL'))).toHaveLength([...told].filter(({ outcome }) => outcome === 'fail').length);
      expect(rows.filter((row) => row.startsWith('?'))).toHaveLength([...told].filter(({ outcome }) => outcome === 'unknown').length);
      for (const { title } of told) expect(rows.filter((row) => row.includes(` ${title} `))).toHaveLength(1);
    }
  });

  it('put what passes in the order of what it leaves', () => {
    for (const { judged } of explanations) {
      const { lines, told } = marginBars(judged.verdicts, withBars(100));
      const passing = lines.slice(lines.length - told.size).filter((row) => row.startsWith('PASS') && !row.includes('minimum stable gain'));
      const lengths = passing.map((row) => row.split('|')[1]?.trimStart().match(/^[▬>]*/u)?.[0].length ?? 0);
      expect(lengths).toEqual([...lengths].sort((a, b) => a - b));
    }
  });

  it('are left out where a bar has no room', () => {
    expect(marginBars(explanations[0]?.judged.verdicts ?? [], withBars(40))).toEqual({ lines: [], told: new Set() });
  });
});

describe('the rails', () => {
  it('have both ends of all bars under each other, labelled, within the terminal', () => {
    fc.assert(fc.property(anyOne, fc.integer({ min: 80, max: 200 }), fc.boolean(), (one, width, ascii) => {
      const lines = swingBars(factsOf(one), ['output', 'input'], withBars(width, { ascii }));
      for (const line of lines) expect(stringWidth(line), line).toBeLessThanOrEqual(width);
      const bars = lines.filter((line) => /^ {2}(?:output|input) /u.test(line));
      expect(bars).toHaveLength(2);
      for (const bar of bars) expect(bar).toMatch(/^ {2}(?:output|input) {2,3}(?:PASS|FAIL|\? {3}) {2} *0\u00a0V [<|].+[|>] \d[\d.]*\u00a0V$/u);
      expect(new Set(bars.map((bar) => bar.search(/[<|]/u))).size).toBe(1);
    }), { numRuns: 40 });
  });

  it('stand at the supply where the tighter verdict stands', () => {
    const window = (supply: number): SwingWindow => ({
      supply,
      output: { signal: { min: 1, max: 2 }, error: 0, worst: { low: 0.1, high: 0.1 }, best: { low: 0.1, high: 0.1 } },
      input: { signal: { min: 1, max: 2 }, worst: { low: 0, high: 0 }, crossover: null },
    });
    const [sample] = (explanations[0]?.judged.verdicts ?? []).filter(({ check }) => check === 'output-high');
    if (sample === undefined) throw new Error('the sample stage asks for output-high');
    const at = (check: string, spare: number, supply: number) => ({ ...sample, check, spare, worstAt: { supply } });
    const topOf = (verdicts: readonly ReturnType<typeof at>[]): string => /(\d\S*)\u00a0V$/u.exec(swingBars({ swing: [window(3), window(4.2)], verdicts }, ['output'], withBars(80))[0] ?? '')?.[1] ?? '';
    expect(topOf([at('output-low', 0.3, 3), at('output-high', 0.2, 4.2)])).toBe('4.2');
    expect(topOf([at('output-low', 0.1, 3), at('output-high', 0.2, 4.2)])).toBe('3');
    expect(topOf([])).toBe('3');
  });
});

describe('text with bars', () => {
  it('reads the same without colour, and is ASCII when asked', () => {
    for (const one of explanations) {
      const plain = renderExplanation(one, withBars(100), CONTEXT);
      expect(stripped(renderExplanation(one, withBars(100, { colour: true }), CONTEXT))).toBe(plain);
      expect(renderExplanation(one, withBars(100, { ascii: true }), CONTEXT)).toMatch(/^[\x20-\x7e\n]*$/u);
    }
    expect(renderShortlist(sampleReport(), withBars(120, { ascii: true }), CONTEXT)).toMatch(/^[\x20-\x7e\n]*$/u);
  });

  it('has every passing check with the words it has without bars', () => {
    for (const one of explanations) {
      const plain = renderExplanation(one, styleOf(100), CONTEXT);
      const barred = renderExplanation(one, withBars(100), CONTEXT);
      for (const verdict of one.judged.verdicts.filter(({ outcome }) => outcome === 'pass')) {
        const words = new RegExp(`${verdict.title} {2,}(\\S+(?: \\S+)*)`, 'u').exec(plain)?.[1] ?? 'missing';
        const row = barred.split('\n').find((line) => new RegExp(`(?:^PASS {2}|^ {6}| {4})${verdict.title} {2}`, 'u').test(line)) ?? '';
        expect(row, verdict.check).toContain(words);
      }
    }
  });

  it('has the column of bars only where no other column moves for it', () => {
    const report = sampleReport();
    const titles = (style: Style): string[] => (fitLines(report, style).find((line) => line.startsWith(' #')) ?? '').trim().split(/ {2,}/u);
    for (let width = 80; width <= 200; width += 1) {
      const drawn = titles(withBars(width));
      expect(drawn.filter((title) => title !== 'of limit')).toEqual(titles(styleOf(width)));
      if (width >= 140) expect(drawn).toContain('of limit');
      if (width === 80) expect(drawn).not.toContain('of limit');
    }
  });

  it('of a part that does not fit', () => {
    const rejected = explanations.find(({ judged }) => judged.outcome === 'does-not-fit');
    if (rejected === undefined) throw new Error('one of the sample parts does not fit');
    const text = renderExplanation(rejected, withBars(80), CONTEXT);
    expect(`\n${text.slice(text.indexOf('Margins'), text.indexOf('Swing  '))}`).toMatchInlineSnapshot(`
      "
      Margins spare as a share of the limit, linear; x missing; > beyond the scale
                                 -100 % limit            200 %
      FAIL  DC error                     x|                     over by 7.7 mV (20 %)
      FAIL  supply current               x|                     over by 8 µA (8.9 %)
      PASS  highest supply                |▬▬▬                  1.3 V spare
      PASS  supply peak                   |▬▬▬                  1.5 V spare
      PASS  lowest supply                 |▬▬▬▬                 1.2 V spare
      PASS  input range high              |▬▬▬▬▬                1.47 V spare
      PASS  output low                    |▬▬▬▬▬▬               129 mV spare (typical)
      PASS  output high                   |▬▬▬▬▬▬▬              224 mV spare (typical)
      PASS  minimum stable gain           |▬▬▬▬▬▬▬▬             7.8 times
      PASS  input range low               |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  125 mV spare
      PASS  gain bandwidth                |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  6.2 times
      PASS  output current                |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  16 times
      PASS  slew rate                     |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  19 times

      PASS  lowest temperature   20 °C spare    highest temperature  65 °C spare
            channels             has 1

      Rails   at the supply end with the least room, figures at their worst
        output  PASS  0 V |..-▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬-....| 3 V
                      signal 197 mV..2.69 V, off by up to 43 mV; usable 25 mV..2.95 V
        input   PASS  0 V |▬▬▬▬▬▬...........................░░░░░░░░░░░░░░░░░░░░░| 3 V
                      signal 25 mV..330 mV; usable -100 mV..1.8 V
        ▬ signal, - offset and drift, . free, ░ head-room kept by the part

      "
    `);
  });

  it('of a shortlist', () => {
    const text = renderShortlist(sampleReport(), withBars(110), CONTEXT);
    expect(`\n${text.slice(text.indexOf(' # '), text.indexOf('Why 1'))}`).toMatchInlineSnapshot(`
      "
       #  Part          Class                Tightest check  worst case     DC error  Current     Price  Proof
                                                                           at output      max   at 1000
       1  TEAM-0005  A  350 kHz, zero-drift  output low      172 mV spare     966 µV    35 µA  0.72 EUR  limits
       2  TEAM-0012  A  1 MHz, low offset    supply current  31 % spare      8.61 mV    62 µA  0.34 EUR  typical (3)
       3  GX-LV-1M   G  1 MHz, 2 mV offset   supply current  16 % spare      24.8 mV    75 µA  0.21 EUR  typical (3)
       ?  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown: fits if 80.5 µV/°C or less

       A on the approved list; G generic set: a class of parts, not something to order; typical (n): rests on n
       figures that are not limits; ? cannot be decided
       Order: approved before generic, all limits before some typical, then merit: margins, price and current in
       equal shares.

      Rails   first part, TEAM-0005, at the supply end with the least room, figures at their worst
        output  PASS  0 V |...▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬......| 3 V
                      signal 197 mV..2.69 V, off by up to 160 µV; usable 25 mV..2.95 V
        ▬ signal, . free

      "
    `);
  });
});
