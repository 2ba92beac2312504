import { expect, it } from 'vitest';
import { farthestFrom25, operatingOf } from '../../src/demands/operating.js';
import { between, dc, stageOf, stageSpec } from '../support/stages.js';

const stage = (cold: number, hot: number): ReturnType<typeof stageOf> => stageOf(stageSpec('follower', dc(1, 2), { supply: between(3, 4.2), temperature: between(cold, hot) }));

it('figures are read for both temperature ends and the nominal supply', () => {
  expect(operatingOf(stage(-20, 60))).toEqual({ coldest: -20, hottest: 60, nominalSupply: 3.6 });
});

it('drift counts from 25 °C to the farther end', () => {
  expect(farthestFrom25(stage(-20, 60))).toEqual({ kelvin: 45, at: -20 });
  expect(farthestFrom25(stage(-20, 85))).toEqual({ kelvin: 60, at: 85 });
  expect(farthestFrom25(stage(25, 25)).kelvin).toBe(0);
});
