import { describe, expect, it } from 'vitest';
import { judgePart, judging } from '../../src/screening/index.js';
import { CHECK_IDS } from '../../src/demands/index.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { assumed, euro, FULL, max, min, partOf, replacing, typ } from '../support/parts.js';
import { judged, verdictOrNull } from '../support/judged.js';
import { between, dc, demandsOf, load, stageSpec, value } from '../support/stages.js';

const SPEC: StageSpec = stageSpec('follower', dc(1, 3, 2e3), { load: load(10e3), temperature: between(0, 60), limits: { dcError: value(5e-3), supplyCurrent: value(80e-6) } });

describe('the outcome of a part', () => {
  it('fits with proof by limits where every deciding figure is one', () => {
    expect(judged(SPEC, FULL)).toMatchObject({ outcome: 'fits', proof: 'limits', likely: false, confirm: [] });
  });

  it('does not fit with any fail, even where another check is unknown', () => {
    expect(judged(SPEC, replacing('quiescentCurrent', max('quiescentCurrent', 1e-3)))).toMatchObject({ outcome: 'does-not-fit', proof: null });
    expect(judged(SPEC, replacing('quiescentCurrent', max('quiescentCurrent', 1e-3)).filter(({ parameter }) => parameter !== 'slewRate')).outcome).toBe('does-not-fit');
  });

  it('cannot be decided with any unknown and no fail', () => {
    expect(judged(SPEC, replacing('slewRate'))).toMatchObject({ outcome: 'undecided', proof: null, likely: false });
  });

  it('fits with proof typical where a figure is derated, estimated or assumed, and names them to confirm', () => {
    const one = judged(SPEC, replacing('slewRate', typ('slewRate', 1e6)));
    expect(one).toMatchObject({ outcome: 'fits', proof: 'typical' });
    expect(one.confirm).toMatchObject([{ figure: 'slewRate', basis: 'derated', checks: ['slew-rate'], needed: { kind: 'min', unit: 'V/s' } }]);
    expect(judged(SPEC, replacing('minimumStableGain'))).toMatchObject({ proof: 'typical', confirm: [{ figure: 'minimumStableGain', basis: 'assumed' }] });
    expect(judged(SPEC, replacing('gainBandwidth', min('gainBandwidth', 2e6, { temperature: 25 }))).confirm).toMatchObject([{ figure: 'gainBandwidth', basis: 'estimated' }]);
  });

  it('names a figure once with all the checks that rest on it', () => {
    const { confirm } = judged(SPEC, replacing('offsetVoltage', typ('offsetVoltage', 0.1e-3)));
    expect(confirm.filter(({ figure }) => figure === 'offsetVoltage').map(({ checks }) => checks)).toEqual([['output-low', 'output-high', 'dc-error']]);
  });
});

describe('likely', () => {
  const generic = partOf(FULL, { id: 'G', tier: 'generic', class: 'c' });
  const lacking = replacing('slewRate');

  it('is an undecided part that passes with the figures of its class', () => {
    expect(judged(SPEC, lacking, { sets: [generic], identity: { class: 'c' } })).toMatchObject({ outcome: 'undecided', likely: true });
  });

  it('needs every set of the class to do, and a class at all', () => {
    const slow = partOf(replacing('slewRate', min('slewRate', 1)), { id: 'H', tier: 'generic', class: 'c' });
    expect(judged(SPEC, lacking, { sets: [generic, slow], identity: { class: 'c' } }).likely).toBe(false);
    expect(judged(SPEC, lacking, { sets: [generic], identity: { class: 'other' } }).likely).toBe(false);
    expect(judged(SPEC, lacking, { sets: [generic] }).likely).toBe(false);
  });
});

describe('every check', () => {
  it('is run, none stopping another, in the order of the contract', () => {
    const { verdicts } = judged(SPEC, []);
    const order = verdicts.map(({ check }) => check);
    expect(order).toEqual(CHECK_IDS.filter((id) => order.includes(id)));
    expect(verdicts.every(({ outcome }) => outcome === 'unknown' || outcome === 'pass')).toBe(true);
    expect(judged(SPEC, [min('supplyVoltage', 9)]).verdicts.map(({ check }) => check)).toEqual(order);
  });

  it('that is not asked has no verdict', () => {
    const plain = stageSpec('follower', dc(1, 2));
    for (const check of ['slew-rate', 'gain-bandwidth', 'dc-error', 'supply-current', 'channels', 'price', 'noise']) expect(verdictOrNull(check, plain, FULL)).toBeNull();
  });

  it('that is not built leaves every part undecided when the stage writes its limit', () => {
    const spec = { ...SPEC, limits: { ...SPEC.limits, frequencyError: value(0.01) } };
    expect(judged(spec, FULL).outcome).toBe('undecided');
    expect(verdictOrNull('frequency-error', spec, FULL)).toMatchObject({ outcome: 'unknown', reason: 'not-built', required: 0.01, sense: 'at-most', offered: null });
  });
});

describe('--strict', () => {
  it('counts only limits: every other figure is missing', () => {
    const typical = replacing('slewRate', typ('slewRate', 1e9));
    expect(judged(SPEC, typical).outcome).toBe('fits');
    expect(judged(SPEC, typical, { strict: true }).outcome).toBe('undecided');
    expect(judged(SPEC, replacing('slewRate', assumed(min('slewRate', 1e9))), { strict: true }).outcome).toBe('undecided');
    expect(judged(SPEC, FULL, { strict: true })).toMatchObject({ outcome: 'fits', proof: 'limits' });
  });

  it('keeps what stands in for a figure that nobody prints', () => {
    expect(judged(SPEC, replacing('minimumStableGain'), { strict: true })).toMatchObject({ outcome: 'fits', proof: 'typical' });
  });
});

describe('the current for the order', () => {
  it('is the quiescent current on the pessimistic reading, asked or not', () => {
    const spec = stageSpec('follower', dc(1, 2));
    expect(judged(spec, [typ('quiescentCurrent', 10e-6)]).current).toBeCloseTo(14e-6, 15);
    expect(judged(spec, []).current).toBeNull();
  });
});

describe('generic sets', () => {
  it('are judged like any other, but not on status, lifecycle and package', () => {
    const spec = { ...SPEC, wishes: { status: ['approved'], lifecycle: ['active'], package: ['SOT-23-5'], channels: 1, price: { amount: 1, currency: 'EUR', text: '1 EUR' } } };
    const checks = judgePart(judging(demandsOf(spec), [], false), partOf(FULL, { tier: 'generic', channels: 2, price: euro(0.5) })).verdicts.map(({ check }) => check);
    expect(checks.filter((check) => ['status', 'lifecycle', 'package'].includes(check))).toEqual([]);
    expect(checks).toContain('price');
  });
});
