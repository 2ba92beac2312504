import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changesFor, type Change, type Changes } from '../../src/explanation/index.js';
import { writtenValue } from '../../src/explanation/printed-value.js';
import type { Part } from '../../src/parts/part.js';
import { changeOptions } from '../../src/presentation/change-words.js';
import { demo, judgedOn, SHIPPED, type Demo } from '../support/trials.js';

const STAGES = [
  'bus-current', 'leaf-filter', 'leaf-wetness', 'light-meter', 'pump-current', 'reference-buffer', 'soil-moisture-probe', 'thermistor-bridge', 'valve-command',
  'vent-motor-control', 'vent-trim', 'vent-vibration-pickup', 'vibration-filter', 'water-meter', 'weather-mast',
];
const MAY_CHANGE = ['limits', 'gain', 'supply', 'signal', 'load', 'temperature', 'wishes', 'margins', 'reference', 'source.resistance', 'resistors', 'filter.corner', 'oscillator'];

/** Limits that bite, one field each. */
const override = fc.oneof(
  fc.integer({ min: 1, max: 3000 }).map((micro) => `limits.supplyCurrent=${micro} µA`),
  fc.integer({ min: 1, max: 200 }).map((milli) => `limits.dcError=${milli} mV`),
  fc.integer({ min: 1, max: 50 }).map((permille) => `limits.gainError=${permille / 10} %`),
  fc.integer({ min: 1, max: 500 }).map((hundred) => `signal.frequency=${hundred * 100} Hz`),
  fc.integer({ min: 0, max: 200 }).map((milli) => `limits.swingLoss=${milli} mV`),
  fc.integer({ min: 10, max: 900 }).map((micro) => `limits.outputNoise=${micro} µVrms`),
  fc.integer({ min: 35, max: 70 }).map((degree) => `limits.phaseMargin=${degree}°`),
  fc.integer({ min: 30, max: 90 }).map((decibel) => `limits.distortion=-${decibel} dB`),
  fc.integer({ min: 1, max: 200 }).map((cent) => `wishes.price=${cent / 100} EUR`),
  fc.integer({ min: 1, max: 30 }).map((tenth) => `margins.slewRate=${tenth / 10}`),
  fc.integer({ min: 1, max: 50 }).map((nano) => `load=${1000 * nano} Ω to ground, ${nano} nF`),
);
const named = fc.option(fc.subarray(MAY_CHANGE, { minLength: 1, maxLength: 4 }).map((paths) => `mayChange=[${paths.join(', ')}]`), { nil: null });
const asked = fc.record({
  name: fc.constantFrom(...STAGES),
  overrides: fc.uniqueArray(override, { maxLength: 3, selector: (one) => one.slice(0, one.indexOf('=')) }),
  mayChange: named,
  part: fc.nat(SHIPPED.length - 1),
});

/** Checks no input that may move usually brings round. */
const FIXED = /^(?:supply|input|temperature|output-current|slew|stable)/u;

/** From the drawn place on, the first part that is out for few checks, none of which stands on what is kept fixed. */
function partOn({ stage }: Demo, at: number, most: number): Part | undefined {
  const turned = [...SHIPPED.slice(at), ...SHIPPED.slice(0, at)].slice(0, 12);
  return turned.find((part) => {
    const missed = judgedOn(stage, part).verdicts.filter(({ outcome }) => outcome !== 'pass');
    return missed.length > 0 && missed.length <= most && !missed.some(({ check }) => FIXED.test(check));
  });
}

function changes(made: Demo, part: Part): Changes {
  return changesFor({ stage: made.stage, part, parts: SHIPPED, strict: false }, made.changing);
}

/** The words after `--set`, as a shell hands them over. */
const typed = (change: Pick<Change, 'moves'>): string[] => changeOptions(change).filter((word) => word !== '--set');

describe('what would let it in', () => {
  it('makes the part fit when it is pasted back, whatever the stage and the part', () => {
    let told = 0;
    fc.assert(
      fc.property(asked, ({ name, overrides, mayChange, part: at }) => {
        const made = demo(name, [...overrides, ...(mayChange === null ? [] : [mayChange])]);
        const part = made === null ? undefined : partOn(made, at, 3);
        fc.pre(made !== null && part !== undefined);
        for (const change of changes(made, part).options) {
          const stage = made.again(typed(change));
          expect(stage, typed(change).join(' ')).not.toBeNull();
          expect(judgedOn(stage!, part).outcome, typed(change).join(' ')).toBe('fits');
          told += 1;
        }
      }),
      { numRuns: 60 },
    );
    expect(told).toBeGreaterThan(5);
  }, 300_000);

  it('turns within a millionth of its boundary, and prints within a hundredth of it on the safe side', () => {
    let told = 0;
    fc.assert(
      fc.property(asked, ({ name, overrides, mayChange, part: at }) => {
        const made = demo(name, [...overrides, ...(mayChange === null ? [] : [mayChange])]);
        const part = made === null ? undefined : partOn(made, at, 1);
        fc.pre(made !== null && part !== undefined);
        for (const { moves } of changes(made, part).options) {
          const [move] = moves;
          const input = made.changing.inputs.find(({ path }) => path === move?.path);
          if (moves.length !== 1 || move?.boundary == null || move.value === null || input?.form !== 'value') continue;
          const { boundary, value } = move;
          const safe = move.direction === 'up' ? 1 : -1;
          expect(safe * (value - boundary)).toBeGreaterThanOrEqual(-1e-12 * Math.abs(boundary));
          expect(Math.abs(value - boundary)).toBeLessThanOrEqual(0.01 * Math.abs(boundary) * (1 + 1e-9));
          const outcomeAt = (at: number): string => {
            const stage = made.again([`${move.path}=${input.before ?? ''}${writtenValue(at, input.unit, { digits: 17 })}`]);
            return stage === null ? 'refused' : judgedOn(stage, part).outcome;
          };
          expect(outcomeAt(boundary * (1 + safe * 1e-6)), `${move.path} beyond ${boundary}`).toBe('fits');
          expect(outcomeAt(boundary * (1 - safe * 1e-6)), `${move.path} short of ${boundary}`).not.toBe('fits');
          told += 1;
        }
      }),
      { numRuns: 60 },
    );
    expect(told).toBeGreaterThan(2);
  }, 300_000);

  it('touches nothing but what may change', () => {
    const made = demo('soil-moisture-probe', ['mayChange=[limits.dcError, signal.frequency]', 'limits.dcError=5 mV'])!;
    const touched = SHIPPED.filter((_, at) => at % 8 === 0).flatMap((part) => changes(made, part).options).filter(({ design }) => design === null).flatMap(({ moves }) => moves.map(({ path }) => path));
    expect([...new Set(touched)].sort()).toEqual(['limits.dcError', 'signal.frequency']);
  }, 60_000);

  it('leaves supply, signal, load, temperature and approval alone unless they are named', () => {
    const made = demo('light-meter', ['limits.supplyCurrent=20 µA'])!;
    const all = SHIPPED.filter((_, at) => at % 8 === 0).flatMap((part) => changes(made, part).options).filter(({ design }) => design === null).flatMap(({ moves }) => moves.map(({ path }) => path));
    expect(all.length).toBeGreaterThan(0);
    expect(all.filter((path) => !/^(?:limits\.|wishes\.price|wishes\.package)/u.test(path))).toEqual([]);
  }, 60_000);

  it('tells only sets of which no part suffices', () => {
    const made = demo('light-meter', ['limits.supplyCurrent=20 µA', 'limits.dcError=2 mV'])!;
    for (const part of SHIPPED.filter((_, at) => at % 8 === 0)) {
      for (const { moves } of changes(made, part).options.filter((option) => option.moves.length > 1)) {
        for (const left of moves) {
          const stage = made.again(typed({ moves: moves.filter((one) => one !== left) }))!;
          expect(judgedOn(stage, part).outcome).not.toBe('fits');
        }
      }
    }
  }, 60_000);

  it('says nothing of a part that fits', () => {
    const made = demo('light-meter')!;
    const fits = SHIPPED.find((part) => judgedOn(made.stage, part).outcome === 'fits')!;
    expect(changes(made, fits).options).toEqual([]);
  });
});
