import { expect, it } from 'vitest';
import { cornerOf } from '../../src/demands/corner.js';

it('a corner is supply, reference and the inputs by name', () => {
  expect(cornerOf({ supply: 5, reference: 2.5, inputs: { positive: 1, negative: 2 } })).toEqual({ supply: 5, reference: 2.5, positive: 1, negative: 2 });
});
