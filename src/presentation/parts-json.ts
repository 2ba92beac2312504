import { conditionKey, figureSlot, PARAMETERS, type Condition } from '../parts/figures.js';
import type { Origin, Part } from '../parts/part.js';
import { document } from './json.js';
import { originText } from './verdict-json.js';

export interface PartLine {
  readonly part: Part;
  /** Checks it fails on the stage asked about; absent when no stage was given. */
  readonly failing?: readonly string[];
}

export function partsJson(list: { readonly total: number; readonly parts: readonly PartLine[] }): string {
  const of = (tier: string): number => list.parts.filter(({ part }) => part.tier === tier).length;
  return document('parts', {
    counts: { catalog: list.total, parts: list.parts.length, approved: of('approved'), generic: of('generic') },
    parts: list.parts.map(({ part, failing }) => ({ part: part.id, tier: part.tier, description: part.description, class: part.class, ...(failing === undefined ? {} : { failing }) })),
  });
}

/** A part that is on the approved list no more: the import that ended it, or the one taken back that had brought it. */
export interface Withdrawn {
  readonly file: string;
  readonly sha256: string;
  readonly takenBack: boolean;
}

/** Every figure of one part with kind, condition and origin. */
export function partJson(part: Part, originOf: (slot: string) => Origin | null, withdrawn?: Withdrawn): string {
  const { figures, id, ...identity } = part;
  return document('part', {
    part: { id, ...identity },
    ...(withdrawn === undefined ? {} : { withdrawn }),
    figures: figures.map((figure) => {
      const origin = originOf(figureSlot(figure));
      const { parameter, kind, value, assumed } = figure;
      const cell = origin?.kind === 'cell' || origin?.kind === 'generic' ? origin.cell : null;
      return { parameter, kind, value, unit: PARAMETERS[parameter].unit, condition: conditionJson(figure.condition), ...(assumed === true ? { assumed } : {}), origin: originText(origin), cell };
    }),
  });
}

function conditionJson(condition: Condition): object | null {
  if (conditionKey(condition) === '') return null;
  const { supply = null, load = null, temperature = null, gain = null } = condition;
  return { supply, load, temperature, gain };
}
