import { describe, expect, it } from 'vitest';
import { surroundingsOf } from '../../src/stage/surroundings.js';
import { ac, dc, GROUND, midSupply, source, stageSpec } from '../support/stages.js';

describe('what surrounds the amplifier', () => {
  it('is nothing in series unless given; the source is exact unless it has a tolerance', () => {
    expect(surroundingsOf(stageSpec('follower', dc(1, 2)), GROUND)).toEqual({ ac: false, sourceResistance: 0, sourceTolerance: 0, referenceResistance: 0 });
    expect(surroundingsOf(stageSpec('follower', ac(1), { source: source(1e3, 0.05) }), midSupply(0, 5e3))).toEqual({
      ac: true, sourceResistance: 1e3, sourceTolerance: 0.05, referenceResistance: 5e3,
    });
  });
});
