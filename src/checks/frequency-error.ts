import type { FrequencyErrorDemand, OscillatorEnd } from '../demands/index.js';
import { slewedOscillation } from '../formulas/oscillator-edges.js';
import { oscillatorDifferentialInput, oscillatorPeriod, oscillatorThresholds, type RelaxationOscillator } from '../formulas/oscillator.js';
import { weakest } from '../parts/basis.js';
import type { HeadroomReading } from '../parts/headroom-curve.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatPercent, formatQuantity } from '../quantities/format.js';
import { meets } from '../verdicts/compare.js';
import type { BoundFinding, Missing, NumberFinding, Term, VertexFindings } from '../verdicts/finding.js';
import type { Check } from './check.js';

/** How far levels short of the rails and edges of the output move the frequency of an oscillator, against its limit (M1). */
export const frequencyError: Check<FrequencyErrorDemand> = {
  id: 'frequency-error',
  title: 'frequency error',
  unit: '1',
  reads: ['outputLowHeadroom', 'outputHighHeadroom', 'slewRate', 'inputClamp'],
  hasMargin: true,
  asks: (demands) => demands['frequency-error'],
  judge: (asked, readings): VertexFindings => ({ kind: 'vertices', findings: asked.ends.map((end) => clampedAt(findingAt(asked, end, readings), differentialInput(asked), readings)) }),
};

/** From here on diodes between the inputs conduct, V (common practice). */
const CLAMP = 0.7;

/** Furthest apart the inputs come, V: at the highest supply, with an output that reaches both rails. */
function differentialInput({ ends, toSupply, toGround, toOutput }: FrequencyErrorDemand): number {
  const supply = Math.max(...ends.map((end) => end.supply));
  return oscillatorDifferentialInput({ supply, high: supply, low: 0, toSupply, toGround, toOutput });
}

/** Conducting diodes between the inputs take charge from the capacitor and pull at the thresholds: what the frequency is then, no figure says. */
function clampedAt(finding: NumberFinding | BoundFinding, apart: number, { identity }: Readings): NumberFinding | BoundFinding {
  if (identity.inputClamp === false || apart <= CLAMP * (1 + 1e-9)) return finding;
  const differential = `differential input ${formatQuantity(apart, 'V', { digits: 3 })}`;
  const said = (caution: string) => [caution, ...(finding.cautions ?? [])];
  if (identity.inputClamp === null) {
    return { ...finding, cautions: said(`${differential}: whether diodes join the inputs is not known; from about ${CLAMP} V they would shift the frequency`) };
  }
  const cautions = said(`${differential}, clamp from about ${CLAMP} V: the diodes between the inputs conduct at every switching, and the frequency is not that of the components`);
  if (finding.kind === 'bound' || !meets(finding.required, finding.offered, finding.sense)) return { ...finding, cautions };
  const { required, unit, sense, basis, corner } = finding;
  return { kind: 'bound', required, unit, sense, basis, ...(corner === undefined ? {} : { corner }), known: 0, missing: [], cause: 'beyond-data', cautions };
}

interface Levels {
  readonly low: HeadroomReading;
  readonly high: HeadroomReading;
  readonly rate: Reading | null;
}

function findingAt(asked: FrequencyErrorDemand, end: OscillatorEnd, readings: Readings): NumberFinding | BoundFinding {
  const at = (current: number) => ({ supply: end.supply, current, assistingLoad: null });
  const levels = { low: readings.headroom('low')(at(end.sunk)), high: readings.headroom('high')(at(end.sourced)), rate: readings.figure('slewRate') };
  const { required, unit, sense } = asked;
  const basis = weakest([levels.low.basis, levels.high.basis, levels.rate?.basis ?? 'guaranteed']);
  const common = { required, unit, sense, basis, corner: { supply: end.supply } };
  const missing = missingOf(levels);
  if (levels.low.value === null || levels.high.value === null || levels.rate === null) {
    return { kind: 'bound', ...common, known: 0, missing, cause: 'missing-figure' };
  }
  return errorOf(asked, { supply: end.supply, low: levels.low.value, high: levels.high.value, levels, rate: levels.rate }, common);
}

interface Known {
  readonly supply: number;
  /** Head-rooms, V. */
  readonly low: number;
  readonly high: number;
  readonly levels: Levels;
  readonly rate: Reading;
}

type Common = Pick<NumberFinding, 'required' | 'unit' | 'sense' | 'basis' | 'corner'>;

/**
 * Against the same components with an output that reaches both rails at once. A head-room is somewhere between none and its limit, and
 * the two effects may partly cancel: each is taken at its worst, edges over the whole swing, and their magnitudes are added.
 */
function errorOf(asked: FrequencyErrorDemand, known: Known, common: Common): NumberFinding | BoundFinding {
  const { supply, rate } = known;
  const { toSupply, toGround, toOutput, timeConstant } = asked;
  const stage = { supply, high: supply - known.high, low: known.low, toSupply, toGround, toOutput };
  const ideal = oscillatorPeriod({ ...stage, high: supply, low: 0 }, timeConstant).frequency;
  if (!oscillates(stage)) return { kind: 'numbers', ...common, offered: 1, how: STOPPED, cautions: [STOPPED] };
  const slewed = Number.isFinite(rate.value) ? slewedOscillation(stage, timeConstant, rate.value) : oscillatorPeriod(stage, timeConstant);
  if (slewed === null) return { kind: 'bound', ...common, known: 0, missing: [], cause: 'beyond-data', cautions: [TOO_SLOW] };
  const railed = { ...stage, high: supply, low: 0 };
  const edged = Number.isFinite(rate.value) ? slewedOscillation(railed, timeConstant, rate.value) : oscillatorPeriod(railed, timeConstant);
  if (edged === null) return { kind: 'bound', ...common, known: 0, missing: [], cause: 'beyond-data', cautions: [TOO_SLOW] };
  const byLevels = Math.abs(oscillatorPeriod(stage, timeConstant).frequency / ideal - 1);
  const byEdges = Math.abs(edged.frequency / ideal - 1);
  const how = `${formatQuantity(slewed.frequency, 'Hz', { digits: 4 })} with a duty of ${formatPercent(slewed.duty)}`;
  return { kind: 'numbers', ...common, offered: byLevels + byEdges, how, terms: termsOf(known, { byLevels, byEdges }), cautions: [RECOVERY] };
}

/** The error is the whole of the frequency then. */
const STOPPED = 'its output does not reach beyond both thresholds: it does not oscillate';
const TOO_SLOW = 'the edges take so long that the capacitor turns round within them: the slew rate sets the frequency, see slew rate';
/** Most amplifiers say nothing of it. */
const RECOVERY = 'the time the output needs to leave the rail is in no list and not counted';

function oscillates(stage: RelaxationOscillator): boolean {
  const { upper, lower } = oscillatorThresholds(stage);
  return stage.high > upper && stage.low < lower && stage.high > stage.low;
}

function termsOf({ low, high, levels, rate }: Known, shares: { readonly byLevels: number; readonly byEdges: number }): Term[] {
  const heavier = high >= low ? levels.high : levels.low;
  const volts = (value: number): string => formatQuantity(value, 'V');
  const figure = rate.printed === null ? null : { value: rate.printed, unit: 'V/s' };
  const levelsHow = [heavier.how, `${volts(low)} above ground, ${volts(high)} below the supply`].filter((step) => step !== null).join(', ');
  return [
    { name: 'levels', value: shares.byLevels, slot: heavier.slot, basis: weakest([levels.low.basis, levels.high.basis]), figure: null, how: levelsHow },
    { name: 'edges', value: shares.byEdges, slot: rate.slot, basis: rate.basis, figure, how: rate.how },
  ];
}

function missingOf({ low, high, rate }: Levels): Missing[] {
  return [
    ...(low.value === null ? [{ figure: 'outputLowHeadroom', kind: 'max' } as const] : []),
    ...(high.value === null ? [{ figure: 'outputHighHeadroom', kind: 'max' } as const] : []),
    ...(rate === null ? [{ figure: 'slewRate', kind: 'min' } as const] : []),
  ];
}
