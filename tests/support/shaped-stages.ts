import type { FilterSpec, SignalSpec, StageSpec } from '../../src/spec/spec.js';
import { dc, midSupply, stageSpec, swing, value } from './stages.js';

/** A DC-coupled step between two levels, V, with or without a 10..90 % time wanted at the output, s. */
export function step(min: number, max: number, edge?: number): SignalSpec {
  return { ...dc(min, max), shape: 'step', ...(edge === undefined ? {} : { edge: value(edge) }) };
}

/** Photodiode of `farad` at its node, 0..`amperes` out of it, Rf in ohm; `capacitor`: fitted across it. */
export function photodiodeStage(of: { readonly amperes: number; readonly farad: number; readonly ohms: number; readonly capacitor?: number; readonly top?: number }, more: Partial<StageSpec> = {}): StageSpec {
  const signal: SignalSpec = { coupling: 'dc', shape: 'band-limited', ...(of.top === undefined ? {} : { frequency: { top: of.top, text: `${of.top} Hz` } }) };
  return stageSpec('transimpedance', signal, {
    photodiode: { current: swing(0, of.amperes), direction: 'out-of-node', capacitance: value(of.farad) },
    resistors: { feedback: value(of.ohms), tolerance: value(0) },
    ...(of.capacitor === undefined ? {} : { capacitors: { feedback: value(of.capacitor) } }),
    ...more,
  });
}

/** Components as fitted, exact. */
export function filterStage(topology: 'sallen-key-low-pass' | 'multiple-feedback-low-pass', parts: Readonly<Record<string, number>>, more: Partial<StageSpec> = {}): StageSpec {
  const filter = Object.fromEntries(Object.entries(parts).map(([name, number]) => [name, value(number)])) as FilterSpec;
  return stageSpec(topology, dc(2, 3), {
    filter,
    reference: midSupply(),
    resistors: { tolerance: value(0) },
    capacitors: { tolerance: value(0) },
    ...(topology === 'sallen-key-low-pass' ? { gain: value(1) } : {}),
    ...more,
  });
}

/** 10 kHz Butterworth with unity gain. */
export const BUTTERWORTH = { r1: 11253.95395196, r2: 11253.95395196, c1: 2e-9, c2: 1e-9 };

export function oscillatorStage(frequency: number, more: Partial<StageSpec> = {}): StageSpec {
  return stageSpec('relaxation-oscillator', { coupling: 'dc', shape: 'band-limited' }, {
    oscillator: { frequency: value(frequency), resistance: value(1e4), capacitance: value(1 / (frequency * 2 * Math.log(2) * 1e4)) },
    resistors: { tolerance: value(0) },
    ...more,
  });
}
