import { describe, expect, it } from 'vitest';
import { canonicalHeader } from '../../src/intake/canonical-header.js';
import { readHeader } from '../../src/intake/header.js';
import type { Condition, Parameter } from '../../src/parts/figures.js';
import { PARAMETERS } from '../../src/parts/figures.js';

const LOADS: Readonly<Record<string, Condition>> = {
  '@ 1 mA, 5 V': { supply: 5, load: { kind: 'current', amperes: 0.001 } },
  '@ 2 kΩ to ground, 5 V': { supply: 5, load: { kind: 'resistance', ohms: 2000, to: 'ground' } },
  '@ 2 kΩ to supply': { load: { kind: 'resistance', ohms: 2000, to: 'supply' } },
  '@ 2 kΩ to mid-supply': { load: { kind: 'resistance', ohms: 2000, to: 'mid-supply' } },
  '@ 2 kΩ': { load: { kind: 'resistance', ohms: 2000, to: 'mid-supply' } },
  '@ 10k to GROUND': { load: { kind: 'resistance', ohms: 10_000, to: 'ground' } },
  '@ 25 °C': { temperature: 25 },
  '@ -40 °C': { temperature: -40 },
  '@ over temperature': { temperature: 'over' },
  '@ gain 10': { gain: 10 },
  '@ 10 V/V': { gain: 10 },
  '@5V,25°C': { supply: 5, temperature: 25 },
};

describe('the canonical headers of the contract', () => {
  it.each([
    ['supply voltage min (V)', 'supplyVoltage', 'min'],
    ['supply voltage max (V)', 'supplyVoltage', 'max'],
    ['supply absolute maximum (V)', 'supplyAbsoluteMaximum', 'max'],
    ['input low headroom max (V)', 'inputLowHeadroom', 'max'],
    ['output high headroom max (mV) @ 1 mA, 5 V', 'outputHighHeadroom', 'max'],
    ['output low headroom max (mV) @ 2 kΩ to ground, 5 V', 'outputLowHeadroom', 'max'],
    ['slew rate min (V/µs)', 'slewRate', 'min'],
    ['gain bandwidth typ (MHz)', 'gainBandwidth', 'typ'],
    ['open loop gain min (dB)', 'openLoopGain', 'min'],
    ['offset voltage max (mV)', 'offsetVoltage', 'max'],
    ['offset drift max (µV/K)', 'offsetDrift', 'max'],
    ['bias current max (pA) @ 25 °C', 'biasCurrent', 'max'],
    ['offset current max (pA)', 'offsetCurrent', 'max'],
    ['common mode rejection min (dB)', 'commonModeRejection', 'min'],
    ['supply rejection min (dB)', 'supplyRejection', 'min'],
    ['voltage noise typ (nV/√Hz)', 'voltageNoise', 'typ'],
    ['noise corner typ (Hz)', 'noiseCorner', 'typ'],
    ['quiescent current max (µA)', 'quiescentCurrent', 'max'],
    ['output current min (mA)', 'outputCurrent', 'min'],
    ['temperature min (°C)', 'temperature', 'min'],
    ['temperature max (°C)', 'temperature', 'max'],
    ['minimum stable gain max (V/V)', 'minimumStableGain', 'max'],
  ])('%s', (text, parameter, limit) => {
    expect(readHeader(text)).toMatchObject({ kind: 'figure', parameter, limit });
  });

  it.each(['id', 'description', 'status', 'lifecycle', 'package', 'channels', 'qualification', 'class', 'family'])('%s', (field) => {
    expect(readHeader(field)).toEqual({ kind: 'identity', field });
  });

  it('price and statements', () => {
    expect(readHeader('price (EUR) @ 1000')).toEqual({ kind: 'price', currency: 'EUR', quantity: 1000 });
    expect(readHeader('price (USD)')).toEqual({ kind: 'price', currency: 'USD', quantity: null });
    expect(readHeader('phase reversal')).toEqual({ kind: 'statement', statement: 'phaseReversal' });
    expect(readHeader('Input Clamp')).toEqual({ kind: 'statement', statement: 'inputClamp' });
    expect(readHeader('input type')).toEqual({ kind: 'statement', statement: 'inputType' });
  });

  it.each(Object.entries(LOADS))('reads the conditions %s', (words, condition) => {
    const reading = readHeader(`output low headroom max (mV) ${words}`);
    expect(reading).toEqual({ kind: 'figure', parameter: 'outputLowHeadroom', limit: 'max', unit: 'mV', condition });
  });
});

describe('every figure railfit knows', () => {
  const all = (Object.keys(PARAMETERS) as Parameter[]).flatMap((parameter) => PARAMETERS[parameter].kinds.map((kind) => ({ parameter, kind })));

  it.each(all)('has a header that is written and read: $parameter $kind', ({ parameter, kind }) => {
    for (const condition of [{}, ...Object.values(LOADS)]) {
      const header = canonicalHeader(parameter, kind, condition);
      expect(readHeader(header)).toEqual({ kind: 'figure', parameter, limit: kind, unit: PARAMETERS[parameter].headerUnit, condition });
      expect(readHeader(header.replace(/ (?=\S)/gu, '  '))).toEqual(readHeader(header));
    }
  });
});

describe('readHeader', () => {
  it.each(['Bias Current Max (nA)', 'bias-current max(µA)', 'BIAS  CURRENT  MAX  ( pA )', 'bias current maximum (pA)'])('accepts %s', (text) => {
    expect(readHeader(text)).toMatchObject({ kind: 'figure', parameter: 'biasCurrent', limit: 'max' });
  });

  it.each([
    ['bias current max (mV)', /not a unit of bias current/u, 'bias current max (pA)'],
    ['gain bandwidth min (mhz)', /not a unit of gain bandwidth/u, 'gain bandwidth min (MHz)'],
    ['voltage noise typ (nV/Hz)', /not a unit of voltage noise/u, 'voltage noise typ (nV/√Hz)'],
    ['output current typ (mA)', /not kept with the kind typ/u, 'output current min (mA)'],
    ['offset voltage (mV)', /limit kind is missing/u, 'offset voltage typ (mV) or offset voltage max (mV)'],
    ['slew rate min (V/µs) @ loud', /"loud" is not a load, supply, temperature or gain/u, 'slew rate min (V/µs)'],
    ['slew rate min (V/µs) @ 5 V, 3 V', /two conditions for the supply/u, 'slew rate min (V/µs)'],
    ['slew rate min (V/µs) @ ', /an empty condition/u, 'slew rate min (V/µs)'],
    ['price (EUROS) @ 1000', /ISO 4217/u, 'price (EUR) @ 1000'],
    ['price (EUR) @ many', /not a quantity/u, 'price (EUR) @ 1000'],
  ])('refuses %s', (text, reason, fix) => {
    const reading = readHeader(text);
    expect(reading).toMatchObject({ kind: 'problem', fix });
    expect(reading.kind === 'problem' && reading.reason).toMatch(reason);
  });

  it('keeps an unknown header as text and says what may be meant', () => {
    expect(readHeader('where used')).toEqual({ kind: 'text' });
    expect(readHeader('slew rat min (V/µs)')).toEqual({ kind: 'text', suggestion: 'slew rate min (V/µs)' });
    expect(readHeader('pakage')).toEqual({ kind: 'text', suggestion: 'package' });
    expect(readHeader('')).toEqual({ kind: 'text' });
  });

  it('takes a header without unit: each cell then brings its own', () => {
    expect(readHeader('slew rate min')).toMatchObject({ kind: 'figure', unit: null });
  });
});
