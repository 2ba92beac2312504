import type { PhaseMarginDemand } from '../demands/index.js';
import { weakest, weaknessOf, type Basis } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { Spread } from '../parts/spread.js';
import { formatQuantity } from '../quantities/format.js';
import { meets } from '../verdicts/compare.js';
import type { Finding, Term, UndecidedFinding } from '../verdicts/finding.js';
import { composed, type Known, type Unlimited } from './check.js';
import { byCapacitiveLoad } from './phase-margin-capacitive-load.js';
import { LOOP_TERMS, loopFigures, type LoopFigures, type PhaseMarginFound } from './phase-margin-figures.js';
import { phaseParts, worstMargin, type Ends, type Loop, type Margin } from './phase-margin-loop.js';
import { isInputAssumed, loopOf, marginFinding, MARGIN_NUMBERS } from './phase-margin-numbers.js';
import { phaseMarginRemedies } from './phase-margin-remedies.js';
import { turningResistance, unknownInput } from './phase-margin-turns.js';

/** Phase margin at the true crossover, with the load behind the output resistance and the capacitance of the part's input. */
export const phaseMargin = composed<PhaseMarginDemand, PhaseMarginFound, PartLoop>({
  id: 'phase-margin',
  title: 'phase margin',
  unit: '°',
  reads: ['gainBandwidth', 'phaseMargin', 'unityCrossover', 'outputResistance', 'capacitiveLoad', 'inputCapacitance', 'minimumStableGain'],
  hasMargin: true,
  asks: (demands) => demands['phase-margin'],
  terms: { ...LOOP_TERMS, stableGain: (_, readings) => readings.figure('minimumStableGain') },
  whole: partLoop,
  finding: againstLimit,
  inNumbers: MARGIN_NUMBERS,
});

/** The loop of this stage with one part, whatever margin is asked. */
interface PartLoop {
  readonly figures: LoopFigures;
  /** Null: gain bandwidth or load are not known well enough. */
  readonly closed: ClosedLoop | null;
  readonly isUnityStable: () => boolean;
}

interface ClosedLoop {
  readonly speed: Spread;
  readonly ends: Ends;
  readonly loop: Loop;
  readonly worst: Margin;
}

function partLoop(asked: Unlimited<PhaseMarginDemand>, found: Known<PhaseMarginFound>, told: Told): PartLoop {
  const figures = loopFigures(asked, found, told);
  return { figures, closed: closedLoop(asked, figures), isUnityStable: () => (found.stableGain()?.value ?? 1) <= 1 };
}

function closedLoop(asked: Unlimited<PhaseMarginDemand>, figures: LoopFigures): ClosedLoop | null {
  const { speed, outputResistance } = figures;
  const ends = speed?.ends ?? null;
  const isLoaded = asked.load.capacitance > 0;
  if (speed === null || ends === null || (isLoaded && outputResistance === null)) return null;
  const loop = loopFigured(asked, figures, isLoaded ? (outputResistance?.value ?? 0) : 0);
  return { speed, ends, loop, worst: worstMargin(loop, ends) };
}

function againstLimit(asked: PhaseMarginDemand, part: PartLoop, told: Told): Finding {
  const { figures: { speed }, closed } = part;
  if (closed !== null) return measured({ asked, part, closed }, told);
  if (speed === null) return withoutSpeed(asked, part.figures, told);
  if (speed.ends === null) return whateverSuits(asked, speed);
  return withoutOutputResistance({ asked, figures: part.figures, ends: speed.ends }, told);
}

type Told = Pick<Readings, 'brief'>;

/** The loop of this stage with this part; output resistance 0: nothing to load, or not to be counted. */
function loopFigured(asked: Unlimited<PhaseMarginDemand>, { own, inputCapacitance }: LoopFigures, outputResistance: number): Loop {
  return loopOf(asked, { ownPole: own.hertz, inputCapacitance: inputCapacitance?.value ?? 0, outputResistance });
}

interface Measured {
  readonly asked: PhaseMarginDemand;
  readonly part: PartLoop;
  readonly closed: ClosedLoop;
}

function measured(of: Measured, { brief }: Told): Finding {
  const { asked, part: { figures, isUnityStable }, closed: { speed, ends, loop, worst } } = of;
  const { required, sense } = asked;
  const known = weakest([speed.basis, figures.own.basis, ...(loop.load === null ? [] : basisOf(figures.outputResistance))]);
  const { needsInput, inputCapacitance } = figures;
  const decided = marginFinding(asked, { loop, ends, weakness: weaknessOf(known), needsInput, inputWeakness: inputCapacitance === null ? NaN : weaknessOf(inputCapacitance.basis) }, worst.margin);
  if (brief) return decided;
  const passes = meets(required, worst.margin, sense);
  const input = inputBasis(figures, { loop, ends, required });
  return {
    ...decided, basis: weakest([known, ...input]), slot: speed.slot,
    how: `at a gain bandwidth of ${formatQuantity(worst.gainBandwidth, 'Hz')}`,
    terms: termsOf(of, input),
    cautions: passes && input.includes('assumed') && figures.inputCapacitance === null ? unknownInput(loop, ends, required) : [],
    remedies: passes ? [] : phaseMarginRemedies({ asked, loop, ends }, isUnityStable()),
  };
}

const basisOf = (reading: Reading | null): Basis[] => (reading === null ? [] : [reading.basis]);

interface At {
  readonly loop: Loop;
  readonly ends: Ends;
  readonly required: number;
}

/** What the input rests on. */
function inputBasis({ needsInput, inputCapacitance }: LoopFigures, at: At): Basis[] {
  if (!needsInput) return [];
  if (inputCapacitance !== null) return [inputCapacitance.basis];
  return isInputAssumed(at) ? ['assumed'] : [];
}

/** Where the phase goes, degrees: the terms add up to the margin. */
function termsOf({ part: { figures }, closed: { speed, loop, worst } }: Measured, inputBases: readonly Basis[]): Term[] {
  const parts = phaseParts(loop, worst.gainBandwidth);
  if (parts === null) return [];
  const { own, inputCapacitance, needsInput, outputResistance } = figures;
  const crossover = `crossover at ${formatQuantity(parts.crossover, 'Hz')}`;
  const term = (name: string, value: number, from: Pick<Term, 'slot' | 'basis' | 'how'>): Term => ({ name, value, figure: null, slot: from.slot, basis: from.basis, how: from.how });
  const input = inputCapacitance === null ? (needsInput ? 'input capacitance not known, not counted' : null) : `with an input of ${formatQuantity(inputCapacitance.value, 'F')}`;
  return [
    term('one-pole amplifier', 90, { slot: speed.slot, basis: speed.basis, how: [speed.how, crossover].filter((step) => step !== null).join(', ') }),
    ...(needsInput ? [term('feedback network', parts.feedback, { slot: inputCapacitance?.slot ?? null, basis: inputCapacitance?.basis ?? inputBases[0] ?? 'guaranteed', how: input })] : []),
    ...(loop.load === null || outputResistance === null ? [] : [term('load behind the output resistance', parts.load, outputResistance)]),
    term('excess phase of the part', parts.own, own),
  ];
}

/** An assumed gain bandwidth at its best: as good as can be, so that it never fails the check. */
function whateverSuits({ required, unit, sense }: PhaseMarginDemand, { basis, slot, how }: Spread): Finding {
  return { kind: 'numbers', required, unit, sense, offered: Infinity, basis, slot, how };
}

function withoutSpeed(asked: PhaseMarginDemand, figures: LoopFigures, { brief }: Told): Finding {
  const { load, required, unit, sense } = asked;
  // With nothing but the load in the loop the maker's limit needs no gain bandwidth.
  const stated = load.capacitance > 0 && !figures.needsInput && figures.outputResistance === null ? byCapacitiveLoad(asked, figures.capacitiveLoad, { margin: 90, basis: 'guaranteed', brief }) : null;
  return stated ?? ({ kind: 'undecided', required, unit, sense, cause: 'missing-figure', missing: [{ figure: 'gainBandwidth', kind: 'min' }] } satisfies UndecidedFinding);
}

interface WithoutResistance {
  readonly asked: PhaseMarginDemand;
  readonly figures: LoopFigures;
  readonly ends: Ends;
}

/** The load pole has no figure: the maker's capacitive load decides, else only what is left without that pole is known. */
function withoutOutputResistance({ asked, figures, ends }: WithoutResistance, { brief }: Told): Finding {
  const unloaded = loopFigured(asked, figures, 0);
  const known = worstMargin(unloaded, ends).margin;
  const { required, unit, sense } = asked;
  const bare = { ...unloaded, ownPole: Infinity };
  const basis = weakest([figures.own.basis, ...inputBasis(figures, { loop: unloaded, ends, required })]);
  const without = { margin: worstMargin(bare, ends).margin, basis: weakest(inputBasis(figures, { loop: bare, ends, required })) };
  const stated = meets(required, known, sense) ? byCapacitiveLoad(asked, figures.capacitiveLoad, { ...without, brief }) : null;
  if (stated !== null) return stated;
  const missing = [{ figure: 'outputResistance', kind: 'typ' }] as const;
  const bound = { kind: 'bound', required, unit, sense, known, basis, missing, cause: 'missing-figure' } as const;
  if (brief) return bound;
  return { ...bound, turnsAt: turningResistance({ ...unloaded, load: { ...asked.load, outputResistance: 0 } }, ends, required), cautions: notEnough(asked, figures) };
}

function notEnough({ load }: PhaseMarginDemand, { capacitiveLoad }: LoopFigures): string[] {
  // An assumed one is as good as can be on the best reading: no number to print.
  if (capacitiveLoad === null || !Number.isFinite(capacitiveLoad.value)) return [];
  return [`the stated capacitive load of ${formatQuantity(capacitiveLoad.value, 'F')} does not settle ${formatQuantity(load.capacitance, 'F')} here`];
}
