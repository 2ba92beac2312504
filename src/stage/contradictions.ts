import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import type { StageSpec } from '../spec/spec.js';
import type { Stage } from './stage.js';

interface Contradiction {
  readonly code: string;
  /** Stage-file fields that contradict each other, the one to blame first. */
  readonly paths: readonly string[];
  readonly message: string;
  readonly fix: string;
}

/** A contradiction of the stage as a problem, standing at the first of its fields that was written and citing the others. */
export function contradiction(spec: StageSpec, what: Contradiction): Problem {
  const written = what.paths.filter((path) => spec.positions[path] !== undefined);
  const cited = written.slice(1).map((path) => `${path} in line ${spec.positions[path]?.line ?? '–'}`);
  const lines = written.slice(1).every((path) => spec.positions[path]?.line !== undefined) ? cited : written.slice(1);
  const first = written[0] === undefined ? undefined : spec.positions[written[0]];
  return {
    code: what.code,
    severity: 'error',
    message: lines.length === 0 ? what.message : `${what.message} (see ${lines.join(', ')})`,
    fix: what.fix,
    place: {
      path: first?.option ?? written[0] ?? what.paths[0] ?? 'stage',
      ...(first?.line === undefined ? {} : { line: first.line }),
      ...(first?.column === undefined ? {} : { column: first.column }),
    },
  };
}

const volts = (value: number): string => formatQuantity(value, 'V', { digits: 4 });
const SLACK = 1e-12;

/** Everything about the finished stage that no amplifier can satisfy, found before any part is looked at (EX-14). */
export function contradictionsOf(spec: StageSpec, stage: Stage): Problem[] {
  return [beyondSupply(spec, stage), outputDisagrees(spec, stage), peakBelowTop(spec)].filter((found) => found !== null);
}

/** The output at nominal values must lie within the nominal supply; worse corners fail parts instead. */
function beyondSupply(spec: StageSpec, stage: Stage): Problem | null {
  const { min, max } = stage.outputNominal;
  const top = stage.supply.nominal;
  const below = min < -SLACK;
  if (!below && max <= top * (1 + 1e-9) + SLACK) return null;
  const asked = `${volts(min)}..${volts(max)}`;
  const end = below ? 'below ground' : `above the ${volts(top)} supply`;
  return contradiction(spec, {
    code: below && inputBelowGround(spec) ? 'S204' : 'S201',
    paths: ['signal.output', 'signal.input', 'signal.amplitude', 'signal.differential', 'signal.positive', 'gain', 'reference', 'supply'],
    message: `the output is asked to swing ${asked}, ${end}: no amplifier on this supply does that`,
    fix: howToStayInside(spec, stage, below),
  });
}

function inputBelowGround(spec: StageSpec): boolean {
  const least = spec.signal.input?.min ?? spec.signal.positive?.min ?? 0;
  return least < 0 && (spec.reference === undefined || spec.reference.kind === 'ground');
}

function howToStayInside(spec: StageSpec, stage: Stage, below: boolean): string {
  const ground = spec.reference === undefined || spec.reference.kind === 'ground';
  if (ground && below) return stage.topology === 'follower' && stage.coupling === 'dc' ? 'keep signal.input at or above 0 V' : 'write reference: mid-supply, or another voltage the output may swing about';
  if (stage.topology === 'follower') return `keep the signal within 0..${volts(stage.supply.nominal)}`;
  const span = stage.outputNominal.max - stage.outputNominal.min;
  const most = Math.abs(stage.gain) * Math.min(1, stage.supply.nominal / span);
  return span > stage.supply.nominal
    ? `a gain of at most ${formatQuantity(most, 'V/V', { digits: 3, round: 'down' })} keeps the swing within the supply`
    : 'move the reference, or lower the gain';
}

/** With a gain, `signal.output` is a cross-check: the nominal output must be what was written, to 1 % of the span. */
function outputDisagrees(spec: StageSpec, stage: Stage): Problem | null {
  const wanted = spec.signal.output;
  if (wanted === undefined) return null;
  const { min, max } = stage.outputNominal;
  // Series resistance of source or reference, and the choice of E96 values, move the gain: that is not the user's contradiction.
  const written = spec.gain?.value ?? bareGain(stage) ?? Math.abs(stage.gain);
  const slack = (wanted.max - wanted.min) * (0.01 + 2 * Math.abs(Math.abs(stage.gain) / written - 1)) + SLACK;
  if (Math.abs(min - wanted.min) <= slack && Math.abs(max - wanted.max) <= slack) return null;
  return contradiction(spec, {
    code: 'S202',
    paths: ['signal.output', 'gain', 'resistors', 'signal.input', 'reference'],
    message: `signal.output says ${wanted.text}, but gain, input and reference give ${volts(min)}..${volts(max)}`,
    fix: `write output: ${volts(min)}..${volts(max)}, or leave out the gain and the reference to have them solved`,
  });
}

function bareGain(stage: Stage): number | null {
  if (stage.resistors === null) return null;
  const ratio = stage.resistors.feedback / stage.resistors.input;
  return stage.topology === 'non-inverting' ? 1 + ratio : ratio;
}

function peakBelowTop(spec: StageSpec): Problem | null {
  const peak = spec.supplyPeak;
  if (peak === undefined || peak.value >= spec.supply.max * (1 - 1e-9)) return null;
  return contradiction(spec, {
    code: 'S206',
    paths: ['supplyPeak', 'supply'],
    message: `supplyPeak ${peak.text} is below the top of the supply, ${volts(spec.supply.max)}`,
    fix: `write supplyPeak: ${volts(spec.supply.max)}, or leave it out`,
  });
}
