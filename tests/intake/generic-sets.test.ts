import { describe, expect, it } from 'vitest';
import { conditionKey, figureSlot, type LimitKind, PARAMETERS, type Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { figuresOf, stated } from '../support/band-figures.js';
import { DIES, genericList, genericSet } from '../support/generic-list.js';
import { RAILS, swingCurves } from '../support/swing-rows.js';

// What the file holds. Whether an amplifier could have such figures: generic-bands.test.ts.

const sets = genericList.parts;
const each = (parts: readonly Part[]): (readonly [string, Part])[] => parts.map((part) => [part.id, part]);
const lacking = (...parameters: Parameter[]): string[] => DIES.filter((part) => parameters.every((parameter) => figuresOf(part, parameter).length === 0)).map(({ id }) => id);
const onlyTypical = (parameter: Parameter): string[] => DIES.filter((part) => figuresOf(part, parameter).length > 0 && figuresOf(part, parameter).every(({ kind }) => kind === 'typ')).map(({ id }) => id);

/** Classes by row of the plan, with the first set of each: the plain one. */
const PLAIN = [
  'GX-BIP-GS', 'GX-BIP-CONV', 'GX-JFET-CONV', 'GX-JFET-RRO', 'GX-HV-CMOS', 'GX-HV-BIP-RRIO', 'GX-HV-ZD', 'GX-CMOS-1M-RRIO',
  'GX-CMOS-1M-GS', 'GX-CMOS-10M-RRIO', 'GX-CMOS-20M-NX', 'GX-CMOS-TRIM', 'GX-ZD-MICRO', 'GX-ZD-FAST', 'GX-NANO', 'GX-CMOS-MICRO',
  'GX-BIP-MICRO', 'GX-CMOS-LN', 'GX-BIP-LN', 'GX-ELECTRO', 'GX-CMOS-50M', 'GX-BIP-200M', 'GX-CMOS-DEC', 'GX-DRIVE',
];

describe('the file', () => {
  it('is read without a fault, a warning or a column kept as mere text', () => {
    expect(genericList.warnings).toEqual([]);
    expect(genericList.columns.filter(({ reading }) => reading.kind === 'text')).toEqual([]);
  });

  it('holds 80 amplifiers in 95 packages, ids of our own', () => {
    expect(new Set(sets.map(({ id }) => id)).size).toBe(sets.length);
    expect([DIES.length, sets.length]).toEqual([80, 95]);
    for (const part of sets) {
      expect(part.id).toMatch(/^GX(-[A-Z0-9]+)+$/);
      expect(part.class).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
      expect(part.description, part.id).toMatch(/^[A-Z0-9][^;:!?]{20,100}$/);
    }
    // A line for the reader names one amplifier.
    expect(new Set(DIES.map(({ description }) => description)).size).toBe(DIES.length);
  });

  it('has 24 classes, each together, the plain set first, with two or more that differ from it', () => {
    const classes = [...new Set(sets.map((part) => part.class))];
    expect(classes).toHaveLength(24);
    const runs = sets.filter((part, at) => part.class !== sets[at - 1]?.class);
    expect(runs.map(({ id }) => id)).toEqual(PLAIN);
    for (const word of classes) expect(DIES.filter((part) => part.class === word).length, word ?? '').toBeGreaterThanOrEqual(3);
  });

  it('has in every class a dearer and a cheaper one than the plain', () => {
    for (const [id, plain] of each(PLAIN.map(genericSet))) {
      const prices = DIES.filter((part) => part.class === plain.class).map(cost);
      expect(Math.min(...prices), id).toBeLessThan(cost(plain));
      expect(Math.max(...prices), id).toBeGreaterThan(cost(plain));
    }
  });

  it('gives a class no status or lifecycle: it is nothing to order', () => {
    for (const part of sets) expect([part.tier, part.status, part.lifecycle], part.id).toEqual(['generic', null, null]);
  });

  it('has no column that no set uses', () => {
    const used = new Set(sets.flatMap((part) => part.figures.map(figureSlot)));
    const unused = genericList.columns.filter(({ reading }) => reading.kind === 'figure' && !used.has(figureSlot({ parameter: reading.parameter, kind: reading.limit, condition: reading.condition })));
    expect(unused.map(({ header }) => header)).toEqual([]);
  });
});

describe('a family', () => {
  const families = [...new Set(sets.flatMap(({ family }) => family ?? []))].map((word) => sets.filter(({ family }) => family === word));

  it('is named after its first, stands together, and has two to three members', () => {
    for (const members of families) {
      expect(members[0]?.family).toBe(members[0]?.id);
      expect([2, 3]).toContain(members.length);
      const at = sets.findIndex(({ id }) => id === members[0]?.id);
      expect(sets.slice(at, at + members.length)).toEqual(members);
    }
  });

  it('is one die: nothing differs but package, channels, price and what the package does to the heat', () => {
    for (const [first, ...rest] of families) {
      if (first === undefined) throw new Error('an empty family');
      const die = (part: Part): object => ({ ...part, id: '', package: '', channels: 0, price: null, figures: part.figures.filter(({ parameter }) => parameter !== 'thermalResistance') });
      for (const variant of rest) {
        expect(die(variant), variant.id).toEqual(die(first));
        expect([variant.package, variant.channels], variant.id).not.toEqual([first.package, first.channels]);
      }
    }
  });

  it('shows singles, duals and quads, dearer the more there are and cheaper per amplifier', () => {
    expect(new Set(sets.map(({ channels }) => channels))).toEqual(new Set([1, 2, 4]));
    for (const members of families) {
      const ordered = [...members].sort((a, b) => (a.channels ?? 0) - (b.channels ?? 0));
      for (const [at, part] of ordered.slice(1).entries()) {
        const smaller = ordered[at];
        if (smaller === undefined) throw new Error('no smaller one');
        expect(cost(part), part.id).toBeGreaterThan(cost(smaller));
        expect(cost(part) / (part.channels ?? 1), part.id).toBeLessThan(cost(smaller) / (smaller.channels ?? 1));
      }
    }
  });
});

describe.each(each(sets))('%s', (_, part) => {
  it('has the figures without which hardly a stage can be judged', () => {
    const needed = [
      'supplyVoltage', 'supplyAbsoluteMaximum', 'inputLowHeadroom', 'inputHighHeadroom', 'slewRate', 'gainBandwidth', 'minimumStableGain', 'openLoopGain',
      'offsetVoltage', 'biasCurrent', 'commonModeRejection', 'quiescentCurrent', 'shortCircuitCurrent', 'temperature', 'thermalResistance', 'junctionTemperature',
    ] as const;
    for (const parameter of needed) expect(figuresOf(part, parameter).length, parameter).toBeGreaterThan(0);
    expect(part.inputType).not.toBeNull();
    expect(cost(part)).toBeGreaterThan(0);
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

  it('rates its swing at three loads or more on every supply it is rated at, at both rails', () => {
    const curves = swingCurves(part);
    expect(new Set(curves.map(({ rail }) => rail))).toEqual(new Set(RAILS));
    for (const { rail, supply, rows } of curves) {
      expect(rows.length, `${rail} at ${supply} V`).toBeGreaterThanOrEqual(3);
      const currents = rows.map(({ current }) => current);
      expect(new Set(currents).size).toBe(currents.length);
    }
    const [low, high] = RAILS.map((rail) => curves.filter((curve) => curve.rail === rail).map(({ supply }) => supply));
    expect(low).toEqual(high);
  });

  it('comes in a package that has room for its channels', () => {
    // Package outlines: JEDEC MO-178 and MO-203 have five pins, MS-012 AA and MO-187 eight, MS-012 AB and MO-153 fourteen (from memory).
    const pins = Number(/-(\d+)(?:-EP)?$/.exec(part.package ?? '')?.[1]);
    const channels = part.channels ?? 0;
    expect(pins).toBeGreaterThanOrEqual(3 * channels + 2);
    expect(pins).toBe(channels === 1 && pins < 8 ? 5 : channels === 4 ? 14 : 8);
  });

  it('is specified over the range its grade asks for', () => {
    // AEC-Q100 Rev-H: grade 0 −40..150 °C, grade 1 −40..125 °C, grade 2 −40..105 °C.
    const top = { 'AEC-Q100 grade 0': 150, 'AEC-Q100 grade 1': 125, 'AEC-Q100 grade 2': 105 }[part.qualification ?? ''];
    if (top === undefined) return expect(part.qualification).toBe('none');
    expect([stated(part, 'temperature', 'min'), stated(part, 'temperature', 'max')]).toEqual([-40, top]);
  });
});

describe('the sets together', () => {
  it('cost as their classes do', () => {
    // Common practice: the everyday parts are the cheapest, fast and very precise ones the dearest.
    const ids = PLAIN.map(genericSet).sort((a, b) => cost(a) - cost(b)).map(({ id }) => id);
    expect(new Set(ids.slice(0, 4))).toEqual(new Set(['GX-BIP-GS', 'GX-BIP-CONV', 'GX-CMOS-1M-RRIO', 'GX-CMOS-1M-GS']));
    expect(new Set(ids.slice(-4))).toEqual(new Set(['GX-ZD-FAST', 'GX-BIP-LN', 'GX-CMOS-50M', 'GX-BIP-200M']));
  });

  it('come qualified for vehicles to grade 0 and grade 1 where that is asked for', () => {
    const graded = (grade: number): string[] => DIES.filter(({ qualification }) => qualification === `AEC-Q100 grade ${grade}`).map(({ id }) => id);
    expect(graded(0)).toEqual(['GX-CMOS-1M-RRIO-A0', 'GX-CMOS-10M-RRIO-A0', 'GX-CMOS-50M-A0']);
    expect(graded(1)).toEqual(['GX-CMOS-1M-RRIO-A1', 'GX-CMOS-1M-GS', 'GX-CMOS-10M-RRIO-A1', 'GX-CMOS-50M-A1']);
    expect(graded(2)).toEqual(['GX-DRIVE']);
  });

  it('reach from 1.2 V of supply and 4 kHz to 500 MHz', () => {
    const speeds = DIES.map((part) => [stated(part, 'gainBandwidth', 'typ') ?? Number.NaN, part.id] as const).sort(([a], [b]) => a - b);
    expect([speeds[0], speeds.at(-1)]).toEqual([[4e3, 'GX-NANO-ECO'], [500e6, 'GX-BIP-500M']]);
    expect(stated(genericSet('GX-CMOS-MICRO-1V2'), 'supplyVoltage', 'min')).toBe(1.2);
    expect(DIES.filter((part) => (stated(part, 'supplyVoltage', 'min') ?? 0) <= 1.8)).toHaveLength(16);
  });

  it('are rated at a second supply, as the class is used', () => {
    const twice = DIES.filter((part) => new Set(swingCurves(part).map(({ supply }) => supply)).size > 1);
    expect(twice).toHaveLength(51);
    // Low-voltage classes at the low end of their supply.
    for (const id of PLAIN.slice(7, 16)) expect(Math.min(...swingCurves(genericSet(id)).map(({ supply }) => supply)), id).toBeLessThan(2.6);
  });

  it('carry the known quirks', () => {
    const ids = (test: (part: Part) => boolean): string[] => DIES.filter(test).map(({ id }) => id);
    expect(ids(({ phaseReversal }) => phaseReversal === true)).toEqual(['GX-BIP-GS', 'GX-BIP-GS-ECO', 'GX-JFET-CONV', 'GX-JFET-CONV-LP']);
    expect(ids(({ inputClamp }) => inputClamp === true)).toHaveLength(15);
    expect(ids((part) => stated(part, 'inputCrossover', 'min') !== null)).toHaveLength(26);
    // Ground-sensing bipolar outputs sink some ten microamperes near V-, and lose a junction beyond.
    for (const id of ids((part) => part.class === 'bipolar-ground-sensing')) {
      const [first, second] = swingCurves(genericSet(id))[0]?.rows ?? [];
      expect(first?.current, id).toBeLessThan(100e-6);
      expect((second?.headroom ?? 0) / (first?.headroom ?? 1), id).toBeGreaterThan(30);
    }
  });

  it('contain both kinds of honesty: figures that are only typical, and empty cells', () => {
    expect(onlyTypical('offsetDrift')).toHaveLength(24);
    expect(onlyTypical('openLoopGain')).toEqual(['GX-BIP-CONV-ECO', 'GX-CMOS-1M-RRIO-ECO', 'GX-NANO', 'GX-NANO-ECO']);
    expect(onlyTypical('commonModeRejection')).toEqual(['GX-BIP-GS', 'GX-BIP-CONV-ECO', 'GX-HV-BIP-RRIO-ECO', 'GX-NANO-ECO', 'GX-BIP-LN-ECO']);
    expect(onlyTypical('supplyRejection')).toEqual(['GX-CMOS-1M-GS']);
    expect(onlyTypical('biasCurrent')).toEqual(['GX-CMOS-1M-RRIO-ECO']);
    expect(lacking('supplyRejection')).toEqual(['GX-CMOS-1M-GS-ECO']);
    expect(lacking('offsetDrift')).toEqual(['GX-BIP-CONV-ECO', 'GX-CMOS-1M-RRIO-ECO', 'GX-CMOS-1M-GS-ECO', 'GX-CMOS-MICRO-ECO', 'GX-CMOS-30M', 'GX-BIP-80M']);
    expect(lacking('outputCurrent')).toEqual(['GX-BIP-GS-ECO', 'GX-BIP-CONV-ECO', 'GX-JFET-CONV-LP', 'GX-CMOS-1M-RRIO-ECO', 'GX-CMOS-10M-RRIO-ECO', 'GX-NANO-ECO', 'GX-CMOS-MICRO-ECO', 'GX-CMOS-30M', 'GX-DRIVE-ECO']);
    expect(lacking('voltageNoise', 'noiseCorner')).toEqual(['GX-BIP-GS-ECO', 'GX-BIP-CONV-ECO', 'GX-CMOS-MICRO-ECO']);
    const never = (Object.keys(PARAMETERS) as Parameter[]).filter((parameter) => lacking(parameter).length === 0);
    expect(never).toHaveLength(19);
  });

  it('state the temperature of every bias current: without it a hot figure would pass for a cool one', () => {
    const rated = sets.flatMap((part) => figuresOf(part, 'biasCurrent').map(({ condition }) => condition.temperature));
    expect(new Set(rated)).toEqual(new Set([25, 70, 85, 125, 150]));
  });
});

function cost(part: Part): number {
  return part.price?.amount ?? Number.NaN;
}
