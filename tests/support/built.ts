import { existsSync, readdirSync, statSync } from 'node:fs';
import { join, relative } from 'node:path';

export const ROOT = join(import.meta.dirname, '..', '..');

/** What a user runs; `npm test` builds it first. */
export const BUILT = join(ROOT, 'dist', 'railfit.mjs');

/** Throws unless the built command is there and as new as its source: a test of an old build proves nothing. */
export function requireBuilt(): void {
  if (!existsSync(BUILT)) throw new Error('dist/railfit.mjs is missing: run npm run build');
  const built = statSync(BUILT).mtimeMs;
  const newer = ['src', 'migrations'].flatMap((folder) => sourcesUnder(join(ROOT, folder))).filter((file) => statSync(file).mtimeMs > built);
  if (newer.length === 0) return;
  const [first = '', ...others] = newer.map((file) => relative(ROOT, file));
  throw new Error(`dist/railfit.mjs is older than ${first}${others.length === 0 ? '' : ` and ${others.length} more`}: run npm run build`);
}

function sourcesUnder(folder: string): string[] {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('.ts'))
    .map((name) => join(folder, name));
}
