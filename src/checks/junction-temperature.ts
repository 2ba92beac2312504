import type { JunctionDemand } from '../demands/index.js';
import { quiescentPower } from '../formulas/power.js';
import { weakest } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { BoundFinding, Finding, Missing, Term, TurningPoint } from '../verdicts/finding.js';
import type { Check } from './check.js';

/**
 * Ambient plus thermal resistance times the worst dissipation, against the limit of the stage or the part's own, whichever is lower
 * (JEDEC JESD51, 1995). Without a limit of the stage it speaks up only where the part's own figures say that it may get too hot.
 */
export const junctionTemperature: Check<JunctionDemand> = {
  id: 'junction-temperature',
  title: 'junction temperature',
  unit: '°C',
  reads: ['thermalResistance', 'junctionTemperature', 'quiescentCurrent', 'channels'],
  hasMargin: false,
  asks: (demands) => demands['junction-temperature'],
  judge: judgeJunction,
};

/**
 * Share of the rise the part stands below which nobody asks. The two readings of the current differ by less than a factor of two,
 * so a part too hot on the worse one speaks up on both.
 */
const QUIET = 0.5;

function judgeJunction(asked: JunctionDemand, readings: Readings): Finding | null {
  const thermal = readings.figure('thermalResistance');
  const own = readings.figure('junctionTemperature');
  const quiescent = readings.figure('quiescentCurrent');
  if (asked.required === null && (thermal === null || own === null || quiescent === null)) return null;
  const required = Math.min(asked.required ?? Number.POSITIVE_INFINITY, own?.value ?? Number.POSITIVE_INFINITY);
  const common = { required, unit: '°C', sense: asked.sense, corner: { supply: asked.supply, temperature: asked.ambient } } as const;
  const powers = powersOf(asked, quiescent, readings);
  const ambient: Term = { name: 'ambient', value: asked.ambient, slot: null, basis: 'guaranteed', figure: null, how: null };
  if (thermal === null || quiescent === null) {
    const missing = missingOf(thermal, quiescent);
    const terms = thermal === null ? [ambient] : [ambient, ...powers.map((power) => heated(power, thermal, readings.brief))];
    const turnsAt = thermal === null && quiescent !== null ? thermalTurn(required - asked.ambient, powers) : null;
    return { kind: 'bound', ...common, known: sum(terms), basis: weakest(terms.map(({ basis }) => basis)), terms, missing, cause: 'missing-figure', turnsAt } satisfies BoundFinding;
  }
  const terms = [ambient, ...powers.map((power) => heated(power, thermal, readings.brief))];
  if (asked.required === null && sum(terms) - asked.ambient <= QUIET * (required - asked.ambient)) return null;
  return { kind: 'numbers', ...common, offered: sum(terms), basis: weakest(terms.map(({ basis }) => basis)), terms, turnsAt: thermalTurn(required - asked.ambient, powers) };
}

interface Power {
  readonly name: string;
  readonly watts: number;
  readonly basis: Term['basis'];
  readonly how: string | null;
  readonly reading: Reading | null;
}

function powersOf(asked: JunctionDemand, quiescent: Reading | null, { identity }: Readings): Power[] {
  const { channels } = identity;
  const sections = channels === null ? 'channels not known: one section' : channels === 1 ? null : `× ${channels} sections`;
  const all: Power[] = [
    { name: 'output', watts: asked.output, basis: 'guaranteed', how: null, reading: null },
    { name: 'load capacitance', watts: asked.capacitive, basis: 'guaranteed', how: null, reading: null },
  ];
  const flowing = all.filter(({ watts }) => watts > 0);
  if (quiescent === null) return flowing;
  const how = [quiescent.how, sections].filter((step) => step !== null).join(', ');
  const basis = weakest([quiescent.basis, ...(channels === null ? (['assumed'] as const) : [])]);
  return [{ name: 'quiescent current', watts: quiescentPower(asked.supply, quiescent.value, channels ?? 1), basis, how: how === '' ? null : how, reading: quiescent }, ...flowing];
}

function heated({ name, watts, basis, how, reading }: Power, thermal: Reading, brief: boolean): Term {
  const printed = thermal.printed ?? thermal.value;
  const steps = brief ? [] : [thermal.how, `× ${formatQuantity(watts, 'W')}`, how].filter((step) => step !== null);
  const slot = reading !== null && thermal.basis === 'guaranteed' && basis !== 'guaranteed' ? reading.slot : thermal.slot;
  return { name, value: thermal.value * watts, slot, basis: weakest([thermal.basis, basis]), figure: { value: printed, unit: 'K/W' }, how: steps.join(', ') };
}

/** The thermal resistance that would just do. */
function thermalTurn(kelvin: number, powers: readonly Power[]): TurningPoint | null {
  const watts = powers.reduce((total, power) => total + power.watts, 0);
  return watts <= 0 || kelvin <= 0 || !Number.isFinite(kelvin) ? null : { figure: 'thermalResistance', kind: 'max', value: kelvin / watts, unit: 'K/W' };
}

function missingOf(thermal: Reading | null, quiescent: Reading | null): Missing[] {
  return [
    ...(thermal === null ? [{ figure: 'thermalResistance', kind: 'max' } as const] : []),
    ...(quiescent === null ? [{ figure: 'quiescentCurrent', kind: 'max' } as const] : []),
  ];
}

const sum = (terms: readonly Term[]): number => terms.reduce((total, { value }) => total + value, 0);
