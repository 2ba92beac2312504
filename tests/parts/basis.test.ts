import { describe, expect, it } from 'vitest';
import { BASES, weakest } from '../../src/parts/basis.js';

describe('the weakest basis', () => {
  it('goes guaranteed, derated, estimated, assumed, borrowed', () => {
    for (const [at, weaker] of BASES.entries()) {
      for (const stronger of BASES.slice(0, at)) expect(weakest([weaker, stronger])).toBe(weaker);
    }
    expect(BASES).toEqual(['guaranteed', 'derated', 'estimated', 'assumed', 'borrowed']);
  });

  it('is guaranteed for none', () => {
    expect(weakest([])).toBe('guaranteed');
  });
});
