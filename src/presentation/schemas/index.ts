import { check } from './check.js';
import { demands } from './demands.js';
import { draft } from './draft.js';
import { explanation } from './explanation.js';
import { help } from './help.js';
import { imported } from './import.js';
import { part } from './part.js';
import { parts } from './parts.js';
import { problems } from './problems.js';
import { shortlist } from './shortlist.js';
import { stages } from './stages.js';

/**
 * Every document railfit prints with --json, by name. The definitions are strict: they are what a test holds the own output
 * against. What is published (`published.ts`) allows further fields, since a later railfit may add some.
 */
export const DOCUMENTS = { shortlist, explanation, demands, parts, part, import: imported, problems, help, draft, check, stages } as const;

export type DocumentName = keyof typeof DOCUMENTS;
