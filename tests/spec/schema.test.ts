import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { SPEC_CODES } from '../../src/spec/codes.js';
import { acceptedKeys, fieldAt, FIELDS, howToWrite, keysPerLevel, renderStageHelp } from '../../src/spec/schema.js';

describe('the table of fields', () => {
  it('lists the keys of every level', () => {
    expect(acceptedKeys('')).toEqual([
      'name', 'topology', 'supply', 'supplyPeak', 'gain', 'resistors', 'reference',
      'legs', 'photodiode', 'shunt', 'filter', 'integrator', 'oscillator', 'drives', 'capacitors',
      'signal', 'source', 'load', 'temperature', 'following', 'converter', 'battery',
      'overdrive', 'sequencing', 'supplyRipple', 'dutyCycle', 'limits', 'wishes', 'margins', 'mayChange', 'avoid', 'part',
    ]);
    expect(keysPerLevel()['limits.settling']).toEqual(['within', 'to']);
    expect(acceptedKeys('legs.trim')).toEqual(['input', 'amplitude', 'resistance', 'gain']);
    expect(Object.keys(keysPerLevel())).toEqual([
      '', 'resistors', 'reference', 'legs', 'legs.NAME', 'photodiode', 'shunt', 'filter', 'integrator', 'oscillator', 'drives', 'capacitors',
      'signal', 'source', 'load', 'following', 'converter', 'battery', 'supplyRipple', 'dutyCycle', 'limits', 'limits.settling', 'wishes', 'margins',
    ]);
  });

  it('has a map above every nested field, and no path twice', () => {
    for (const { path } of FIELDS.filter((row) => row.path.includes('.'))) expect(fieldAt(path.slice(0, path.lastIndexOf('.')))?.shape, path).toBe('map');
    expect(new Set(FIELDS.map((row) => row.path)).size).toBe(FIELDS.length);
  });

  it('gives help for every field', () => {
    const help = renderStageHelp();
    expect(help).toHaveLength(FIELDS.length);
    for (const line of help) expect([line.accepted, line.example, line.meaning].every((text) => text.length > 0), line.path).toBe(true);
    expect(help.find((line) => line.path === 'signal.input')).toEqual({ path: 'signal.input', accepted: 'a voltage or a range: 25 mV..330 mV', example: '25 mV..330 mV', meaning: 'DC-coupled: extremes at the stage input against ground', option: '--input', topologies: ['follower', 'non-inverting', 'inverting', 'sallen-key-low-pass', 'multiple-feedback-low-pass', 'integrator'] });
  });

  it('shows how to write a field in a file and on the command line', () => {
    expect(howToWrite('limits.settling.to', true)).toBe('limits: {settling: {to: 0.1 %}}');
    expect(howToWrite('supply', false)).toBe('--supply "5 V ± 5 %"');
    expect(howToWrite('limits.dcError', false)).toBe('--set "limits.dcError=20 mV"');
  });
});

describe('the codes', () => {
  it('are exactly those that the room reports', () => {
    const folder = new URL('../../src/spec/', import.meta.url);
    const sources = readdirSync(folder).filter((name) => name !== 'codes.ts').map((name) => readFileSync(new URL(name, folder), 'utf8'));
    const used = new Set(sources.flatMap((text) => [...text.matchAll(/'(S1\d\d)'/g)].map((match) => match[1])));
    expect([...used].sort()).toEqual(SPEC_CODES.map(({ code }) => code));
  });
});
