import type { Amplifier } from '../support/amplifiers.js';
import { at, netlist, type Circuit } from '../support/netlists.js';
import { period, spice } from '../support/spice.js';
import { allBenches, cornersOf, signalCircuit, swinging, withNominalCurrent, type Corner } from './corners.js';
import type { Draw } from './draw.js';
import { both, oneSided, type Bench, type Measured } from './measured.js';
import type { Loss } from './part-drawn.js';
import type { DrawnStage } from './stage-drawn.js';
import { staticPoints, type StaticPoint } from './static-points.js';

type Side = 'low' | 'high';

const SIMPLIFICATION =
  'the current at a vertex is that of nominal resistors and the ideal output, and the offset is multiplied by the upper corner of the noise gain at every vertex';

/** Does the wanted sine lose more at a rail than it may, with the load and feedback current flowing through the loss of the output. */
export function outputHeadroom(side: Side): Bench {
  return {
    simplification: SIMPLIFICATION,
    measure: (draw, ground) =>
      both((reading) => {
        const physical = draw.part.physical(draw.scale, reading);
        if (physical === null) return null;
        const output = { side, loss: physical.loss!, offset: (side === 'high' ? 1 : -1) * (physical.offset ?? 0) };
        return ground === 'real' ? clipped(draw, output) : byRule(draw, output);
      }),
  };
}

interface Output {
  readonly side: Side;
  readonly loss: (supply: number) => Loss;
  /** Volts at the input, signed towards the rail. */
  readonly offset: number;
}

const room = (point: StaticPoint, side: Side): number => (side === 'high' ? point.corner.supply - point.output : point.output);
const towards = (point: StaticPoint, side: Side): number => Math.max(0, side === 'high' ? point.current : -point.current);

/** What an output needs beyond the room there is, V; a margin the team keeps counts as needed. */
function lack(point: StaticPoint, { side, loss }: Output, stage: DrawnStage): number {
  return loss(point.corner.supply).at(towards(point, side)) + stage.headroomMargin - stage.swingLoss - room(point, side);
}

/** The corners that lack most by their operating points, then a sine through each with and without the loss. */
async function clipped(draw: Draw, output: Output): Promise<Measured> {
  const { stage } = draw;
  const points = await staticPoints(stage, cornersOf(stage, allBenches(stage)), output.offset);
  const [worst, ...rest] = [...points].sort((a, b) => lack(b, output, stage) - lack(a, output, stage));
  const another = rest.find(({ corner }) => corner.supply !== worst!.corner.supply) ?? rest[0];
  const missing = await missingAt(stage, [worst!, ...(another === undefined ? [] : [another])], output);
  return oneSided(Math.max(...missing) - stage.swingLoss - SAME, 'V', SAME);
}

/** A sine slow enough that the loop takes nothing from it; its first quarter ends at the extreme. */
const SLOW = 100;
/** Volts by which two runs of the same sine may differ. */
const SAME = 2e-6;
const GAIN_BANDWIDTH = 1e6;
const STEPS = 400;

async function missingAt(stage: DrawnStage, points: readonly StaticPoint[], output: Output): Promise<number[]> {
  const circuits = points.flatMap(({ corner, point }, k): Circuit[] => {
    const inputs = swinging(stage.centre, point, SLOW);
    const place = (name: string, amplifier: Amplifier): Circuit => signalCircuit({ stage, corner, name: `${name}${k}`, amplifier }, inputs, output.offset);
    return [place('f', lossy(output.offset, null, output.side)), place('c', lossy(output.offset, withMargin(output, stage, corner), output.side))];
  });
  const step = 1 / SLOW / STEPS;
  const run = await spice(netlist(circuits, `.tran ${step} ${0.36 / SLOW} ${0.1 / SLOW} ${step} uic`, ...circuits.map(({ name }) => at('out', name))));
  const samples = (name: string): number[] => period(run.real('time'), run.real(at('out', name)), [0.15 / SLOW, 0.2 / SLOW, STEPS]);
  return points.map((_, k) => shortAtExtreme(samples(`f${k}`), samples(`c${k}`), output.side));
}

/** At the moment the free sine turns: afterwards a held loop has wound up, and comes back late and higher. */
function shortAtExtreme(free: readonly number[], held: readonly number[], side: Side): number {
  const sign = side === 'high' ? 1 : -1;
  const turn = free.reduce((best, volts, k) => (sign * volts > sign * free[best]! ? k : best), 0);
  return sign * (free[turn]! - held[turn]!);
}

function withMargin(output: Output, stage: DrawnStage, corner: Corner): string {
  const current = output.side === 'high' ? 'i(vo@)' : '-i(vo@)';
  return `${output.loss(corner.supply).text(current)}+${stage.headroomMargin}`;
}

/** One pole about half the supply, an offset, and an output held away from one rail by a loss in volts; none: it never clips. */
function lossy(offset: number, loss: string | null, side: Side): Amplifier {
  return ({ plus, minus, drive, supply, tag }) => {
    const wanted = `v(${supply})/2+v(y${tag})`;
    const text = loss?.replaceAll('@', tag);
    const held = text === undefined ? wanted : side === 'high' ? `min(${wanted},v(${supply})-(${text}))` : `max(${wanted},${text})`;
    return [
      `vos${tag} a${tag} ${plus} ${offset}`,
      `g${tag} 0 y${tag} a${tag} ${minus} 1`,
      `cy${tag} y${tag} 0 ${1 / (2 * Math.PI * GAIN_BANDWIDTH)}`,
      `ry${tag} y${tag} 0 1e9`,
      `b${tag} ${drive} 0 v=${held}`,
    ];
  };
}

/** The written rule on operating points: network as if nominal, the ideal output, the offset as far as it goes at any corner. */
async function byRule(draw: Draw, output: Output): Promise<Measured> {
  const { stage } = draw;
  const benches = allBenches(stage).map((bench) => withNominalCurrent(stage, bench));
  const corners = cornersOf(stage, benches);
  const plain = await staticPoints(stage, corners);
  const shifted = output.offset === 0 ? plain : await staticPoints(stage, corners, output.offset);
  const share = Math.max(...plain.map((point, k) => Math.abs(shifted[k]!.output - point.output)));
  return { excess: Math.max(...plain.map((point) => lack(point, output, stage))) + share, unit: 'V', resolution: SAME };
}

