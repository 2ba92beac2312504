import { describe, expect, it } from 'vitest';
import { BASE, DEMO, option, printedAll, specOf } from '../support/stage-file.js';
import { stageFile } from '../support/topology-stages.js';

const gain = option('gain', '6', '--gain');
const BRIDGE = `topology: difference
supply: 5 V
gain: 10
resistors: {feedback: 100 kΩ, input: 10 kΩ, positiveInput: 10 kΩ, toReference: 100 kΩ}
reference: {value: mid-supply, tolerance: 1 %, resistance: 5 kΩ}
signal: {positive: 1.2..1.4 V, negative: 1.2..1.3 V}
`;

describe('an override', () => {
  it('wins over the file, and the option is its position', () => {
    const spec = specOf(DEMO, [option('limits.dcError', '5 mV'), option('temperature', '25 °C', '--temperature')]);
    expect([spec.limits.dcError?.value, spec.temperature?.max]).toEqual([0.005, 25]);
    expect(spec.positions['limits.dcError']).toEqual({ option: '--set limits.dcError' });
    expect(spec.notes).toEqual([]);
  });

  it('of the same field twice: the last one counts', () => {
    expect(specOf(BASE, [option('supply', '3 V'), option('supply', '4 V')]).supply.nominal).toBe(4);
  });

  it('heals a fault of the file in the same place', () => {
    expect(specOf(BASE.replace('5 V', '[5 V]'), [option('supply', '3 V', '--supply')]).supply.nominal).toBe(3);
    expect(specOf(`${BASE}load: {ohms: 5}\n`, [option('load', '10k', '--load')]).load?.resistance?.value).toBe(10e3);
  });

  it('takes flow maps, lists, quoted texts and signs that YAML would read as its own', () => {
    const spec = specOf(BASE, [
      option('limits.settling', '{within: 20 µs, to: 0.1 %}'),
      option('limits.dcError', '<5 mV'),
      option('limits.phaseMargin', '>45°'),
      option('wishes.package', '[SOT-23-5, SC-70-5]'),
      option('wishes.status', 'approved,conditional'),
      option('name', '"#1: first"'),
    ]);
    expect(spec).toMatchObject({
      name: '#1: first',
      limits: { settling: { within: { value: 20e-6 } }, dcError: { value: 0.005 }, phaseMargin: { value: 45 } },
      wishes: { package: ['SOT-23-5', 'SC-70-5'], status: ['approved', 'conditional'] },
    });
  });

  it('that is wrong is told by its option', () => {
    const overrides = [option('supply', '4.2..3.0 V', '--supply'), option('load', '10M', '--load'), option('signal.input', '1 V to', '--input'), option('gian', '8'), option('limits.settling', '{within: 5}'), option('limits.dcError', '{')];
    expect(printedAll(BASE, overrides)).toMatchInlineSnapshot(`
      "
      error[Q007]: --supply: the range runs downwards
         4.2..3.0 V
         ^^^^^^^^^^
         fix: 3.0..4.2 V
      error[Q002]: --load: 10M has no unit: SI and IEC 60062 read mega (10 MΩ), SPICE reads milli (10 mΩ)
         10M
           ^
         fix: 10 MΩ, 10meg or 10 mΩ
      error[Q013]: --input: 1 V to ends where a number is expected; accepted: a voltage or a range: 25 mV..330 mV
         1 V to
              ^
         fix: 25 mV..330 mV
      error[S101]: --set gian: gian is not a field of the stage file, did you mean gain? accepted: name, topology, supply, supplyPeak, gain, resistors, reference, legs, photodiode, shunt, filter, integrator, oscillator, drives, capacitors, signal, source, load, temperature, following, converter, battery, overdrive, sequencing, supplyRipple, dutyCycle, limits, wishes, margins, mayChange, avoid, part
         fix: gain
      error[S102]: --set limits.settling: limits.settling.to is missing; accepted: a percentage: 0.1 %
         fix: --set "limits.settling.to=0.1 %"
      error[Q001]: --set limits.settling: 5 has no unit; a time is expected
         5
         ^
         fix: 5 µs
      error[S100]: --set limits.dcError: something is missing here: a colon with a space after it, a comma, a closing quote or bracket
         fix: key: value
      "
    `);
  });
});

describe('an override of gain', () => {
  it('keeps feedback and has the input resistor derived again', () => {
    const spec = specOf(DEMO, [gain]);
    expect(spec).toMatchObject({ gain: { value: 6 }, keepFeedback: true, resistors: { feedback: { value: 70e3 } } });
    expect(spec.resistors?.input).toBeUndefined();
    expect(spec.signal.output).toBeUndefined();
    expect(spec.notes).toMatchInlineSnapshot(`
      [
        "--gain 6: feedback 70 kΩ kept, input resistor derived again",
        "--gain 6: signal.output 0.2..2.64 V of the file dropped, the output follows from the gain",
      ]
    `);
  });

  it('keeps toReference too in a difference stage, and lets positiveInput follow', () => {
    const spec = specOf(BRIDGE, [gain]);
    expect(Object.keys(spec.resistors ?? {}).sort()).toEqual(['feedback', 'toReference']);
    expect(spec.notes).toMatchInlineSnapshot(`
      [
        "--gain 6: feedback 100 kΩ and toReference 100 kΩ kept, input resistors derived again",
      ]
    `);
  });

  it('respects an input resistor given beside it', () => {
    const spec = specOf(DEMO, [gain, option('resistors.input', '14 kΩ')]);
    expect(spec.resistors?.input?.value).toBe(14e3);
    expect(spec.keepFeedback).toBeUndefined();
  });

  it('has nothing to keep when the file names no resistors', () => {
    const spec = specOf(BASE, [gain]);
    expect([spec.keepFeedback, spec.resistors, spec.notes]).toEqual([undefined, undefined, []]);
  });
});

describe('an override of a resistor', () => {
  it('of feedback keeps the gain and has the input resistor derived again', () => {
    const spec = specOf(DEMO, [option('resistors.feedback', '100 kΩ')]);
    expect(spec).toMatchObject({ gain: { value: 8 }, keepFeedback: true, resistors: { feedback: { value: 100e3 } } });
    expect(spec.resistors?.input).toBeUndefined();
  });

  it('of input lets the gain follow from the resistors', () => {
    const spec = specOf(DEMO, [option('resistors.input', '14 kΩ')]);
    expect([spec.gain, spec.resistors?.feedback?.value, spec.keepFeedback]).toEqual([undefined, 70e3, undefined]);
    expect(spec.notes).toMatchInlineSnapshot(`
      [
        "--set resistors.input=14 kΩ: gain 8 of the file dropped, it follows from the resistors",
        "--set resistors.input=14 kΩ: signal.output 0.2..2.64 V of the file dropped, the output follows from the gain",
      ]
    `);
  });
});

describe('what an override makes pointless', () => {
  it('supplyPeak below the new top of the supply', () => {
    const spec = specOf(DEMO, [option('supply', '5 V ± 5 %', '--supply')]);
    expect(spec.supplyPeak).toBeUndefined();
    expect(spec.notes).toMatchInlineSnapshot(`
      [
        "--supply 5 V ± 5 %: supplyPeak 4.5 V of the file dropped, it lies below the new top of the supply",
      ]
    `);
  });

  it('but not a supplyPeak above it, or one that an option gave', () => {
    expect(specOf(DEMO, [option('supply', '4.4 V', '--supply')]).supplyPeak?.value).toBe(4.5);
    expect(specOf(DEMO, [option('supply', '5 V', '--supply'), option('supplyPeak', '4 V')]).supplyPeak?.value).toBe(4);
  });

  it('amplitude and center, when input is given', () => {
    const file = BASE.replace('input: 25 mV..330 mV', 'amplitude: 100 mVpk, center: 200 mV');
    const spec = specOf(file, [option('signal.input', '10 mV..300 mV', '--input')]);
    expect(spec.signal.input).toMatchObject({ min: 0.01, max: 0.3 });
    expect(spec.notes).toMatchInlineSnapshot(`
      [
        "--input 10 mV..300 mV: signal.amplitude 100 mVpk and signal.center 200 mV of the file dropped",
      ]
    `);
  });

  it('positive and negative, when differential and commonMode are given', () => {
    const spec = specOf(BRIDGE, [option('signal.differential', '-50..50 mV'), option('signal.commonMode', '1.25 V')]);
    expect([spec.signal.positive, spec.signal.differential?.max]).toEqual([undefined, 0.05]);
  });

  it('an output that only cross-checked the gain, but not one that the gain is solved from', () => {
    const input = option('signal.input', '25 mV..300 mV', '--input');
    expect(specOf(DEMO, [input]).signal.output).toBeUndefined();
    const solved = BASE.replace('gain: 8\n', '').replace('330 mV}', '330 mV, output: 0.2..2.64 V}');
    expect(specOf(solved, [input]).signal.output?.max).toBe(2.64);
  });

  it('the whole load', () => {
    const spec = specOf(DEMO, [option('load', '2 kΩ to supply', '--load')]);
    expect(spec.load).toEqual({ resistance: { value: 2000, text: '2 kΩ' }, to: 'supply' });
    expect(spec.notes).toMatchInlineSnapshot(`
      [
        "--load 2 kΩ to supply replaces load: load.capacitance 100 pF dropped",
      ]
    `);
  });

  it('the whole reference, unless its value alone is named', () => {
    expect(specOf(BRIDGE, [option('reference', '2.5 V', '--reference')]).reference).toMatchObject({ kind: 'voltage', value: { min: 2.5, max: 2.5 } });
    expect(specOf(BRIDGE, [option('reference', '2.5 V', '--reference')]).reference?.resistance).toBeUndefined();
    const kept = specOf(BRIDGE, [option('reference.value', '2.5 V', '--reference')]).reference;
    expect([kept?.value.min, kept?.resistance?.value]).toEqual([2.475, 5000]);
    const own = specOf(BRIDGE, [option('reference.value', '2.5 V ± 2 %', '--reference')]);
    expect([own.reference?.value.min, own.reference?.resistance?.value, own.notes.length]).toEqual([2.45, 5000, 1]);
    expect(specOf(BRIDGE, [option('reference.value', 'ground', '--reference')]).reference).toMatchObject({ kind: 'ground', resistance: { value: 5000 } });
  });

  it('one key of a field in its short form leaves the rest', () => {
    const spec = specOf(`${BASE}load: 10 kΩ to supply\nsource: 1 kΩ\n`, [option('load.capacitance', '1 nF'), option('source.tolerance', '5 %')]);
    expect(spec.load).toMatchObject({ resistance: { value: 10e3 }, to: 'supply', capacitance: { value: 1e-9 } });
    expect(spec.source).toMatchObject({ resistance: { value: 1000 }, tolerance: { value: 0.05 } });
  });
});

describe('what an option on a topology of its own makes pointless', () => {
  const notesOf = (text: string, ...overrides: Parameters<typeof option>[]): readonly string[] => specOf(text, overrides.map((one) => option(...one))).notes;
  const parts = 'filter: {r1: 10k, r2: 11k, c1: 22 nF, c2: 10 nF}';

  it('components, when a response is wanted, and the other way round', () => {
    const spec = specOf(stageFile('sallen-key-low-pass', parts), [option('filter.corner', '2 kHz'), option('filter.q', '1')]);
    expect(spec.filter).toEqual({ corner: { value: 2000, text: '2 kHz' }, q: { value: 1, text: '1' } });
    expect(spec.notes).toEqual(['--set filter.corner=2 kHz: filter.r1 10k and filter.r2 11k and filter.c1 22 nF and filter.c2 10 nF of the file dropped']);
    const fitted = [['filter.r1', '10k'], ['filter.r2', '10k'], ['filter.c1', '1 nF'], ['filter.c2', '1 nF']] as const;
    expect(notesOf(stageFile('sallen-key-low-pass'), ...fitted.map(([path, text]): [string, string] => [path, text]))).toEqual(['--set filter.r1=10k: filter.corner 1 kHz and filter.q 0.707 of the file dropped']);
  });

  it('a response that an option gives in part asks for the rest', () => {
    expect(printedAll(stageFile('sallen-key-low-pass', parts), [option('filter.corner', '2 kHz')])).toContain('error[S102]');
  });

  it('the gain of a multiple-feedback filter, when r1 or r2 is named', () => {
    const file = stageFile('multiple-feedback-low-pass', 'filter: {r1: 10k, r2: 20k, r3: 5k, c1: 22 nF, c2: 2.2 nF}');
    expect(notesOf(file, ['filter.r2', '10k'])).toEqual(['--set filter.r2=10k: gain -2 of the file dropped, it follows from r2 over r1']);
    expect(notesOf(file, ['filter.c2', '1 nF'])).toEqual([]);
  });

  it('one of the timing components of an oscillator, which is chosen again', () => {
    const file = stageFile('relaxation-oscillator', 'oscillator: {frequency: 2 kHz, resistance: 330k, capacitance: 1.1 nF}');
    const dropped = (path: string, text: string): unknown => {
      const { oscillator, notes } = specOf(file, [option(path, text)]);
      return [oscillator?.resistance?.value, oscillator?.capacitance?.value, notes];
    };
    expect(dropped('oscillator.frequency', '5 kHz')).toEqual([undefined, 1.1e-9, ['--set oscillator.frequency=5 kHz: oscillator.resistance 330k of the file dropped, chosen again for the frequency']]);
    expect(dropped('oscillator.resistance', '100k')).toEqual([100e3, undefined, ['--set oscillator.resistance=100k: oscillator.capacitance 1.1 nF of the file dropped, chosen again for the frequency']]);
    expect(dropped('oscillator.edge', '3 %')).toEqual([330e3, 1.1e-9, []]);
  });

  it('edge and duty, when the shape has none', () => {
    const file = stageFile('follower', 'signal: {input: 1..2 V, shape: pulse, edge: 1 µs, duty: 0.3}');
    expect(notesOf(file, ['signal.shape', 'sine'])).toEqual(['--set signal.shape=sine: signal.edge 1 µs and signal.duty 0.3 of the file dropped']);
    expect(notesOf(file, ['signal.shape', 'step'])).toEqual(['--set signal.shape=step: signal.duty 0.3 of the file dropped']);
  });

  it('an output that cross-checks a shunt, a sum or a photodiode, but not one that the gain is solved from', () => {
    const low = stageFile('low-side-sense', 'signal: {output: 0..2.4 V}');
    expect(notesOf(low, ['shunt.current', '0..2 A'])).toEqual(['--set shunt.current=0..2 A: signal.output 0..2.4 V of the file dropped, the output follows from the gain']);
    expect(specOf(low.replace('gain: 40\n', ''), [option('shunt.current', '0..2 A')]).signal.output?.max).toBe(2.4);
    expect(notesOf(stageFile('summing', 'signal: {output: 1..2 V}'), ['legs.command.input', '0..2 V'])).toHaveLength(1);
    const meter = stageFile('transimpedance', 'signal: {output: 0..3 V}');
    expect(notesOf(meter, ['photodiode.current', '0..1 µA'])).toEqual([]);
    expect(notesOf(`${meter}resistors: {feedback: 1 MΩ}\n`, ['photodiode.current', '0..1 µA'])).toHaveLength(1);
  });

  it('the input resistors of a current sense, when gain is given', () => {
    const file = stageFile('high-side-sense', 'resistors: {feedback: 100k, input: 250k, positiveInput: 250k, toReference: 100k}');
    const spec = specOf(file, [option('gain', '0.5', '--gain')]);
    expect(Object.keys(spec.resistors ?? {}).sort()).toEqual(['feedback', 'toReference']);
    expect([spec.keepFeedback, spec.notes]).toEqual([true, ['--gain 0.5: feedback 100k and toReference 100k kept, input resistors derived again']]);
  });

  it('nothing: --frequency on an oscillator is refused by its option, and says where the frequency is', () => {
    expect(printedAll(stageFile('relaxation-oscillator'), [option('signal.frequency', '2 kHz', '--frequency')])).toContain('error[S108]: --frequency: an oscillator makes its own signal: what it runs at is oscillator.frequency');
  });
});
