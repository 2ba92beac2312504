import type { Stage } from '../../../../stage/index.js';
import type { Point } from '../../drawing/label-placing.js';
import { said } from '../../drawing/said.js';
import type { Piece, Symbols } from '../piece.js';
import { source } from '../symbols/ends.js';
import { inputWords, ohms, sourceResistance } from '../values.js';
import { chain, type Link } from './chain.js';

export const COUPLING: Link = { kind: 'capacitor', label: 'C coupling' };

/** The links a signal passes first: its own resistance, and the coupling capacitor. */
export function signalLinks(stage: Stage): Link[] {
  const ohmic = sourceResistance(stage);
  const own: Link[] = ohmic === 0 ? [] : [{ kind: 'resistor', label: ohms('Rs', ohmic) }];
  return [{ kind: 'wire', length: 24 }, ...own, ...(stage.coupling === 'ac' ? [COUPLING] : [])];
}

/** A row of parts that begins at the signal source and ends at a point. */
export function driven(stage: Stage, end: Point, { links, symbols }: { readonly links: readonly Link[]; readonly symbols: Symbols }): Piece[] {
  const { start, pieces } = chain(end, links, symbols);
  return [...pieces, source(start, signalWords(stage))];
}

function signalWords(stage: Stage): string[] {
  const top = stage.frequency === null ? [] : [`up to ${said(stage.frequency, 'Hz')}`];
  return [inputWords(stage, 'input', 'V'), ...top].filter((words) => words !== '');
}
