import { readFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { describe, expect, it } from 'vitest';

const ROOT = join(import.meta.dirname, '..');
const SRC = join(ROOT, 'src');
const DOOR = join(SRC, 'index.ts');

/** An import that runs code: of all its names, or of those that are no types. */
interface Loaded {
  readonly from: string;
  readonly names: readonly string[];
}

const STATIC = /(?:^|\n)(?:import|export)\s(?!type\s)(?:([^;'"]*?)\sfrom\s+)?'([^']+)'/gu;

function loadedBy(path: string): Loaded[] {
  return [...readFileSync(path, 'utf8').matchAll(STATIC)].flatMap(([, clause = '', from = '']) => {
    const list = /\{([^}]*)\}/u.exec(clause)?.[1];
    const names = (list ?? '').split(',').map((name) => name.trim()).filter((name) => name !== '' && !name.startsWith('type '));
    return list !== undefined && names.length === 0 ? [] : [{ from, names: names.map((name) => name.split(' as ')[0] ?? '') }];
  });
}

const NAMES: ReadonlyMap<string, string> = new Map(loadedBy(DOOR).flatMap(({ from, names }) => names.map((name): [string, string] => [name, placeOf(DOOR, from)])));

function placeOf(importer: string, from: string): string {
  return from.startsWith('.') ? join(dirname(importer), from).replace(/\.js$/u, '.ts') : from;
}

/** Every file and package that is loaded with these files, as the bundle loads them: through the public door only what is asked for. */
function loadedWith(...files: readonly string[]): ReadonlySet<string> {
  const seen = new Set<string>();
  const visit = (path: string): void => {
    if (seen.has(path)) return;
    seen.add(path);
    if (!path.startsWith('/')) return;
    for (const { from, names } of loadedBy(path)) {
      const place = placeOf(path, from);
      for (const one of place === DOOR ? names.map((name) => NAMES.get(name) ?? `${name}, which the door does not hand out`) : [place]) visit(one);
    }
  };
  for (const file of files) visit(join(SRC, file));
  return new Set([...seen].map((path) => (path.startsWith('/') ? relative(ROOT, path) : path)));
}

const packagesOf = (loaded: ReadonlySet<string>): string[] => [...loaded].filter((name) => !name.includes('.ts') && !name.startsWith('node:')).sort();

describe('start-up', () => {
  const query = loadedWith('cli/main.ts', 'cli/shortlist.ts');

  it('of a query loads the rooms that answer it', () => {
    expect(query.size).toBeGreaterThan(200);
    expect([...query].filter((file) => ['src/engine.ts', 'src/checks/index.ts', 'src/catalog/index.ts', 'src/presentation/json.ts'].includes(file))).toHaveLength(4);
  });

  it('of a query loads no package but these: no migrator, no reader of tables, no schemas, no prompts, no drawing', () => {
    expect(packagesOf(query)).toEqual(['better-sqlite3', 'commander', 'fft.js', 'string-width', 'yaml']);
  });

  it('of a query loads no migration, no reading of lists, no page, no bars and no help', () => {
    const REST = /^migrations\/|^src\/catalog\/migrate|^src\/intake\/(?:read-list|workbook)|^src\/presentation\/(?:page|bars|schemas|shortlist-text|explain-text)|^src\/cli\/(?:help|import|report|guided|shortlist-told)/u;
    expect([...query].filter((file) => REST.test(file))).toEqual([]);
  });

  it('of the command alone loads no catalog, no list, no stage file and no presenter', () => {
    const alone = loadedWith('cli/main.ts');
    expect([...alone].filter((file) => /^src\/(?:catalog|intake|saved|presentation)\/|^src\/spec\/read\.ts/u.test(file))).toEqual([]);
  });
});
