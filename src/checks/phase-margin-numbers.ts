import type { PhaseMarginDemand } from '../demands/index.js';
import { BASES, weaknessOf } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import { BriefNumbers } from '../verdicts/brief-finding.js';
import { meets } from '../verdicts/compare.js';
import type { NumberFinding } from '../verdicts/finding.js';
import { numberAt, STANDS, writeReading, type InNumbers, type NumbersOf, type Row } from './in-numbers.js';
import { decidesByLoad, isLoadEnough, loadAtGain } from './phase-margin-capacitive-load.js';
import { needsInputCapacitance, ownPoleOf, type PhaseMarginFound } from './phase-margin-figures.js';
import { isMarginLeft, leastMargin, sideOfMargin, worstMargin, type Ends, type LoadedOutput, type Loop } from './phase-margin-loop.js';

/** Where the numbers stand in a row: Hz, degrees, F, Ω and F at the noise gain of the stage (not a number: not known), each with the weakness of its basis behind it. */
const AT = { least: 0, most: 1, printed: 2, speedWeakness: 3, angle: 4, angleWeakness: 5, crossover: 6, input: 8, inputWeakness: 9, resistance: 10, resistanceWeakness: 11, load: 12, loadWeakness: 13 } as const;

type Asked = PhaseMarginDemand;

const READING: NumbersOf<Asked, Reading | null> = { width: 2, write: (_, reading, to) => writeReading(reading, to) };
const NOTHING = { width: 0, write: () => undefined } as const;

/** The phase margin in numbers, where gain bandwidth and output resistance are known as far as they count. */
export const MARGIN_NUMBERS: InNumbers<Asked, PhaseMarginFound> = {
  terms: {
    speed: {
      width: 4,
      write(_, speed, { row, at }) {
        row[at] = speed?.ends?.least ?? NaN;
        row[at + 1] = speed?.ends?.most ?? NaN;
        row[at + 2] = speed?.printed ?? NaN;
        row[at + 3] = weaknessOf(speed?.basis ?? 'guaranteed');
      },
    },
    angle: READING,
    unityCrossover: READING,
    inputCapacitance: READING,
    outputResistance: READING,
    capacitiveLoad: {
      width: 2,
      write(asked, reading, { row, at }) {
        row[at] = reading === null ? NaN : loadAtGain(asked, reading);
        row[at + 1] = weaknessOf(reading?.basis ?? 'guaranteed');
      },
    },
    // For remedies alone.
    stableGain: NOTHING,
  },
  finding(asked, row) {
    const numbers = loopIn(asked, row);
    return numbers === null ? null : marginFinding(asked, numbers, worstMargin(numbers.loop, numbers.ends).margin);
  },
  stands(asked, row) {
    const numbers = loopIn(asked, row);
    if (numbers === null) return standsUnloaded(asked, row);
    const offered = sideOfMargin(numbers.loop, numbers.ends, asked.required);
    return meets(asked.required, offered, asked.sense) ? STANDS.passes + weaknessIn(asked, numbers, offered) : STANDS.fails;
  },
};

/** With a load behind nobody knows what, what is left without it is a bound: enough of it leaves the part open, unless the load the maker states is enough. */
function standsUnloaded(asked: Asked, row: Row): number {
  const ends = { least: numberAt(row, AT.least), most: numberAt(row, AT.most) };
  const load = numberAt(row, AT.load);
  if (Number.isNaN(ends.most) || load === Infinity) return STANDS.untold;
  const [needsInput, input] = [needsInputCapacitance(asked), inputIn(asked, row)];
  const figured = { ownPole: ownPoleIn(row), inputCapacitance: Number.isNaN(input) ? 0 : input, outputResistance: 0 };
  const { required, sense } = asked;
  if (!meets(required, sideOfMargin(loopOf(asked, figured), ends, required), sense)) return STANDS.fails;
  if (Number.isNaN(load) || !decidesByLoad(asked)) return STANDS.open;
  // The maker's limit contains the part's own excess phase.
  const bare = loopOf(asked, { ...figured, ownPole: Infinity });
  const isEnough = isLoadEnough(asked, load, leastMargin(bare, ends)) || isLoadEnough(asked, load, worstMargin(bare, ends).margin);
  if (!isEnough) return STANDS.open;
  const ofInput = !needsInput ? 0 : !Number.isNaN(input) ? numberAt(row, AT.inputWeakness) : isInputAssumed({ loop: bare, ends, required }) ? ASSUMED : 0;
  return STANDS.passes + Math.max(numberAt(row, AT.loadWeakness), ofInput);
}

/** F; not a number: not known, or of no account. */
const inputIn = (asked: Asked, row: Row): number => (needsInputCapacitance(asked) ? numberAt(row, AT.input) : NaN);

const ownPoleIn = (row: Row): number => ownPoleOf({ angle: numberAt(row, AT.angle), crossover: numberAt(row, AT.crossover), gainBandwidth: numberAt(row, AT.printed) });

/** All that decides about a loop, in numbers. */
export interface LoopNumbers {
  readonly loop: Loop;
  readonly ends: Ends;
  /** Of gain bandwidth, excess phase and, where there is a load, output resistance. */
  readonly weakness: number;
  readonly needsInput: boolean;
  /** Not a number: the capacitance is not known. */
  readonly inputWeakness: number;
}

/** Null: no loop, or one whose load stands behind nobody knows what. */
function loopIn(asked: Asked, row: Row): LoopNumbers | null {
  const [least, most] = [numberAt(row, AT.least), numberAt(row, AT.most)];
  const isLoaded = asked.load.capacitance > 0;
  const outputResistance = isLoaded ? numberAt(row, AT.resistance) : 0;
  if (Number.isNaN(most) || Number.isNaN(outputResistance)) return null;
  const [needsInput, input] = [needsInputCapacitance(asked), inputIn(asked, row)];
  const angle = numberAt(row, AT.angle);
  const ofAngle = Number.isNaN(angle) ? ASSUMED : angle >= 90 || !Number.isNaN(numberAt(row, AT.crossover)) ? numberAt(row, AT.angleWeakness) : ESTIMATED;
  return {
    loop: loopOf(asked, { ownPole: ownPoleIn(row), inputCapacitance: Number.isNaN(input) ? 0 : input, outputResistance }),
    ends: { least, most },
    weakness: Math.max(numberAt(row, AT.speedWeakness), ofAngle, outputResistance === 0 ? 0 : numberAt(row, AT.resistanceWeakness)),
    needsInput,
    inputWeakness: Number.isNaN(input) ? NaN : numberAt(row, AT.inputWeakness),
  };
}

interface LoopFigured {
  readonly ownPole: number;
  readonly inputCapacitance: number;
  /** Ω; 0: nothing to load, or not to be counted. */
  readonly outputResistance: number;
}

/** The loop of a stage with one part. */
export function loopOf({ network, open, load }: Pick<PhaseMarginDemand, 'network' | 'open' | 'load'>, { ownPole, inputCapacitance, outputResistance }: LoopFigured): Loop {
  return { network, open, inputCapacitance, ownPole, load: outputResistance === 0 ? null : behind(outputResistance, load) };
}

/** Member by member: a spread takes the engine longer than the rest of the loop, and there is one for every part. */
function behind(outputResistance: number, { capacitance, resistance, isolation }: PhaseMarginDemand['load']): LoadedOutput {
  return { outputResistance, capacitance, resistance, isolation };
}

/** What decides. What the input rests on counts in a pass alone, and where it can weaken that any further. */
export function marginFinding(asked: Asked, numbers: LoopNumbers, offered: number): NumberFinding {
  return new BriefNumbers(asked, BASES[weaknessIn(asked, numbers, offered)] ?? 'assumed', { offered, borrowed: 0 });
}

function weaknessIn({ required, sense }: Asked, { loop, ends, weakness, needsInput, inputWeakness }: LoopNumbers, offered: number): number {
  if (!needsInput || !meets(required, offered, sense)) return weakness;
  if (!Number.isNaN(inputWeakness)) return Math.max(weakness, inputWeakness);
  return weakness < ASSUMED && isInputAssumed({ loop, ends, required }) ? ASSUMED : weakness;
}

/** No input has more than this (common practice, from memory), F. */
const MOST_INPUT = 30e-12;

/** The capacitance of an input that is not known makes no pole here: an assumption, unless the margin would hold with the most an input has. */
export function isInputAssumed({ loop: { network, open, inputCapacitance, ownPole, load }, ends, required }: { readonly loop: Loop; readonly ends: Ends; readonly required: number }): boolean {
  return !isMarginLeft({ network, open, inputCapacitance, stray: MOST_INPUT, ownPole, load }, ends, required);
}

const [ESTIMATED, ASSUMED] = [weaknessOf('estimated'), weaknessOf('assumed')];
