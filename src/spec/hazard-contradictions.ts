import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction, type Written } from './contradiction.js';
import type { StageSpec } from './spec.js';

type Hazards = Written & Partial<Pick<StageSpec, 'supply' | 'supplyRipple' | 'dutyCycle' | 'limits'>>;

/** Hazards that contradict each other or the supply; needs no circuit. */
export function hazardContradictions(spec: Hazards): Problem[] {
  return [neverOff(spec), tooLate(spec), moreThanSupply(spec)].filter((found) => found !== null);
}

function neverOff(spec: Hazards): Problem | null {
  const { dutyCycle: cycle } = spec;
  if (cycle === undefined || cycle.on.value < cycle.every.value * (1 - 1e-9)) return null;
  return contradiction(spec, {
    code: 'S220',
    paths: ['dutyCycle.on', 'dutyCycle.every'],
    message: `on for ${cycle.on.text} of every ${cycle.every.text}: the stage is never off`,
    fix: `write a time below ${cycle.every.text}, or leave dutyCycle out`,
  });
}

function tooLate(spec: Hazards): Problem | null {
  const { dutyCycle: cycle, limits } = spec;
  const start = limits?.startUp;
  if (cycle === undefined || start === undefined || start.value <= cycle.on.value * (1 + 1e-9)) return null;
  return contradiction(spec, {
    code: 'S220',
    paths: ['limits.startUp', 'dutyCycle.on'],
    message: `a start-up of ${start.text} is allowed, but the stage is on for ${cycle.on.text} only`,
    fix: `write startUp: ${cycle.on.text} or less`,
  });
}

function moreThanSupply(spec: Hazards): Problem | null {
  const { supply, supplyRipple: ripple } = spec;
  if (supply === undefined || ripple === undefined || ripple.amplitude.value < supply.min) return null;
  return contradiction(spec, {
    code: 'S221',
    paths: ['supplyRipple.amplitude', 'supply'],
    message: `a ripple of ${ripple.amplitude.text} takes the supply of ${formatQuantity(supply.min, 'V', { digits: 4 })} below ground`,
    fix: 'write the ripple that is left behind the supply filter: 50 mVpp',
  });
}
