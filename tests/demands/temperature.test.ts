import { expect, it } from 'vitest';
import { between, dc, demandsOf, stageSpec } from '../support/stages.js';

it('temperature is asked at both ends of the ambient range, 25 °C when none is given', () => {
  const demands = demandsOf(stageSpec('follower', dc(1, 2), { temperature: between(-20, 60) }));
  expect(demands['temperature-low']).toMatchObject({ required: -20, sense: 'at-most', unit: '°C' });
  expect(demands['temperature-high']).toMatchObject({ required: 60, sense: 'at-least', unit: '°C' });
  expect(demandsOf(stageSpec('follower', dc(1, 2)))['temperature-high'].required).toBe(25);
});
