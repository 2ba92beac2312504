import { describe, expect, it } from 'vitest';
import { readOrdinaryHeader } from '../../src/intake/ordinary-header.js';
import { readAnyHeader } from '../../src/intake/recognised.js';

describe('the words hardware lists use', () => {
  it.each([
    ['Vos max (mV)', { target: 'offsetVoltage', limit: 'max', unit: 'mV' }],
    ['GBW typ', { target: 'gainBandwidth', limit: 'typ', unit: null }],
    ['Iq/ch', { target: 'quiescentCurrent', limit: null, perPackage: false }],
    ['Iq typ (µA/ch)', { target: 'quiescentCurrent', limit: 'typ', unit: 'µA/ch' }],
    ['Iq total (mA)', { target: 'quiescentCurrent', perPackage: true }],
    ['SR', { target: 'slewRate', limit: null }],
    ['Slew typ/(V/µs)', { target: 'slewRate', limit: 'typ', unit: 'V/µs' }],
    ['CMVR low', { target: 'commonModeLow' }],
    ['CMVR high', { target: 'commonModeHigh' }],
    ['Input common mode range (V)', { target: 'commonModeRange', unit: 'V' }],
    ['en 1kHz', { target: 'voltageNoise', unit: null }],
    ['en @1kHz (nV/√Hz)', { target: 'voltageNoise', unit: 'nV/√Hz', condition: {} }],
    ['en 1 kHz [nV/rtHz]', { target: 'voltageNoise', unit: 'nV/rtHz' }],
    ['V+ max/V', { target: 'supplyVoltage', limit: 'max', unit: 'V' }],
    ['Supply [V]', { target: 'supplyRange', limit: null, unit: 'V' }],
    ['Supply voltage abs max (V)', { target: 'supplyAbsoluteMaximum', limit: 'max' }],
    ['GBW in MHz', { target: 'gainBandwidth', unit: 'MHz' }],
    ['Offset max, mV', { target: 'offsetVoltage', limit: 'max', unit: 'mV' }],
    ['Vos max mV', { target: 'offsetVoltage', limit: 'max', unit: 'mV' }],
    ['Vos_max_mV', { target: 'offsetVoltage', limit: 'max', unit: 'mV' }],
    ['Vos [mV] typ/max', { target: 'offsetVoltage', limit: null, order: ['typ', 'max'] }],
    ['GBW (MHz) min/typ', { target: 'gainBandwidth', order: ['min', 'typ'] }],
    ['Ib max/nA @ 85 °C', { target: 'biasCurrent', limit: 'max', unit: 'nA', condition: { temperature: 85 } }],
    ['Vos max over temp (mV)', { target: 'offsetVoltage', limit: 'max', condition: { temperature: 'over' } }],
    ['Swing from rail max @10k (mV)', { target: 'bothSwings', limit: 'max', condition: { load: { kind: 'resistance', ohms: 10_000, to: 'mid-supply' } } }],
    ['Swing low @ RL = 2k to GND (mV)', { target: 'outputLowHeadroom', condition: { load: { kind: 'resistance', ohms: 2000, to: 'ground' } } }],
    ['VOH min (V) @ 2 kΩ, 5 V', { target: 'outputHighVoltage', limit: 'min', condition: { supply: 5 } }],
    ['VOL max (mV) @ 1 mA', { target: 'outputLowHeadroom', limit: 'max', condition: { load: { kind: 'current', amperes: 1e-3 } } }],
    ['Iout min (mA)', { target: 'outputCurrent', limit: 'min' }],
    ['Iout (mA)', { target: 'shortCircuitCurrent', limit: null }],
    ['Iout at swing min (mA)', { target: 'outputCurrent', limit: 'min' }],
    ['Input offset (mV) / typ', { target: 'offsetVoltage', limit: 'typ', unit: 'mV' }],
    ['Output swing from rail (mV) / low side max', { target: 'outputLowHeadroom', limit: 'max' }],
    ['Temp range (°C)', { target: 'temperatureRange' }],
    ['PSRR [dB]', { target: 'supplyRejection', unit: 'dB' }],
    ['Cload max', { target: 'capacitiveLoad', limit: 'max' }],
  ])('%s', (header, reading) => {
    expect(readOrdinaryHeader(header)).toMatchObject({ kind: 'measured', ...reading });
  });

  it.each([
    ['Internal P/N', { kind: 'identity', field: 'id' }],
    ['Package (JEDEC/JEITA)', { kind: 'identity', field: 'package' }],
    ['Ch', { kind: 'identity', field: 'channels' }],
    ['Price (EUR @1k)', { kind: 'price', currency: 'EUR', quantity: 1000 }],
    ['Unit price (USD)', { kind: 'price', currency: 'USD', quantity: null }],
    ['Rail-to-rail', { kind: 'rail', sense: 'words' }],
    ['RRI', { kind: 'rail', sense: 'input' }],
    ['Ground sensing', { kind: 'rail', sense: 'ground' }],
    ['Load (kΩ)', { kind: 'load', unit: 'kΩ' }],
    ['Rload min', { kind: 'known', field: 'resistance' }],
    ['0.1..10 Hz noise (µVpp)', { kind: 'known' }],
    ['Maker P/N', { kind: 'known', field: null }],
    ['Shutdown', { kind: 'known', field: null }],
  ])('%s', (header, reading) => {
    expect(readOrdinaryHeader(header)).toMatchObject(reading);
  });

  it('keeps figures as text that no check reads under this kind or frequency', () => {
    for (const header of ['Vos min (mV)', 'Noise 10 Hz (nV/√Hz)', 'CMRR @ 100 kHz (dB)', 'Noise (µVpp)']) expect(readOrdinaryHeader(header), header).toMatchObject({ kind: 'known' });
  });

  it('asks where a header has two readings, with the headers that say each', () => {
    const reading = readOrdinaryHeader('VOH @ 2k');
    if (reading?.kind !== 'question') throw new Error('no question');
    for (const { header } of reading.choices.slice(0, -1)) expect(readAnyHeader(header).kind, header).toMatch(/^(?:figure|measured)$/u);
    expect(reading.choices.at(-1)?.header).toBe('text');
  });

  it('does not pass over a word in brackets that decides', () => {
    expect(readOrdinaryHeader('Swing (low) (mV)')).toMatchObject({ target: 'outputLowHeadroom' });
    expect(readOrdinaryHeader('Swing (lower part) (mV)')).toBeNull();
  });

  it('refuses a unit that does not measure what the words say', () => {
    expect(readOrdinaryHeader('Vos max (MHz)')).toMatchObject({ kind: 'problem', reason: expect.stringContaining('not a unit of offset voltage') as string });
  });

  it.each(['Stock bin', 'Gain', 'where used', 'Favourite'])('does not know %s', (header) => {
    expect(readOrdinaryHeader(header)).toBeNull();
  });

  it('reads canonical headers as canonical', () => {
    expect(readAnyHeader('offset voltage max (mV)')).toMatchObject({ kind: 'figure', parameter: 'offsetVoltage', limit: 'max' });
    expect(readAnyHeader('offset voltage (mV)')).toMatchObject({ kind: 'measured', target: 'offsetVoltage', limit: null });
  });
});
