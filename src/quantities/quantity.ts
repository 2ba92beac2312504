import type { FieldKind } from './kinds.js';

/** A quantity as read: SI numbers plus the canonical echo. Absent ends were not given. */
export interface Quantity {
  readonly kind: FieldKind;
  readonly min?: number;
  readonly nominal?: number;
  readonly max?: number;
  /** Unit of the numbers: `V`, `Ω`, `V/s`, `V/√Hz`, `V/V`, `1`, `°C`, `Vpk`; for prices the ISO 4217 code. */
  readonly unit: string;
  /** As typed. */
  readonly text: string;
  /** Canonical form, rule Q-20: `4.7 kΩ ±5 %`, `3 V..4.2 V`, `at most 5 mV`. */
  readonly echo: string;
  /** `max 5 mV` → max; `typ 1 mV` → typ; a plain value has none. Three figures with slashes carry none but fill all ends. */
  readonly limit?: 'min' | 'typ' | 'max';
  /** True when min..max is the tolerance band around nominal (`5 V ±5 %`). */
  readonly tolerance?: boolean;
  /** Accepted with a note: what was assumed about the writing. */
  readonly note?: string;
}

/** Why a quantity was refused. `span` is [start, end) in UTF-16 units of the text as typed. */
export interface QuantityProblem {
  readonly code: string;
  readonly message: string;
  readonly fix?: string;
  readonly span: readonly [number, number];
}

export type QuantityResult =
  | { readonly ok: true; readonly quantity: Quantity }
  | { readonly ok: false; readonly problem: QuantityProblem };

export interface ReadingContext {
  /** `comma` when the file (or `--decimal=comma`) settles the decimal mark; default: each text on its own. */
  readonly decimal?: 'point' | 'comma';
  /** Unit from a CSV header, written as in the header (`nA`, `MHz`, `µV/K`); a cell's own unit wins over it. */
  readonly headerUnit?: string;
  /** Amplitude: what rms is turned into peak with. `sine` by default; null asks for the crest factor. */
  readonly waveform?: 'sine' | null;
  /** Voltage: an rms voltage (`300 µVrms`) is meant, so `rms` may be written. */
  readonly rms?: boolean;
}
