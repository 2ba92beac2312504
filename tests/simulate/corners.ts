import { cornerBenches } from '../support/corner-bench.js';
import type { Bench, Circuit, Drive, Load } from '../support/netlists.js';
import type { Amplifier } from '../support/amplifiers.js';
import type { DrawnStage, Point } from './stage-drawn.js';

/**
 * On what ground a verdict is looked at. `real`: every resistor by itself at either end of its tolerance. `agreed`: where the
 * written rules fix a simplification (nominal resistors for a current or a noise gain), the same circuit with just that.
 */
export type Ground = 'real' | 'agreed';

/** One set of resistors on one pair of rails. */
export interface Corner {
  readonly bench: Bench;
  readonly supply: number;
  readonly reference: number;
}

/** All ends of all resistors. */
export function allBenches(stage: DrawnStage): Bench[] {
  if (stage.tolerance === 0 && stage.sourceTolerance === 0) return [stage.bench];
  return cornerBenches(stage.bench, stage.tolerance, stage.sourceTolerance);
}

/** Supply and reference that belong together: half the supply moves with it. */
export function rails({ supply, reference }: DrawnStage): (readonly [number, number])[] {
  const supplies = supply.min === supply.max ? [supply.min] : [supply.min, supply.max];
  const factors = reference.tolerance === 0 ? [1] : [1 - reference.tolerance, 1 + reference.tolerance];
  return supplies.flatMap((volts) => factors.map((factor) => [volts, factor * (reference.kind === 'mid-supply' ? volts / 2 : reference.value)] as const));
}

export function cornersOf(stage: DrawnStage, benches: readonly Bench[]): Corner[] {
  return benches.flatMap((bench) => rails(stage).map(([supply, reference]) => ({ bench, supply, reference })));
}

/** All resistors scaled alike, so that the ratios stay and the feedback network draws the current of the nominal one. */
export function withNominalCurrent(stage: DrawnStage, bench: Bench): Bench {
  const across = (one: Bench): number =>
    (one.feedback ?? 0) + (one.topology === 'non-inverting' ? (one.input ?? 0) + (stage.isAc ? 0 : (one.referenceResistance ?? 0)) : 0);
  if (across(bench) === 0) return bench;
  const factor = across(stage.bench) / across(bench);
  const scaled = (['feedback', 'input', 'positiveInput', 'toReference', 'source', 'referenceResistance'] as const).flatMap((name) => {
    const ohms = bench[name];
    return ohms === undefined ? [] : [[name, ohms * factor] as const];
  });
  return { ...bench, ...Object.fromEntries(scaled) };
}

interface Placed {
  readonly stage: DrawnStage;
  readonly corner: Corner;
  readonly name: string;
  readonly amplifier: Amplifier;
}

/**
 * The stage at signal frequencies. A coupling capacitor holds its voltage there: the average of the node behind it, so that an
 * AC-coupled stage is the same circuit with its input centred on the bias. `held` is what the average is off the reference, V.
 */
export function signalCircuit({ stage, corner, name, amplifier }: Placed, inputs: (bias: number) => Drive['inputs'], held = 0): Circuit {
  const load: { load?: Load } = stage.load?.ohms === undefined ? {} : { load: { ohms: stage.load.ohms, to: stage.load.to } };
  if (!stage.isAc) return { name, bench: corner.bench, amplifier, drive: { supply: corner.supply, reference: corner.reference, inputs: inputs(0) }, ...load };
  const { referenceResistance: _onlyAtDc, ...bench } = corner.bench;
  const bias = corner.reference + (bench.topology === 'inverting' ? held : 0);
  const reference = corner.reference + (bench.topology === 'non-inverting' ? held : 0);
  return { name, bench, amplifier, drive: { supply: corner.supply, reference, inputs: inputs(bias) }, ...load };
}

/** A point as constant voltages, on top of the bias. */
export const still = (point: Point) => (bias: number): Record<string, number> =>
  Object.fromEntries(Object.entries(point).map(([name, volts]) => [name, bias + volts]));

/** A sine from the centre to a point first, back through the centre to its opposite. */
export const swinging = (centre: Point, to: Point, frequency: number) => (bias: number): Record<string, string> =>
  Object.fromEntries(Object.entries(centre).map(([name, volts]) => [name, `sin(${bias + volts} ${(to[name] ?? 0) - volts} ${frequency})`]));

/** A resistance no current flows through: an open circuit the simulator can still solve. */
const OPEN = 1e12;

/** The stage at DC: a coupling capacitor is open, so nothing of the signal is left. */
export function quietCircuit({ stage, corner, name, amplifier }: Placed, point: Point): Circuit {
  const { supply, reference } = corner;
  if (!stage.isAc) return { name, bench: corner.bench, amplifier, drive: { supply, reference, inputs: point } };
  const { topology, feedback, referenceResistance } = corner.bench;
  const drive = { supply, reference, inputs: { input: reference } };
  const bias = referenceResistance === undefined ? {} : { source: referenceResistance };
  if (topology === 'follower') return { name, amplifier, drive, bench: { topology, ...bias } };
  // + input through its bias resistance, feedback resistor alone: both topologies are the same circuit at DC.
  return { name, amplifier, drive, bench: { topology: 'non-inverting', ...(feedback === undefined ? {} : { feedback }), input: OPEN, ...bias } };
}
