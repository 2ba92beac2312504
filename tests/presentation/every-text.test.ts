import fc from 'fast-check';
import stringWidth from 'string-width';
import { describe, expect, it } from 'vitest';
import { renderDemands } from '../../src/presentation/demands-text.js';
import { renderExplanation } from '../../src/presentation/explain-text.js';
import { renderPart } from '../../src/presentation/part-text.js';
import { renderParts } from '../../src/presentation/parts-text.js';
import { renderProblems } from '../../src/presentation/problems-text.js';
import { renderShortlist } from '../../src/presentation/shortlist-text.js';
import type { Style } from '../../src/presentation/style.js';
import { CONTEXT, SAMPLE_PARTS, sampleDemands, sampleExplanation, sampleReport, sampleSource, styleOf } from '../support/sample-report.js';

const reports = [sampleReport(), sampleReport({ 'signal.input': '0 mV..330 mV' }), sampleReport({ 'limits.outputNoise': '300 µVrms' })];
const explanations = SAMPLE_PARTS.map(({ id }) => sampleExplanation(id));
const demands = sampleDemands();
const [first] = SAMPLE_PARTS;
if (first === undefined) throw new Error('no sample part');
const place = { file: 'approved.csv', line: 7, row: 7, column: 2, columnLetter: 'B', header: 'GBW (MHz)', part: 'TEAM-0902' };

/** Every text there is, by name. */
const TEXTS: Readonly<Record<string, (style: Style) => string>> = {
  ...Object.fromEntries(reports.map((report, at) => [`shortlist ${at}`, (style: Style) => renderShortlist(report, style, CONTEXT)])),
  ...Object.fromEntries(explanations.map((one) => [`explain ${one.judged.part.id}`, (style: Style) => renderExplanation(one, style, CONTEXT)])),
  demands: (style) => renderDemands(demands, style),
  parts: (style) => renderParts({ total: 6, parts: SAMPLE_PARTS.map((part) => ({ part, failing: ['dc-error', 'supply-current'] })) }, style),
  part: (style) => renderPart(first, (slot) => sampleSource().origin(first.id, slot), style),
  problems: (style) => renderProblems([{ code: 'Q002', severity: 'error', message: 'is 10M 10 MHz or 0.01 Hz? It has no unit', text: '10M', span: [0, 3], fix: '10 MHz', place }], style, '1 problem, 3 mV. (exit 3)'),
};

const anyStyle = fc.record({ width: fc.integer({ min: 40, max: 200 }), ascii: fc.boolean(), all: fc.boolean(), sources: fc.boolean(), gluedUnits: fc.boolean(), bars: fc.boolean(), top: fc.integer({ min: 1, max: 20 }) })
  .map((style) => ({ ...style, colour: false }));

const UNIT = String.raw`(?:[fpnuµmkMGT]?(?:V|A|Ω|ohm|F|Hz|s)(?:/(?:µs|us|ms|s|V|°C|C))?|%|°C|C|dB|EUR|K)`;
const stripped = (text: string): string => text.replace(/\u001b\[\d+m/gu, '');

describe.each(Object.entries(TEXTS))('%s', (_, render) => {
  it('has no line wider than the terminal', () => {
    fc.assert(fc.property(anyStyle, (style) => {
      for (const line of render(style).split('\n')) expect(stringWidth(line), line).toBeLessThanOrEqual(style.width);
    }), { numRuns: 16 });
  });

  it('never parts a number from its unit', () => {
    const parted = new RegExp(String.raw`\d\n *${UNIT}(?=[\s,.;:)]|$)`, 'u');
    fc.assert(fc.property(anyStyle, (style) => { expect(render(style)).not.toMatch(parted); }), { numRuns: 16 });
  });

  it('on a terminal holds them with U+00A0', () => {
    const text = render(styleOf(100, { gluedUnits: true }));
    const loose = new RegExp(String.raw`(?<![\w"])(?<!\w-)\d[\d.]* ${UNIT}(?=[\s,.;:)])`, 'u');
    const prose = text.split('\n').filter((line) => !/fix:|railfit/u.test(line));
    expect(prose.filter((line) => loose.test(line))).toEqual([]);
  });

  it('reads the same without colour', () => {
    fc.assert(fc.property(anyStyle, (style) => { expect(stripped(render({ ...style, colour: true }))).toBe(render(style)); }), { numRuns: 16 });
  });

  it('is ASCII when asked', () => {
    fc.assert(fc.property(anyStyle, (style) => { expect(render({ ...style, ascii: true })).toMatch(/^[\x20-\x7e\n]*$/u); }), { numRuns: 16 });
  });

  it('ends in one newline, has no trailing blanks and no two empty lines', () => {
    fc.assert(fc.property(anyStyle, (style) => { expect(render(style)).not.toMatch(/ \n|\n\n\n|\n\n$|[^\n]$|^\n/u); }), { numRuns: 16 });
  });
});

describe('a word wider than the terminal', () => {
  it('stays whole and alone', () => {
    const id = `TEAM-${'7'.repeat(70)}`;
    const report = sampleReport({}, SAMPLE_PARTS.map((part, at) => (at === 0 ? { ...part, id } : part)));
    for (const line of renderShortlist(report, styleOf(60), CONTEXT).split('\n')) {
      if (stringWidth(line) > 60) expect(line.trim().split(id).join('').length, line).toBeLessThan(12);
    }
  });
});
