import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { TOPOLOGIES } from '../../src/spec/spec.js';
import { readStage } from '../../src/spec/read.js';
import { buildStage } from '../../src/stage/index.js';
import { ROOT } from '../support/built.js';

// Topologies, demo stages and README name each other; what is missing says which file to edit.

const FOLDER = join(ROOT, 'catalog', 'stages');
const readme = readFileSync(join(ROOT, 'README.md'), 'utf8');
const files = readdirSync(FOLDER).sort();
const textOf = (file: string): string => readFileSync(join(FOLDER, file), 'utf8');

describe('the demo stages', () => {
  it.each(TOPOLOGIES)('show the topology %s', (topology) => {
    const shown = files.filter((file) => textOf(file).includes(`\ntopology: ${topology}\n`));
    expect(shown.length, `no file in catalog/stages has topology: ${topology}; add one`).toBeGreaterThan(0);
  });

  it('are YAML files and nothing else', () => {
    expect(files.filter((file) => !/^[a-z]+(?:-[a-z]+)*\.yaml$/u.test(file))).toEqual([]);
  });

  it.each(files)('%s starts with a comment that gives its reasons', (file) => {
    const comment = textOf(file).split('\n').findIndex((line) => !line.startsWith('#'));
    expect(comment, `catalog/stages/${file}: write what the stage does and why its numbers are what they are on top`).toBeGreaterThan(5);
  });

  it.each(files)('%s reads and builds without a problem', (file) => {
    const read = readStage(textOf(file), { file });
    if (!read.ok) return expect(read.problems).toEqual([]);
    const built = buildStage(read.spec);
    expect(built.ok ? [] : built.problems).toEqual([]);
  });

  it.each(files)('%s stands in the README', (file) => {
    const section = readme.split(/^## /mu).find((text) => text.startsWith('The stages that ship\n')) ?? '';
    expect(section, `README.md, "The stages that ship": name ${file}`).toContain(file);
  });
});
