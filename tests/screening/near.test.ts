import fc from 'fast-check';
import { expect, it } from 'vitest';
import { nearestKeeper } from '../../src/screening/near.js';
import { SHOWN } from '../../src/screening/nearest.js';

it('the nearest of many are kept, of equals the first seen; who is told that a part is at least so far may pass it over', () => {
  const parts = fc.array(fc.tuple(fc.nat(20), fc.double({ min: 0, max: 1, noNaN: true })), { maxLength: 40 });
  fc.assert(fc.property(parts, (seen) => {
    const [all, few] = [nearestKeeper(), nearestKeeper()];
    const distances = seen.map(([distance]) => distance);
    seen.forEach(([distance, share], position) => {
      all.see(position, distance);
      if (few.wants(distance * share)) few.see(position, distance);
    });
    const sorted = distances.map((distance, position) => ({ position, distance })).sort((a, b) => a.distance - b.distance || a.position - b.position);
    expect(all.found()).toEqual(sorted.slice(0, SHOWN));
    expect(few.found()).toEqual(all.found());
  }));
});
