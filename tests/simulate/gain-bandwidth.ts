import { onePole } from '../support/amplifiers.js';
import { at, netlist } from '../support/netlists.js';
import { magnitude, type Complex } from '../support/nodal.js';
import { spice } from '../support/spice.js';
import { allBenches, signalCircuit, type Corner, type Ground } from './corners.js';
import type { Draw } from './draw.js';
import type { Bench, Both, Measured } from './measured.js';
import { READINGS } from './reading.js';
import type { DrawnStage } from './stage-drawn.js';

/** Is the gain at the top frequency off its low-frequency value by more than the limit: small-signal analysis with one pole. */
export const gainBandwidth: Bench = { simplification: 'the noise gain is that of nominal resistors', measure };

const DIFFERENTIAL = { positive: 'dc 0 ac 0.5', negative: 'dc 0 ac -0.5' };

async function measure(draw: Draw, ground: Ground): Promise<Both> {
  const { stage } = draw;
  const benches = ground === 'real' ? allBenches(stage) : [stage.bench];
  const inputs = stage.bench.topology === 'difference' ? DIFFERENTIAL : { input: 'dc 0 ac 1' };
  const circuits = benches.flatMap((bench, k) =>
    READINGS.map((reading) => {
      const corner: Corner = { bench, supply: 0, reference: 0 };
      return signalCircuit({ stage, corner, name: `${reading}${k}`, amplifier: onePole(draw.part.physical(draw.scale, reading)!.value!) }, () => inputs);
    }),
  );
  const run = await spice(netlist(circuits, `.ac dec 1 ${stage.frequency / 1e4} ${stage.frequency}`, ...circuits.map(({ name }) => at('out', name))));
  const worst = (reading: string): Measured => {
    const errors = benches.map((_, k) => errorOf(stage, run.complex(at('out', `${reading}${k}`))));
    return { excess: Math.max(...errors) / stage.gainError - 1, unit: 'fraction', resolution: 1e-5 };
  };
  return { pessimistic: worst('pessimistic'), optimistic: worst('optimistic') };
}

function errorOf(stage: DrawnStage, response: readonly Complex[]): number {
  const [low, top] = [response[0]!, response.at(-1)!];
  const lost: Complex = [low[0] - top[0], low[1] - top[1]];
  return stage.isVector ? magnitude(lost) / magnitude(low) : 1 - magnitude(top) / magnitude(low);
}
