import { check } from './check.js';
import { comparison } from './comparison.js';
import { demands } from './demands.js';
import { draft } from './draft.js';
import { explanation } from './explanation.js';
import { help } from './help.js';
import { imported } from './import.js';
import { lookups } from './lookups.js';
import { part } from './part.js';
import { parts } from './parts.js';
import { prediction } from './prediction.js';
import { problems } from './problems.js';
import { report } from './report.js';
import { shortlist } from './shortlist.js';
import { stages } from './stages.js';
import { sweep } from './sweep.js';
import { verification } from './verification.js';

/**
 * Every document railfit prints with --json, by name. The definitions are strict: they are what a test holds the own output
 * against. What is published (`published.ts`) allows further fields, since a later railfit may add some.
 */
export const DOCUMENTS = { shortlist, lookups, explanation, demands, parts, part, import: imported, problems, help, draft, check, stages, prediction, sweep, comparison, report, verification } as const;

export type DocumentName = keyof typeof DOCUMENTS;
