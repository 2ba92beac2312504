import { expect, it } from 'vitest';
import { limitKindOf } from '../../src/parts/assumption.js';

it('an assumed figure stands for the limit on the bad side', () => {
  expect(limitKindOf('offsetDrift')).toBe('max');
  expect(limitKindOf('slewRate')).toBe('min');
  expect(limitKindOf('outputResistance')).toBe('typ');
  expect(limitKindOf('supplyVoltage')).toBe('max');
});
