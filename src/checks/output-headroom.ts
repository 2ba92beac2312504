import type { HeadroomDemand, HeadroomVertex } from '../demands/index.js';
import { weakest, type Basis } from '../parts/basis.js';
import type { Side } from '../parts/headroom.js';
import type { HeadroomReading } from '../parts/headroom-curve.js';
import type { Readings } from '../parts/readings.js';
import { meets } from '../verdicts/compare.js';
import { bindingVertices, type Binding, type Curve } from './binding-vertices.js';
import type { ComposedCheck, Known } from './check.js';
import { shareOf } from './output-headroom-numbers.js';
import type { BoundFinding, NumberFinding, SingleFinding, Term, TurningPoint, Uncharged, VertexFindings } from '../verdicts/finding.js';
import { formatQuantity } from '../quantities/format.js';

/** Vertices with their room, and what the offset is multiplied by. */
export type HeadroomVertices = Pick<HeadroomDemand, 'vertices' | 'noiseGain' | 'kelvin'>;

/** What a finding about the head-room of one side is put together from; all of it is asked for what the stage asks. */
export interface HeadroomFound {
  readonly curve: HeadroomAtVertices;
  readonly offset: Offset;
  /** Null: not known, or of no account at one temperature. */
  readonly drift: Term | null;
}

interface HeadroomAtVertices {
  /** Of every vertex; empty where those that decide are enough. */
  readonly readings: Binding['places'];
  readonly binding: Binding | null;
}

interface Offset {
  readonly term: Term | null;
  readonly overTemperature: boolean;
}

/** Terms of a check of one side. */
export function headroomTerms(side: Side): ComposedCheck<HeadroomVertices, HeadroomFound, VertexFindings>['terms'] {
  return {
    curve: ({ vertices }, readings) => atVertices(vertices, readings.headroom(side), readings),
    offset: offsetAtOutput,
    drift: driftAtOutput,
  };
}

function atVertices(vertices: readonly HeadroomVertex[], curve: Curve, { brief }: Pick<Readings, 'brief'>): HeadroomAtVertices {
  const binding = brief ? bindingVertices(vertices, curve) : null;
  return { readings: binding === null ? vertices.map((vertex) => ({ vertex, reading: curve(vertex) })) : [], binding };
}

function offsetAtOutput({ noiseGain }: HeadroomVertices, readings: Readings): Offset {
  const offset = readings.offset();
  if (offset === null) return { term: null, overTemperature: false };
  const how = readings.brief ? null : told(offset.how, times(noiseGain));
  const term = { name: 'offset', value: noiseGain * offset.value, slot: offset.slot, basis: offset.basis, figure: { value: offset.printed ?? offset.value, unit: 'V' }, how };
  return { term, overTemperature: offset.overTemperature };
}

function driftAtOutput({ noiseGain, kelvin }: HeadroomVertices, readings: Readings): Term | null {
  const drift = kelvin === 0 ? null : readings.figure('offsetDrift');
  if (drift === null) return null;
  const how = readings.brief ? null : told(drift.how, `× ${kelvin} K`, times(noiseGain));
  return { name: 'offset drift', value: noiseGain * drift.value * kelvin, slot: drift.slot, basis: drift.basis, figure: { value: drift.printed ?? drift.value, unit: 'V/K' }, how };
}

const told = (...steps: readonly (string | null)[]): string => steps.filter((step) => step !== null).join(', ');
const times = (noiseGain: number): string => `× noise gain ${Number(noiseGain.toPrecision(4))}`;

/** Head-room needed at every vertex: the part's curve at the current flowing there, plus the offset's share (M1 and M6). */
export function judgeHeadroom(asked: HeadroomVertices, side: Side, readings: Readings): VertexFindings {
  const { curve, offset, drift } = headroomTerms(side);
  const found = { curve: () => curve(asked, readings), offset: () => offset(asked, readings), drift: () => drift(asked, readings) };
  return headroomFinding(asked, found, { side, brief: readings.brief });
}

/** The same from terms that are worked out already. */
export function headroomFinding(asked: HeadroomVertices, found: Known<HeadroomFound>, { side, brief }: Pick<At, 'side' | 'brief'>): VertexFindings {
  const { readings, binding } = found.curve();
  const share = offsetShare(asked, found);
  if (binding !== null) {
    const findings = binding.places.map(({ vertex, reading }) => findingAt(vertex, { side, share, reading, brief }));
    return { kind: 'vertices', findings, basis: weakest([binding.basis, share.basis]) };
  }
  return { kind: 'vertices', findings: readings.map(({ vertex, reading }) => findingAt(vertex, { side, share, reading, brief })) };
}

interface Share {
  /** What the offset takes of the room at the output, V; only the part that is known. */
  readonly terms: readonly Term[];
  readonly value: number;
  readonly basis: Basis;
  readonly unknowns: Unknowns;
}

function offsetShare({ noiseGain, kelvin }: HeadroomVertices, found: Known<HeadroomFound>): Share {
  const { term: offset, overTemperature } = found.offset();
  const drift = overTemperature ? null : found.drift();
  const terms = [offset, drift].filter((term) => term !== null);
  const driftKnown = overTemperature || kelvin === 0 || drift !== null;
  return {
    terms,
    value: shareOf(offset?.value ?? NaN, drift?.value ?? NaN),
    basis: weakest(terms.map(({ basis }) => basis)),
    unknowns: { noiseGain, offsetKnown: offset !== null, driftKnown, kelvin },
  };
}

interface Unknowns {
  readonly noiseGain: number;
  readonly offsetKnown: boolean;
  readonly driftKnown: boolean;
  readonly kelvin: number;
}

/** Where offset or drift is not known: at which value the spare is used up. Of both the offset is told. */
function unchargedFor(spare: number, { noiseGain, kelvin, offsetKnown, driftKnown }: Unknowns): Uncharged | null {
  if (spare < 0 || (offsetKnown && driftKnown)) return null;
  const left = spare / noiseGain;
  return offsetKnown ? { figure: 'offsetDrift', kind: 'max', value: left / kelvin, unit: 'V/K' } : { figure: 'offsetVoltage', kind: 'max', value: left, unit: 'V' };
}

function cautionFor({ figure, value, unit }: Uncharged): string {
  const [name, of] = figure === 'offsetDrift' ? ['offset drift', ''] : ['offset', ' of offset'];
  return `${name} not known and not charged: ${formatQuantity(value, unit, { round: 'down' })}${of} uses the spare up`;
}

interface At {
  readonly side: Side;
  readonly share: Share;
  readonly reading: HeadroomReading;
  /** Only the decision is wanted. */
  readonly brief: boolean;
}

function findingAt(vertex: HeadroomVertex, at: At): SingleFinding {
  const { share, reading } = at;
  const bare = bareAt(vertex, at);
  if (at.brief) return bare;
  if (bare.kind === 'bound') return { ...bare, ...toldOfBound(vertex, at), turnsAt: turnsAt(vertex, at) };
  const uncharged = unchargedFor(vertex.room - bare.offered, share.unknowns);
  return {
    ...bare, slot: reading.slot, how: reading.how, turnsAt: turnsAt(vertex, at),
    terms: [headroomTerm(reading, reading.value ?? 0, vertex), ...share.terms],
    ...(uncharged === null ? {} : { cautions: [cautionFor(uncharged)], uncharged }),
  } satisfies NumberFinding;
}

/** The numbers that decide and what is missing for one: nothing else is told, but the distortion asks for both. */
function bareAt(vertex: HeadroomVertex, at: At): NumberFinding | BoundFinding {
  const { room: required, corner } = vertex;
  const { share, reading } = at;
  const basis = weakest([reading.basis, share.basis]);
  if (reading.value === null) return boundAt(vertex, at, { known: (reading.bound ?? 0) + share.value, basis });
  const offered = reading.value + share.value;
  // No output swings beyond its rail, whatever head-room a list gives it: room below zero fails every part.
  if (!meets(required, 0, 'at-most') && meets(required, offered, 'at-most')) return boundAt(vertex, at, { known: share.value, basis });
  return { kind: 'numbers', unit: 'V', sense: 'at-most', required, corner, basis, offered };
}

function boundAt({ room: required, corner }: HeadroomVertex, { side, reading }: At, { known, basis }: Pick<BoundFinding, 'known' | 'basis'>): BoundFinding {
  const cause = reading.bound === null ? 'missing-figure' : 'beyond-data';
  return { kind: 'bound', unit: 'V', sense: 'at-most', required, corner, basis, known, missing: MISSING[side], cause };
}

const MISSING = {
  low: [{ figure: 'outputLowHeadroom', kind: 'max' }],
  high: [{ figure: 'outputHighHeadroom', kind: 'max' }],
} as const;

/** What a bound is told with. Where no point reaches the current that flows, the heaviest one's own head-room is the least it can be. */
function toldOfBound({ current, supply }: HeadroomVertex, { side, reading, share }: At): Pick<BoundFinding, 'terms' | 'missing'> {
  const { value, bound, covers, slot, basis, how } = reading;
  if (value !== null || bound === null || covers === null) return { terms: share.terms, missing: MISSING[side] };
  const term: Term = { name: 'head-room of the heaviest point', value: bound, slot, basis, figure: null, how };
  return { terms: [term, ...share.terms], missing: MISSING[side].map((one) => ({ ...one, beyond: { covers, current, supply } })) };
}

function headroomTerm(reading: HeadroomReading, value: number, vertex: HeadroomVertex): Term {
  const at = vertex.current === 0 ? 'no current towards this rail' : `at ${formatQuantity(vertex.current, 'A')}`;
  const how = [at, reading.how].filter((step) => step !== null).join(', ');
  return { name: 'head-room', value, slot: reading.slot, basis: reading.basis, figure: null, how };
}

/** The head-room at this vertex' current that would just pass. */
function turnsAt(vertex: HeadroomVertex, at: At): TurningPoint {
  const figure = at.side === 'low' ? 'outputLowHeadroom' : 'outputHighHeadroom';
  return { figure, kind: 'max', value: vertex.room - at.share.value, unit: 'V', condition: { current: vertex.current, supply: vertex.supply } };
}
