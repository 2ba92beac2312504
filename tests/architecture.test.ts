import { readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, normalize, relative } from 'node:path';
import { describe, expect, it } from 'vitest';

/** Who may import whom, and which packages. Data flows one way; nothing flows back. Change this table with DEVELOPERS.md. */
const TABLE: Readonly<Record<string, { readonly rooms: readonly string[]; readonly packages: readonly string[] }>> = {
  quantities: { rooms: [], packages: [] },
  formulas: { rooms: ['quantities'], packages: [] },
  parts: { rooms: ['quantities'], packages: [] },
  spec: { rooms: ['quantities'], packages: ['yaml'] },
  stage: { rooms: ['quantities', 'formulas', 'spec'], packages: [] },
  demands: { rooms: ['quantities', 'formulas', 'stage'], packages: [] },
  // The stage with a part's own figures in it, simulated; told beside the verdicts, never one of them.
  prediction: { rooms: ['quantities', 'formulas', 'parts', 'stage'], packages: ['fft.js'] },
  verdicts: { rooms: ['parts'], packages: [] },
  checks: { rooms: ['quantities', 'formulas', 'parts', 'demands', 'verdicts'], packages: [] },
  screening: { rooms: ['parts', 'demands', 'verdicts', 'checks'], packages: [] },
  // formulas: the desirability relation is a citation like any other.
  ranking: { rooms: ['quantities', 'formulas', 'parts', 'verdicts', 'screening'], packages: [] },
  // spec and stage: what may move, and the stage an option makes; types only, reading and building are handed in. formulas: bisection, where a verdict turns.
  explanation: { rooms: ['quantities', 'formulas', 'spec', 'stage', 'parts', 'demands', 'verdicts', 'checks', 'screening', 'ranking'], packages: [] },
  // What pictures show, from the same readings and loop as the checks; presenters see its types through the report.
  curves: { rooms: ['formulas', 'parts', 'stage', 'demands', 'checks', 'screening'], packages: [] },
  'report.ts': { rooms: ['curves', 'parts', 'stage', 'demands', 'verdicts', 'screening', 'ranking', 'explanation', 'prediction'], packages: [] },
  'rules.ts': { rooms: [], packages: [] },
  'engine.ts': { rooms: ['rules.ts', 'curves', 'parts', 'stage', 'demands', 'verdicts', 'checks', 'screening', 'ranking', 'explanation', 'report.ts', 'prediction'], packages: [] },
  // Rooms below are types only, as a report carries them; a test of its own holds that.
  presentation: {
    rooms: ['quantities', 'report.ts', 'parts', 'stage', 'demands', 'prediction', 'verdicts', 'screening', 'ranking', 'explanation', 'curves'],
    packages: ['string-width', 'zod', 'd3-scale', 'd3-shape'],
  },
  intake: { rooms: ['quantities', 'parts'], packages: ['node:crypto', 'read-excel-file'] },
  catalog: {
    rooms: ['quantities', 'parts', 'intake', 'migrations'],
    packages: ['better-sqlite3', 'kysely', 'node:fs', 'node:path', 'node:crypto'],
  },
  // The team's stage files: read from disk and judged again; which are kept stands in the catalog.
  saved: { rooms: ['quantities', 'spec', 'stage', 'parts', 'screening', 'engine.ts'], packages: ['node:fs', 'node:path'] },
  'index.ts': { rooms: ['rules.ts', 'quantities', 'spec', 'stage', 'parts', 'demands', 'checks', 'verdicts', 'ranking', 'explanation', 'engine.ts', 'report.ts', 'presentation', 'prediction'], packages: [] },
  cli: { rooms: ['index.ts', 'rules.ts', 'catalog', 'intake', 'saved', 'quantities'], packages: ['commander', '@inquirer/prompts', 'node:'] },
  // Half of the build, none of the program.
  bundle: { rooms: ['cli'], packages: ['esbuild', 'string-width', 'node:'] },
  migrations: { rooms: [], packages: ['kysely'] },
};

const ROOT = join(import.meta.dirname, '..');
const SRC = join(ROOT, 'src');

interface Import {
  readonly file: string;
  readonly room: string;
  /** Room or package. */
  readonly target: string;
  readonly isPackage: boolean;
  readonly typeOnly: boolean;
}

function filesUnder(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return filesUnder(path);
    return name.endsWith('.ts') ? [path] : [];
  });
}

const IMPORT = /(?:^|\n)\s*(import|export)(\s+type)?\s[^;'"]*?from\s+'([^']+)'|import\('([^']+)'\)|(?:^|\n)import\s+'([^']+)'/gu;

function importsOf(path: string): Import[] {
  const file = relative(ROOT, path);
  const room = roomOf(path);
  return [...readFileSync(path, 'utf8').matchAll(IMPORT)].map((match) => {
    const target = match[3] ?? match[4] ?? match[5] ?? '';
    const typeOnly = match[2] !== undefined;
    if (!target.startsWith('.')) return { file, room, target, isPackage: true, typeOnly };
    return { file, room, target: roomOf(normalize(join(dirname(path), target)).replace(/\.js$/u, '.ts')), isPackage: false, typeOnly };
  });
}

function roomOf(path: string): string {
  const inSource = relative(SRC, path);
  if (inSource.startsWith('..')) return relative(ROOT, path).split('/')[0] ?? '';
  return inSource.split('/')[0] ?? '';
}

const FILES: readonly string[] = [...filesUnder(SRC), ...filesUnder(join(ROOT, 'migrations'))];
const ALL: readonly Import[] = FILES.flatMap(importsOf);

function isAllowed({ room, target, isPackage }: Import): boolean {
  const row = TABLE[room];
  if (row === undefined) return false;
  if (!isPackage) return target === room || row.rooms.includes(target);
  return row.packages.some((name) => (name.endsWith(':') ? target.startsWith(name) : target === name || target.startsWith(`${name}/`)));
}

describe('architecture', () => {
  it('sees the whole source', () => {
    expect(ALL.length).toBeGreaterThan(400);
    expect(new Set(FILES.map(roomOf))).toEqual(new Set(Object.keys(TABLE)));
  });

  it('lets rooms import only what the table allows', () => {
    const broken = ALL.filter((one) => !isAllowed(one)).map(({ file, target }) => `${file} imports ${target}`);
    expect(broken).toEqual([]);
  });

  it('shows presenters types of the judging rooms, never their code', () => {
    const TYPES_ONLY = new Set(['curves', 'stage', 'demands', 'prediction', 'verdicts', 'screening', 'ranking', 'explanation']);
    const broken = ALL.filter(({ room, target, typeOnly }) => room === 'presentation' && TYPES_ONLY.has(target) && !typeOnly);
    expect(broken.map(({ file, target }) => `${file} imports code of ${target}`)).toEqual([]);
  });

  it('keeps zod out of everything a query loads', () => {
    const users = ALL.filter(({ target, isPackage }) => isPackage && target === 'zod').map(({ file }) => file);
    expect(users.filter((file) => !file.startsWith('src/presentation/schemas/'))).toEqual([]);
  });

  it('reaches disk only in catalog, saved and cli, and the console only in cli', () => {
    const users = ALL.filter(({ target }) => /^node:(?:fs|process|readline|child_process)/u.test(target)).map(({ room }) => room);
    expect([...new Set(users)].filter((room) => !['catalog', 'saved', 'cli', 'bundle'].includes(room))).toEqual([]);
  });

  it('holds exactly the folders of the house at the top', () => {
    const KNOWN = ['.ci', '.git', '.gitignore', '.cache', 'DEVELOPERS.md', 'LICENSE', 'README.md', 'catalog', 'coverage', 'dist', 'eslint.config.js', 'migrations', 'node_modules', 'package-lock.json', 'package.json', 'src', 'tests', 'tsconfig.json'];
    expect(readdirSync(ROOT).filter((name) => !KNOWN.includes(name))).toEqual([]);
  });
});
