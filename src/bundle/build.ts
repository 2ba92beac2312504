import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build, type BuildOptions, type Plugin } from 'esbuild';
import { keepCode } from './keep-code.js';

/** Second half of `npm run build`: what the compiler left becomes the program, the command that starts it, and the program's compiled code. */
const root = fileURLToPath(new URL('../../../', import.meta.url));
const from = (file: string): string => join(root, 'dist', 'src', file);
const folder = join(root, 'dist', 'railfit');
const COMMON: BuildOptions = { bundle: true, platform: 'node', target: 'node20', minify: true, logLevel: 'warning' };
const lateStringWidth: Plugin = {
  name: 'late string-width',
  // The bundler reads the pattern by rules of its own, without flags.
  setup: (building) => building.onResolve({ filter: /^string-width$/ }, ({ kind }) => (kind === 'require-call' ? undefined : { path: from('bundle/late-string-width.js') })),
};

rmSync(folder, { recursive: true, force: true });
await build({
  ...COMMON,
  entryPoints: { program: from('cli/run.js') },
  format: 'cjs',
  // Code that was kept cannot import what is outside of it: it requires it.
  supported: { 'dynamic-import': false },
  outdir: folder,
  entryNames: '[name]-[hash]',
  outExtension: { '.js': '.cjs' },
  external: ['better-sqlite3', 'read-excel-file'],
  inject: [from('bundle/injected.js')],
  define: { 'import.meta.url': 'programUrl' },
  plugins: [lateStringWidth],
});
await build({ ...COMMON, entryPoints: [from('cli/start.js')], format: 'esm', outfile: join(root, 'dist', 'railfit.mjs'), banner: { js: '#!/usr/bin/env node' } });
await keepCode(folder, join(root, 'catalog', 'stages'));
