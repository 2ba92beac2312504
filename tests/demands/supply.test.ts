import { describe, expect, it } from 'vitest';
import { between, dc, demandsOf, stageSpec, value } from '../support/stages.js';

describe('what the stage asks of the supply range', () => {
  const spec = stageSpec('follower', dc(1, 2), { supply: between(3, 4.2) });

  it('is both ends, and the peak: the top unless another is given', () => {
    const demands = demandsOf(spec);
    expect(demands['supply-low']).toMatchObject({ required: 3, sense: 'at-most', unit: 'V', because: 'lowest supply 3 V' });
    expect(demands['supply-high']).toMatchObject({ required: 4.2, sense: 'at-least' });
    expect(demands['supply-peak']).toMatchObject({ required: 4.2, sense: 'at-least' });
    expect(demandsOf({ ...spec, supplyPeak: value(5.5) })['supply-peak'].required).toBe(5.5);
  });
});
