import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { FIELDS } from '../../src/spec/schema.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { BASE, codesOf, problemsOf, specOf } from '../support/stage-file.js';

type Accepted = readonly [text: string, pick: (spec: StageSpec) => unknown, value: unknown];
type Refused = readonly [text: string, code: string];

const without = (...keys: readonly string[]): string => BASE.split('\n').filter((line) => !keys.some((key) => line.startsWith(`${key}:`))).join('\n');
const stage = (lines: string): string => `${without(...[...lines.matchAll(/^(\w+):/gm)].map((match) => match[1] ?? ''))}\n${lines}\n`;
const bridge = (signal: string): string => stage(`topology: difference\nsignal: ${signal}`);

const ACCEPTED: readonly Accepted[] = [
  ['name: 12', (s) => s.name, '12'],
  ['topology: inverting', (s) => s.topology, 'inverting'],
  ['supply: 5 V', (s) => [s.supply.min, s.supply.nominal, s.supply.max], [5, 5, 5]],
  ['supply: 5 V ± 5 %', (s) => [s.supply.min, s.supply.nominal, s.supply.max], [4.75, 5, 5.25]],
  ['supply: 5 V +5/-10 %', (s) => [s.supply.min, s.supply.nominal, s.supply.max], [4.5, 5, 5.25]],
  ['supply: 3.0/3.6/4.2 V', (s) => [s.supply.min, s.supply.nominal, s.supply.max], [3, 3.6, 4.2]],
  ['supply: 3V3', (s) => s.supply.nominal, 3.3],
  ['part: GX-CMOS-1M-RRIO', (s) => s.part, 'GX-CMOS-1M-RRIO'],
  ['supplyPeak: 6 V', (s) => s.supplyPeak?.value, 6],
  ['supplyPeak: max 6 V', (s) => s.supplyPeak, { value: 6, text: '6 V' }],
  ['gain: 20 dB', (s) => s.gain?.value, 10],
  ['gain: x8', (s) => s.gain?.value, 8],
  ['topology: inverting\ngain: -8', (s) => s.gain, { value: 8, text: '8 V/V' }],
  ['topology: inverting\ngain: 8', (s) => s.gain, { value: 8, text: '8 V/V' }],
  ['topology: inverting\ngain: 0.5', (s) => s.gain?.value, 0.5],
  ['topology: follower\ngain: 1', (s) => s.gain?.value, 1],
  ['resistors: {feedback: 4k7}', (s) => s.resistors, { feedback: { value: 4700, text: '4.7 kΩ' } }],
  ['resistors: {tolerance: ±0.1 %}', (s) => s.resistors?.tolerance?.value, 0.001],
  ['reference: ground', (s) => s.reference?.kind, 'ground'],
  ['reference: 0 V', (s) => s.reference?.kind, 'ground'],
  ['reference: mid-supply', (s) => s.reference, { kind: 'mid-supply', value: { min: 1, nominal: 1, max: 1, text: 'mid-supply' } }],
  ['reference: 2.5 V', (s) => [s.reference?.kind, s.reference?.value.min, s.reference?.value.max], ['voltage', 2.5, 2.5]],
  ['reference: 2.5 V ± 1 %', (s) => [s.reference?.value.min, s.reference?.value.nominal, s.reference?.value.max], [2.475, 2.5, 2.525]],
  ['reference: 1.2..1.3 V', (s) => [s.reference?.value.min, s.reference?.value.nominal, s.reference?.value.max], [1.2, 1.25, 1.3]],
  ['reference: {value: 2.5 V, tolerance: 2 %}', (s) => [s.reference?.value.min, s.reference?.value.nominal, s.reference?.value.max], [2.45, 2.5, 2.55]],
  ['reference: {value: mid-supply, tolerance: 1 %, resistance: 5 kΩ, bypass: 1 µF}', (s) => [s.reference?.kind, s.reference?.value.min, s.reference?.value.max, s.reference?.resistance?.value, s.reference?.bypass?.value], ['mid-supply', 0.99, 1.01, 5000, 1e-6]],
  ['signal: {input: 0.2 V}', (s) => [s.signal.input?.min, s.signal.input?.max], [0.2, 0.2]],
  ['signal: {input: -50..100 mV}', (s) => [s.signal.input?.min, s.signal.input?.max], [-0.05, 0.1]],
  ['signal: {input: 1 V ± 10 %}', (s) => [s.signal.input?.min, s.signal.input?.max], [0.9, 1.1]],
  ['signal: {amplitude: 200 mVpp, center: 1.5 V}', (s) => [s.signal.input, s.signal.amplitude], [{ min: 1.4, max: 1.6, text: '200 mVpp (100 mVpk) about 1.5 V' }, undefined]],
  ['signal: {amplitude: 100 mVpk, coupling: ac}', (s) => [s.signal.amplitude?.value, s.signal.input], [0.1, undefined]],
  ['signal: {input: 1..2 V}', (s) => [s.signal.coupling, s.signal.shape, s.signal.frequency], ['dc', 'band-limited', undefined]],
  ['signal: {input: 1..2 V, shape: sine}', (s) => s.signal.shape, 'sine'],
  ['signal: {input: 1..2 V, output: 0.2..2.64 V}', (s) => [s.signal.output?.min, s.signal.output?.max], [0.2, 2.64]],
  ['signal: {input: 1..2 V, frequency: 20 Hz..2 kHz}', (s) => s.signal.frequency, { bottom: 20, top: 2000, text: '20 Hz..2 kHz' }],
  ['signal: {input: 1..2 V, frequency: max 2 kHz}', (s) => s.signal.frequency, { top: 2000, text: '2 kHz' }],
  ['source: 1 kΩ', (s) => s.source, { resistance: { value: 1000, text: '1 kΩ' } }],
  ['source: {resistance: 1 kΩ, tolerance: 5 %}', (s) => s.source?.tolerance?.value, 0.05],
  ['load: 10 kΩ to ground, 100 pF', (s) => [s.load?.resistance?.value, s.load?.to, s.load?.capacitance?.value], [10e3, 'ground', 100e-12]],
  ['load: 100 pF', (s) => s.load, { to: 'ground', capacitance: { value: 100e-12, text: '100 pF' } }],
  ['load: 2 kΩ to supply', (s) => [s.load?.resistance?.value, s.load?.to], [2000, 'supply']],
  ['load: 2k2 to reference; 4n7', (s) => [s.load?.resistance?.value, s.load?.to, s.load?.capacitance?.value], [2200, 'reference', 4.7e-9]],
  ['load: "4,7 kΩ,100 pF"', (s) => [s.load?.resistance?.value, s.load?.capacitance?.value], [4700, 100e-12]],
  ['load: {capacitance: 1 nF}', (s) => s.load?.capacitance?.value, 1e-9],
  ['load: {resistance: 10k}', (s) => [s.load?.to, s.notes], ['ground', ['load 10 kΩ taken to ground']]],
  ['temperature: 85 °C', (s) => [s.temperature?.min, s.temperature?.max], [85, 85]],
  ['temperature: -40/+85 °C', (s) => [s.temperature?.min, s.temperature?.max], [-40, 85]],
  ['limits: {swingLoss: 20 mV}', (s) => s.limits.swingLoss?.value, 0.02],
  ['limits: {gainErrorKind: vector}', (s) => s.limits.gainErrorKind, 'vector'],
  ['limits: {dcError: ±20 mV}', (s) => s.limits.dcError, { value: 0.02, text: '20 mV' }],
  ['limits: {dcError: <20 mV}', (s) => s.limits.dcError, { value: 0.02, text: '20 mV' }],
  ['limits: {outputNoise: 1 mVrms}', (s) => s.limits.outputNoise, { value: 0.001, text: '1 mVrms' }],
  ['limits: {outputNoise: max 300 uV rms}', (s) => s.limits.outputNoise, { value: 300e-6, text: '300 µVrms' }],
  ['limits: {snr: 60 dB}', (s) => s.limits.snr?.value, 1000],
  ['limits: {distortion: -60 dB}', (s) => s.limits.distortion, { value: 0.001, text: '−60 dB' }],
  ['limits: {distortion: 60 dBc}', (s) => s.limits.distortion?.value, 0.001],
  ['limits: {distortion: 0.1 %}', (s) => s.limits.distortion, { value: 0.001, text: '0.1 %' }],
  ['limits: {supplyCurrent: 80 µA, supplyCurrentPer: package}', (s) => [s.limits.supplyCurrent?.value, s.limits.supplyCurrentPer], [80e-6, 'package']],
  ['limits: {settling: {within: 20 µs, to: 0.1 %}}', (s) => [s.limits.settling?.within.value, s.limits.settling?.to.value], [20e-6, 0.001]],
  ['limits: {phaseMargin: min 60°}', (s) => s.limits.phaseMargin?.value, 60],
  ['limits:', (s) => s.limits, {}],
  ['wishes: {channels: 2, qualification: AEC-Q100 grade 1}', (s) => [s.wishes.channels, s.wishes.qualification], [2, 'AEC-Q100 grade 1']],
  ['wishes: {package: SOT-23-5}', (s) => s.wishes.package, ['SOT-23-5']],
  ['wishes: {status: "approved, conditional", lifecycle: [active, nrnd]}', (s) => [s.wishes.status, s.wishes.lifecycle], [['approved', 'conditional'], ['active', 'nrnd']]],
  ['wishes: {price: 0.50 USD}', (s) => [s.wishes.price?.amount, s.wishes.price?.currency], [0.5, 'USD']],
  ['margins: {slewRate: 1.5, gainBandwidth: 0.8}', (s) => [s.margins.slewRate, s.margins.gainBandwidth], [1.5, 0.8]],
  ['margins: {outputHeadroom: 20 mV}', (s) => s.margins.outputHeadroom?.value, 0.02],
  ['mayChange: []', (s) => s.mayChange, []],
  ['mayChange: [load, limits.settling.within]', (s) => s.mayChange, ['load', 'limits.settling.within']],
  ['avoid: [crossover, phase-reversal, clamp, overdrive]', (s) => s.avoid, ['crossover', 'phase-reversal', 'clamp', 'overdrive']],
];

const REFUSED: readonly Refused[] = [
  ['supply: 5', 'Q001'],
  ['supply: 4.2..3.0 V', 'Q007'],
  ['supply: min 4.5 V', 'S112'],
  ['supply: typ 5 V', 'S112'],
  ['supply: 0 V', 'S110'],
  ['supply: 0..5 V', 'S110'],
  ['supply:', 'Q020'],
  ['supplyPeak: 5..6 V', 'S112'],
  ['gain: 4..8', 'S112'],
  ['gain: 0', 'S110'],
  ['gain: 1', 'S110'],
  ['gain: 0.5', 'S110'],
  ['gain: -8', 'S110'],
  ['topology: follower\ngain: 2', 'S110'],
  ['resistors: {feedback: 70 kΩ ± 1 %}', 'S112'],
  ['resistors: {feedback: 10M}', 'Q002'],
  ['resistors: {feedback: 0 Ω}', 'S110'],
  ['resistors: {feedback: -1 kΩ}', 'S110'],
  ['resistors: {tolerance: 150 %}', 'S110'],
  ['resistors: {tolerance: 100 %}', 'S110'],
  ['resistors: {positiveInput: 10 kΩ}', 'S108'],
  ['resistors: 10 kΩ', 'S103'],
  ['topology: follower\ngain: 1\nresistors: {feedback: 1 kΩ, input: 1 kΩ}', 'S108'],
  ['reference: midsupply', 'S104'],
  ['reference: mid-supply ± 1 %', 'S104'],
  ['reference: 2.5', 'Q001'],
  ['reference: max 2.5 V', 'S112'],
  ['reference: {tolerance: 1 %}', 'S102'],
  ['reference: {value: ground, tolerance: 1 %}', 'S108'],
  ['reference: {value: 2.5 V ± 1 %, tolerance: 1 %}', 'S109'],
  ['signal: {input: 1 mA}', 'Q004'],
  ['signal: {amplitude: 1 V, center: 2 V}', 'Q014'],
  ['signal: {amplitude: 1 Vpk}', 'S108'],
  ['signal: {input: 1 V, center: 1 V}', 'S108'],
  ['signal: {center: 1 V}', 'S102'],
  ['signal: {coupling: ac, input: 1..2 V}', 'S108'],
  ['signal: {coupling: ac, amplitude: 1 Vpk, center: 1 V}', 'S108'],
  ['signal: {coupling: ac}', 'S102'],
  ['signal: {positive: 1..2 V}', 'S108'],
  ['signal: {input: 1 V, coupling: dcc}', 'S104'],
  ['signal: {input: 1 V, frequency: 0 Hz}', 'S110'],
  ['signal: {input: 1 V, frequency: 2 kHz ± 5 %}', 'S112'],
  ['signal: {input: 1 V, frequency: min 2 kHz}', 'S112'],
  ['signal: 1 V', 'S103'],
  ['source: 1 kΩ ± 5 %', 'S112'],
  ['source: {tolerance: 5 %}', 'S102'],
  ['load: 0 Ω', 'S110'],
  ['load: 10M', 'Q002'],
  ['load: 10 kΩ to vcc', 'S104'],
  ['load: 10 kΩ, 20 kΩ', 'S109'],
  ['load: {to: ground}', 'S102'],
  ['load: {to: supply, capacitance: 1 nF}', 'S102'],
  ['load: {}', 'S102'],
  ['temperature: min -20 °C', 'S112'],
  ['limits: {swingLoss: -5 mV}', 'S110'],
  ['limits: {gainError: 100 %}', 'S110'],
  ['limits: {gainError: 0 %}', 'S110'],
  ['limits: {gainErrorKind: phase}', 'S104'],
  ['limits: {dcError: 0 V}', 'S110'],
  ['limits: {dcError: min 5 mV}', 'S112'],
  ['limits: {outputNoise: 300 µV}', 'Q014'],
  ['limits: {outputNoise: 2 mVpp}', 'Q014'],
  ['limits: {snr: 0 dB}', 'S110'],
  ['limits: {snr: max 70 dB}', 'S112'],
  ['limits: {distortion: 0 dB}', 'S110'],
  ['limits: {supplyCurrent: 80}', 'Q001'],
  ['limits: {supplyCurrent: 0 A}', 'S110'],
  ['limits: {settling: 20 µs}', 'S103'],
  ['limits: {settling: {within: 20 µs}}', 'S102'],
  ['limits: {settling: {within: 20 µs, to: 0 %}}', 'S110'],
  ['limits: {phaseMargin: 180°}', 'S110'],
  ['limits: [dcError]', 'S103'],
  ['wishes: {channels: 0}', 'S110'],
  ['wishes: {package: [[a]]}', 'S103'],
  ['wishes: {package: []}', 'S103'],
  ['wishes: {status: [aproved]}', 'S104'],
  ['wishes: {lifecycle: alive}', 'S104'],
  ['wishes: {qualification: [a]}', 'S103'],
  ['margins: {slewRate: 0}', 'S110'],
  ['margins: {outputHeadroom: -1 mV}', 'S110'],
  ['mayChange: [limits.dcErorr]', 'S101'],
  ['mayChange: [name]', 'S104'],
  ['avoid: [clamping]', 'S104'],
  ['part: [GX-CMOS-1M-RRIO]', 'S103'],
  ['photodiode: {current: 0..2 µA}', 'S108'],
];

describe('every field', () => {
  it.each(ACCEPTED.map(([text, pick, value]) => ({ text, pick, value })))('takes $text', ({ text, pick, value }) => {
    expect(pick(specOf(stage(text)))).toEqual(value);
  });

  it.each(REFUSED.map(([text, code]) => ({ text, code })))('refuses $text with $code', ({ text, code }) => {
    expect(codesOf(stage(text))).toEqual([code]);
  });

  it('says what is accepted and what to type, wherever it refuses', () => {
    for (const [text] of REFUSED) {
      for (const problem of problemsOf(stage(text))) {
        expect(problem.fix, text).toBeTruthy();
        expect(problem.place?.line, text).toBeGreaterThan(0);
        expect(problem.message, text).not.toMatch(/please|oops|!|undefined|null/i);
      }
    }
  });

  it('has a tested form', () => {
    // The last lines stand for the tests of a difference stage, below, and of the topologies, which have a file of their own.
    const elsewhere = ['resistors.positiveInput resistors.toReference signal.negative signal.differential signal.commonMode', ...['topologies.test.ts', 'hazards.test.ts'].map((name) => readFileSync(new URL(name, import.meta.url), 'utf8')), 'legs.NAME'];
    const tested = [...ACCEPTED.map(([text]) => text), BASE, ...elsewhere].join('\n');
    for (const { path } of FIELDS) expect(tested, path).toContain(path.slice(path.lastIndexOf('.') + 1));
  });

  it('takes its own example', () => {
    for (const row of FIELDS) {
      const keys = row.path.split('.');
      const line = keys.reduceRight((inner, key, at) => (at === 0 ? `${key}: ${inner}` : `{${key}: ${inner}}`), row.example.includes(',') && !/^[[{]/.test(row.example) ? `"${row.example}"` : row.example);
      const codes = codesOf(stage(line)).filter((code) => code !== 'S102' && code !== 'S108');
      expect(codes, line).toEqual([]);
    }
  });
});

describe('a difference stage', () => {
  it.each([
    ['{positive: 1.2..1.4 V, negative: 1.2..1.3 V}', []],
    ['{differential: -50..50 mV, commonMode: 1.2..1.3 V}', []],
    ['{positive: 1.2..1.4 V}', ['S102']],
    ['{commonMode: 1.2 V}', ['S102']],
    ['{}', ['S102']],
    ['{input: 1.2..1.4 V}', ['S108']],
    ['{amplitude: 1 Vpk, coupling: ac}', ['S108', 'S107']],
    ['{positive: 1 V, negative: 1 V, differential: 0 V}', ['S108']],
    ['{positive: 1 V, negative: 1 V, coupling: ac}', ['S107']],
  ])('%s: %j', (signal, codes) => {
    expect(codesOf(bridge(signal))).toEqual(codes);
  });

  it('keeps all four resistors', () => {
    const spec = specOf(`${bridge('{positive: 1.2..1.4 V, negative: 1.2..1.3 V}')}resistors: {feedback: 100k, input: 10k, positiveInput: 11k, toReference: 110k}\n`);
    expect([spec.resistors?.positiveInput?.value, spec.resistors?.toReference?.value]).toEqual([11e3, 110e3]);
    expect([spec.signal.positive?.max, spec.signal.negative?.min]).toEqual([1.4, 1.2]);
  });
});
