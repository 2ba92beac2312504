import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import { hazardContradictions } from '../spec/hazard-contradictions.js';
import { supplyContradictions } from '../spec/supply-contradictions.js';
import type { StageSpec, Topology } from '../spec/spec.js';
import { gainForm } from './gain-form.js';
import type { Stage } from './stage.js';
import { wayInside, type Rebuild } from './way-inside.js';

const volts = (value: number): string => formatQuantity(value, 'V', { digits: 4 });
const SLACK = 1e-12;

/** Everything about the finished stage that no amplifier can satisfy, found before any part is looked at (EX-14). */
export function contradictionsOf(spec: StageSpec, stage: Stage, rebuild: Rebuild): Problem[] {
  const accepting = (isInside: (built: Stage) => boolean) => (tried: StageSpec): boolean => {
    const built = rebuild(tried);
    return built !== null && supplyContradictions(tried).length <= idle(spec) && isInside(built) && outputDisagrees(tried, built) === null;
  };
  const trial = { rebuild, accepts: accepting(isWithinSupply), acceptsAtCorners: accepting(isWithinAtCorners) };
  const found = [beyondSupply(spec, stage, () => wayInside(spec, stage, trial)), outputDisagrees(spec, stage)];
  return [...found.filter((one) => one !== null), ...supplyContradictions(spec), ...hazardContradictions(spec)];
}

/** A peak below the supply stays whatever is done about gain and reference. */
const idle = (spec: StageSpec): number => supplyContradictions(spec).filter(({ code }) => code === 'S206').length;

const isBelow = (stage: Stage): boolean => stage.outputNominal.min < -SLACK;

/** Within the lowest supply, with resistors and signal at their ends. */
const isWithinAtCorners = ({ output, supply }: Stage): boolean => output.min >= -SLACK && output.max <= supply.min + SLACK;

function isWithinSupply(stage: Stage): boolean {
  return !isBelow(stage) && stage.outputNominal.max <= stage.supply.nominal * (1 + 1e-9) + SLACK;
}

/** The output at nominal values must lie within the nominal supply; worse corners fail parts instead. */
function beyondSupply(spec: StageSpec, stage: Stage, fix: () => string): Problem | null {
  if (isWithinSupply(stage)) return null;
  const { min, max } = stage.outputNominal;
  const top = volts(stage.supply.nominal);
  const below = isBelow(stage);
  const asked = `${volts(min)}..${volts(max)}`;
  const end = below ? 'below ground' : `above the ${top} supply`;
  return contradiction(spec, {
    code: below && inputBelowGround(spec) ? 'S204' : 'S201',
    paths: ['signal.output', ...DRIVES, 'gain', 'filter', 'reference', 'supply'],
    message: `the output is asked to swing ${asked}, ${end}: no amplifier on this supply does that`,
    fix: fix(),
  });
}

/** Where the stage file says what drives the stage. */
const DRIVES = ['signal.input', 'signal.amplitude', 'signal.differential', 'signal.positive', 'legs', 'photodiode', 'photodiode.current', 'shunt', 'shunt.current', 'integrator'];

function inputBelowGround(spec: StageSpec): boolean {
  const least = spec.signal.input?.min ?? spec.signal.positive?.min ?? spec.shunt?.current.min ?? 0;
  return least < 0 && (spec.reference === undefined || spec.reference.kind === 'ground');
}

/** With a gain, `signal.output` is a cross-check: the nominal output must be what was written, to 1 % of the span. */
function outputDisagrees(spec: StageSpec, stage: Stage): Problem | null {
  const wanted = spec.signal.output;
  if (wanted === undefined) return null;
  const { min, max } = passed(stage);
  const slack = (wanted.max - wanted.min) * (0.01 + leeway(spec, stage)) + SLACK;
  if (Math.abs(min - wanted.min) <= slack && Math.abs(max - wanted.max) <= slack) return null;
  return contradiction(spec, {
    code: 'S202',
    paths: ['signal.output', 'gain', 'resistors', 'filter', ...DRIVES, 'reference'],
    message: `signal.output says ${wanted.text}, but ${SAYS[stage.topology] ?? 'gain, input and reference'} give ${volts(min)}..${volts(max)}`,
    fix: `write output: ${volts(min)}..${volts(max)}, or leave out ${SOLVED[stage.topology] ?? 'the gain and the reference to have them solved'}`,
  });
}

/** What the output follows from, where that is not gain, input and reference. */
const SAYS: Readonly<Partial<Record<Topology, string>>> = {
  follower: 'the input and the stage, which passes it on,',
  summing: 'legs, feedback resistor and reference',
  transimpedance: 'photodiode, feedback resistor and reference',
  'low-side-sense': 'gain, shunt and reference',
  'high-side-sense': 'gain, shunt and reference',
  integrator: 'components, window, input and reference',
};

/** What can be left out to have the output as written, where that is not gain and reference. */
const SOLVED: Readonly<Partial<Record<Topology, string>>> = {
  follower: 'the output: a follower puts out its input',
  summing: 'the output: the legs say it',
  transimpedance: 'the feedback resistor and the reference to have them solved',
  integrator: 'the output: the components say it',
};

/** The output without what a filter's own peak or overshoot adds to the swing: that is what signal.output means. */
function passed({ outputNominal: { min, max }, response }: Stage): Stage['outputNominal'] {
  if (response.kind !== 'low-pass') return { min, max };
  const [middle, half] = [(min + max) / 2, (max - min) / 2 / response.growth];
  return { min: middle - half, max: middle + half };
}

/** E96 values lie within this of what was solved. */
const ROUNDED = 0.013;

/** Series resistance of source or reference, and the choice of preferred values, move the gain: that is not the user's contradiction. Fraction of the span. */
function leeway(spec: StageSpec, stage: Stage): number {
  if (stage.topology === 'transimpedance') return spec.resistors?.feedback === undefined ? ROUNDED : 0;
  const written = spec.gain?.value ?? bareGain(stage);
  return written === null ? 0 : 2 * Math.abs(Math.abs(stage.gain) / written - 1);
}

function bareGain(stage: Stage): number | null {
  if (stage.resistors === null || gainForm(stage.topology) === null) return null;
  const ratio = stage.resistors.feedback / stage.resistors.input;
  return gainForm(stage.topology) === 'non-inverting' ? 1 + ratio : ratio;
}
