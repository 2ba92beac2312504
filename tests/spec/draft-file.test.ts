import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { asciiText } from '../../src/quantities/ascii.js';
import { draftKeysOf, type DraftField } from '../../src/spec/draft-fields.js';
import { draftFile } from '../../src/spec/draft-file.js';
import { DRAFTS, sceneOf } from '../../src/spec/draft-scenes.js';
import { readStage } from '../../src/spec/read.js';
import { scalarText } from '../../src/spec/scalar-text.js';
import { FIELDS } from '../../src/spec/schema.js';
import { TOPOLOGIES, type StageSpec } from '../../src/spec/spec.js';
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
  it('there is one of every topology, and with AC coupling of all that a voltage feeds through one input or through legs', () => {
    expect(DRAFTS.filter(({ coupling }) => coupling === 'dc').map(({ topology }) => topology)).toEqual([...TOPOLOGIES]);
    expect(DRAFTS.filter(({ coupling }) => coupling === 'ac').map(({ topology }) => topology)).toEqual([
      'follower', 'non-inverting', 'inverting', 'summing', 'sallen-key-low-pass', 'multiple-feedback-low-pass', 'integrator',
    ]);
    expect(() => draftFile({ topology: 'difference', coupling: 'ac' })).toThrow(RangeError);
  });

  it.each(CASES)('$topology, $coupling, reads back as it is and asks for no default of what is live', ({ topology, coupling, text }) => {
    expect(faultsOf(text)).toEqual([]);
    const { positions } = specOf(text);
    const live = Object.keys(sceneOf(topology, coupling)?.live ?? {});
    const isInside = (path: string): boolean => live.some((one) => path.startsWith(`${one}.`));
    const written = Object.keys(positions).filter((path) => !['signal', 'resistors', 'capacitors', 'limits', 'wishes', 'margins'].includes(path) && !isInside(path));
    expect(new Set(written)).toEqual(new Set(live));
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
    expect(FIELDS.filter(({ path }) => !told.includes(path)).map(({ path }) => path)).toEqual(FIELDS.map(({ path }) => path).filter((path) => isForeign(path, { topology, coupling })));
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
    if (one.kind === 'told') return one.rows.map(({ path }) => path);
    return one.kind === 'block' ? [one.row.path, ...pathsOf(one.fields)] : [one.row.path, ...one.parts.map(({ path }) => path)];
  });
}

/** What the reader refuses with S108 at its own place, in a stage of the scene where nothing else stands in its way. */
function isForeign(path: string, { topology, coupling }: (typeof DRAFTS)[number]): boolean {
  const scene = sceneOf(topology, coupling);
  if (scene === null || path in scene.live) return false;
  const { without, with: more, text } = { ...ALONE, ...OWN_WAY[path] };
  const own = path.replace('NAME', 'pump');
  const row = FIELDS.find((one) => one.path === path);
  const value = text ?? (row?.shape === 'map' && path in OPEN_MAPS ? '{}' : (row?.example ?? ''));
  // An oscillator has no signal, so nothing of a signal goes with anything.
  const company = topology === 'relaxation-oscillator' ? {} : more;
  const live = Object.entries({ ...scene.live, ...company }).filter(([one]) => !without.includes(one));
  const read = readStage(null, { overrides: [...live, [own, value]].map(([at = '', typed = '']) => ({ path: at, text: typed, option: at })) });
  return !read.ok && read.problems.some(({ code, place }) => code === 'S108' && place?.path === own);
}

interface OwnWay {
  readonly without: readonly string[];
  readonly with: Readonly<Record<string, string>>;
  readonly text?: string;
}

const ALONE: OwnWay = { without: [], with: {} };
const OPEN_MAPS: Readonly<Record<string, true>> = { resistors: true, capacitors: true, signal: true, limits: true };
const AS_FITTED: OwnWay = { without: ['filter'], with: {} };
/** Fields that stand in place of another one, or go with one. */
const OWN_WAY: Readonly<Record<string, OwnWay>> = {
  'signal.edge': { without: [], with: { 'signal.shape': 'step' } },
  'signal.duty': { without: [], with: { 'signal.shape': 'pulse' } },
  'signal.amplitude': { without: ['signal.input'], with: { 'signal.center': '1 V' } },
  'signal.center': { without: ['signal.input'], with: { 'signal.amplitude': '1 Vpk' } },
  'legs.NAME': { without: ['legs'], with: {}, text: '{gain: 0.3}' },
  'legs.NAME.gain': { without: ['legs'], with: {} },
  'filter.r1': AS_FITTED, 'filter.r2': AS_FITTED, 'filter.r3': AS_FITTED, 'filter.c1': AS_FITTED, 'filter.c2': AS_FITTED,
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
      { examples: [['−'], ['Level −2']] },
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
