import type { OverdriveDemand } from '../demands/index.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { Finding, Missing, TurningPoint } from '../verdicts/finding.js';
import type { Check } from './check.js';

/** An input taken beyond a rail against the voltage it endures there, or the current through the resistance in series (M9). */
export const overdrive: Check<OverdriveDemand> = {
  id: 'overdrive',
  title: 'overdrive',
  unit: 'V',
  reads: ['inputOverdrive', 'overdriveCurrent'],
  hasMargin: false,
  asks: ({ overdrive: asked }) => (asked.avoided ? asked : null),
  judge: judgeOverdrive,
};

/** Undecided where the stage does not say how far an input goes; also asked for cautions. */
export function judgeOverdrive(asked: OverdriveDemand, readings: Readings): Finding {
  const { required, unit, sense, reach } = asked;
  if (required === null) return { kind: 'undecided', required, unit, sense, cause: 'not-said', missing: [], cautions: [UNSAID] };
  const common = { kind: 'numbers', required, unit, sense } as const;
  if (required === 0) return { ...common, offered: 0, basis: 'guaranteed', how: 'by the stage no input leaves the rails' };
  const [volts, amperes] = [readings.figure('inputOverdrive'), reach.series > 0 ? readings.figure('overdriveCurrent') : null];
  const best = larger(ofVoltage(volts), ofCurrent(amperes, reach.series));
  const unknown = missingOf({ volts, amperes }, reach.series);
  if (unknown.length > 0 && (best === null || best.offered < required)) {
    return { kind: 'undecided', required, unit, sense, cause: 'missing-figure', missing: unknown, turnsAt: turnOf(asked, unknown) };
  }
  return best === null ? { kind: 'undecided', required, unit, sense, cause: 'missing-figure', missing: unknown } : { ...common, ...best };
}

const UNSAID = 'write overdrive (how far an input goes beyond a rail), or sequencing';

interface Endures extends Pick<Reading, 'basis' | 'slot' | 'how'> {
  readonly offered: number;
}

function ofVoltage(volts: Reading | null): Endures | null {
  return volts === null ? null : { offered: volts.value, basis: volts.basis, slot: volts.slot, how: volts.how };
}

/** The whole overdrive across the resistance: what the diode in the part takes off is left out. */
function ofCurrent(amperes: Reading | null, series: number): Endures | null {
  if (amperes === null) return null;
  // An assumed value is as good as can be on the best reading: no number to print.
  const current = Number.isFinite(amperes.value) ? formatQuantity(amperes.value, 'A') : 'an assumed current';
  const how = `${current} through ${formatQuantity(series, 'Ω')}`;
  return { offered: amperes.value * series, basis: amperes.basis, slot: amperes.slot, how };
}

function larger(a: Endures | null, b: Endures | null): Endures | null {
  if (a === null || b === null) return a ?? b;
  return b.offered > a.offered ? b : a;
}

function missingOf({ volts, amperes }: { readonly volts: Reading | null; readonly amperes: Reading | null }, series: number): Missing[] {
  return [
    ...(volts === null ? [{ figure: 'inputOverdrive', kind: 'max' } as const] : []),
    ...(amperes === null && series > 0 ? [{ figure: 'overdriveCurrent', kind: 'max' } as const] : []),
  ];
}

/** Where one figure alone would settle it. */
function turnOf({ required, reach }: OverdriveDemand, unknown: readonly Missing[]): TurningPoint | null {
  const [only] = unknown;
  if (required === null || only === undefined || unknown.length > 1) return null;
  if (only.figure === 'inputOverdrive') return { figure: 'inputOverdrive', kind: 'max', value: required, unit: 'V' };
  return { figure: 'overdriveCurrent', kind: 'max', value: required / reach.series, unit: 'A' };
}
