import { describe, expect, it } from 'vitest';
import { reduceMesh, roomFor, starMesh } from '../../src/formulas/star-mesh.js';
import { refuses } from '../support/examples.js';
import { capacitor, resistor } from './networks.js';

describe('star and mesh', () => {
  it('adds parallel branches and the capacitance at the kept node', () => {
    const mesh = starMesh([resistor('A', 1e3, ['x', 'pin']), resistor('B', 2e3, ['pin', 'x'])], 'pin', 3e-12);
    expect(mesh.nodes).toEqual(['x', 'pin', 'output', 'input', 'ground']);
    expect(mesh.conductance[1]).toBeCloseTo(1.5e-3, 15);
    expect(mesh.conductance[5]).toBe(mesh.conductance[1]);
    expect(mesh.capacitance[1 * 5 + 4]).toBe(3e-12);
  });
  it('answers in room it is given, whatever was there before', () => {
    const mesh = starMesh([resistor('A', 1e3, ['input', 'x']), resistor('B', 3e3, ['x', 'pin']), capacitor('C', 1e-9, ['x', 'ground'])], 'pin', 2e-12);
    const room = roomFor(mesh);
    expect(room.re).toHaveLength(25);
    reduceMesh(mesh, 1e6, room);
    expect(reduceMesh(mesh, 1e3, room)).toEqual(reduceMesh(mesh, 1e3));
  });
  it('leaves a series of two resistors as one branch', () => {
    const { re } = reduceMesh(starMesh([resistor('A', 1e3, ['input', 'x']), resistor('B', 3e3, ['x', 'pin'])], 'pin', 0), 0);
    expect(re[1 * 5 + 3]).toBeCloseTo(0.25e-3, 15);
    expect([re[1 * 5 + 2], re[1 * 5 + 4]]).toEqual([0, 0]);
    expect(re[1]).toBeCloseTo(0.25, 14);
    expect(re[3]).toBeCloseTo(0.75, 14);
  });
  it('keeps the digits of a weak branch beside a strong one', () => {
    const { re } = reduceMesh(starMesh([resistor('A', 1, ['pin', 'x']), resistor('B', 1e15, ['x', 'ground'])], 'pin', 0), 0);
    expect(re[1 * 5 + 4]! * (1e15 + 1)).toBeCloseTo(1, 14);
  });
  it('passes over an element with both ends at one node', () => {
    expect(starMesh([resistor('A', 1, ['pin', 'pin'])], 'pin', 0).conductance.every((value) => value === 0)).toBe(true);
  });
  refuses(() => starMesh([resistor('Rf', 0, ['output', 'n'])], 'n', 0), 'starMesh: Rf must be finite, above 0, but is 0');
  refuses(() => starMesh([], 'n', -1), 'starMesh: capacitance at n must be finite, at least 0, but is -1');
  refuses(
    () => reduceMesh(starMesh([resistor('R', 1, ['a', 'b']), resistor('R2', 1, ['n', 'ground'])], 'n', 0), 10),
    'reduceMesh: node b has no path to output, input or ground; connect it',
  );
  refuses(
    () => reduceMesh(starMesh([capacitor('C', 1e-9, ['input', 'n'])], 'n', 0), 0),
    'reduceMesh: node n has no path for direct current to output, input or ground, so its voltage at 0 Hz is undefined; ask for a frequency above 0 or add a resistor',
  );
  refuses(() => reduceMesh(starMesh([resistor('R', 1, ['n', 'ground'])], 'n', 0), -1), 'reduceMesh: frequency must be finite, at least 0, but is -1');
});
