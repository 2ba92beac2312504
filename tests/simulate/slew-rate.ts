import type { Amplifier } from '../support/amplifiers.js';
import { at, netlist } from '../support/netlists.js';
import { period, spice } from '../support/spice.js';
import { allBenches, cornersOf, signalCircuit, swinging } from './corners.js';
import type { Draw } from './draw.js';
import { oneSided, type Bench, type Both, type Measured } from './measured.js';
import { READINGS } from './reading.js';
import { staticPoints, type StaticPoint } from './static-points.js';

/** Does a full sine at the top frequency leave its course: the same loop with and without a hard limit of its slope. */
export const slewRate: Bench = { simplification: null, measure };

const STEPS = 1000;
/** The loop is this much faster than the signal, so that it takes nothing from the sine. */
const FASTER = 1000;
/** Share of the peak by which two runs of the same sine may differ: steps in time. */
const SAME = 2e-5;

async function measure(draw: Draw): Promise<Both> {
  const { stage } = draw;
  const points = await staticPoints(stage, cornersOf(stage, allBenches(stage)));
  const { far, half } = largest(points);
  const { frequency } = stage;
  const noiseGain = 1 + (stage.bench.feedback ?? 0) / (stage.bench.input ?? 1);
  const inputs = swinging(stage.centre, far.point, frequency);
  const place = (name: string, limit: number) => {
    const amplifier = limited({ gainBandwidth: FASTER * frequency * noiseGain, slewRate: limit, start: far.output - half });
    return signalCircuit({ stage, corner: far.corner, name, amplifier }, inputs);
  };
  const circuits = [place('free', 1e3 * frequency * Math.max(half, 1)), ...READINGS.map((reading) => place(reading, draw.part.physical(draw.scale, reading)!.value!))];
  const step = 1 / frequency / STEPS;
  const run = await spice(netlist(circuits, `.tran ${step} ${0.86 / frequency} ${0.25 / frequency} ${step} uic`, ...circuits.map(({ name }) => at('out', name))));
  const samples = (name: string): number[] => period(run.real('time'), run.real(at('out', name)), [0.3 / frequency, 0.55 / frequency, STEPS]);
  const free = samples('free');
  const off = (name: string): Measured => {
    const deviation = Math.max(...samples(name).map((volts, k) => Math.abs(volts - free[k]!)));
    return oneSided(deviation / Math.abs(half) - SAME, 'fraction', SAME);
  };
  return { pessimistic: off('pessimistic'), optimistic: off('optimistic') };
}

/** The corner with the largest span between two of its points, the upper of them, and half that span. */
function largest(points: readonly StaticPoint[]): { far: StaticPoint; half: number } {
  const found = points.map((far) => {
    const same = points.filter(({ corner }) => corner === far.corner);
    return { far, half: (far.output - Math.min(...same.map(({ output }) => output))) / 2 };
  });
  return found.reduce((best, next) => (next.half > best.half ? next : best));
}

interface Limited {
  readonly gainBandwidth: number;
  readonly slewRate: number;
  /** Where the output starts, V. */
  readonly start: number;
}

const FARAD = 1e-9;

function limited({ gainBandwidth, slewRate: most, start }: Limited): Amplifier {
  const siemens = 2 * Math.PI * gainBandwidth * FARAD;
  return ({ plus, minus, drive, tag }) => [
    `b${tag} 0 y${tag} i=min(max(${siemens}*(v(${plus})-v(${minus})),${-most * FARAD}),${most * FARAD})`,
    `cy${tag} y${tag} 0 ${FARAD} ic=${start}`,
    `e${tag} ${drive} 0 y${tag} 0 1`,
  ];
}
