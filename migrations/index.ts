import type { Migration } from 'kysely';
import * as m0001 from './0001-parts.js';

/** Every migration by its file name, in order. Never edited after a release; a change of the tables is a new file. */
export const MIGRATIONS: Readonly<Record<string, Migration>> = {
  '0001-parts': m0001,
};
