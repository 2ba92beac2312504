import type { NoiseDemand } from '../demands/index.js';
import type { NoiseGrid } from '../formulas/noise-grid.js';
import { outputNoise, type OutputNoise } from '../formulas/noise-integral.js';
import { maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import { weakest } from '../parts/basis.js';
import type { Parameter } from '../parts/figures.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { Spread } from '../parts/spread.js';
import { formatQuantity } from '../quantities/format.js';
import type { Missing, Term, TurningPoint } from '../verdicts/finding.js';

/** A figure that is missing, and the value of it that would make the square of its term (V²) this much. */
export interface MissingNoise {
  readonly missing: Missing;
  readonly turnsAt: (square: number) => TurningPoint | null;
}

/** Every term of the output noise that is known (V rms, they add as squares), and what is missing. */
export interface NoiseTerms {
  readonly terms: readonly Term[];
  readonly missing: readonly MissingNoise[];
  /** The value of the voltage noise at which its own terms would have this square, V²; null when it is not among them. */
  readonly turnsAt: (square: number) => TurningPoint | null;
}

/** More gain bandwidth is more noise: the most of it counts. */
export function noiseTerms(asked: NoiseDemand, readings: Readings): NoiseTerms {
  const speed = readings.spread('gainBandwidth');
  const quantisation = fixedTerm('quantisation', asked.quantisation, 'LSB/√12');
  if (speed === null) return { terms: quantisation, missing: [absent('gainBandwidth', 'min', () => null)], turnsAt: () => null };
  // An assumed gain bandwidth at its best lets no noise through.
  if (speed.ends === null) return { terms: quantisation, missing: [], turnsAt: () => null };
  const hertz = speed.ends.most;
  const stage = stageOf({ asked, readings, speed, hertz });
  const voltage = voltageTerms(stage);
  const others = [...currentTerms(stage), ...thermalTerms(stage), ...shotTerms(stage)];
  return {
    terms: [...voltage.terms, ...others.flatMap((one) => ('value' in one ? [one] : [])), ...quantisation],
    missing: [...voltage.missing, ...others.flatMap((one) => ('value' in one ? [] : [one]))],
    turnsAt: voltage.turnsAt,
  };
}

interface Stage {
  readonly asked: NoiseDemand;
  readonly readings: Readings;
  readonly speed: Spread;
  readonly hertz: number;
  readonly grid: NoiseGrid;
  readonly voltage: Reading | null;
  readonly corner: Reading | null;
  readonly current: Reading | null;
  /** Where the capacitance of the part's input belongs to the circuit and is not known. */
  readonly inputUnknown: boolean;
  /** With white voltage noise alone. */
  readonly white: OutputNoise;
}

function stageOf(of: Pick<Stage, 'asked' | 'readings' | 'speed' | 'hertz'>): Stage {
  const { asked, readings, hertz } = of;
  const own = asked.countsInput ? readings.figure('inputCapacitance') : null;
  const input = own?.value ?? 0;
  const feedback = asked.open === null ? null : maximallyFlatCapacitor({ feedback: asked.open.feedback, inputCapacitance: asked.open.inputCapacitance + input, gainBandwidth: hertz });
  const grid = asked.grid({ input, feedback });
  const voltage = readings.figure('voltageNoise');
  const current = asked.sees.plus || asked.sees.minus ? readings.figureOrClass('currentNoise') : null;
  const white = outputNoise(grid, { gainBandwidth: hertz, voltageNoise: voltage?.value ?? 0, noiseCorner: 0, currentNoise: current?.value ?? 0 });
  return { ...of, grid, voltage, corner: readings.figureOrClass('noiseCorner'), current, inputUnknown: asked.countsInput && own === null, white };
}

/** Square of the voltage-noise term (V²) for a density (V/√Hz) and a corner (Hz). */
function voltageSquare({ grid, hertz }: Stage, voltageNoise: number, noiseCorner: number): number {
  return (outputNoise(grid, { gainBandwidth: hertz, voltageNoise, noiseCorner, currentNoise: 0 }).terms[0]?.rms ?? 0) ** 2;
}

/** To ask for the square per unit: any value that is not lost in rounding. */
const SOME_DENSITY = 10e-9;
const SOME_CORNER = 1e3;
const SOME_CURRENT = 1e-12;

function voltageTerms(stage: Stage): NoiseTerms {
  const { voltage, corner, speed, inputUnknown, white } = stage;
  if (voltage === null) {
    const known = corner?.value ?? 0;
    const value = (square: number): number => SOME_DENSITY * Math.sqrt(square / voltageSquare(stage, SOME_DENSITY, known));
    return { terms: [], missing: [absent('voltageNoise', 'max', value), ...cornerMissing(stage)], turnsAt: () => null };
  }
  const bandwidth = `up to a gain bandwidth of ${formatQuantity(stage.hertz, 'Hz')}`;
  const basis = weakest([voltage.basis, speed.basis, ...(inputUnknown ? (['assumed'] as const) : [])]);
  const how = [voltage.how, bandwidth, inputUnknown ? 'capacitance of its input not known, not counted' : null].filter((step) => step !== null).join(', ');
  const whiteRms = white.terms[0]?.rms ?? 0;
  const flicker = corner === null || corner.value === 0 ? 0 : Math.sqrt(Math.max(0, voltageSquare(stage, voltage.value, corner.value) - whiteRms ** 2));
  const flickers = corner === null ? [] : shown({ name: 'amplifier 1/f noise', value: flicker, slot: corner.slot, basis: weakest([voltage.basis, corner.basis]), figure: { value: corner.printed ?? corner.value, unit: 'Hz' }, how: corner.how });
  return {
    terms: [...shown({ name: 'amplifier voltage noise', value: whiteRms, slot: voltage.slot, basis, figure: { value: voltage.printed ?? voltage.value, unit: 'V/√Hz' }, how }), ...flickers],
    missing: voltage.value === 0 ? [] : cornerMissing(stage),
    turnsAt: (square) => turning('voltageNoise', 'max', voltage.value * Math.sqrt(square / (whiteRms ** 2 + flicker ** 2))),
  };
}

function cornerMissing(stage: Stage): MissingNoise[] {
  const { corner, voltage } = stage;
  if (corner !== null) return [];
  const density = voltage?.value ?? SOME_DENSITY;
  return [absent('noiseCorner', 'max', (square) => (SOME_CORNER * square) / (voltageSquare(stage, density, SOME_CORNER) - voltageSquare(stage, density, 0)))];
}

/** Nothing at a pin that sees no impedance: it needs no figure. */
function currentTerms(stage: Stage): (Term | MissingNoise)[] {
  const { asked, current, white, grid, hertz } = stage;
  if (!asked.sees.plus && !asked.sees.minus) return [];
  if (current === null) {
    const { terms } = outputNoise(grid, { gainBandwidth: hertz, voltageNoise: 0, noiseCorner: 0, currentNoise: SOME_CURRENT });
    const rms = Math.hypot(terms[1]?.rms ?? 0, terms[2]?.rms ?? 0);
    return [absent('currentNoise', 'max', (square) => (SOME_CURRENT * Math.sqrt(square)) / rms)];
  }
  const { slot, basis, how } = current;
  const figure = { value: current.printed ?? current.value, unit: 'A/√Hz' };
  return [1, 2].flatMap((place) => shown({ name: white.terms[place]?.name ?? '', value: white.terms[place]?.rms ?? 0, slot, basis, figure, how }));
}

/** Every resistor of the networks, by name, at the hottest. */
function thermalTerms({ white, asked, speed }: Stage): Term[] {
  const how = `thermal noise at ${formatQuantity(asked.temperature, '°C')}`;
  return white.terms.slice(3).flatMap(({ name, rms }) => shown({ name: `${name} resistor`, value: rms, slot: null, basis: speed.basis, figure: null, how }));
}

/** √(2qI) of the largest photodiode current into the − input (Schottky, Ann. Phys. 362, 1918, from memory). */
function shotTerms({ asked, grid, hertz, speed }: Stage): Term[] {
  if (asked.shot === 0) return [];
  const value = outputNoise(grid, { gainBandwidth: hertz, voltageNoise: 0, noiseCorner: 0, currentNoise: asked.shot }).terms[2]?.rms ?? 0;
  return shown({ name: 'photodiode shot noise', value, slot: null, basis: speed.basis, figure: { value: asked.shot, unit: 'A/√Hz' }, how: 'of its largest current' });
}

const fixedTerm = (name: string, value: number, how: string): Term[] => shown({ name, value, slot: null, basis: 'guaranteed', figure: null, how });

/** A term of nothing is not shown. */
const shown = (term: Term): Term[] => (term.value === 0 && term.basis !== 'borrowed' ? [] : [term]);

function absent(figure: Parameter, kind: 'min' | 'max', value: (square: number) => number | null): MissingNoise {
  return { missing: { figure, kind }, turnsAt: (square) => turning(figure, kind, value(square)) };
}

const UNITS: Partial<Record<Parameter, string>> = { voltageNoise: 'V/√Hz', noiseCorner: 'Hz', currentNoise: 'A/√Hz' };

function turning(figure: Parameter, kind: 'min' | 'max', value: number | null): TurningPoint | null {
  const unit = UNITS[figure];
  return value === null || unit === undefined || !Number.isFinite(value) ? null : { figure, kind, value, unit };
}
