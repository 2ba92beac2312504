import type { Probe } from '../screening/index.js';
import { standingOf } from '../verdicts/standing.js';
import type { SingleFinding } from '../verdicts/finding.js';
import type { Errand } from './boundary.js';
import { setting, type Advice, type Change, type Changing } from './changing.js';
import { EXACT, writtenValue } from './printed-value.js';

interface Means {
  readonly changing: Changing;
  /** Smallest changes for these checks, in by this. */
  readonly smallest: (checks: readonly string[], isIn: (probe: Probe) => boolean) => readonly Change[];
}

/** Ways the stage file cannot say, each computed beside it. */
export function adviceFor(errand: Errand, means: Means): Advice[] {
  return [...calibrated(errand, means), ...split(errand, means)];
}

/** DC error without the offset, on the worst reading: what a calibration at 25 °C leaves; drift stays. Null where that cannot be told, or does not pass. */
function leftAfterCalibration(probe: Probe): { readonly left: number; readonly allowed: number } | null {
  const finding = probe.check('dc-error')?.worst as SingleFinding | undefined;
  if (finding?.kind !== 'numbers') return null;
  const offset = finding.terms?.find(({ name }) => name === 'offset');
  // An offset that holds over temperature has its drift inside, which no calibration takes away.
  if (offset === undefined || finding.terms?.some(({ name }) => name === 'offset drift') !== true) return null;
  const left = finding.offered - offset.value;
  const borrowed = (finding.borrowed ?? 0) - (offset.basis === 'borrowed' ? offset.value : 0);
  // What is left must pass as any DC error must: within the limit, and little of it borrowed.
  return standingOf({ ...finding, offered: left, borrowed }) === 'pass' ? { left, allowed: finding.required } : null;
}

function calibrated({ bench, checks }: Errand, { smallest }: Means): Advice[] {
  const asIs = bench.tried([]);
  const now = asIs === null || !checks.includes('dc-error') ? null : leftAfterCalibration(asIs);
  if (now === null) return [];
  const others = checks.filter((check) => check !== 'dc-error');
  if (others.length === 0) return [{ kind: 'calibrate', ...now, moves: [] }];
  const isIn = (probe: Probe): boolean => leftAfterCalibration(probe) !== null && probe.notPassing().every((check) => check === 'dc-error');
  const [first] = smallest(others, isIn).filter(({ moves }) => moves.every(({ path }) => path !== 'limits.dcError'));
  return first === undefined ? [] : [{ kind: 'calibrate', ...now, moves: first.moves }];
}

/** Below this a second stage costs more than it gives. */
const WORTH = 4;

/** Two stages in a row, each with the root of the gain and half of the errors: both judged in full with this part. */
function split({ bench, checks }: Errand, { changing }: Means): Advice[] {
  const { topology, gain, asked, vertices, coupling } = bench.stage;
  const input = changing.inputs.find(({ path }) => path === 'signal.input');
  const isPlain = topology === 'non-inverting' && coupling === 'dc' && vertices.every(({ reference }) => reference === 0);
  if (!isPlain || gain < WORTH || input?.form !== 'range' || !checks.includes('gain-bandwidth') || asked.limits.gainErrorKind === 'vector') return [];
  const root = Math.sqrt(gain);
  const gainError = 1 - Math.sqrt(1 - (asked.limits.gainError?.value ?? 0.01));
  const dcError = asked.limits.dcError?.value;
  const dcErrors = dcError === undefined ? null : ([dcError / 2 / root, dcError / 2] as const);
  const noise = asked.limits.outputNoise?.value;
  const each = (at: 0 | 1): boolean => {
    const fields = [
      setting('gain', String(root)),
      setting('limits.gainError', writtenValue(gainError, '%', { digits: EXACT })),
      ...(dcErrors === null ? [] : [setting('limits.dcError', writtenValue(dcErrors[at], 'V', { digits: EXACT }))]),
      ...(noise === undefined ? [] : [setting('limits.outputNoise', writtenValue(noise / Math.SQRT2 / (at === 0 ? root : 1), 'Vrms', { digits: EXACT }))]),
      ...(at === 0 ? [] : [setting('signal.input', `${writtenValue(input.min * root, 'V', { digits: EXACT })}..${writtenValue(input.max * root, 'V', { digits: EXACT })}`)]),
    ];
    return bench.tried(fields)?.fits() === true;
  };
  return each(0) && each(1) ? [{ kind: 'split', gain: root, gainError, dcErrors }] : [];
}
