import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { readStage } from '../../src/spec/read.js';
import { acceptedKeys, FIELDS } from '../../src/spec/schema.js';
import { codesOf, DEMO, option, printedAll, specOf } from '../support/stage-file.js';

describe('the demo stage of the contract', () => {
  const spec = specOf(DEMO);

  it('reads to exact numbers', () => {
    expect(spec).toMatchObject({
      name: 'Soil-moisture probe, second amplifier',
      topology: 'non-inverting',
      supply: { min: 3, nominal: 3.6, max: 4.2, text: '3 V..4.2 V' },
      supplyPeak: { value: 4.5, text: '4.5 V' },
      gain: { value: 8, text: '8 V/V' },
      resistors: { feedback: { value: 70e3 }, input: { value: 10e3 }, tolerance: { value: 0.01, text: '1 %' } },
      reference: { kind: 'ground', value: { min: 0, nominal: 0, max: 0 } },
      signal: { coupling: 'dc', shape: 'sine', input: { min: 0.025, max: 0.33 }, output: { min: 0.2, max: 2.64 }, frequency: { top: 2000, text: '2 kHz' } },
      source: { resistance: { value: 1000 } },
      load: { resistance: { value: 10e3, text: '10 kΩ' }, to: 'ground', capacitance: { value: 100e-12 } },
      temperature: { min: -20, nominal: 20, max: 60 },
      wishes: { channels: 1, package: ['SOT-23-5', 'SC-70-5'], qualification: 'AEC-Q100 grade 1', status: ['approved'], price: { amount: 1, currency: 'EUR' } },
      margins: { slewRate: 1, gainBandwidth: 1, outputHeadroom: { value: 0 } },
      mayChange: ['limits.dcError', 'limits.swingLoss', 'gain'],
      avoid: [],
      notes: [],
    });
    expect(spec.keepFeedback).toBeUndefined();
  });

  it('reads its limits to exact numbers', () => {
    expect(spec.limits).toMatchObject({
      swingLoss: { value: 0 },
      gainError: { value: 0.01 },
      dcError: { value: 0.02, text: '20 mV' },
      outputNoise: { value: 300e-6, text: '300 µVrms' },
      supplyCurrent: { value: 80e-6 },
      settling: { within: { value: 20e-6 }, to: { value: 0.001 } },
      phaseMargin: { value: 45 },
    });
    expect(spec.limits.distortion?.value).toBeCloseTo(10 ** (-70 / 20), 15);
  });

  it('knows where every field was written', () => {
    expect(spec.positions).toMatchObject({
      topology: { line: 2, column: 11 },
      supply: { line: 3, column: 9 },
      'resistors.input': { line: 6, column: (DEMO.split('\n')[5] ?? '').indexOf('10 kΩ') + 1 },
      signal: { line: 8, column: 1 },
      'signal.input': { line: 9, column: 10 },
      'limits.settling.to': { line: 24, column: (DEMO.split('\n')[23] ?? '').indexOf('0.1 %') + 1 },
      mayChange: { line: 28, column: 12 },
    });
  });
});

describe('JSON', () => {
  const { positions: _yaml, ...fromYaml } = specOf(DEMO);

  it.each([undefined, 2, '\t'])('reads as its YAML does, indented by %j', (indent) => {
    const { positions: _json, ...fromJson } = specOf(JSON.stringify(parse(DEMO, { schema: 'failsafe' }), null, indent));
    expect(fromJson).toEqual(fromYaml);
  });

  it('takes numbers as they are written', () => {
    const spec = specOf('{"topology": "inverting", "supply": "5 V", "gain": 8.50, "signal": {"input": "0..1 V"}, "wishes": {"channels": 2}}');
    expect([spec.gain?.value, spec.wishes.channels]).toEqual([8.5, 2]);
  });
});

describe('files that hold no stage', () => {
  it.each([
    ['', ['S102']],
    ['# only a comment\n', ['S102']],
    ['---\n', ['S102']],
    ['- topology: follower\n', ['S103']],
    ['[]', ['S103']],
    ['hello', ['S103']],
    ['gain:8', ['S103']],
    ['null', ['S102']],
    ['{}', ['S102', 'S102', 'S102']],
    ['topology: follower\n---\ntopology: follower\n', ['S100']],
    ['limits:\n\tdcError: 5 mV\n', ['S100']],
    ['a\0b', ['S100']],
    ['{'.repeat(500), ['S100']],
    ['- '.repeat(5000), ['S100']],
    ['x'.repeat(300_000), ['S100']],
  ])('%#: %j', (text, codes) => {
    expect(codesOf(text)).toEqual(codes);
  });

  it('reads a file that starts with a byte order mark, and one with Windows line ends', () => {
    expect(specOf(`\uFEFF${DEMO}`)).toEqual(specOf(DEMO));
    expect(specOf(DEMO.replaceAll('\n', '\r\n'))).toEqual(specOf(DEMO));
  });

  it('names options, not lines, when there is no file', () => {
    expect(printedAll(null)).toMatchInlineSnapshot(`
      "
      error[S102]: topology: topology is missing; accepted: follower, non-inverting, inverting, summing, difference, transimpedance, low-side-sense, high-side-sense, sallen-key-low-pass, multiple-feedback-low-pass, integrator, relaxation-oscillator
         fix: --topology "non-inverting"
      error[S102]: supply: supply is missing; accepted: one voltage, a tolerance or a range: 5 V, 5 V ± 5 %, 3.0..4.2 V
         fix: --supply "5 V ± 5 %"
      error[S102]: signal.input: signal.input is missing; accepted: a voltage or a range: 25 mV..330 mV
         fix: --input "25 mV..330 mV"
      "
    `);
  });

  it('is satisfied by options alone', () => {
    const spec = specOf(null, [option('topology', 'follower', '--topology'), option('supply', '5 V', '--supply'), option('signal.input', '1..2 V', '--input')]);
    expect(spec).toMatchObject({ topology: 'follower', supply: { min: 5, max: 5 }, signal: { input: { min: 1, max: 2 } }, positions: { supply: { option: '--supply' } } });
    expect(specOf('# nothing\n', [option('topology', 'follower'), option('supply', '5 V'), option('signal.input', '1..2 V')]).topology).toBe('follower');
  });
});

describe('any text', () => {
  const keys = fc.constantFrom(...FIELDS.map((row) => row.path), ...acceptedKeys(''));
  const values = fc.oneof(fc.string(), fc.constantFrom(...FIELDS.map((row) => row.example), '8', '-', '[', '{a: 1}', 'null', '&a 1', '*a', '>', '"'));

  it('never throws, and is either a stage or coded problems', () => {
    const texts = fc.oneof(fc.string(), fc.string({ unit: 'binary' }), fc.array(fc.tuple(keys, values)).map((lines) => lines.map(([key, value]) => `${key}: ${value}`).join('\n')));
    fc.assert(fc.property(texts, (text) => isAnswered(readStage(text))), { numRuns: 500 });
  });

  it('never throws on any option', () => {
    fc.assert(fc.property(keys, values, (path, text) => isAnswered(readStage(DEMO, { overrides: [option(path, text)] }))), { numRuns: 500 });
  });

  function isAnswered(result: ReturnType<typeof readStage>): boolean {
    if (result.ok) return result.spec.supply.max > 0;
    return result.problems.length > 0 && result.problems.every(({ code, message }) => /^[QS]\d{3}$/.test(code) && message.length > 0 && !message.includes('undefined'));
  }
});
