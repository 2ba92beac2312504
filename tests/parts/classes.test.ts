import { describe, expect, it } from 'vitest';
import { BORROWABLE, classesOf } from '../../src/parts/classes.js';
import { AT_25, max, min, partOf, typ } from '../support/parts.js';

const GENERIC = { tier: 'generic', class: 'c1' } as const;

describe('the worst of a class', () => {
  it('is the worst of its generic sets, derated as any other', () => {
    const classes = classesOf(
      [
        partOf([min('openLoopGain', 2e5), typ('offsetDrift', 1e-6)], GENERIC),
        partOf([min('openLoopGain', 1e5), max('offsetDrift', 2e-6)], GENERIC),
      ],
      AT_25,
    );
    expect(classes.get('c1')).toEqual({ openLoopGain: 1e5, offsetDrift: 3e-6 });
  });

  it('holds only terms of the DC error and of the noise', () => {
    expect(BORROWABLE).toEqual(['commonModeRejection', 'supplyRejection', 'openLoopGain', 'offsetDrift', 'offsetCurrent', 'noiseCorner', 'currentNoise']);
    expect(classesOf([partOf([min('slewRate', 1e6)], GENERIC)], AT_25).get('c1')).toEqual({});
  });

  it('stands in the surroundings it is asked for, whatever was asked of the list before', () => {
    const list = [partOf([min('openLoopGain', 2e5, { supply: 5 }), min('openLoopGain', 1e5, { supply: 3 })], GENERIC)];
    const low = { ...AT_25, nominalSupply: 3 };
    expect(classesOf(list, AT_25).get('c1')).toEqual({ openLoopGain: 2e5 });
    expect(classesOf(list, low).get('c1')).toEqual({ openLoopGain: 1e5 });
    expect(classesOf(list, { ...low })).toBe(classesOf(list, low));
    expect(classesOf(list, AT_25).get('c1')).toEqual({ openLoopGain: 2e5 });
    expect(classesOf([...list, ...list], low)).toEqual(classesOf(list, low));
  });

  it('takes nothing from approved parts or from sets without a class', () => {
    const figures = [min('openLoopGain', 1)];
    expect(classesOf([partOf(figures, { class: 'c1' }), partOf(figures, { tier: 'generic' })], AT_25).size).toBe(0);
  });
});
