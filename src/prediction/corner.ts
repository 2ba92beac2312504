import type { Side } from '../parts/headroom.js';
import type { HeadroomReading } from '../parts/headroom-curve.js';
import type { Readings } from '../parts/readings.js';
import type { Stage, Vertex } from '../stage/index.js';
import type { Outcome } from './amplifier.js';

/** One corner of supply and reference with the swing the ideal stage makes there, V. */
export interface Corner {
  readonly supply: number;
  readonly reference: number;
  readonly low: Vertex;
  readonly high: Vertex;
}

/** Nominal values of the stage, or the corner that leaves its output the least room. */
export function cornerOf(stage: Stage, form: Outcome): Corner {
  return form === 'typical' ? nominalCorner(stage) : tightestCorner(stage);
}

/** Middle of all corners with the signal where it makes each end of the output: there everything has its nominal value. */
function nominalCorner(stage: Stage): Corner {
  const { min, max } = stage.outputNominal;
  const [low, high] = [{ ...middleAbout(stage, least(stage.vertices)), output: min }, { ...middleAbout(stage, most(stage.vertices)), output: max }];
  const reference = mean(stage.vertices.map((vertex) => vertex.reference));
  return { supply: stage.supply.nominal, reference, low: atOutput(stage, low, min), high: atOutput(stage, high, max) };
}

function middleAbout({ vertices }: Stage, extreme: Vertex): Vertex {
  const key = JSON.stringify(extreme.inputs);
  const alike = vertices.filter(({ inputs }) => JSON.stringify(inputs) === key);
  const middle = (pick: (vertex: Vertex) => number): number => mean(alike.map(pick));
  return {
    inputs: extreme.inputs,
    supply: middle(({ supply }) => supply),
    reference: middle(({ reference }) => reference),
    output: middle(({ output }) => output),
    commonMode: middle(({ commonMode }) => commonMode),
    loadCurrent: middle(({ loadCurrent }) => loadCurrent),
    networkCurrent: middle(({ networkCurrent }) => networkCurrent),
  };
}

function tightestCorner({ vertices }: Stage): Corner {
  const groups = new Map<string, Vertex[]>();
  for (const vertex of vertices) {
    const key = `${vertex.supply} ${vertex.reference}`;
    groups.set(key, [...(groups.get(key) ?? []), vertex]);
  }
  const corners = [...groups.values()].map((group): Corner => {
    const [low, high] = [least(group), most(group)];
    return { supply: high.supply, reference: high.reference, low, high };
  });
  const room = ({ supply, low, high }: Corner): number => Math.min(supply - high.output, low.output);
  return corners.reduce((best, next) => (room(next) < room(best) ? next : best));
}

const least = (all: readonly Vertex[]): Vertex => all.reduce((best, next) => (next.output < best.output ? next : best));
const most = (all: readonly Vertex[]): Vertex => all.reduce((best, next) => (next.output > best.output ? next : best));
const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;

/** The vertex with its output moved, and the currents that go with it. */
function atOutput(stage: Stage, vertex: Vertex, output: number): Vertex {
  const move = output - vertex.output;
  return { ...vertex, output, loadCurrent: vertex.loadCurrent + stage.loadConductance * move, networkCurrent: vertex.networkCurrent + stage.networkConductance * move };
}

/** How near a rail the output comes, V from V−, with the head-room read there; level null: not known. */
export interface Level {
  readonly level: number | null;
  readonly reading: HeadroomReading;
}

/** Rounds until level and current agree: a head-room changes slowly with the current. */
const ROUNDS = 40;

/** Where the output ends at one rail: the head-room at the current of its extreme, and where it does not reach that, with the output right there. */
export function levelAt(stage: Stage, corner: Corner, of: { readonly side: Side; readonly readings: Readings }): Level {
  const { side, readings } = of;
  const curve = readings.headroom(side);
  const vertex = side === 'high' ? corner.high : corner.low;
  const supply = corner.supply;
  const read = (output: number): HeadroomReading => curve(questionAt(stage, atOutput(stage, vertex, output), { side, supply }));
  const endOf = (room: number): number => (side === 'high' ? supply - room : room);
  const inside = Math.min(supply, Math.max(0, vertex.output));
  let reading = read(inside);
  let level = reading.value === null ? inside : endOf(reading.value);
  // An oscillator always goes to its ends.
  const isReached = stage.response.kind === 'oscillator' || (side === 'high' ? level < inside : level > inside);
  for (let round = 0; isReached && round < ROUNDS && reading.value !== null; round += 1) {
    reading = read(level);
    const next = reading.value === null ? level : endOf(reading.value);
    if (next === level) break;
    level = next;
  }
  return { level: reading.value === null ? null : level, reading };
}

/** Below this a current is no pull, A. */
const NO_PULL = 1e-12;

/** As the head-room checks ask: current towards the rail, and the load where it and the whole current pull that way. */
function questionAt(stage: Stage, { loadCurrent, networkCurrent }: Vertex, { side, supply }: { readonly side: Side; readonly supply: number }) {
  const sign = side === 'high' ? 1 : -1;
  const whole = (loadCurrent + networkCurrent) * sign;
  const isHelped = -loadCurrent * sign > NO_PULL && -whole > NO_PULL;
  return { supply, current: Math.max(0, whole), assistingLoad: isHelped ? (stage.load?.resistance ?? null) : null };
}
