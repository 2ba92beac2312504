import { ideal } from '../support/amplifiers.js';
import { netlist, outputCurrent as currentOf, type Circuit } from '../support/netlists.js';
import { magnitude } from '../support/nodal.js';
import { spice } from '../support/spice.js';
import { allBenches, cornersOf, signalCircuit, still, type Corner, type Ground } from './corners.js';
import type { Draw } from './draw.js';
import { both, type Bench, type Both } from './measured.js';
import type { DrawnStage, Point } from './stage-drawn.js';

/** Does the output give more than it may: current at the centre of the signal plus the amplitude at the top frequency. */
export const outputCurrent: Bench = { simplification: 'the current is that of nominal resistors', measure };

async function measure(draw: Draw, ground: Ground): Promise<Both> {
  const { stage } = draw;
  const corners = cornersOf(stage, ground === 'real' ? allBenches(stage) : [stage.bench]);
  const peaks = await peaksOf(stage, corners);
  return both((reading) => {
    const { high, low } = draw.part.physical(draw.scale, reading)!.usable!;
    const excess = Math.max(...peaks.map(({ centre, swing }) => Math.max((centre + swing) / high, (swing - centre) / low))) - 1;
    return { excess, unit: 'fraction', resolution: 1e-6 };
  });
}

interface Peak {
  readonly centre: number;
  readonly swing: number;
}

/** Every corner with the inputs swinging to every extreme: the constant part, then the amplitude, load capacitance included. */
async function peaksOf(stage: DrawnStage, corners: readonly Corner[]): Promise<Peak[]> {
  const places = corners.flatMap((corner) => stage.points.map((point) => ({ corner, point })));
  const circuits = (drive: (point: Point) => (bias: number) => Circuit['drive']['inputs']): Circuit[] =>
    places.map(({ corner, point }, k) => {
      const circuit = signalCircuit({ stage, corner, name: `k${k}`, amplifier: ideal }, drive(point));
      return stage.load?.farad === undefined ? circuit : { ...circuit, load: stage.load };
    });
  const saved = places.map((_, k) => currentOf(`k${k}`));
  const resting = await spice(netlist(circuits(() => still(stage.centre)), '.op', ...saved));
  const moving = await spice(netlist(circuits((point) => sines(stage, point)), `.ac lin 1 ${stage.frequency} ${stage.frequency}`, ...saved));
  return saved.map((name) => ({ centre: resting.value(name), swing: magnitude(moving.complex(name)[0]!) }));
}

/** In phase or against each other, as the point lies from the centre. */
function sines(stage: DrawnStage, point: Point) {
  return (): Record<string, string> =>
    Object.fromEntries(Object.entries(point).map(([name, volts]) => [name, `dc 0 ac ${volts - stage.centre[name]!}`]));
}
