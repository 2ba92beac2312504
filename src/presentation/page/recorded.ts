import type { StageChanged, Symbols } from './review.js';
import { SYMBOLS } from './review.js';

/** A verdict of a recorded document, as far as it is compared. */
export interface RecordedVerdict {
  readonly check: string;
  readonly outcome: string;
  readonly offered: unknown;
  readonly required: unknown;
  readonly text: string;
}

export interface RecordedPart {
  readonly part: string;
  readonly verdicts: readonly RecordedVerdict[];
}

export interface RecordedStage {
  readonly file: string | null;
  readonly text: string | null;
  readonly sha256: string | null;
  readonly changes: readonly StageChanged[];
  readonly chosen: (RecordedPart & { readonly by: 'named' | 'saved' | 'first'; readonly rank: number | null; readonly outcome: string; readonly proof: string | null; readonly withdrawn?: string }) | null;
  readonly outcomes: readonly { readonly part: string; readonly outcome: string; readonly rank: number | null; readonly checks: readonly string[] }[];
  readonly shortlist: {
    readonly stage: Readonly<Record<string, unknown>>;
    readonly demands: readonly { readonly check: string; readonly required: unknown }[];
    readonly fit: readonly RecordedPart[];
    readonly undecided: readonly RecordedPart[];
    readonly nearest: readonly RecordedPart[];
    readonly asking: { readonly strict: boolean; readonly order: string; readonly assumed: readonly string[] };
    readonly data: { readonly catalog: { readonly parts: number; readonly sha256: string }; readonly rules: string };
  };
}

/** The document `report` as it is read back. */
export interface RecordedReport {
  readonly name: string | null;
  readonly time: string;
  readonly tool: string;
  readonly command: string;
  readonly symbols: Symbols;
  readonly top: number;
  readonly all: boolean;
  readonly stages: readonly RecordedStage[];
}

export type ReadReport = { readonly ok: true; readonly report: RecordedReport } | { readonly ok: false; readonly why: string };

/** The document a page carries, from its text. What verify relies on is checked, so that a damaged page is refused and not half believed. */
export function readRecorded(text: string): ReadReport {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    return no('the embedded document is broken off or damaged: it is no JSON');
  }
  if (!isObject(value) || value['schema'] !== 'railfit/report') return no('the embedded document is no railfit report');
  if (value['schemaVersion'] !== 1) return no(`the report has schema version ${String(value['schemaVersion'])}, this railfit reads version 1`);
  const fault = faultOf(value);
  return fault === null ? { ok: true, report: value as unknown as RecordedReport } : no(`the embedded document is damaged at ${fault}`);
}

const no = (why: string): ReadReport => ({ ok: false, why });

type Fields = Readonly<Record<string, unknown>>;
const isObject = (value: unknown): value is Fields => typeof value === 'object' && value !== null && !Array.isArray(value);
const isText = (value: unknown): boolean => typeof value === 'string';
const orNull = (is: (value: unknown) => boolean) => (value: unknown): boolean => value === null || is(value);
const listOf = (is: (value: unknown) => boolean) => (value: unknown): boolean => Array.isArray(value) && value.every(is);
const shaped = (shape: Readonly<Record<string, (value: unknown) => boolean>>) => (value: unknown): boolean => isObject(value) && Object.entries(shape).every(([key, is]) => is(value[key]));

const verdict = shaped({ check: isText, outcome: isText, text: isText });
const part = shaped({ part: isText, verdicts: listOf(verdict) });
const shortlist = shaped({
  stage: isObject,
  demands: listOf(shaped({ check: isText })),
  fit: listOf(part),
  undecided: listOf(part),
  nearest: listOf(part),
  asking: shaped({ strict: (value) => typeof value === 'boolean', order: isText, assumed: listOf(isText) }),
  data: shaped({ catalog: shaped({ parts: Number.isSafeInteger, sha256: isText }), rules: isText }),
});
const STAGE: Readonly<Record<string, (value: unknown) => boolean>> = {
  file: orNull(isText),
  text: orNull(isText),
  sha256: orNull(isText),
  changes: listOf(shaped({ path: isText, text: isText, option: isText })),
  chosen: orNull((value) => part(value) && shaped({ by: isText, outcome: isText })(value)),
  outcomes: listOf(shaped({ part: isText, outcome: isText, checks: listOf(isText) })),
  shortlist,
};
const HEAD: Readonly<Record<string, (value: unknown) => boolean>> = {
  name: orNull(isText),
  time: isText,
  tool: isText,
  command: isText,
  symbols: (value) => (SYMBOLS as readonly unknown[]).includes(value),
  top: Number.isSafeInteger,
  all: (value) => typeof value === 'boolean',
  stages: (value) => Array.isArray(value) && value.length > 0 && value.every(isObject),
};

/** Path of the first field that is not what it should be; null when all are. */
function faultOf(document: Fields): string | null {
  const head = Object.keys(HEAD).find((key) => HEAD[key]?.(document[key]) !== true);
  if (head !== undefined) return head;
  for (const [at, stage] of (document['stages'] as readonly Fields[]).entries()) {
    const key = Object.keys(STAGE).find((name) => STAGE[name]?.(stage[name]) !== true);
    if (key !== undefined) return `stages[${at}].${key}`;
  }
  return null;
}
