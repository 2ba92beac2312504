import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readList } from '../../src/intake/read-list.js';
import { writeList } from '../../src/intake/write-list.js';
import type { Figure, LimitKind, Parameter } from '../../src/parts/figures.js';
import { conditionKey } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';

// The approved list of the demo is invented. What can be checked: it is read without a question, an amplifier could have
// such figures (the relations of the generic sets, as far as a figure is known), and it is as ordinary as it says it is.

const generic = readList(readFileSync(new URL('../../catalog/generic.csv', import.meta.url)), { file: 'generic.csv', tier: 'generic' });
if (!generic.ok) throw new Error(generic.problems.map(({ message }) => message).join('\n'));
const sets = generic.parts;
const text = readFileSync(new URL('../../catalog/demo-approved.csv', import.meta.url), 'utf8');
const list = readList(new TextEncoder().encode(text), {
  file: 'demo-approved.csv',
  tier: 'approved',
  genericIds: new Set(sets.map(({ id }) => id)),
  classes: new Set(sets.flatMap((set) => set.class ?? [])),
});
if (!list.ok) throw new Error(list.problems.map(({ message }) => message).join('\n'));
const parts = list.parts;

/** Elementary charge over Boltzmann constant: exact since 2019 (SI Brochure, 9th edition). */
const THERMAL_VOLTAGE = (1.380649e-23 * 298.15) / 1.602176634e-19;
const RAILS = ['outputLowHeadroom', 'outputHighHeadroom'] as const;

const figures = (part: Part, parameter: Parameter, kind?: LimitKind): Figure[] =>
  part.figures.filter((figure) => figure.parameter === parameter && (kind === undefined || figure.kind === kind));

const value = (part: Part, parameter: Parameter, kind: LimitKind): number | null => figures(part, parameter, kind)[0]?.value ?? null;

const lacking = (parameter: Parameter, kind?: LimitKind): string[] => parts.filter((part) => figures(part, parameter, kind).length === 0).map(({ id }) => id);

describe('catalog/demo-approved.csv', () => {
  it('is read without a fault, a warning or a column kept as mere text', () => {
    expect(list.warnings).toEqual([]);
    expect(list.columns.filter(({ reading }) => reading.kind === 'text')).toEqual([]);
    expect(parts.map(({ id }) => id)).toEqual(Array.from({ length: 20 }, (_, at) => `GH-AMP-${String(at + 1).padStart(2, '0')}`));
  });

  it('is what parts --csv would write', () => {
    expect(writeList(parts)).toBe(text);
  });

  it('has words of every kind: status, lifecycle, families, packages', () => {
    expect(new Set(parts.map((part) => part.status))).toEqual(new Set(['approved', 'conditional', 'restricted']));
    expect(new Set(parts.map((part) => part.lifecycle))).toEqual(new Set(['active', 'nrnd', 'preliminary', 'last-time-buy']));
    const families = new Set(parts.flatMap((part) => part.family ?? []));
    for (const family of families) expect(parts.filter((part) => part.family === family).length, family).toBeGreaterThan(1);
    expect(families.size).toBe(2);
    expect(parts.filter((part) => part.class === null).map(({ id }) => id)).toEqual(['GH-AMP-05', 'GH-AMP-20']);
  });

  it('is as ordinary as real lists: typical figures, one swing, empty cells', () => {
    for (const part of parts) for (const rail of RAILS) expect(figures(part, rail), `${part.id} ${rail}`).toHaveLength(1);
    expect(parts.length - lacking('outputHighHeadroom', 'max').length).toBe(4);
    expect(parts.length - lacking('gainBandwidth', 'min').length).toBe(2);
    expect(parts.length - lacking('slewRate', 'min').length).toBe(3);
    expect(lacking('temperature')).toEqual(['GH-AMP-12', 'GH-AMP-16', 'GH-AMP-20']);
    expect(lacking('offsetDrift')).toEqual(['GH-AMP-05', 'GH-AMP-06', 'GH-AMP-13', 'GH-AMP-19']);
    expect(lacking('quiescentCurrent', 'max')).toEqual(['GH-AMP-04', 'GH-AMP-13', 'GH-AMP-14']);
    expect(lacking('offsetCurrent', 'max').length).toBeGreaterThan(parts.length / 2);
  });
});

describe.each(parts.map((part) => [part.id, part] as const))('%s', (_, part) => {
  it('steers its input pair with a voltage transistors have', () => {
    // SR/(2π·GBW): Solomon, "The monolithic op amp: a tutorial study", IEEE JSSC 9(6), 1974 (from memory).
    const steering = (value(part, 'slewRate', 'typ') ?? Number.NaN) / (2 * Math.PI * (value(part, 'gainBandwidth', 'typ') ?? Number.NaN));
    expect(steering).toBeGreaterThan(part.inputType === 'bipolar' ? 2 * THERMAL_VOLTAGE : 0.02);
    expect(steering).toBeLessThan(4);
  });

  it('buys its bandwidth with current: 0.5 to 100 MHz per mA', () => {
    // Common practice.
    const current = value(part, 'quiescentCurrent', 'typ') ?? value(part, 'quiescentCurrent', 'max') ?? Number.NaN;
    const perAmpere = (value(part, 'gainBandwidth', 'typ') ?? Number.NaN) / current;
    expect(perAmpere).toBeGreaterThan(0.5e9);
    expect(perAmpere).toBeLessThan(100e9);
  });

  it('has the input current of its input type, and rejects 60 to 120 dB', () => {
    // Common practice.
    for (const { value: bias } of figures(part, 'biasCurrent')) {
      if (part.inputType === 'fet') expect(bias).toBeLessThan(1e-9);
      else expect(bias).toBeGreaterThan(1e-9);
    }
    for (const { value: ratio } of [...figures(part, 'commonModeRejection'), ...figures(part, 'supplyRejection')]) {
      expect(20 * Math.log10(ratio)).toBeGreaterThanOrEqual(60);
      expect(20 * Math.log10(ratio)).toBeLessThanOrEqual(120);
    }
  });

  it('swings at a supply it works on, the low side no worse than the high side', () => {
    // Common practice: the n-type device at the bottom is the stronger one.
    const [low, high] = RAILS.map((rail) => figures(part, rail)[0]);
    expect(low?.condition.load).toBeDefined();
    expect(conditionKey(low?.condition ?? {})).toBe(conditionKey(high?.condition ?? {}));
    expect(low?.value).toBeLessThanOrEqual(high?.value ?? Number.NaN);
    expect(low?.condition.supply ?? 5).toBeGreaterThanOrEqual(value(part, 'supplyVoltage', 'min') ?? Number.NaN);
    expect(low?.condition.supply ?? 5).toBeLessThanOrEqual(value(part, 'supplyVoltage', 'max') ?? Number.NaN);
    expect(value(part, 'supplyAbsoluteMaximum', 'max') ?? Infinity).toBeGreaterThan(value(part, 'supplyVoltage', 'max') ?? Number.NaN);
  });

  it('short-circuits at 1.5 to 4 times what it guarantees, where both are known', () => {
    // Common practice.
    const [short, guaranteed] = [value(part, 'shortCircuitCurrent', 'typ'), value(part, 'outputCurrent', 'min')];
    if (short === null || guaranteed === null) return expect(lacking('outputCurrent').concat(lacking('shortCircuitCurrent'))).toContain(part.id);
    expect(short / guaranteed).toBeGreaterThanOrEqual(1.5);
    expect(short / guaranteed).toBeLessThanOrEqual(4);
  });

  it('comes in a package that has room for its channels', () => {
    // Package outlines: JEDEC MO-178 and MO-203 have five pins, MS-012 AA and MO-187 eight, MO-153 AB fourteen (from memory).
    const pins = Number(/-(\d+)(?:-EP)?$/.exec(part.package ?? '')?.[1]);
    expect(pins).toBeGreaterThanOrEqual(3 * (part.channels ?? Number.NaN) + 2);
  });

  it('is no generic set multiplied by something, and no other part of the list', () => {
    const others = [...sets, ...parts.filter((other) => other.id > part.id && (other.family === null || other.family !== part.family))];
    for (const other of others) {
      const ratios = COMPARED.flatMap(([parameter, kind]) => {
        const [mine, theirs] = [value(part, parameter, kind), value(other, parameter, kind)];
        return mine === null || theirs === null ? [] : [mine / theirs];
      });
      expect(ratios.length, other.id).toBeGreaterThanOrEqual(3);
      expect(Math.max(...ratios) / Math.min(...ratios), other.id).toBeGreaterThan(1.1);
    }
  });
});

const COMPARED = [
  ['gainBandwidth', 'typ'], ['slewRate', 'typ'], ['quiescentCurrent', 'typ'], ['quiescentCurrent', 'max'], ['offsetVoltage', 'max'], ['voltageNoise', 'typ'],
] as const;
