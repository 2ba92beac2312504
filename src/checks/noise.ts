import { weakest } from '../parts/basis.js';
import type { Readings } from '../parts/readings.js';
import type { Finding, SingleFinding, Term, TurningPoint } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { noiseTerms, type NoiseTerms } from './noise-sources.js';
import { noiseNotes, signalOf, swingOf, type NoiseQuestion, type Swing } from './noise-swing.js';

/**
 * All noise at the output over the true bandwidth against its limit in volts, its limit as a ratio to the signal, or both. The
 * capacitance of the part's own input is counted in transimpedance stages alone, where it decides the noise gain; elsewhere it would
 * raise the noise only about the pole it makes with Rf||Rg, near the end of the bandwidth, and is left out.
 */
export const noise: Check<NoiseQuestion> = {
  id: 'noise',
  title: 'noise',
  unit: 'V',
  reads: ['voltageNoise', 'noiseCorner', 'currentNoise', 'gainBandwidth', 'inputCapacitance', 'outputLowHeadroom', 'outputHighHeadroom'],
  hasMargin: true,
  asks: (demands) => (demands.noise === null ? null : { noise: demands.noise, low: demands['output-low'], high: demands['output-high'] }),
  judge: judgeNoise,
};

function judgeNoise(asked: NoiseQuestion, readings: Readings): Finding {
  const found = noiseTerms(asked.noise, readings);
  const swing = swingOf(asked, readings);
  const sum: Sum = { asked, found, swing, rms: Math.hypot(...found.terms.map(({ value }) => value)), borrowed: Math.hypot(...borrowed(found.terms)) };
  const { rms, ratio } = asked.noise;
  const findings = [...(rms === null ? [] : [inVolts(sum, rms)]), ...(ratio === null ? [] : [asRatio(sum, ratio)])];
  const [only] = findings;
  return findings.length === 1 && only !== undefined ? only : { kind: 'vertices', findings };
}

const borrowed = (terms: readonly Term[]): number[] => terms.filter(({ basis }) => basis === 'borrowed').map(({ value }) => value);

interface Sum {
  readonly asked: NoiseQuestion;
  readonly found: NoiseTerms;
  readonly swing: Swing;
  /** Of everything known, and of what is borrowed, V rms. */
  readonly rms: number;
  readonly borrowed: number;
}

function inVolts(sum: Sum, required: number): SingleFinding {
  const common = { ...commonOf(sum, required), required, unit: 'V', sense: 'at-most' } as const;
  return sum.found.missing.length > 0
    ? { ...common, ...unknown(sum), kind: 'bound', known: sum.rms }
    : { ...common, kind: 'numbers', offered: sum.rms, borrowed: sum.borrowed };
}

/** Signal over noise, V/V; the terms stay in volts. */
function asRatio(sum: Sum, required: number): SingleFinding {
  const { swing, rms } = sum;
  const signal = signalOf(swing);
  const allowed = signal / required;
  const offered = signal === 0 ? 0 : signal / rms;
  const common = { ...commonOf(sum, allowed), required, unit: 'V/V', sense: 'at-least', termUnit: 'V' } as const;
  return sum.found.missing.length > 0
    ? { ...common, ...unknown(sum), kind: 'bound', known: offered }
    : { ...common, kind: 'numbers', offered, borrowed: allowed === 0 ? 0 : (sum.borrowed / allowed) * required };
}

const unknown = ({ found }: Sum) => ({ missing: found.missing.map(({ missing }) => missing), cause: 'missing-figure' }) as const;

/** What both findings share; `allowed` V rms. */
function commonOf(sum: Sum, allowed: number) {
  const { found, swing, rms, asked } = sum;
  return {
    terms: found.terms,
    adds: 'squares',
    corner: { temperature: asked.noise.temperature },
    basis: weakest(found.terms.map(({ basis }) => basis)),
    notes: found.missing.length === 0 ? noiseNotes(rms, swing) : [],
    turnsAt: turnsAt(sum, allowed),
  } as const;
}

/** The one missing figure, or the voltage noise, at which the sum just meets what is allowed, V rms. */
function turnsAt({ found, rms }: Sum, allowed: number): TurningPoint | null {
  const [first, second] = found.missing;
  if (first !== undefined) return second === undefined && rms < allowed ? first.turnsAt(allowed ** 2 - rms ** 2) : null;
  const others = found.terms.filter(({ name }) => !VOLTAGE.has(name)).reduce((sum, { value }) => sum + value ** 2, 0);
  return others < allowed ** 2 ? found.turnsAt(allowed ** 2 - others) : null;
}

const VOLTAGE: ReadonlySet<string> = new Set(['amplifier voltage noise', 'amplifier 1/f noise']);
