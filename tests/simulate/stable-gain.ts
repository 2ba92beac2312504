import type { Amplifier } from '../support/amplifiers.js';
import { at, netlist } from '../support/netlists.js';
import { magnitude, type Complex } from '../support/nodal.js';
import { spice } from '../support/spice.js';
import { allBenches, signalCircuit } from './corners.js';
import type { Bench, Both } from './measured.js';
import type { Draw } from './draw.js';

/**
 * Is the phase margin of the loop below 45°: two poles, the second placed so that the margin is 45° where the noise gain equals
 * the part's minimum stable gain. What a list means by that figure is a claim of its maker; the model only holds that it is a
 * noise gain, and that the smallest one of the stage counts.
 */
export const stableGain: Bench = { simplification: null, measure };

const GAIN_BANDWIDTH = 1e6;
const LEAST_MARGIN = 45;

async function measure(draw: Draw): Promise<Both> {
  const { stage } = draw;
  const benches = allBenches(stage);
  const minimum = draw.part.physical(draw.scale, 'pessimistic')!.value!;
  const inputs = stage.bench.topology === 'difference' ? { positive: 0, negative: 0 } : { input: 0 };
  const circuits = benches.map((bench, k) => signalCircuit({ stage, corner: { bench, supply: 0, reference: 0 }, name: `k${k}`, amplifier: opened(minimum) }, () => inputs));
  const run = await spice(netlist(circuits, `.ac dec 400 ${GAIN_BANDWIDTH / 1e4} ${10 * GAIN_BANDWIDTH}`, ...circuits.flatMap(({ name }) => [at('minus', name), at('plus', name)])));
  const margins = circuits.map(({ name }) => {
    const plus = run.complex(at('plus', name));
    return marginOf(run.complex(at('minus', name)).map(([re, im], k) => [re - plus[k]![0], im - plus[k]![1]]));
  });
  const found = { excess: 1 - Math.min(...margins) / LEAST_MARGIN, unit: 'fraction', resolution: 1e-4 } as const;
  return { pessimistic: found, optimistic: found };
}

/** The amplifier with its loop opened: driven by a source of its own, the pins only watched. */
function opened(minimum: number): Amplifier {
  const second = GAIN_BANDWIDTH / minimum / Math.SQRT2;
  return ({ drive, tag }) => [
    `vt${tag} t${tag} 0 dc 0 ac 1`,
    `g${tag} 0 y${tag} t${tag} 0 1`,
    `cy${tag} y${tag} 0 ${1 / (2 * Math.PI * GAIN_BANDWIDTH)}`,
    `ry${tag} y${tag} 0 1e9`,
    `g2${tag} 0 z${tag} y${tag} 0 1`,
    `rz${tag} z${tag} 0 1`,
    `cz${tag} z${tag} 0 ${1 / (2 * Math.PI * second)}`,
    `e${tag} ${drive} 0 z${tag} 0 1`,
  ];
}

/** Degrees left at the frequency where the loop gain crosses one, on straight lines between the points. */
function marginOf(loop: readonly Complex[]): number {
  const sizes = loop.map((value) => Math.log(magnitude(value)));
  const below = sizes.findIndex((size) => size < 0);
  const phase = (at: number): number => (Math.atan2(loop[at]![1], loop[at]![0]) * 180) / Math.PI;
  const share = sizes[below - 1]! / (sizes[below - 1]! - sizes[below]!);
  return 180 + phase(below - 1) + share * (phase(below) - phase(below - 1));
}
