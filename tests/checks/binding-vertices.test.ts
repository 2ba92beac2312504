import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bindingVertices, type Curve } from '../../src/checks/binding-vertices.js';
import { judgeHeadroom } from '../../src/checks/output-headroom.js';
import type { HeadroomVertex } from '../../src/demands/index.js';
import { BASES } from '../../src/parts/basis.js';
import type { HeadroomReading } from '../../src/parts/headroom-curve.js';
import { readingsOf, type Readings } from '../../src/parts/readings.js';
import { decide, decideBriefly } from '../../src/verdicts/decide.js';
import { max, partOf } from '../support/parts.js';

const CHECK = { id: 'output-low', title: 'output low', hasMargin: false };
const OPERATING = { coldest: 25, hottest: 25, nominalSupply: 5 };

const vertex = fc.record({ room: fc.double({ min: -0.05, max: 1, noNaN: true }), current: fc.constantFrom(0, 1e-4, 1e-3, 5e-3) })
  .map(({ room, current }): HeadroomVertex => ({ room, current, supply: 5, assistingLoad: null, corner: { supply: 5 } }));
const reading = fc.record({ value: fc.option(fc.double({ min: 0, max: 1, noNaN: true }), { freq: 12 }), basis: fc.constantFrom(...BASES) })
  .map(({ value, basis }): HeadroomReading => ({ value, basis, bound: value === null ? 0.02 : null, covers: value === null ? 1e-3 : null, slot: null, how: null }));

/** A curve that need not rise with the current: nothing about it is taken for granted but that it answers the same to the same question. */
const curveOver = (vertices: readonly HeadroomVertex[], readings: readonly HeadroomReading[]): Curve => {
  const known = new Map(vertices.map((one, at) => [one.current, readings[at]]));
  return ({ current }) => known.get(current) ?? { value: 0, bound: null, covers: null, basis: 'guaranteed', slot: null, how: null };
};

function reader(curve: Curve, offset: number, brief: boolean): Readings {
  const test = { part: partOf([max('offsetVoltage', offset, { temperature: 'over' })]), operating: OPERATING, strict: false, classWorst: null, outlook: 'pessimistic' as const };
  return { ...readingsOf(test), headroom: () => curve, brief };
}

describe('vertices that can decide', () => {
  it('decide as all of them do, whatever the curves and the offset', () => {
    const drawn = fc.array(fc.tuple(vertex, reading, reading), { minLength: 1, maxLength: 8 });
    fc.assert(
      fc.property(drawn, fc.constantFrom(0, 1e-4, 0.03), fc.double({ min: 1, max: 100, noNaN: true }), (rows, offset, noiseGain) => {
        const vertices = rows.map(([one]) => one);
        const asked = { vertices, noiseGain, kelvin: 0 };
        const curves = [curveOver(vertices, rows.map((row) => row[1])), curveOver(vertices, rows.map((row) => row[2]))] as const;
        const [worst, best] = curves.map((curve) => judgeHeadroom(asked, 'low', reader(curve, offset, false)));
        const [briefWorst, briefBest] = curves.map((curve) => judgeHeadroom(asked, 'low', reader(curve, offset, true)));
        if (worst === undefined || best === undefined || briefWorst === undefined || briefBest === undefined) throw new Error('two curves were drawn');
        expect(decide(CHECK, worst, best)).toMatchObject(decideBriefly(CHECK, briefWorst, briefBest));
      }),
      { numRuns: 600, seed: 5 },
    );
  });

  it('are the one with the least room left, and none where a vertex has no number or no room', () => {
    const at = (room: number): HeadroomVertex => ({ room, current: 1e-3, supply: 5, assistingLoad: null, corner: { supply: 5 } });
    const [wide, tight] = [at(0.5), at(0.2)];
    const curve: Curve = () => ({ value: 0.1, bound: null, covers: null, basis: 'derated', slot: null, how: null });
    expect(bindingVertices([wide, tight], curve)).toMatchObject({ places: [{ vertex: tight }], basis: 'derated' });
    expect(bindingVertices([wide, at(-0.01)], curve)).toBeNull();
    expect(bindingVertices([wide, tight], () => ({ ...curve(wide), value: null }))).toBeNull();
  });
});
