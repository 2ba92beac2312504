import { describe, expect, it } from 'vitest';
import { explain } from '../../src/engine.js';
import type { Sensitivity } from '../../src/explanation/index.js';
import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { sensitivityText } from '../../src/presentation/sensitivity-text.js';
import { FULL, max, min, partOf, replacing, typ } from '../support/parts.js';
import { dc, stageOf, stageSpec } from '../support/stages.js';

const SET: Part = partOf(FULL, { id: 'GX-SET', tier: 'generic', class: 'house-class' });
const spec = (dcError: number) => stageSpec('follower', dc(1, 4, 1000), { limits: { ...stageSpec('follower', dc(1, 4)).limits, dcError: { value: dcError, text: `${dcError * 1e3} mV` } } });

function sensitivity(figures: readonly Figure[], dcError: number, identity: Partial<Part> = {}): readonly Sensitivity[] {
  const part = partOf(figures, { id: 'HOUSE-1', class: 'house-class', ...identity });
  return explain(stageOf(spec(dcError)), { parts: [part, SET], sha256: '0', origin: () => null }, { part }).sensitivity;
}

/** Offset alone is 1 mV; 1.5 V of common mode over 1e4 and 1.5 V of output over 1e5 add 150 µV and 15 µV. */
const borrowing = replacing('commonModeRejection');

describe('sensitivity to what is borrowed', () => {
  it('is told with both ends: nothing, and the worst of the class', () => {
    const [found] = sensitivity(borrowing, 20e-3).filter(({ on }) => on === 'borrowed');
    expect(found).toMatchObject({ check: 'dc-error', figures: ['commonModeRejection'], required: 20e-3, outcome: 'pass', depends: false });
    expect((found?.worst.offered ?? 0) - (found?.best.offered ?? 0)).toBeCloseTo(1.5 / 1e4, 9);
  });

  it('hangs on it where the limit lies between the two ends', () => {
    const [wide] = sensitivity(borrowing, 20e-3).filter(({ on }) => on === 'borrowed');
    const between = ((wide?.best.offered ?? 0) + (wide?.worst.offered ?? 0)) / 2;
    const [found] = sensitivity(borrowing, between).filter(({ on }) => on === 'borrowed');
    expect(found).toMatchObject({ outcome: 'unknown', depends: true, best: { outcome: 'pass' }, worst: { outcome: 'fail' } });
    expect(found === undefined ? '' : sensitivityText(found)).toMatch(/hangs on what is borrowed\.$/u);
  });

  it('says that a fail stands without it', () => {
    const [found] = sensitivity(borrowing, 0.5e-3).filter(({ on }) => on === 'borrowed');
    expect(found).toMatchObject({ outcome: 'fail', depends: false, best: { outcome: 'fail' }, worst: { outcome: 'fail' } });
    expect(found === undefined ? '' : sensitivityText(found)).toMatch(/with nothing for what is borrowed .* still .* does not depend on them\.$/u);
  });

  it('has nothing to say of a part without a class, or of one that knows all', () => {
    expect(sensitivity(borrowing, 20e-3, { class: null })).toEqual([]);
    expect(sensitivity(FULL, 20e-3)).toEqual([]);
  });
});

describe('sensitivity to typical figures', () => {
  it('compares as printed with derated', () => {
    const [found] = sensitivity(replacing('slewRate', typ('slewRate', 1e6)), 20e-3);
    expect(found).toMatchObject({ check: 'slew-rate', on: 'typical', figures: ['slewRate'], best: { offered: 1e6, outcome: 'pass' }, worst: { offered: 0.6e6, outcome: 'pass' }, depends: false });
  });

  it('hangs on it where only the printed value reaches', () => {
    const need = 2 * Math.PI * 1000 * 1.5;
    const [found] = sensitivity(replacing('slewRate', typ('slewRate', need * 1.2)), 20e-3);
    expect(found).toMatchObject({ check: 'slew-rate', outcome: 'unknown', depends: true });
  });

  it('leaves limits alone', () => {
    expect(sensitivity(replacing('slewRate', min('slewRate', 1e6)), 20e-3)).toEqual([]);
    expect(sensitivity(replacing('offsetVoltage', max('offsetVoltage', 1e-3)), 20e-3)).toEqual([]);
  });
});
