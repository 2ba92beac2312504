import { expect, it } from 'vitest';
import { acceptedKeys } from '../../src/spec/schema.js';
import { unknownKey } from '../../src/spec/unknown-key.js';

it('the last word of one key of the same map comes before the same word elsewhere', () => {
  expect(acceptedKeys('shunt')).toContain('current');
  expect(unknownKey('current', 'limits').fix).toBe('supplyCurrent');
  expect(unknownKey('noise', 'limits').fix).toBe('outputNoise');
});


it('a word that ends no key is looked for elsewhere', () => {
  expect(unknownKey('dcError', '').fix).toBe('limits.dcError');
});

it('what is near by its letters comes first', () => {
  expect(unknownKey('error', 'limits').fix).toBe('dcError');
});

it('what takes a quantity of that name is meant, where one key alone does', () => {
  expect(unknownKey('voltage', 'reference').fix).toBe('value');
  expect(unknownKey('capacitance', 'reference').fix).toBe('bypass');
  expect(unknownKey('voltage', 'limits').fix).not.toBe('value');
});
