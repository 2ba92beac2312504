import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readList } from '../../src/intake/read-list.js';
import type { Figure, LimitKind, Parameter } from '../../src/parts/figures.js';
import { conditionKey, PARAMETERS } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';

// The generic sets are invented; what can be checked is that an amplifier could have such figures. Every relation below
// names its source, or says that it is common practice.

const list = readList(readFileSync(new URL('../../catalog/generic.csv', import.meta.url)), { file: 'generic.csv', tier: 'generic' });
if (!list.ok) throw new Error(list.problems.map(({ message }) => message).join('\n'));
const sets = list.parts;

/** Elementary charge over Boltzmann constant: exact since 2019 (SI Brochure, 9th edition). */
const CHARGE = 1.602176634e-19;
const BOLTZMANN = 1.380649e-23;

function figures(part: Part, parameter: Parameter, kind?: LimitKind): Figure[] {
  return part.figures.filter((figure) => figure.parameter === parameter && (kind === undefined || figure.kind === kind));
}

/** The only figure of that kind, or the one at `celsius`; null when the cell is empty. */
function value(part: Part, parameter: Parameter, kind: LimitKind, celsius?: number): number | null {
  const found = figures(part, parameter, kind).filter(({ condition }) => celsius === undefined || condition.temperature === celsius);
  if (found.length > 1) throw new Error(`${part.id}: ${parameter} ${kind} stands under several conditions`);
  return found[0]?.value ?? null;
}

function known(part: Part, parameter: Parameter, kind: LimitKind, celsius?: number): number {
  const found = value(part, parameter, kind, celsius);
  if (found === null) throw new Error(`${part.id}: ${parameter} ${kind} is missing`);
  return found;
}

const decibel = (ratio: number): number => 20 * Math.log10(ratio);
const RAILS = ['outputLowHeadroom', 'outputHighHeadroom'] as const;

/** Current of a swing row, A: printed, or through its resistance to mid-supply at the rated supply. */
function rowCurrent({ condition, value: headroom }: Figure): number {
  const { load, supply } = condition;
  if (load === undefined || supply === undefined) throw new Error('a swing row without load or supply');
  if (load.kind === 'current') return load.amperes;
  if (load.to !== 'mid-supply') throw new Error('a generic swing row is loaded to mid-supply');
  return (supply / 2 - headroom) / load.ohms;
}

const lightRow = (part: Part, rail: Parameter, supply: number): number | undefined =>
  figures(part, rail).find(({ condition }) => condition.load?.kind === 'resistance' && condition.supply === supply)?.value;

const ratedSupplies = (part: Part): number[] => [...new Set(RAILS.flatMap((rail) => figures(part, rail).map(({ condition }) => condition.supply ?? 0)))];

describe('the file', () => {
  it('is read without a fault, a warning or a column kept as mere text', () => {
    expect(list.warnings).toEqual([]);
    expect(list.columns.filter(({ reading }) => reading.kind === 'text')).toEqual([]);
  });

  it('holds 24 sets of 24 classes, ids of our own', () => {
    expect(sets).toHaveLength(24);
    expect(new Set(sets.map(({ id }) => id)).size).toBe(24);
    expect(new Set(sets.map((part) => part.class)).size).toBe(24);
    for (const part of sets) {
      expect(part.id).toMatch(/^GX(-[A-Z0-9]+)+$/);
      expect(part.class).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
    }
  });

  it('gives a class no status, lifecycle or family: it is nothing to order', () => {
    for (const part of sets) expect([part.tier, part.status, part.lifecycle, part.family], part.id).toEqual(['generic', null, null, null]);
  });

  it('has no column that no set uses', () => {
    const used = new Set(sets.flatMap((part) => part.figures.map((figure) => `${figure.parameter} ${figure.kind} ${conditionKey(figure.condition)}`)));
    const unused = list.columns.filter(({ reading }) => reading.kind === 'figure' && !used.has(`${reading.parameter} ${reading.limit} ${conditionKey(reading.condition)}`));
    expect(unused.map(({ header }) => header)).toEqual([]);
  });
});

describe.each(sets.map((part) => [part.id, part] as const))('%s', (_, part) => {
  it('has the figures without which hardly a stage can be judged', () => {
    const needed = [
      ['supplyVoltage', 'min'], ['supplyVoltage', 'max'], ['supplyAbsoluteMaximum', 'max'], ['inputLowHeadroom', 'max'],
      ['inputHighHeadroom', 'max'], ['slewRate', 'typ'], ['gainBandwidth', 'typ'], ['minimumStableGain', 'max'],
      ['offsetVoltage', 'max'], ['quiescentCurrent', 'max'], ['temperature', 'min'], ['temperature', 'max'],
    ] as const;
    for (const [parameter, kind] of needed) expect(value(part, parameter, kind), `${parameter} ${kind}`).not.toBeNull();
    for (const rail of RAILS) expect(figures(part, rail, 'max').length, rail).toBeGreaterThanOrEqual(2);
    expect(part.inputType).not.toBeNull();
    expect(part.price?.amount).toBeGreaterThan(0);
  });

  it('keeps min ≤ typ ≤ max under equal conditions', () => {
    const order: readonly LimitKind[] = ['min', 'typ', 'max'];
    for (const figure of part.figures) {
      const later = part.figures.filter(
        (other) => other.parameter === figure.parameter && conditionKey(other.condition) === conditionKey(figure.condition) && order.indexOf(other.kind) > order.indexOf(figure.kind),
      );
      for (const other of later) expect(figure.value, figure.parameter).toBeLessThanOrEqual(other.value);
    }
  });

  it('steers its input pair with a voltage transistors have', () => {
    // SR/(2π·GBW): Solomon, "The monolithic op amp: a tutorial study", IEEE JSSC 9(6), 1974 (from memory).
    // An undegenerated bipolar pair needs 2kT/q, every other one more; the range is common practice.
    const steering = known(part, 'slewRate', 'typ') / (2 * Math.PI * known(part, 'gainBandwidth', 'typ'));
    expect(steering).toBeGreaterThan(0.02);
    expect(steering).toBeLessThan(4);
    if (part.inputType === 'bipolar') expect(steering).toBeGreaterThan((2 * BOLTZMANN * 298.15) / CHARGE);
  });

  it('buys its bandwidth with current: 0.5 to 100 MHz per mA', () => {
    // Common practice.
    const perAmpere = known(part, 'gainBandwidth', 'typ') / known(part, 'quiescentCurrent', 'typ');
    expect(perAmpere).toBeGreaterThan(0.5e9);
    expect(perAmpere).toBeLessThan(100e9);
  });

  it('has the input current of its input type', () => {
    // Common practice: at 25 °C gates leak (or, chopped, are charged) with less than 1 nA, bases take more.
    const bias = known(part, 'biasCurrent', 'max', 25);
    if (part.inputType === 'fet') expect(bias).toBeLessThan(1e-9);
    else expect(bias).toBeGreaterThan(1e-9);
    for (const hot of figures(part, 'biasCurrent', 'max')) {
      if (hot.condition.temperature !== 25) expect(hot.value).toBeGreaterThan(bias);
    }
    const difference = value(part, 'offsetCurrent', 'max');
    if (difference !== null) expect(difference).toBeLessThan(bias);
  });

  it('rejects 60 to 120 dB', () => {
    // Common practice. The file keeps either the limit or the typical figure.
    for (const parameter of ['commonModeRejection', 'supplyRejection'] as const) {
      const stated = figures(part, parameter);
      expect(stated, parameter).toHaveLength(1);
      for (const { value: ratio } of stated) {
        expect(decibel(ratio)).toBeGreaterThan(59.99);
        expect(decibel(ratio)).toBeLessThan(120.01);
      }
    }
  });

  it('loses more at a rail when more current flows, and no less at the high side', () => {
    // Common practice: on-resistance or saturation grows with current; the n-type device at the bottom is the stronger one.
    for (const rail of RAILS) {
      for (const supply of ratedSupplies(part)) {
        const rows = figures(part, rail).filter(({ condition }) => condition.supply === supply).sort((a, b) => rowCurrent(a) - rowCurrent(b));
        expect(rows.length, `${rail} at ${supply} V`).toBeGreaterThanOrEqual(2);
        const losses = rows.map(({ value: loss }) => loss);
        expect(losses, `${rail} at ${supply} V`).toEqual([...losses].sort((a, b) => a - b));
      }
    }
    for (const low of figures(part, 'outputLowHeadroom')) {
      const high = figures(part, 'outputHighHeadroom').find(({ condition }) => conditionKey(condition) === conditionKey(low.condition));
      if (high !== undefined) expect(low.value).toBeLessThanOrEqual(high.value);
    }
  });

  it('is rated at supplies it works on, and survives them', () => {
    for (const supply of ratedSupplies(part)) {
      expect(supply).toBeGreaterThanOrEqual(known(part, 'supplyVoltage', 'min'));
      expect(supply).toBeLessThanOrEqual(known(part, 'supplyVoltage', 'max'));
    }
    expect(known(part, 'supplyAbsoluteMaximum', 'max')).toBeGreaterThan(known(part, 'supplyVoltage', 'max'));
  });

  it('short-circuits at 1.5 to 4 times what it guarantees', () => {
    // Common practice.
    const ratio = known(part, 'shortCircuitCurrent', 'typ') / known(part, 'outputCurrent', 'min');
    expect(ratio).toBeGreaterThanOrEqual(1.5);
    expect(ratio).toBeLessThanOrEqual(4);
  });

  it('crosses unity where its margin says', () => {
    // One dominant and one further pole: crossover = GBW · sin(margin) (Franco, Design with Operational Amplifiers and
    // Analog Integrated Circuits, 3rd ed., ch. 8, from memory of the chapter; the closed form is derived from the two poles).
    const margin = value(part, 'phaseMargin', 'typ');
    const crossover = value(part, 'unityCrossover', 'typ');
    if (known(part, 'minimumStableGain', 'max') > 1) return expect([margin, crossover]).toEqual([null, null]);
    if (margin === null || crossover === null) throw new Error(`${part.id}: margin or crossover missing`);
    const expected = known(part, 'gainBandwidth', 'typ') * Math.sin((margin * Math.PI) / 180);
    expect(crossover / expected).toBeGreaterThan(0.96);
    expect(crossover / expected).toBeLessThan(1.04);
  });

  it('hands over between input pairs only where two pairs reach both rails', () => {
    const [nearer, farther] = [value(part, 'inputCrossover', 'min'), value(part, 'inputCrossover', 'max')];
    if (nearer === null || farther === null) return expect([nearer, farther]).toEqual([null, null]);
    expect(nearer).toBeLessThan(farther);
    expect(known(part, 'inputHighHeadroom', 'max')).toBeLessThanOrEqual(0);
    expect(farther).toBeLessThan(known(part, 'supplyVoltage', 'min'));
  });

  it('comes in a package that has room for its channels', () => {
    // Package outlines: JEDEC MO-178 and MO-203 have five pins, MS-012 AA and MO-187 eight (from memory).
    const pins = Number(/-(\d+)(?:-EP)?$/.exec(part.package ?? '')?.[1]);
    const channels = part.channels ?? 0;
    expect(channels).toBeGreaterThanOrEqual(1);
    expect(pins).toBeGreaterThanOrEqual(3 * channels + 2);
    expect(pins).toBe(channels === 1 && pins < 8 ? 5 : 8);
  });

  it('is specified over the range its grade asks for', () => {
    // AEC-Q100 Rev-H: grade 1 −40..125 °C, grade 2 −40..105 °C.
    const top = { 'AEC-Q100 grade 1': 125, 'AEC-Q100 grade 2': 105 }[part.qualification ?? ''];
    if (top === undefined) return expect(part.qualification).toBe('none');
    expect([known(part, 'temperature', 'min'), known(part, 'temperature', 'max')]).toEqual([-40, top]);
  });
});

describe.each(sets.filter(({ inputType }) => inputType === 'bipolar').map((part) => [part.id, part] as const))('%s, bipolar', (_, part) => {
  it('has the shot noise of its bias current, and not much more', () => {
    // √(2qI): Schottky, Annalen der Physik 57, 1918 (from memory). Less is impossible; twice as much is common practice.
    const shot = Math.sqrt(2 * CHARGE * known(part, 'biasCurrent', 'typ', 25));
    const stated = known(part, 'currentNoise', 'typ');
    expect(stated).toBeGreaterThan(shot);
    expect(stated).toBeLessThan(2 * shot);
  });
});

describe('the sets together', () => {
  it('lose at the lowest supply what the smaller drive of the output devices costs', () => {
    // Ron ~ 1/(VS − 0.7 V), light load: on-resistance of a MOS device (Gray, Hurst, Lewis & Meyer, Analysis and Design of
    // Analog Integrated Circuits, 5th ed., ch. 1, from memory), with a threshold of 0.7 V by common practice.
    const twice = sets.filter((part) => Math.min(...ratedSupplies(part)) < 3);
    expect(twice).toHaveLength(9);
    for (const part of twice) {
      const lowest = Math.min(...ratedSupplies(part));
      for (const rail of RAILS) {
        const ratio = (lightRow(part, rail, lowest) ?? 0) / (lightRow(part, rail, 5) ?? 0);
        const drive = (5 - 0.7) / (lowest - 0.7);
        expect(ratio / drive, `${part.id} ${rail}`).toBeGreaterThan(0.85);
        expect(ratio / drive, `${part.id} ${rail}`).toBeLessThan(1.15);
      }
    }
  });

  it('are no two of them related by scaling', () => {
    const compared = [
      ['gainBandwidth', 'typ'], ['slewRate', 'typ'], ['quiescentCurrent', 'max'], ['offsetVoltage', 'max'],
      ['voltageNoise', 'typ'], ['outputResistance', 'typ'], ['outputCurrent', 'min'],
    ] as const;
    for (const [index, first] of sets.entries()) {
      for (const second of sets.slice(index + 1)) {
        const ratios = compared.map(([parameter, kind]) => known(first, parameter, kind) / known(second, parameter, kind));
        expect(Math.max(...ratios) / Math.min(...ratios), `${first.id}, ${second.id}`).toBeGreaterThan(1.1);
      }
    }
  });

  it('cost as their classes do', () => {
    // Common practice: the everyday parts are the cheapest, fast and very precise ones the dearest.
    const cost = (part: Part): number => part.price?.amount ?? Number.NaN;
    const ids = [...sets].sort((a, b) => cost(a) - cost(b)).map(({ id }) => id);
    expect(new Set(ids.slice(0, 4))).toEqual(new Set(['GX-BIP-GS', 'GX-BIP-CONV', 'GX-CMOS-1M-RRIO', 'GX-CMOS-1M-GS']));
    expect(new Set(ids.slice(-4))).toEqual(new Set(['GX-ZD-FAST', 'GX-BIP-LN', 'GX-CMOS-50M', 'GX-BIP-200M']));
  });

  it('contain both kinds of honesty: typical figures without a limit, and empty cells', () => {
    const typicalOnly = sets.filter((part) => figures(part, 'offsetDrift', 'max').length === 0);
    for (const part of typicalOnly) expect(known(part, 'offsetDrift', 'typ')).toBeGreaterThan(0);
    expect(typicalOnly.map(({ id }) => id)).toEqual(['GX-BIP-GS', 'GX-CMOS-1M-RRIO', 'GX-CMOS-MICRO', 'GX-CMOS-50M']);
    const absent = (Object.keys(PARAMETERS) as Parameter[]).filter((parameter) => sets.some((part) => figures(part, parameter).length === 0));
    expect(absent).toEqual(['offsetCurrent', 'currentNoise', 'phaseMargin', 'unityCrossover', 'capacitiveLoad', 'inputCapacitance', 'inputCrossover']);
  });

  it('state the temperature of every bias current: without it a hot figure would pass for a cool one', () => {
    const rated = sets.flatMap((part) => figures(part, 'biasCurrent').map(({ condition }) => condition.temperature));
    expect(new Set(rated)).toEqual(new Set([25, 70, 85, 125]));
  });
});
