import { expect, it } from 'vitest';
import { ac, dc, demandsOf, midSupply, resistors, stageSpec } from '../support/stages.js';

it('stable gain is the noise gain at its lower corner, also AC-coupled', () => {
  const spec = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3) });
  expect(demandsOf(spec)['stable-gain']).toMatchObject({ sense: 'at-most', unit: 'V/V' });
  expect(demandsOf(spec)['stable-gain'].required).toBeCloseTo(1 + (7 * 0.99) / 1.01, 12);
  const coupledBy = stageSpec('non-inverting', ac(0.1), { resistors: resistors(70e3, 10e3), reference: midSupply() });
  expect(demandsOf(coupledBy)['stable-gain'].required).toBeCloseTo(1 + (7 * 0.99) / 1.01, 12);
});
