import type { ChargedLoad, SettlingDemand } from '../demands/index.js';
import { weakest } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { BoundFinding, Finding, Missing, Term } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { leastTime, settlingParts, type Speed } from './settling-time.js';
import { settlingTurn } from './settling-turn.js';

/** Slewing and linear settling of the largest step against the time allowed. */
export const settling: Check<SettlingDemand> = {
  id: 'settling',
  title: 'settling time',
  unit: 's',
  reads: ['slewRate', 'gainBandwidth', 'inputCapacitance', 'outputCurrent', 'outputLowHeadroom', 'outputHighHeadroom'],
  hasMargin: true,
  asks: (demands) => demands.settling,
  judge: judgeSettling,
};

function judgeSettling(asked: SettlingDemand, readings: Readings): Finding {
  const { required, unit, sense } = asked;
  if (asked.step === 0) return { kind: 'numbers', required, unit, sense, offered: 0, basis: 'guaranteed', how: 'the output does not move' };
  const figures = figuresOf(asked, readings);
  const missing = missingOf(asked, figures);
  const turnsAt = settlingTurn(asked, figures);
  if (missing.length > 0) {
    const basis = weakest([figures.rate, figures.bandwidth].map((one) => one?.basis ?? 'guaranteed'));
    const known = leastTime(asked, speedOf(figures));
    return { kind: 'bound', required, unit, sense, known, basis, missing, cause: 'missing-figure', turnsAt: missing.length === 1 ? turnsAt : null } satisfies BoundFinding;
  }
  const parts = settlingParts(asked, speedOf(figures));
  const terms = termsOf(asked, figures, parts);
  if (!Number.isFinite(parts.slewing + parts.linear)) {
    const known = leastTime(asked, speedOf(figures));
    return { kind: 'bound', required, unit, sense, known, basis: weakest(terms.map(({ basis }) => basis)), missing: [], cause: 'beyond-data', cautions: [NEVER] };
  }
  return { kind: 'numbers', required, unit, sense, offered: parts.slewing + parts.linear, basis: weakest(terms.map(({ basis }) => basis)), terms, turnsAt };
}

/** Other checks reject the part for it; there is no time to compare. */
const NEVER = 'it never settles: no current is left for the load capacitance, or the loop is unstable';

/** What of the part decides it. `charging` is null without a capacitive load. */
export interface SettlingFigures {
  readonly rate: Reading | null;
  readonly bandwidth: Reading | null;
  readonly inputCapacitance: Reading | null;
  readonly charging: { readonly load: ChargedLoad; readonly current: Reading | null } | null;
}

function figuresOf(asked: SettlingDemand, readings: Readings): SettlingFigures {
  const { load } = asked;
  return {
    rate: readings.figure('slewRate'),
    bandwidth: readings.figure('gainBandwidth'),
    inputCapacitance: asked.closedLoop.countsInput ? readings.figure('inputCapacitance') : null,
    charging: load === null ? null : { load, current: usableCurrent(load, readings) },
  };
}

/** The usable current of the weaker direction. */
function usableCurrent({ supply }: ChargedLoad, readings: Readings): Reading | null {
  const rated = readings.figure('outputCurrent');
  if (rated !== null) return rated;
  const [low, high] = [readings.currentFromHeadroom('low', supply), readings.currentFromHeadroom('high', supply)];
  if (low === null || high === null) return null;
  return low.value <= high.value ? low : high;
}

function missingOf(asked: SettlingDemand, { rate, bandwidth, charging }: SettlingFigures): Missing[] {
  return [
    ...(rate === null ? [{ figure: 'slewRate', kind: 'min' } as const] : []),
    ...(bandwidth === null ? [{ figure: 'gainBandwidth', kind: 'min' } as const] : []),
    ...(charging !== null && charging.current === null ? [{ figure: 'outputCurrent', kind: 'min' } as const] : []),
  ];
}

/** Slew rate into the load, and the loop; null what is missing. */
function speedOf({ rate, bandwidth, inputCapacitance, charging }: SettlingFigures): Speed {
  const limits = [rate?.value ?? Number.POSITIVE_INFINITY, charged(charging)];
  return { slewRate: Math.min(...limits), loop: bandwidth === null ? null : { gainBandwidth: bandwidth.value, inputCapacitance: inputCapacitance?.value ?? 0 } };
}

/** V/s the current left beside the resistive load gives the capacitance; endless without one, or with a current not known. */
function charged(charging: SettlingFigures['charging']): number {
  if (charging?.current == null) return Number.POSITIVE_INFINITY;
  return Math.max(0, charging.current.value - charging.load.resistiveCurrent) / charging.load.capacitance;
}

function termsOf(asked: SettlingDemand, figures: SettlingFigures, parts: { readonly slewing: number; readonly linear: number }): Term[] {
  const { rate, bandwidth, inputCapacitance, charging } = figures;
  const byCurrent = charging !== null && charged(charging) < (rate?.value ?? Number.POSITIVE_INFINITY);
  const limiting = byCurrent ? charging.current : rate;
  const over = `over ${formatQuantity(asked.step, 'V')}`;
  const into = byCurrent ? `into ${formatQuantity(charging.load.capacitance, 'F')}, ${over}` : over;
  const counted = !asked.closedLoop.countsInput ? [] : [inputCapacitance === null ? 'input capacitance not known and not counted' : `with ${formatQuantity(inputCapacitance.value, 'F')} of its own`];
  const basis = weakest([bandwidth?.basis ?? 'guaranteed', ...(asked.closedLoop.countsInput ? [inputCapacitance?.basis ?? ('assumed' as const)] : [])]);
  return [
    term('slewing', parts.slewing, { reading: limiting, unit: byCurrent ? 'A' : 'V/s', how: [into] }),
    { ...term('linear settling', parts.linear, { reading: bandwidth, unit: 'Hz', how: [`to ${formatQuantity(asked.tolerance * 100, '%')}`, ...counted] }), basis },
  ];
}

function term(name: string, value: number, of: { readonly reading: Reading | null; readonly unit: string; readonly how: readonly string[] }): Term {
  const { reading, unit } = of;
  const printed = reading?.printed ?? reading?.value ?? null;
  const how = [reading?.how ?? null, ...of.how].filter((step) => step !== null).join(', ');
  return { name, value, slot: reading?.slot ?? null, basis: reading?.basis ?? 'guaranteed', figure: printed === null || !Number.isFinite(printed) ? null : { value: printed, unit }, how };
}
