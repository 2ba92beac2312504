import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { asciiText } from '../../src/quantities/ascii.js';
import { draftKeysOf, type DraftField } from '../../src/spec/draft-fields.js';
import { draftFile } from '../../src/spec/draft-file.js';
import { DRAFTS, sceneOf } from '../../src/spec/draft-scenes.js';
import { readStage } from '../../src/spec/read.js';
import { scalarText } from '../../src/spec/scalar-text.js';
import { FIELDS } from '../../src/spec/schema.js';
import { BUILT_TOPOLOGIES, type StageSpec } from '../../src/spec/spec.js';
import { buildStage } from '../../src/stage/index.js';
import { printed } from '../support/stage-file.js';

/** Everything wrong with a text, from reading it to deriving the circuit. */
function faultsOf(text: string): string[] {
  const read = readStage(text, { file: 'stage.yaml' });
  if (!read.ok) return read.problems.map(printed);
  const built = buildStage(read.spec);
  return built.ok ? [] : built.problems.map(printed);
}

function specOf(text: string): StageSpec {
  const read = readStage(text);
  if (!read.ok) throw new Error(read.problems.map(printed).join('\n'));
  return read.spec;
}

/** A field that is left out: # directly before its key. */
const LEFT_OUT = /^( *)#(?=\w+:)/u;

function leftOut(text: string): { key: string; at: number }[] {
  return text.split('\n').flatMap((line, at) => (LEFT_OUT.test(line) ? [{ key: /#(\w+):/u.exec(line)?.[1] ?? '', at }] : []));
}

function taken(text: string, at: number): string {
  return text.split('\n').map((line, index) => (index === at ? line.replace(LEFT_OUT, '$1') : line)).join('\n');
}

const CASES = DRAFTS.map(({ topology, coupling }) => ({ topology, coupling, text: draftFile({ topology, coupling }) }));
const LINES = CASES.flatMap(({ topology, coupling, text }) => leftOut(text).map(({ key, at }) => ({ topology, coupling, key, at, text })));

describe('a draft', () => {
  it('there is one of every topology that is built, and with AC coupling of all but the difference stage', () => {
    expect(DRAFTS.filter(({ coupling }) => coupling === 'dc').map(({ topology }) => topology)).toEqual([...BUILT_TOPOLOGIES]);
    expect(DRAFTS.filter(({ coupling }) => coupling === 'ac').map(({ topology }) => topology)).toEqual(['follower', 'non-inverting', 'inverting']);
    expect(() => draftFile({ topology: 'difference', coupling: 'ac' })).toThrow(RangeError);
  });

  it.each(CASES)('$topology, $coupling, reads back as it is and asks for no default of what is live', ({ topology, coupling, text }) => {
    expect(faultsOf(text)).toEqual([]);
    const { positions } = specOf(text);
    const written = Object.keys(positions).filter((path) => !['signal', 'resistors', 'limits', 'wishes', 'margins'].includes(path) && !path.startsWith('reference.'));
    expect(new Set(written)).toEqual(new Set(Object.keys(sceneOf(topology, coupling)?.live ?? {})));
  });

  it.each(LINES)('$topology, $coupling: $key reads when it alone is taken', ({ text, at, key }) => {
    const more = taken(text, at);
    expect(faultsOf(more)).toEqual([]);
    // It is a field of its own now, not a comment that YAML still skips.
    const before = Object.keys(specOf(text).positions);
    const added = Object.keys(specOf(more).positions).filter((path) => !before.includes(path));
    expect(added.some((path) => path.split('.').includes(key)), added.join()).toBe(true);
  });

  it.each(CASES)('$topology, $coupling, names every field that this stage may have, once', ({ topology, coupling, text }) => {
    const scene = sceneOf(topology, coupling);
    const told = pathsOf(draftKeysOf({ topology, coupling, live: new Map(Object.entries(scene?.live ?? {})), examples: scene?.examples ?? {} }));
    expect(FIELDS.filter(({ path }) => !told.includes(path)).map(({ path }) => path)).toEqual(FOREIGN[`${topology} ${coupling}`]);
    expect(new Set(told).size).toBe(told.length);
    const unsaid = told.filter((path) => !text.includes(`${path.slice(path.lastIndexOf('.') + 1)}:`));
    expect(unsaid).toEqual([]);
  });

  it.each(CASES)('$topology, $coupling, in ASCII reads back the same', ({ text }) => {
    const ascii = asciiText(text);
    expect(ascii).toMatch(/^\p{ASCII}*$/u);
    expect(faultsOf(ascii)).toEqual([]);
    expect(withoutPlaces(specOf(ascii))).toEqual(withoutPlaces(specOf(text)));
  });

  it.each(CASES)('$topology, $coupling, fits a screen and wears its signs plainly', ({ text }) => {
    const lines = text.split('\n');
    expect(Math.max(...lines.filter((line) => /^ *# /u.test(line)).map((line) => line.length))).toBeLessThanOrEqual(100);
    expect(text).not.toContain('−');
    expect(text.endsWith('\n')).toBe(true);
    expect(lines.filter((line) => line !== line.trimEnd())).toEqual([]);
  });
});

/** Every field a draft writes or tells, by path. */
function pathsOf(fields: readonly DraftField[]): string[] {
  return fields.flatMap((one) => {
    if (one.kind === 'instead') return one.rows.map(({ path }) => path);
    return one.kind === 'block' ? [one.row.path, ...pathsOf(one.fields)] : [one.row.path, ...one.parts.map(({ path }) => path)];
  });
}

const SECOND = ['signal.positive', 'signal.negative', 'signal.differential', 'signal.commonMode'];
const DIFFERENCE_RESISTORS = ['resistors.positiveInput', 'resistors.toReference'];
const RESISTORS = ['resistors', 'resistors.feedback', 'resistors.input', ...DIFFERENCE_RESISTORS, 'resistors.tolerance'];
const FOREIGN: Readonly<Record<string, readonly string[]>> = {
  'follower dc': [...RESISTORS, ...SECOND],
  'follower ac': [...RESISTORS, 'signal.input', 'signal.center', ...SECOND],
  'non-inverting dc': [...DIFFERENCE_RESISTORS, ...SECOND],
  'non-inverting ac': [...DIFFERENCE_RESISTORS, 'signal.input', 'signal.center', ...SECOND],
  'inverting dc': [...DIFFERENCE_RESISTORS, ...SECOND],
  'inverting ac': [...DIFFERENCE_RESISTORS, 'signal.input', 'signal.center', ...SECOND],
  'difference dc': ['signal.input', 'signal.amplitude', 'signal.center'],
};

/** What was typed differs in spelling, and so do columns. */
function withoutPlaces(spec: StageSpec): unknown {
  return JSON.parse(JSON.stringify({ ...spec, positions: null }, (key, value: unknown) => (key === 'text' || key === 'notes' ? null : value)));
}

describe('a draft with answers', () => {
  const values = new Map([['topology', 'inverting'], ['supply', '5 V +/- 5 %'], ['signal.coupling', 'dc'], ['signal.input', '1..2 V'], ['signal.output', '1..4 V'], ['load', '2 kΩ to ground, 100 pF'], ['name', 'Pump: left, #2']]);
  const text = draftFile({ topology: 'inverting', coupling: 'dc', values });

  it('holds each as it was typed, and nothing of the example', () => {
    expect(faultsOf(text)).toEqual([]);
    const spec = specOf(text);
    expect(spec).toMatchObject({ name: 'Pump: left, #2', topology: 'inverting', load: { resistance: { value: 2000 }, to: 'ground', capacitance: { value: 1e-10 } } });
    expect(spec.supply.max).toBeCloseTo(5.25, 12);
    expect(spec.gain).toBeUndefined();
    expect(spec.reference).toBeUndefined();
    expect(text).toContain('supply: 5 V +/- 5 %\n');
    expect(text).not.toContain('Vent-motor control of');
  });

  it('tells the gain as another way to say the output', () => {
    expect(leftOut(text).map(({ key }) => key)).not.toContain('gain');
    expect(text).toContain('# In place of signal.output, gain: 8 ');
  });

  it('holds any name as it was typed', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', minLength: 1 }).map((name) => name.trim()), (name) => {
        fc.pre(name !== '' && !/^[[{"']/u.test(name) && !/[\p{Cc}\p{Cs}]/u.test(name));
        const named = draftFile({ topology: 'follower', coupling: 'dc', values: new Map([['name', name], ['topology', 'follower'], ['supply', '5 V'], ['signal.input', '1..2 V']]) });
        expect(specOf(named).name).toBe(name);
      }),
    );
  });
});

describe('a text as a value', () => {
  it.each([
    ['-20..60 °C', '-20..60 °C'],
    ['8', '8'],
    ['10 kΩ to ground, 100 pF', '10 kΩ to ground, 100 pF'],
    ['{resistance: 10 kΩ, to: ground}', '{resistance: 10 kΩ, to: ground}'],
    ['>5 mV', '">5 mV"'],
    ['a: b', '"a: b"'],
    ['a #b', '"a #b"'],
    ['- 5', '"- 5"'],
    ['null', '"null"'],
    ['say "no"', 'say "no"'],
  ])('%s is written %s', (typed, written) => {
    expect(scalarText(typed)).toBe(written);
  });
});
