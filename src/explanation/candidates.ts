import { CHECKS } from '../checks/index.js';
import type { Demands } from '../demands/index.js';
import { limitKindOf } from '../parts/assumption.js';
import { BORROWABLE } from '../parts/classes.js';
import { PARAMETERS, type Condition, type LimitKind, type Parameter } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import type { JudgedPart } from '../screening/index.js';
import type { Verdict } from '../verdicts/verdict.js';
import { isIdentity, type Answer, type Subject } from './supposed.js';

/** A figure that might settle open checks, with what the checks say about it. */
export interface Candidate extends Subject {
  /** Open checks it was named by. */
  readonly checks: readonly string[];
  /** Where a check's closed form says that it turns, SI. */
  readonly guess: number | null;
  /** Identity fields: what the stage wants there. */
  readonly wanted: Answer | null;
  /** An open check asks for it by name; otherwise it is only something the check reads. */
  readonly named: boolean;
}

/** Verdicts no figure of a list can close: the check does not exist, the stage does not say what it takes, or the price is in another currency. */
export const isBeyondLists = ({ reason }: Verdict): boolean => reason === 'not-built' || reason === 'not-said' || reason === 'currency';

/** Everything that might be looked up for a part: what its open checks name first, then what else they read and have no limit of. */
export function candidatesOf({ part, verdicts }: JudgedPart, demands: Demands, rated: Rated = 'known'): Candidate[] {
  const open = verdicts.filter((verdict) => verdict.outcome === 'unknown' && !isBeyondLists(verdict));
  const found = new Map<string, Candidate>();
  const named = open.flatMap((verdict) => [...missingOf(verdict), ...turningOf(verdict), ...borrowedOf(verdict, part)]);
  const read = open.flatMap((verdict) => alsoRead(verdict, part));
  for (const one of [...named, ...read]) {
    const key = `${one.figure}/${one.kind ?? ''}`;
    const known = found.get(key);
    const placed = known ?? { ...one, condition: isIdentity(one.figure) ? {} : conditionOf(one.figure, one.kind, { part, demands, rated }) };
    found.set(key, { ...placed, guess: placed.guess ?? one.guess, checks: [...new Set([...placed.checks, ...one.checks])] });
  }
  return [...found.values()];
}

function missingOf(verdict: Verdict): Candidate[] {
  return verdict.missing.map(({ figure, kind }) => ({
    figure,
    kind: isIdentity(figure) ? null : (kind ?? limitKindOf(figure)),
    condition: {},
    checks: [verdict.check],
    guess: verdict.decidesAt?.figure === figure ? verdict.decidesAt.value : null,
    // A hazard of the inputs: the part that does not have it is the better one.
    wanted: figure === 'phaseReversal' || figure === 'inputClamp' ? 'no' : wantedOf(verdict),
    named: true,
  }));
}

function wantedOf({ required, unit, check }: Verdict): Answer | null {
  if (Array.isArray(required)) return String(required[0] ?? '');
  if (typeof required !== 'number') return null;
  return check === 'price' ? `${unit ?? 'EUR'}:${required}` : required;
}

function turningOf({ decidesAt, check }: Verdict): Candidate[] {
  if (decidesAt === null) return [];
  const { figure, kind, value } = decidesAt;
  return [{ figure, kind, condition: {}, checks: [check], guess: value, wanted: null, named: true }];
}

/** Of what a check borrows from the class only the part's own figure is a proof. */
function borrowedOf({ check, terms }: Verdict, part: Part): Candidate[] {
  if (!terms.some(({ basis }) => basis === 'borrowed')) return [];
  const lacking = readsOf(check).filter((parameter) => (BORROWABLE as readonly string[]).includes(parameter) && !part.figures.some((one) => one.parameter === parameter));
  return lacking.map((parameter) => ({ ...plain(parameter, check), named: true }));
}

/** What else a check reads of which the part has no printed limit. */
function alsoRead({ check }: Verdict, { figures }: Part): Candidate[] {
  const isLimited = (parameter: Parameter): boolean => figures.some((one) => one.parameter === parameter && one.kind === limitKindOf(parameter) && one.assumed !== true);
  return readsOf(check).filter((parameter) => !isLimited(parameter)).map((parameter) => plain(parameter, check));
}

const plain = (parameter: Parameter, check: string): Candidate => ({ figure: parameter, kind: limitKindOf(parameter), condition: {}, checks: [check], guess: null, wanted: null, named: false });

export function readsOf(check: string): Parameter[] {
  const reads = CHECKS.find(({ id }) => id === check)?.reads ?? [];
  return reads.filter((name): name is Parameter => name in PARAMETERS);
}

/** Checks whose verdict may change with a figure. */
export function readersOf(figure: string): string[] {
  return CHECKS.filter(({ reads }) => reads.includes(figure)).map(({ id }) => id);
}

/** At which supply a new head-room point would be rated: where the part's other points are, or at the lowest of the stage. */
export type Rated = 'known' | 'lowest';

interface Place {
  readonly part: Part;
  readonly demands: Demands;
  readonly rated: Rated;
}

/** The condition a new column would state: head-rooms at the heaviest current of the stage; a limit that did not reach once more over temperature. */
function conditionOf(parameter: Parameter, kind: LimitKind | null, { part, demands, rated }: Place): Condition {
  if (parameter === 'outputLowHeadroom' || parameter === 'outputHighHeadroom') {
    const { vertices } = demands[parameter === 'outputLowHeadroom' ? 'output-low' : 'output-high'];
    return heaviest(vertices, rated === 'lowest' ? null : ratedSupply(part, parameter, demands.operating.nominalSupply));
  }
  const isTaken = part.figures.some((one) => one.parameter === parameter && one.kind === kind && one.assumed !== true);
  return isTaken ? { temperature: 'over' } : {};
}

/** A head-room with no current towards its rail is asked at this load, A: below the lightest point that point holds. */
const LIGHT = 10e-6;

function heaviest(vertices: readonly { readonly current: number; readonly supply: number }[], known: number | null): Condition {
  const current = Math.max(LIGHT, ...vertices.map((vertex) => vertex.current));
  const supply = known ?? Math.min(...vertices.map((vertex) => vertex.supply));
  return { load: { kind: 'current', amperes: upTo(current) }, supply: Number(supply.toPrecision(4)) };
}

/** A datasheet states its points at one supply: the one of those known nearest to the stage's, as a ratio. */
function ratedSupply({ figures }: Part, parameter: Parameter, nominal: number): number | null {
  const supplies = figures.flatMap((one) => (one.parameter === parameter && one.condition.supply !== undefined ? [one.condition.supply] : []));
  const away = (supply: number): number => Math.abs(Math.log(supply / nominal));
  return supplies.reduce<number | null>((best, next) => (best === null || away(next) < away(best) ? next : best), null);
}

/** Two digits, upwards. */
function upTo(value: number): number {
  const size = 10 ** (Math.floor(Math.log10(value)) - 1);
  return Number((Math.ceil(value / size - 1e-9) * size).toPrecision(2));
}
