import type { Migration } from 'kysely';
import * as m0001 from './0001-parts.js';
import * as m0002 from './0002-saved-stages.js';
import * as m0003 from './0003-figure-columns.js';
import * as m0004 from './0004-hazard-figures.js';
import * as m0005 from './0005-patched-cells.js';
import * as m0006 from './0006-check-dictionary.js';

/** Every migration by its file name, in order. Never edited after a release; a change of the tables is a new file. */
export const MIGRATIONS: Readonly<Record<string, Migration>> = {
  '0001-parts': m0001,
  '0002-saved-stages': m0002,
  '0003-figure-columns': m0003,
  '0004-hazard-figures': m0004,
  '0005-patched-cells': m0005,
  '0006-check-dictionary': m0006,
};
