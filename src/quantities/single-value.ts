import { echoFigures, echoLimit, echoRange, echoTolerance, echoTypedLimit, echoValue } from './echo.js';
import { readFigure } from './figure.js';
import { measure, refuseImplausible, type Measured } from './measure.js';
import { refuseOrphanTolerance } from './orphan-tolerance.js';
import { opposite, refuseUnfit, unitOf, type Outcome } from './outcome.js';
import { readList, readRange } from './range.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';
import type { Figure, Segment } from './syntax.js';
import { ends, readTolerance, type Side, type Toleranced } from './tolerance.js';

/** What one value, limit, range, list or tolerance comes to. Throws Refusal. */
export function readSingle(segment: Segment, reading: Reading): Outcome {
  const { body, limit } = segment;
  refuseOrphanTolerance(segment, reading);
  const hasLimit = limit !== null && limit !== 'nominal';
  if (hasLimit && body.shape !== 'value') {
    throw new Refusal('Q013', `a limit takes one figure; ${reading.text.slice(segment.start, segment.end)} has more`, segment);
  }
  switch (body.shape) {
    case 'value':
      return hasLimit ? limited(body.figures[0], limit, reading) : plain(body.figures[0], reading);
    case 'magnitude':
      return magnitude(body.figures[0], reading);
    case 'tolerance':
      return toleranced(readTolerance(body.figures[0], body.tolerance, reading), reading);
    case 'range':
      return ranged(readRange(body.figures, reading), reading);
    case 'list':
      return listed(readList(body.figures, reading), reading);
  }
}

function one(figure: Figure, reading: Reading): Measured {
  const measured = measure(readFigure(figure, reading), reading);
  refuseUnfit(measured, reading);
  return measured;
}

function plain(figure: Figure, reading: Reading): Outcome {
  const measured = one(figure, reading);
  if (measured.letterTolerance !== undefined) {
    const side: Side = { amount: Number(`${measured.letterTolerance}e-2`), relative: true };
    return toleranced({ nominal: measured, upper: side, lower: side, symmetric: true }, reading);
  }
  const echo = echoValue(measured, reading.kind, unitOf([measured], reading));
  return { nominal: measured.value, echo, measured: [measured] };
}

function limited(figure: Figure, word: 'min' | 'typ' | 'max', reading: Reading): Outcome {
  const measured = one(figure, reading);
  const limit = measured.falling ? opposite(word) : word;
  const asTyped = reading.kind === 'ratio' && measured.unit.dimension !== 'dB';
  const echo = asTyped ? echoTypedLimit(measured, word) : echoLimit(measured.value, limit, { kind: reading.kind, unit: unitOf([measured], reading) });
  return { [limit === 'typ' ? 'nominal' : limit]: measured.value, limit, echo, measured: [measured] };
}

function magnitude(figure: Figure, reading: Reading): Outcome {
  const measured = one(figure, reading);
  const echo = echoLimit(measured.value, 'max', { kind: reading.kind, unit: unitOf([measured], reading) });
  return { max: measured.value, limit: 'max', echo: `magnitude ${echo}`, measured: [measured] };
}

function toleranced(read: Toleranced, reading: Reading): Outcome {
  const { nominal } = read;
  const { min, max } = ends(read);
  for (const value of [nominal.value, min, max]) refuseImplausible(value, nominal, reading);
  const echo = echoTolerance(read, reading.kind, unitOf([nominal], reading));
  return { min, nominal: nominal.value, max, tolerance: true, echo, measured: [nominal] };
}

function ranged([low, high]: readonly [Measured, Measured], reading: Reading): Outcome {
  const echo = echoRange(low.value, high.value, { kind: reading.kind, unit: unitOf([low], reading) });
  return { min: low.value, max: high.value, echo, measured: [low, high] };
}

function listed(list: readonly Measured[], reading: Reading): Outcome {
  const [min, nominal, max] = list;
  if (min === undefined || nominal === undefined) throw new RangeError('a list has at least two figures');
  if (max === undefined) return ranged([min, nominal], reading);
  const figures = { min: min.value, nominal: nominal.value, max: max.value };
  return { ...figures, echo: echoFigures(figures, reading.kind, unitOf(list, reading)), measured: list };
}
