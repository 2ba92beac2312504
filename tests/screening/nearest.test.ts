import { describe, expect, it } from 'vitest';
import type { JudgedPart } from '../../src/screening/index.js';
import { nearestOf } from '../../src/screening/nearest.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import { fitting, passing } from '../support/fitting.js';

const failing = (id: string, ...fails: Partial<Verdict>[]): JudgedPart => fitting(id, { outcome: 'does-not-fit', verdicts: [passing('supply-low', 2), ...fails.map((fail) => passing('x', null, { outcome: 'fail', ...fail }))] });
const nearest = (...parts: JudgedPart[]): string[] => nearestOf(parts, 5).map(({ part }) => part.id);

describe('parts nearest to fitting', () => {
  it('are up to three, by how far all their fails together are', () => {
    expect(nearest(failing('FAR', { margin: 0.1 }), failing('TWO', { margin: 0.9 }, { margin: 0.8 }), failing('NEAR', { margin: 0.9 }), failing('MID', { margin: 0.5 }))).toEqual(['NEAR', 'TWO', 'MID']);
  });

  it('measure head-room against the supply and temperature by its own step', () => {
    // 0.05 V of 5 V is 0.1 of a step; 20 K is one.
    expect(nearest(failing('COLD', { required: 0, offered: 20, unit: '°C' }), failing('ROOM', { required: 0.1, offered: 0.15 }), failing('BOUND', { required: 0.1, offered: null, known: 0.35 }))).toEqual(['ROOM', 'BOUND', 'COLD']);
  });

  it('put a word that does not match, or nothing to measure, behind numbers nearby', () => {
    expect(nearest(failing('WORD', { required: ['A'], offered: 'B' }), failing('NUMBER', { margin: 0.3 }), failing('NOTHING', { required: 1, offered: null }))).toEqual(['NUMBER', 'NOTHING', 'WORD']);
  });

  it('go by id when equally far', () => {
    expect(nearest(failing('B', { margin: 0.5 }), failing('A', { margin: 0.5 }))).toEqual(['A', 'B']);
  });
});
