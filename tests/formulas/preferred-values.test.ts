import { describe } from 'vitest';
import { preferredValue } from '../../src/formulas/preferred-values.js';
import { example, refuses } from '../support/examples.js';

describe('preferred values', () => {
  example('preferredValue(96, 9)', () => preferredValue(96, 9), 1.24);
  example('preferredValue(192, 185), the one exception,', () => preferredValue(192, 185), 9.2);
  example('preferredValue(48, 47)', () => preferredValue(48, 47), 9.53);
  refuses(() => preferredValue(96, 96), 'preferredValue: index must be finite, at least 0, below 96, but is 96');
});
