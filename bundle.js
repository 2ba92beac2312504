// Bundles the command: `node bundle.js`, after tsc. A file a command needs is loaded when it needs it, so the command is an entry and its pieces.
import { readFileSync, rmSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { build } from 'esbuild';

const BUILT = resolve('dist/src');
const DOOR = join(BUILT, 'index.js');
const ENTRY = join(BUILT, 'cli/main.js');

// Filters of esbuild take no flags.
const SLOW = /^(?:string-width|node:child_process)$/;
const PARSER = /\/commander\/lib\//u;
const CLI = /\/dist\/src\/cli\/.*\.js$/;

const BANNER = "import{createRequire as __createRequire}from'node:module';const require=__createRequire(import.meta.url);";

/** Where each name the public door hands out comes from. The door is a list of `export { ... } from '...'` and nothing else. */
function namesOfDoor() {
  const names = new Map();
  for (const [, list, from] of readFileSync(DOOR, 'utf8').matchAll(/export \{([^}]*)\} from '([^']+)';/gu)) {
    for (const name of list.split(',').map((one) => one.trim())) names.set(name, join(BUILT, from));
  }
  return names;
}

/**
 * The command takes what it needs through the door, and a bundler that splits loads whatever the door hands out with it: all of the
 * presentation for one answer. Here each import of the door becomes imports of the files behind it; the source keeps its one door.
 */
const throughTheDoor = {
  name: 'through-the-door',
  setup({ onLoad }) {
    const names = namesOfDoor();
    onLoad({ filter: CLI }, ({ path }) => {
      const contents = readFileSync(path, 'utf8').replaceAll(/^import \{([^}]*)\} from '(\.[^']*\/index\.js)';$/gmu, (whole, list, from) => {
        if (resolve(dirname(path), from) !== DOOR) return whole;
        return list.split(',').map((one) => one.trim()).map((name) => `import { ${name} } from ${JSON.stringify(placeOf(names, name))};`).join(' ');
      });
      // Of all pieces only the command itself is run by a shell.
      return { contents: path === ENTRY ? `#!/usr/bin/env node\n${contents}` : contents, loader: 'js' };
    });
  },
};

/**
 * What is slow to load and hardly ever used is loaded when it is: the table of emoji that measures their width, and the processes the
 * option parser could start for commands that are programs of their own. The source imports both as usual.
 */
const LATE = new Map([
  ['string-width', "let measure; export default (text) => (measure ??= require('string-width').default)(text);"],
  ['node:child_process', "exports.spawn = (...received) => require('node:child_process').spawn(...received);"],
]);

const loadedLate = {
  name: 'loaded-late',
  setup({ onLoad, onResolve }) {
    onResolve({ filter: SLOW }, ({ path, namespace, importer }) => {
      const isLate = namespace !== 'late' && (path === 'string-width' || PARSER.test(importer));
      return isLate ? { path, namespace: 'late' } : undefined;
    });
    onLoad({ filter: SLOW, namespace: 'late' }, ({ path }) => ({ contents: LATE.get(path), resolveDir: resolve('.') }));
  },
};

function placeOf(names, name) {
  const place = names.get(name.split(' as ')[0]);
  if (place === undefined) throw new Error(`the public door does not hand out ${name}`);
  return place;
}

rmSync('dist/railfit', { recursive: true, force: true });
await build({
  entryPoints: { railfit: ENTRY },
  bundle: true,
  splitting: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  minify: true,
  external: ['better-sqlite3', 'read-excel-file'],
  outdir: 'dist',
  outExtension: { '.js': '.mjs' },
  chunkNames: 'railfit/[name]-[hash]',
  logLevel: 'warning',
  banner: { js: BANNER },
  plugins: [throughTheDoor, loadedLate],
});
