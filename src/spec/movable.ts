import type { StageSpec } from './spec.js';
import { STATED, type Stated } from './stated.js';

/** An input of the stage as it stands, which a change could move. SI units, temperatures in °C. */
export type MovableInput =
  /** One figure. `before` is what stands in front of it where it is the upper end of something (`20 Hz..2 kHz`). */
  | { readonly form: 'value'; readonly path: string; readonly value: number; readonly unit: string; readonly text: string; readonly written: boolean; readonly before?: string }
  /** Two ends. */
  | { readonly form: 'range'; readonly path: string; readonly min: number; readonly max: number; readonly unit: string; readonly text: string; readonly written: boolean }
  /** One of some words. */
  | { readonly form: 'words'; readonly path: string; readonly words: readonly string[]; readonly text: string; readonly written: boolean };

/** What may be moved in this stage: what is written, and the limits that stand by default. */
export function movableInputs(spec: StageSpec): MovableInput[] {
  return STATED.flatMap((stated) => inputOf(stated, spec) ?? []);
}

function inputOf(stated: Stated, spec: StageSpec): MovableInput | null {
  const { path } = stated;
  const found = stated.of(spec);
  if (found === undefined) return null;
  const written = spec.positions[path] !== undefined;
  if ('words' in found) return { form: 'words', path, words: found.words, text: found.words.join(', '), written };
  if ('value' in found) {
    const { value, text, before } = found;
    return { form: 'value', path, value, unit: stated.unit ?? found.unit ?? '1', text, written, ...(before === undefined ? {} : { before }) };
  }
  const { min, max, text } = found;
  if (min === max) return { form: 'value', path, value: min, unit: stated.unit ?? '1', text, written };
  return { form: 'range', path, min, max, unit: stated.unit ?? '1', text, written };
}
