import { describe, expect, it } from 'vitest';
import { confirmations } from '../../src/screening/confirm.js';
import { passing } from '../support/fitting.js';

const turnsAt = { figure: 'slewRate', kind: 'min', value: 5, unit: 'V/s' } as const;

describe('figures to confirm before release', () => {
  it('are none behind a guaranteed verdict', () => {
    expect(confirmations([passing('slew-rate', 2)])).toEqual([]);
  });

  it('are the figure that decides, with the limit that would still pass', () => {
    expect(confirmations([passing('slew-rate', 2, { basis: 'derated', slot: 'slewRate.typ', how: 'typical × 0.6', turnsAt })])).toEqual([
      { figure: 'slewRate', slot: 'slewRate.typ', basis: 'derated', how: 'typical × 0.6', checks: ['slew-rate'], needed: { kind: 'min', value: 5, unit: 'V/s' } },
    ]);
  });

  it('are not what is asked to be nothing', () => {
    const weak = { basis: 'derated', slot: 'slewRate.typ', unit: 'V/s', sense: 'at-least', turnsAt: { ...turnsAt, value: 0 } } as const;
    expect(confirmations([passing('slew-rate', 2, weak)])).toEqual([]);
    expect(confirmations([passing('slew-rate', 2, { ...weak, turnsAt })])).toHaveLength(1);
  });

  it('are the weak terms of a sum, guaranteed ones apart', () => {
    const term = (name: string, basis: 'guaranteed' | 'derated' | 'borrowed', slot: string | null): object => ({ name, basis, slot, value: 1, figure: null, how: null });
    const terms = [term('offset', 'guaranteed', 'offsetVoltage.max'), term('offset drift', 'derated', 'offsetDrift.typ'), term('common mode', 'borrowed', null)] as never;
    expect(confirmations([passing('dc-error', 2, { basis: 'borrowed', terms })]).map(({ figure, basis }) => [figure, basis])).toEqual([['offsetDrift', 'derated'], ['common mode', 'borrowed']]);
  });

  it('are named once, with every check that rests on them', () => {
    const both = ['output-low', 'dc-error'].map((check) => passing(check, 2, { basis: 'derated', slot: 'offsetVoltage.typ' }));
    expect(confirmations(both)).toMatchObject([{ figure: 'offsetVoltage', checks: ['output-low', 'dc-error'] }]);
  });

  it('of a sum that turns on one of its figures carry the limit of that one only', () => {
    const term = (name: string, slot: string): object => ({ name, basis: 'derated', slot, value: 1, figure: null, how: null });
    const terms = [term('slewing', 'slewRate.typ'), term('linear settling', 'gainBandwidth.typ')] as never;
    expect(confirmations([passing('settling', 2, { basis: 'derated', terms, turnsAt })]).map(({ figure, needed }) => [figure, needed?.value ?? null])).toEqual([['slewRate', 5], ['gainBandwidth', null]]);
  });
});
