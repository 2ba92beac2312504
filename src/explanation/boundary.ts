import type { Probe, Probed } from '../screening/index.js';
import type { Override } from '../spec/spec.js';
import type { Finding, SingleFinding } from '../verdicts/finding.js';
import type { Bench } from './bench.js';
import { setting } from './changing.js';
import { textAt, type Mover } from './movers.js';
import { EXACT } from './printed-value.js';
import { turnBetween, type Trial } from './turn.js';

/** Where a mover is asked to go: which checks it must bring round, with what else already moved. */
export interface Errand {
  readonly bench: Bench;
  readonly checks: readonly string[];
  readonly before: readonly Override[];
  /** How near a search goes, as a share of the value; what is told and not proposed needs no more than it shows. */
  readonly width?: number;
}

/** The least move with which all these checks pass, unrounded, on the passing side; null where there is none. */
export function boundaryOf(mover: Mover, errand: Errand): number | null {
  const closed = closedForm(mover, errand);
  if (closed !== undefined) return closed;
  return searched(mover, errand);
}

/** The move to this value, unrounded. */
export const movedTo = (mover: Mover, value: number): Override => setting(mover.path, textAt(mover, value, EXACT));

/**
 * A check that compares a number of the part with this very limit turns where the limit is what the part offers on its worst reading
 * (and borrowed terms are a tenth). Undefined where the limit is not compared as it stands.
 */
function closedForm(mover: Mover, { bench, checks, before }: Errand): number | null | undefined {
  const [check] = checks;
  if (mover.touches?.length !== 1 || checks.length !== 1 || check === undefined || mover.end !== 'value') return undefined;
  const finding = bench.tried(before)?.check(check)?.worst;
  if (finding?.kind !== 'numbers') return finding === undefined ? undefined : finding.kind === 'vertices' ? undefined : null;
  if (finding.required !== mover.from || (finding.sense === 'at-most') !== (mover.direction === 'up')) return undefined;
  const value = finding.sense === 'at-most' ? Math.max(finding.offered, (finding.borrowed ?? 0) * BORROWED) : finding.offered;
  if (isBeyond(mover, value)) return null;
  return trial(mover, { bench, checks, before }, value).passes ? value : undefined;
}

/** Limit to borrowed terms in a pass. */
const BORROWED = 10;

const isBeyond = ({ direction, most }: Mover, value: number): boolean => (direction === 'up' ? value > most : value < most);

function searched(mover: Mover, errand: Errand): number | null {
  let before = mover.from;
  const tried = (value: number): Trial => trial(mover, errand, value);
  for (const value of steps(mover, tried(mover.from).slack)) {
    if (tried(value).passes) return turnBetween(tried, { no: before, yes: value, ...(errand.width === undefined ? {} : { width: errand.width }) });
    before = value;
  }
  return null;
}

function trial(mover: Mover, { bench, checks, before }: Errand, value: number): Trial {
  const probe = bench.tried(value === mover.from ? before : [...before, movedTo(mover, value)]);
  if (probe === null) return { passes: false, slack: null };
  return { passes: allPass(probe, checks), slack: leastSlack(checks.map((id) => probe.check(id))) };
}

export const allPass = (probe: Probe, checks: readonly string[]): boolean => checks.every((id) => (probe.check(id)?.outcome ?? 'pass') === 'pass');

/** Multiples away from where it stands; from nothing, shares of the farthest. */
const RATIOS = [1.02, 1.05, 1.1, 1.2, 1.4, 1.7, 2, 3, 5, 10, 30, 100, 1000];
const SHARES = [0.001, 0.003, 0.01, 0.03, 0.1, 0.3, 1];
/** Shares of the way an end can go. */
const INWARDS = [0.02, 0.05, 0.1, 0.2, 0.35, 0.5, 0.7, 0.85, 1];

/** Where to look, nearest first; `slack` as things stand says where it should be, most demands being proportional to what moves. */
function steps(mover: Mover, slack: number | null): number[] {
  const { from, direction, end } = mover;
  const all = ladder(mover);
  if (end !== 'value' || from <= 0 || slack === null || slack >= 0) return all;
  const guess = direction === 'up' ? from * Math.exp(-slack) * (1 + NEAR) : (from * Math.exp(slack)) / (1 + NEAR);
  if (isBeyond(mover, guess)) return all;
  return [guess, ...all.filter((value) => (direction === 'up' ? value > guess : value < guess)).slice(0, FURTHER)];
}

/** So many steps beyond a guess that was too near. */
const FURTHER = 6;
/** A little beyond the guess, to be on the passing side of it. */
const NEAR = 0.01;

function ladder(mover: Mover): number[] {
  const { from, most, direction, end } = mover;
  if (end === 'min' || end === 'max') return INWARDS.map((share) => from + share * (most - from));
  if (from === 0) return SHARES.map((share) => share * most);
  const values = RATIOS.map((ratio) => (direction === 'up' ? from * ratio : from / ratio)).filter((value) => !isBeyond(mover, value));
  return Number.isFinite(most) && values.at(-1) !== most ? [...values, most] : values;
}

function leastSlack(probed: readonly (Probed | null)[]): number | null {
  const all = probed.map((one) => (one === null ? Number.POSITIVE_INFINITY : slackOf(one.worst)));
  return all.some((one) => one === null) ? null : Math.min(...all.map(Number));
}

/** What is left on the worst reading, positive when the check is met; head-rooms in V, all else as the logarithm of a ratio where there is one. */
function slackOf(finding: Finding): number | null {
  if (finding.kind === 'words' || finding.kind === 'undecided') return null;
  if (finding.kind !== 'vertices') return slackOfOne(finding);
  const all = finding.findings.map(slackOfOne);
  return all.some((one) => one === null) ? null : Math.min(...all.map(Number));
}

function slackOfOne(finding: SingleFinding): number | null {
  if (finding.kind !== 'numbers') return null;
  const { offered, required, sense, unit } = finding;
  const sign = sense === 'at-least' ? 1 : -1;
  const slack = unit !== 'V' && offered > 0 && required > 0 ? Math.log(offered / required) : offered - required;
  return Number.isFinite(slack) ? sign * slack : null;
}
