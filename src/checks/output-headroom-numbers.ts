import type { HeadroomDemand } from '../demands/index.js';
import { BASES, weaknessOf } from '../parts/basis.js';
import { BriefNumbers } from '../verdicts/brief-finding.js';
import { meets } from '../verdicts/compare.js';
import type { NumberFinding } from '../verdicts/finding.js';
import { CLOSE } from './binding-vertices.js';
import type { HeadroomFound } from './output-headroom.js';
import { numberAt, STANDS, writeReading, type InNumbers, type Row } from './in-numbers.js';

/** Vertices that can decide are one or two of a stage's; a part with more is told from its terms. */
const MOST = 3;

/** Where the numbers stand in a row: how many vertices (below zero: only how they stand is told; not a number: not even that), rooms and head-rooms there, V; offset and drift at the output, V (not a number: not known). */
const AT = { vertices: 0, curveWeakness: 1, places: 2, offset: 2 + 2 * MOST, offsetWeakness: 3 + 2 * MOST, isOver: 4 + 2 * MOST, drift: 5 + 2 * MOST, driftWeakness: 6 + 2 * MOST } as const;

/** A head-room check in numbers. */
export const HEADROOM_NUMBERS: InNumbers<HeadroomDemand, HeadroomFound> = {
  terms: {
    curve: { width: AT.offset, write: (_, curve, { row, at }) => writeCurve(curve, row, at) },
    offset: {
      width: 3,
      write(_, { term, overTemperature }, { row, at }) {
        writeReading(term, { row, at });
        row[at + 2] = overTemperature ? 1 : 0;
      },
    },
    drift: { width: 2, write: (_, term, to) => writeReading(term, to) },
  },
  finding: atVertices,
  stands: standsAtVertices,
};

function writeCurve({ binding, readings }: HeadroomFound['curve'], row: Row, at: number): void {
  const places = binding === null ? boundPlaces(readings) : binding.places.map(({ vertex, reading }) => ({ room: vertex.room, level: reading.value ?? NaN }));
  const isTold = places.length <= MOST;
  row[at] = isTold ? (binding === null ? -places.length : places.length) : NaN;
  row[at + 1] = weaknessOf(binding?.basis ?? 'guaranteed');
  for (let place = 0; place < MOST; place += 1) {
    const one = isTold ? places[place] : undefined;
    row[at + AT.places + 2 * place] = one?.room ?? NaN;
    row[at + AT.places + 2 * place + 1] = one?.level ?? NaN;
  }
}

interface Place {
  readonly room: number;
  /** What the part needs of it without the offset's share, V; at least. */
  readonly level: number;
}

/** Where a vertex has a bound or no room for any part: those that fail first as the offset's share grows. If they hold, the part is open. */
function boundPlaces(readings: HeadroomFound['curve']['readings']): Place[] {
  const places = readings.map(({ vertex: { room }, reading: { value, bound } }) => ({ room, level: value === null ? (bound ?? 0) : meets(room, 0, 'at-most') ? value : Infinity }));
  const least = Math.min(...places.map(({ room, level }) => room - level));
  const first = places.filter(({ room, level }) => room - level <= least + CLOSE);
  return first.filter((one, at) => first.findIndex(({ room, level }) => room === one.room && level === one.level) === at);
}

/** What is known of what offset and drift take of the room, V; drift is given where the offset does not hold over temperature already. Not a number: not known. */
export function shareOf(offset: number, drift: number): number {
  return (Number.isNaN(offset) ? 0 : offset) + (Number.isNaN(drift) ? 0 : drift);
}

function standsAtVertices(_: HeadroomDemand, row: Row): number {
  const count = numberAt(row, AT.vertices);
  if (Number.isNaN(count)) return STANDS.untold;
  const [offset, drift] = [numberAt(row, AT.offset), driftIn(row)];
  const share = shareOf(offset, drift);
  for (let place = 0; place < Math.abs(count); place += 1) {
    if (!meets(numberAt(row, AT.places + 2 * place), numberAt(row, AT.places + 2 * place + 1) + share, 'at-most')) return STANDS.fails;
  }
  return count < 0 ? STANDS.open : STANDS.passes + weaknessIn(row, offset, drift);
}

const driftIn = (row: Row): number => (numberAt(row, AT.isOver) === 1 ? NaN : numberAt(row, AT.drift));

const weaknessIn = (row: Row, offset: number, drift: number): number =>
  Math.max(numberAt(row, AT.curveWeakness), Number.isNaN(offset) ? 0 : numberAt(row, AT.offsetWeakness), Number.isNaN(drift) ? 0 : numberAt(row, AT.driftWeakness));

/** Of the vertices the one that is told: of least spare, and one that fails before one that holds. */
function atVertices({ unit, sense }: HeadroomDemand, row: Row): NumberFinding | null {
  const count = numberAt(row, AT.vertices);
  // Also where it is not a number.
  if (!(count > 0)) return null;
  const [offset, drift] = [numberAt(row, AT.offset), driftIn(row)];
  const share = shareOf(offset, drift);
  let required = 0;
  let offered = 0;
  let holds = true;
  for (let place = 0; place < count; place += 1) {
    const room = numberAt(row, AT.places + 2 * place);
    const needed = numberAt(row, AT.places + 2 * place + 1) + share;
    const passes = meets(room, needed, 'at-most');
    if (place > 0 && (passes === holds ? room - needed >= required - offered : passes)) continue;
    [required, offered, holds] = [room, needed, passes];
  }
  return new BriefNumbers({ required, unit, sense }, BASES[weaknessIn(row, offset, drift)] ?? 'guaranteed', { offered, borrowed: 0 });
}
