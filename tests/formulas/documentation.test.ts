import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

/** Machinery of the room rather than published relations. */
const MACHINERY = new Set(['domain.ts']);

const ROOM = new URL('../../src/formulas/', import.meta.url);
const files = readdirSync(ROOM).filter((name) => name.endsWith('.ts'));

describe('src/formulas', () => {
  for (const file of files) {
    const test = new URL(file.replace(/\.ts$/, '.test.ts'), import.meta.url);
    it(`${file} has its test beside it in tests/formulas`, () => {
      expect(existsSync(test)).toBe(true);
    });

    const text = readFileSync(new URL(file, ROOM), 'utf8');
    const functions = [...text.matchAll(/(\/\*\*(?:(?!\*\/)[\s\S])*\*\/\n)?export function (\w+)/g)];
    for (const [, comment, name] of MACHINERY.has(file) ? [] : functions) {
      it(`${name} states a worked example and its source, and both are tested`, () => {
        expect(comment, `docstring of ${name} in ${file}`).toMatch(/@example [\s\S]*Source: /);
        expect(readFileSync(test, 'utf8'), `tests/formulas test of ${name}`).toMatch(new RegExp(`\\b${name}\\(`));
      });
    }
  }

  it('imports nothing but itself and src/quantities', () => {
    const imports = files.flatMap((file) => [...readFileSync(new URL(file, ROOM), 'utf8').matchAll(/from '([^']+)'/g)].map(([, from]) => from!));
    expect(imports.filter((from) => !/^\.\/[\w-]+\.js$|^\.\.\/quantities\/[\w-]+\.js$/.test(from))).toEqual([]);
  });
});
