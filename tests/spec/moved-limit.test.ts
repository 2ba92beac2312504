// Another value of the same limit reads the limits alone: what comes out must be what the whole reader answers.
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readStage, stageReader } from '../../src/spec/read.js';
import type { Override } from '../../src/spec/spec.js';
import { DEMO, option } from '../support/stage-file.js';

const FOLDER = join(import.meta.dirname, '../../catalog/stages');
const STAGES = [DEMO, ...readdirSync(FOLDER).map((name) => readFileSync(join(FOLDER, name), 'utf8'))];
const VALUES: readonly (readonly [path: string, texts: readonly string[]])[] = [
  ['limits.dcError', ['1 mV', '12.5mV', '0.02 V', '1 A', '-3 mV', '{a: 1}', '"5 mV"', 'max 5 mV', '']],
  ['limits.gainError', ['1 %', '0.2%', '±0.5 %', '140 %', '{magnitude: 1 %}']],
  ['limits.outputNoise', ['300 µVrms', '0.1 mVrms', '1 mV', '1 uVrms']],
  ['limits.snr', ['60 dB', '72 dB', '3']],
  ['limits.settling.within', ['20 µs', '1 ms', '0']],
  ['limits.supplyCurrent', ['80 µA', '1mA', '1 kA']],
  ['limits', ['{dcError: 3 mV}', '{supplyCurrent: 1 mA}']],
  ['supply', ['5 V', '3.3 V ± 5 %']],
];
const moved = fc.constantFrom(...VALUES).chain(([path, texts]) => fc.array(fc.constantFrom(...texts), { minLength: 2, maxLength: 5 }).map((some) => some.map((text) => option(path, text))));
const before = fc.array(fc.constantFrom(option('gain', '6'), option('limits.dcError', '7 mV'), option('limits.supplyCurrent', '2 mA')), { maxLength: 2 });

describe('a limit that moves', () => {
  it('is read as by a reader who saw nothing before, whatever was asked before', () => {
    fc.assert(
      fc.property(fc.constantFrom(...STAGES), before, fc.array(moved, { minLength: 1, maxLength: 3 }), (text, first, series) => {
        const read = stageReader(text);
        for (const last of series.flat()) {
          const overrides: readonly Override[] = [...first, last];
          expect(read(overrides)).toEqual(readStage(text, { overrides }));
        }
      }),
      { numRuns: 150 },
    );
  }, 60_000);

  it('leaves the rest of the spec as it was read, the same objects', () => {
    const read = stageReader(DEMO);
    const [one, other] = ['5 mV', '6 mV'].map((text) => read([option('limits.dcError', text)]));
    if (one?.ok !== true || other?.ok !== true) throw new Error('refused');
    expect(other.spec.limits.dcError).toEqual({ value: 0.006, text: '6 mV' });
    expect(other.spec.signal).toBe(one.spec.signal);
    const whole = read([option('supply', '5 V')]);
    expect(whole.ok && whole.spec.signal !== one.spec.signal).toBe(true);
  });
});
