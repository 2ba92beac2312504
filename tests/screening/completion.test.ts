import { expect, it } from 'vitest';
import { completions } from '../../src/screening/completion.js';
import { max, min, partOf } from '../support/parts.js';

it('a part is completed once per set of its class, with what it lacks and nothing it has', () => {
  const part = partOf([min('slewRate', 1)]);
  const sets = [partOf([min('slewRate', 9), min('gainBandwidth', 2)]), partOf([max('offsetVoltage', 3)])];
  expect(completions(part, sets).map(({ figures }) => figures)).toEqual([[min('slewRate', 1), min('gainBandwidth', 2)], [min('slewRate', 1), max('offsetVoltage', 3)]]);
  expect(completions(part, [])).toEqual([]);
});
