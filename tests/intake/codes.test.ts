import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { INTAKE_CODES } from '../../src/intake/codes.js';

const ROOM = join(import.meta.dirname, '../../src/intake');

it('every code an import reports has a page, and every page a code that is reported (edit src/intake/codes.ts)', () => {
  const source = readdirSync(ROOM).filter((name) => name !== 'codes.ts').map((name) => readFileSync(join(ROOM, name), 'utf8')).join('\n');
  const used = new Set([...source.matchAll(/'(I\d{3})'/gu)].map(([, code]) => code));
  // Those of a look-up sheet, I8xx, have their pages beside the command that takes it.
  expect(Object.keys(INTAKE_CODES).sort()).toEqual([...used].filter((code) => code?.startsWith('I8') === false).sort());
});
