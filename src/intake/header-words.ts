import type { LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { canonicalHeader, canonicalWords, foldWords } from './canonical-header.js';

/** Identity columns in canonical order; the header is the field itself. Price has a header of its own. */
export const IDENTITY_FIELDS = [
  'id', 'description', 'status', 'lifecycle', 'package', 'channels', 'qualification', 'class', 'family',
] as const;
export type IdentityField = (typeof IDENTITY_FIELDS)[number];

/** Statements in canonical order, with their headers. */
export const STATEMENTS = {
  phaseReversal: 'phase reversal',
  inputClamp: 'input clamp',
  inputType: 'input type',
  crossoverFree: 'crossover free',
} as const;
export type Statement = keyof typeof STATEMENTS;

export const IDENTITY_WORDS: ReadonlyMap<string, IdentityField> = new Map(IDENTITY_FIELDS.map((field) => [field, field]));
export const STATEMENT_WORDS: ReadonlyMap<string, Statement> = new Map(
  (Object.keys(STATEMENTS) as Statement[]).map((statement) => [foldWords(STATEMENTS[statement]), statement]),
);

export interface FigureWords {
  readonly parameter: Parameter;
  /** null when the kind is missing or not one the parameter has. */
  readonly limit: LimitKind | null;
  readonly written: LimitKind | null;
  readonly kinds: readonly LimitKind[];
}

/** Parameter and limit kind of folded header words; null when they name no parameter. */
export function figureWords(folded: string): FigureWords | null {
  return lookUp(folded) ?? lookUp(folded.replace(/minimum$/u, 'min').replace(/typical$/u, 'typ').replace(/maximum$/u, 'max'));
}

/** Every folded header words with the canonical header they stand for. */
export function allHeaderWords(): ReadonlyMap<string, string> {
  return ALL_WORDS;
}

function lookUp(folded: string): FigureWords | null {
  const exact = FIGURES.get(folded);
  if (exact !== undefined) return exact;
  const written = /(?:min|typ|max)$/u.exec(folded)?.[0] as LimitKind | undefined;
  const parameter = PARAMETER_WORDS.get(folded) ?? PARAMETER_WORDS.get(folded.slice(0, -3));
  if (parameter === undefined || (written === undefined && !PARAMETER_WORDS.has(folded))) return null;
  return { parameter, limit: null, written: PARAMETER_WORDS.has(folded) ? null : (written ?? null), kinds: PARAMETERS[parameter].kinds };
}

const ENTRIES = Object.keys(PARAMETERS) as Parameter[];
const PARAMETER_WORDS: ReadonlyMap<string, Parameter> = new Map(ENTRIES.map((name) => [foldWords(PARAMETERS[name].words), name]));

const FIGURES: ReadonlyMap<string, FigureWords> = new Map(
  ENTRIES.flatMap((parameter) =>
    PARAMETERS[parameter].kinds.flatMap((limit) => {
      const entry = { parameter, limit, written: limit, kinds: PARAMETERS[parameter].kinds };
      const written = [canonicalWords(parameter, limit), `${PARAMETERS[parameter].words} ${limit}`];
      return written.map((words): [string, FigureWords] => [foldWords(words), entry]);
    }),
  ),
);

const ALL_WORDS: ReadonlyMap<string, string> = new Map([
  ...IDENTITY_FIELDS.map((field): [string, string] => [field, field]),
  ['price', 'price (EUR) @ 1000'],
  ...Object.values(STATEMENTS).map((words): [string, string] => [foldWords(words), words]),
  ...ENTRIES.flatMap((parameter) =>
    PARAMETERS[parameter].kinds.map((kind): [string, string] => [
      foldWords(canonicalWords(parameter, kind)),
      canonicalHeader(parameter, kind),
    ]),
  ),
]);
