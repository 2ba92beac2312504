import { toNumber } from './decimal.js';
import { readFigure } from './figure.js';
import type { Measured } from './measure.js';
import { refuseUnfit } from './outcome.js';
import type { Figure } from './syntax.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { measureAll, shareUnit } from './sharing.js';

/** Reads both ends of a range, lower first (rule Q-11). Throws Refusal Q007 when it runs downwards. */
export function readRange(figures: readonly [Figure, Figure], reading: Reading): readonly [Measured, Measured] {
  const [first, second] = measured(figures, reading);
  if (first === undefined || second === undefined) throw new RangeError('a range has two ends');
  const [low, high] = first.falling && second.falling ? [second, first] : [first, second];
  if (low.value > high.value) refuseDownwards(figures, reading);
  return [low, high];
}

/** Reads figures with slashes (rule Q-12): three rising ones, or two temperatures of which the second is signed. Throws Refusal. */
export function readList(figures: readonly Figure[], reading: Reading): readonly Measured[] {
  const [first, second] = figures;
  if (figures.length === 2 && first !== undefined && second !== undefined) {
    if (reading.kind === 'temperature' && second.sign !== '') return readRange([first, second], reading);
    refuseTwo(first, second, reading);
  }
  if (figures.length > 3) throw new Refusal('Q009', `${figures.length} figures with slashes have no reading; three are min/typ/max`, extent(figures));
  const list = measured(figures, reading);
  const ordered = list.every((one) => one.falling) ? list.toReversed() : list;
  const rising = ordered.every((one, index) => index === 0 || (ordered[index - 1]?.value ?? one.value) <= one.value);
  if (!rising) refuseUnordered(figures, reading);
  return ordered;
}

function measured(figures: readonly Figure[], reading: Reading): Measured[] {
  const reads = shareUnit(figures.map((figure) => readFigure(figure, reading)), reading);
  const list = measureAll(reads, reading);
  for (const one of list) refuseUnfit(one, reading);
  return list;
}

const extent = (figures: readonly Figure[]): { start: number; end: number } => ({ start: figures[0]?.start ?? 0, end: figures.at(-1)?.end ?? 0 });

/** Number and own unit of a figure, as typed. */
const typed = (figure: Figure): string => figure.sign + figure.number.text;

function refuseDownwards(figures: readonly [Figure, Figure], reading: Reading): never {
  const [first, second] = figures;
  const whole = (figure: Figure): string => reading.text.slice(figure.start, figure.end);
  const turned = first.unit === null ? `${typed(second)}..${typed(first)}${suffix(second)}` : `${whole(second)}..${whole(first)}`;
  throw new Refusal('Q007', 'the range runs downwards', { ...extent(figures), fix: patched(reading, extent(figures), turned) });
}

const suffix = (figure: Figure): string => (figure.unit === null ? '' : ` ${figure.unit.text}`);

function refuseTwo(first: Figure, second: Figure, reading: Reading): never {
  const whole = (figure: Figure): string => reading.text.slice(figure.start, figure.end);
  const turned = first.unit === null && numberOf(first, reading) > numberOf(second, reading);
  const fix = turned ? `${typed(second)}..${typed(first)}${suffix(second)}` : `${whole(first)}..${whole(second)}`;
  throw new Refusal('Q009', 'two values with a slash: min/max, typ/max or two options?', {
    ...extent([first, second]),
    fix: patched(reading, extent([first, second]), fix),
  });
}

function refuseUnordered(figures: readonly Figure[], reading: Reading): never {
  const message = `${reading.text.trim()}: three figures with slashes are min/typ/max and must rise`;
  throw new Refusal('Q007', message, extent(figures));
}

function numberOf(figure: Figure, reading: Reading): number {
  const { number } = readFigure(figure, reading);
  return toNumber(number.mantissa, number.exponent);
}
