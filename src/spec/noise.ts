import type { Draft } from './draft.js';
import { field } from './schema.js';
import type { Value } from './spec.js';
import { leafAt, refuse } from './refuse.js';
import { readQuantity, readValue, valueFrom, withinBounds } from './value.js';

/** `300 µVrms`: volts rms. A voltage that does not say rms is refused: peak-to-peak noise is another figure. */
export function readNoise(draft: Draft): Value | undefined {
  const path = 'limits.outputNoise';
  const text = leafAt(draft, path)?.text;
  if (text === undefined) return undefined;
  const kindless = /\d\s*[fpnuµμm]?V\s*(pp|p-p|pk|p)?$/.exec(text);
  if (kindless !== null) return refuse(draft, path, notRms(text, kindless[1]));
  const quantity = readQuantity(draft, path, { prepare: withoutRms });
  if (quantity === undefined) return undefined;
  const read = valueFrom(draft, path, quantity);
  return read === undefined ? undefined : { value: read.value, text: /\drms|Vrms/.test(read.text) ? read.text : `${read.text}rms` };
}

function notRms(text: string, kind: string | undefined): { code: string; message: string; fix: string } {
  const { accepted, example } = field('limits.outputNoise');
  if (kind !== undefined) return { code: 'Q014', message: `${text} is a peak; noise has no fixed peak, so its limit is an rms voltage: ${accepted}`, fix: example };
  return { code: 'Q014', message: `${text} rms or peak-to-peak? accepted: ${accepted}`, fix: `${text}rms` };
}

/** Blanks `rms`, keeping every character's place. */
function withoutRms(text: string): string {
  return text.replace(/(V)\s*_?(rms)\b/i, (found, unit: string) => unit + ' '.repeat(found.length - unit.length));
}

/** `-70 dB`, `70 dB` (below the signal) or `0.03 %`: fraction of the signal. */
export function readDistortion(draft: Draft): Value | undefined {
  const path = 'limits.distortion';
  const text = leafAt(draft, path)?.text;
  if (text === undefined) return undefined;
  if (!/dBc?\s*$/i.test(text)) return readValue(draft, path, { kind: 'fraction' });
  const quantity = readQuantity(draft, path, { kind: 'ratio', prepare: (typed) => typed.replace(/dBc\s*$/, 'dB ') });
  const decibels = quantity?.nominal ?? quantity?.max ?? quantity?.min;
  if (quantity === undefined || decibels === undefined) return undefined;
  const value = 1 / decibels;
  return withinBounds(draft, path, [value]) ? { value, text: `−${quantity.echo.replace(/^[−-]|^at (?:most|least) /, '')}` } : undefined;
}
