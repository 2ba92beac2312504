import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bindingVertices } from '../../src/checks/binding-vertices.js';
import { rowOf } from '../../src/checks/in-numbers.js';
import { HEADROOM_NUMBERS, shareOf } from '../../src/checks/output-headroom-numbers.js';
import { headroomFinding, type HeadroomFound } from '../../src/checks/output-headroom.js';
import type { HeadroomDemand, HeadroomVertex } from '../../src/demands/index.js';
import { BASES } from '../../src/parts/basis.js';
import type { Term } from '../../src/verdicts/finding.js';
import { decideBriefly } from '../../src/verdicts/decide.js';

const CHECK = { id: 'output-low', title: 'output low', hasMargin: false };

const demand = (vertices: readonly HeadroomVertex[]): HeadroomDemand => ({ check: 'output-low', required: 0, unit: 'V', sense: 'at-most', because: '', source: '', vertices, noiseGain: 2, kelvin: 10 });
const vertexAt = (room: number, current = 1e-3): HeadroomVertex => ({ room, current, supply: 5, assistingLoad: null, corner: { supply: 5 } });
const term = (value: number, basis: Term['basis']): Term => ({ name: 'offset', value, slot: null, basis, figure: null, how: null });

/** Terms of a part that needs these head-rooms, by vertex. */
function foundOf(vertices: readonly HeadroomVertex[], needs: readonly number[], { offset, drift, overTemperature = false }: { readonly offset: Term | null; readonly drift: Term | null; readonly overTemperature?: boolean }) {
  const curve = (vertex: { readonly current: number }) => ({ value: needs[vertices.findIndex(({ current }) => current === vertex.current)] ?? 0, bound: null, covers: null, basis: 'derated' as const, slot: null, how: null });
  const found: HeadroomFound = { curve: { readings: [], binding: bindingVertices(vertices, curve) }, offset: { term: offset, overTemperature }, drift };
  return { curve: () => found.curve, offset: () => found.offset, drift: () => found.drift };
}

describe('a head-room in numbers', () => {
  it('is what its terms decide, whichever vertices bind', () => {
    const rooms = fc.array(fc.tuple(fc.constantFrom(0.1, 0.2, 0.3), fc.constantFrom(0.05, 0.15, 0.25, 0.1000002)), { minLength: 1, maxLength: 3 });
    const part = fc.record({
      offset: fc.option(fc.tuple(fc.constantFrom(0, 0.01, 0.06), fc.constantFrom(...BASES)).map(([value, basis]) => term(value, basis))),
      drift: fc.option(fc.tuple(fc.constantFrom(0, 0.02), fc.constantFrom(...BASES)).map(([value, basis]) => term(value, basis))),
      overTemperature: fc.boolean(),
    });
    fc.assert(fc.property(rooms, part, (drawn, figures) => {
      const vertices = drawn.map(([room], at) => vertexAt(room, (at + 1) * 1e-3));
      const asked = demand(vertices);
      const found = foundOf(vertices, drawn.map(([, need]) => need), figures);
      const inNumbers = HEADROOM_NUMBERS.finding(asked, rowOf(HEADROOM_NUMBERS, asked, found));
      const fromTerms = headroomFinding(asked, found, { side: 'low', brief: true });
      if (inNumbers === null) throw new Error('all of these are told in numbers');
      expect(decideBriefly(CHECK, inNumbers, inNumbers)).toEqual(decideBriefly(CHECK, fromTerms, fromTerms));
    }), { numRuns: 1000, seed: 4 });
  });

  it('is told from its terms where a vertex has no number, and where more vertices bind than a row has room for', () => {
    const four = [1, 2, 3, 4].map((at) => vertexAt(0.2, at * 1e-3));
    const offset = { offset: null, drift: null };
    const rowFor = (vertices: readonly HeadroomVertex[], needs: readonly number[]) => rowOf(HEADROOM_NUMBERS, demand(vertices), foundOf(vertices, needs, offset));
    expect(HEADROOM_NUMBERS.finding(demand(four), rowFor(four, [0.1, 0.1, 0.1, 0.1]))).toBeNull();
    expect(HEADROOM_NUMBERS.finding(demand(four.slice(1)), rowFor(four.slice(1), [0.1, 0.1, 0.1]))).not.toBeNull();
    const none = [vertexAt(-0.1)];
    expect(HEADROOM_NUMBERS.finding(demand(none), rowFor(none, [0.1]))).toBeNull();
  });

  it('takes of offset and drift what is known', () => {
    expect([shareOf(0.01, 0.002), shareOf(0.01, NaN), shareOf(NaN, 0.002), shareOf(NaN, NaN)]).toEqual([0.012, 0.01, 0.002, 0]);
  });
});
