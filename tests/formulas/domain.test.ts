import { describe, expect, it } from 'vitest';
import { requireFinite, requireNotNegative, requirePositive, requireWithin } from '../../src/formulas/domain.js';
import { refuses } from '../support/examples.js';

describe('domain of a formula', () => {
  it('accepts values inside, ends included where the interval says so', () => {
    expect(() => requireWithin('here', { a: 0, b: 1 }, { from: 0, to: 1 })).not.toThrow();
    expect(() => requirePositive('here', { a: 1e-300 })).not.toThrow();
    expect(() => requireNotNegative('here', { a: 0 })).not.toThrow();
    expect(() => requireFinite('here', { a: -1e300 })).not.toThrow();
  });
  refuses(() => requirePositive('here', { a: 1, b: 0 }), 'here: b must be finite, above 0, but is 0');
  refuses(() => requireNotNegative('here', { a: -1 }), 'here: a must be finite, at least 0, but is -1');
  refuses(() => requireWithin('here', { a: 1 }, { above: 0, below: 1 }), 'here: a must be finite, above 0, below 1, but is 1');
  refuses(() => requireWithin('here', { a: 1.1 }, { to: 1 }), 'here: a must be finite, at most 1, but is 1.1');
  refuses(() => requireFinite('here', { a: NaN }), 'here: a must be finite, but is NaN');
  refuses(() => requireNotNegative('here', { a: Infinity }), 'here: a must be finite, at least 0, but is Infinity');
});
