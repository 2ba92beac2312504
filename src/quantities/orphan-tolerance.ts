import { readFigure } from './figure.js';
import { formatQuantity } from './format.js';
import { measure } from './measure.js';
import type { Figure, Segment } from './syntax.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';

/**
 * Refuses a tolerance without a value (Q021) and a split supply (Q015). ± alone is a limit on the magnitude where the kind
 * allows it.
 */
export function refuseOrphanTolerance(segment: Segment, reading: Reading): void {
  const { body } = segment;
  if (body.shape === 'magnitude') { plusMinusAlone(body.figures[0], segment, reading); return; }
  if (body.shape !== 'list' || body.figures.length !== 2) return;
  const [one, other] = body.figures;
  if (one === undefined || other === undefined) return;
  const isSplit = one.sign !== other.sign && other.sign !== '' && (one.sign !== '' || other.sign === '-');
  if (reading.kind === 'temperature' || !isSplit) return;
  const isPercent = /^(?:%|‰|ppm)$/.test(other.unit?.text ?? '');
  if (isPercent) refuseWithoutValue(`${one.sign}${one.number.text}/${other.sign}${other.number.text} ${other.unit?.text ?? ''}`, segment, reading);
  if (reading.kind === 'supply') refuseSplit(other, segment, reading);
}

function plusMinusAlone(figure: Figure, segment: Segment, reading: Reading): void {
  const isPercent = /^(?:%|‰|ppm)$/.test(figure.unit?.text ?? '');
  if (isPercent && reading.kind !== 'fraction') refuseWithoutValue(`±${figure.number.text} ${figure.unit?.text ?? ''}`, segment, reading);
  if (reading.kind === 'supply') refuseSplit(figure, segment, reading);
  if (reading.rule.magnitude !== true) refuseEitherSide(figure, segment, reading);
}

function refuseWithoutValue(tolerance: string, segment: Segment, reading: Reading): never {
  const value = reading.rule.dimensions.includes('1/K') ? undefined : `${reading.rule.sample} ${tolerance}`;
  throw new Refusal('Q021', 'a tolerance without a value', { start: segment.start, end: segment.end, fix: value });
}

function refuseSplit(figure: Figure, segment: Segment, reading: Reading): never {
  const rail = measure(readFigure({ ...figure, sign: '' }, reading), reading).value;
  const typed = reading.text.slice(segment.start, segment.end);
  const total = Number.isFinite(rail) ? `${formatQuantity(rail * 2, 'V', { digits: 12 })} if the part sees ${formatQuantity(rail * 2, 'V', { digits: 12 })} in total, or give the single rail` : undefined;
  throw new Refusal('Q015', `${typed} is a split supply; this tool covers one supply and ground`, { start: segment.start, end: segment.end, fix: total });
}

/** `±1 V` of a voltage: a range about zero, or a bound on the magnitude. */
function refuseEitherSide(figure: Figure, segment: Segment, reading: Reading): never {
  const typed = reading.text.slice(segment.start, segment.end);
  const amount = `${figure.number.text}${figure.unit === null ? '' : ` ${figure.unit.text}`}`;
  const fix = reading.rule.signed ? `-${amount}..${amount}` : `${reading.rule.sample} ±${amount}`;
  throw new Refusal('Q021', `${typed} is a tolerance without a value`, { start: segment.start, end: segment.end, fix });
}
