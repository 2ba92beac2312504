import { echoFigures } from './echo.js';
import { readFigure } from './figure.js';
import type { Measured } from './measure.js';
import { opposite, refuseUnfit, unitOf, type Outcome } from './outcome.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { measureAll, shareUnit } from './sharing.js';
import type { Figure, Segment } from './syntax.js';

/** Several worded figures, `min 3 V, max 5 V` or `2 (5 max)`: a figure without a word is the typical one. Throws Refusal. */
export function combine(segments: readonly Segment[], reading: Reading): Outcome {
  refuseUnworded(segments, reading);
  const figures = segments.map((segment) => wordedFigure(segment, reading));
  const reads = shareUnit(figures.map((figure) => readFigure(figure, reading)), reading);
  const measured = measureAll(reads, reading);
  const ends: { min?: number; nominal?: number; max?: number } = {};
  for (const [index, found] of measured.entries()) {
    refuseUnfit(found, reading);
    const word = segments[index]?.limit;
    const limit = word === 'min' || word === 'max' ? (found.falling ? opposite(word) : word) : 'typ';
    const key = limit === 'typ' ? 'nominal' : limit;
    if (ends[key] !== undefined) refuseTwice(limit, found, reading);
    ends[key] = found.value;
  }
  refuseDisorder(ends, segments, reading);
  return { ...ends, echo: echoFigures(ends, reading.kind, unitOf(measured, reading)), measured };
}

function wordedFigure(segment: Segment, reading: Reading): Figure {
  const { body } = segment;
  if (body.shape === 'value') return body.figures[0];
  const typed = reading.text.slice(segment.start, segment.end);
  throw new Refusal('Q013', `${typed} beside another figure is not read`, segment);
}

/** Two numbers, neither with a word: nothing says which of them counts. */
function refuseUnworded(segments: readonly Segment[], reading: Reading): void {
  const unworded = segments.filter((segment) => segment.limit === null);
  const second = unworded[1];
  if (second === undefined) return;
  const message = `${reading.text.trim()} has ${unworded.length} figures and nothing says which counts; one is expected`;
  throw new Refusal('Q013', message, { start: second.start, end: second.end });
}

function refuseTwice(limit: string, { figure }: Measured, reading: Reading): never {
  const typed = reading.text.slice(figure.start, figure.end);
  throw new Refusal('Q009', `${typed} is a second ${limit} figure; which one counts is not said`, { start: figure.start, end: figure.end });
}

function refuseDisorder(ends: { min?: number; nominal?: number; max?: number }, segments: readonly Segment[], { text }: Reading): void {
  const rising = [ends.min, ends.nominal, ends.max].filter((value) => value !== undefined);
  if (rising.every((value, index) => index === 0 || (rising[index - 1] ?? value) <= value)) return;
  const where = { start: segments[0]?.start ?? 0, end: segments.at(-1)?.end ?? text.length };
  throw new Refusal('Q007', `${text.trim()}: min, typ and max do not rise`, where);
}
