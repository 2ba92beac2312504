import type { MovableInput } from '../spec/movable.js';
import type { Stage } from '../stage/index.js';
import type { Changing } from './changing.js';
import { EXACT, writtenValue } from './printed-value.js';

/** One way to move one input: one direction, one end. */
export interface Mover {
  readonly path: string;
  readonly input: MovableInput;
  readonly end: 'value' | 'min' | 'max' | 'words';
  /** SI, °C; 0 of words. */
  readonly from: number;
  readonly direction: 'up' | 'down';
  /** As far as it makes sense. */
  readonly most: number;
  /** Checks it can change; null: any. */
  readonly touches: readonly string[] | null;
  /** What it means for the circuit, where it is not a limit that moves. */
  readonly design?: string;
}

interface Limit {
  readonly direction: 'up' | 'down';
  readonly touches: readonly string[];
  /** Beyond this the limit says nothing any more. */
  readonly most?: (stage: Stage) => number;
}

const spanOf = ({ outputNominal: { min, max } }: Stage): number => max - min;

/** An error as large as a share of the signal is none to allow. */
const HALF = 0.5;
/** A loop with less rings heavily (common practice), °. */
const LEAST_MARGIN = 30;
/** −20 dB: more is no amplifier. */
const MOST_DISTORTION = 0.1;

/** Limits and wishes: which way they give, and which checks ask for them. */
const LIMITS: Readonly<Record<string, Limit>> = {
  'limits.swingLoss': { direction: 'up', touches: ['output-low', 'output-high'], most: (stage) => HALF * spanOf(stage) },
  'limits.gainError': { direction: 'up', touches: ['gain-bandwidth'], most: () => HALF },
  'limits.dcError': { direction: 'up', touches: ['dc-error'], most: (stage) => (spanOf(stage) > 0 ? HALF * spanOf(stage) : Number.POSITIVE_INFINITY) },
  'limits.outputNoise': { direction: 'up', touches: ['noise'], most: (stage) => (spanOf(stage) > 0 ? HALF * spanOf(stage) : Number.POSITIVE_INFINITY) },
  'limits.snr': { direction: 'down', touches: ['noise'], most: () => 1.01 },
  'limits.distortion': { direction: 'up', touches: ['distortion'], most: () => MOST_DISTORTION },
  'limits.supplyCurrent': { direction: 'up', touches: ['supply-current'] },
  'limits.settling.within': { direction: 'up', touches: ['settling', 'gain-bandwidth'] },
  'limits.settling.to': { direction: 'up', touches: ['settling', 'gain-bandwidth'], most: () => HALF },
  'limits.supplyRipple': { direction: 'up', touches: ['supply-ripple'], most: (stage) => (spanOf(stage) > 0 ? HALF * spanOf(stage) : Number.POSITIVE_INFINITY) },
  'limits.startUp': { direction: 'up', touches: ['start-up'] },
  'limits.phaseMargin': { direction: 'down', touches: ['phase-margin'], most: () => LEAST_MARGIN },
  'limits.junctionTemperature': { direction: 'up', touches: ['junction-temperature'] },
  'limits.frequencyError': { direction: 'up', touches: ['frequency-error'], most: () => HALF },
  'wishes.price': { direction: 'up', touches: ['price'] },
  'margins.slewRate': { direction: 'down', touches: ['slew-rate'] },
  'margins.gainBandwidth': { direction: 'down', touches: ['gain-bandwidth'] },
  'margins.outputHeadroom': { direction: 'down', touches: ['output-low', 'output-high'], most: () => 0 },
};

/** Words: the check that asks for them. */
export const WORD_CHECKS: Readonly<Record<string, string>> = {
  'wishes.package': 'package',
  'wishes.qualification': 'qualification',
  'wishes.status': 'status',
  'wishes.lifecycle': 'lifecycle',
};

/** What gives way when the stage does not say: budgets, price and package; never what the circuit must do or what has been approved. */
const USUAL = ['limits', 'wishes.price', 'wishes.package'];

/** Inputs that may move, by `mayChange` or the usual ones. */
export function movable({ inputs, mayChange }: Changing): MovableInput[] {
  const named = mayChange ?? USUAL;
  return inputs.filter(({ path }) => named.some((one) => isUnder(path, one)));
}

/** What mayChange names and no input answers to. */
export function untried({ inputs, mayChange }: Changing): string[] {
  return (mayChange ?? []).filter((named) => !inputs.some(({ path }) => isUnder(path, named) || isUnder(named, path)));
}

/** `supply.min` is named by `supply`; a map by what it holds. */
const isUnder = (path: string, ancestor: string): boolean => path === ancestor || path.startsWith(`${ancestor}.`);

/** Every way to move every input that may move. */
export function moversOf(changing: Changing, stage: Stage): Mover[] {
  return movable(changing).flatMap((input) => moversFor(input, stage));
}

function moversFor(input: MovableInput, stage: Stage): Mover[] {
  const { path } = input;
  if (input.form === 'words') return [{ path, input, end: 'words', from: 0, direction: 'up', most: 0, touches: [WORD_CHECKS[path] ?? ''] }];
  if (input.form === 'range') return [endMover(input, 'min'), endMover(input, 'max')];
  const limit = limitMover(input, stage);
  return limit === null ? [valueMover(input, 'up'), valueMover(input, 'down')] : [limit];
}

/** A limit moves one way; null of what is no limit. */
export function limitMover(input: MovableInput, stage: Stage): Mover | null {
  const limit = LIMITS[input.path];
  if (limit === undefined || input.form !== 'value') return null;
  const { direction, touches } = limit;
  const free = direction === 'up' ? Number.POSITIVE_INFINITY : 0;
  return { path: input.path, input, end: 'value', from: input.value, direction, touches, most: limit.most?.(stage) ?? free };
}

/** A hundredth or a hundred times: beyond that it is another stage. */
const FARTHEST = 100;

export function valueMover(input: MovableInput & { readonly form: 'value' }, direction: 'up' | 'down'): Mover {
  const { path, value } = input;
  return { path, input, end: 'value', from: value, direction, touches: null, most: direction === 'up' ? value * FARTHEST : value / FARTHEST };
}

/** Ends move inwards, up to where nearly nothing is left between them. */
const LEFT = 0.02;

export function endMover(input: MovableInput & { readonly form: 'range' }, end: 'min' | 'max'): Mover {
  const { path, min, max } = input;
  const move = (1 - LEFT) * (max - min);
  return end === 'min'
    ? { path, input, end, from: min, direction: 'up', touches: null, most: min + move }
    : { path, input, end, from: max, direction: 'down', touches: null, most: max - move };
}

/** The field with this value, rounded away from where it stood to so many digits. */
export function textAt({ input, end, direction }: Mover, value: number, digits: number): string {
  if (input.form === 'words') return '';
  const print = (figure: number, count: number): string => writtenValue(figure, input.unit, { digits: count, round: count === EXACT ? 'nearest' : direction });
  if (input.form === 'value') return `${input.before ?? ''}${print(value, digits)}`;
  return end === 'min' ? `${print(value, digits)}..${print(input.max, EXACT)}` : `${print(input.min, EXACT)}..${print(value, digits)}`;
}

/** A temperature has no ratio: so many kelvin count as twice (common practice: reaction and leakage rates double in about half of that). */
const KELVIN = 20;

/** How far the field moves, new to old, never below 1. A swing that is given up counts as its share of the span. */
export function factorOf({ path, input, from }: Mover, value: number, stage: Stage): number {
  if (input.form === 'words') return 1;
  if (input.unit === '°C') return 2 ** (Math.abs(value - from) / KELVIN);
  if (path === 'limits.swingLoss' || path === 'margins.outputHeadroom') return 1 + Math.abs(value - from) / spanOf(stage);
  if (input.form === 'range' && path !== 'supply') return (input.max - input.min) / (input.max - input.min - Math.abs(value - from));
  return from > 0 && value > 0 ? Math.max(value / from, from / value) : Number.POSITIVE_INFINITY;
}
