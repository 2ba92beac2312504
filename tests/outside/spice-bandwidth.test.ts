import { describe, expect, it } from 'vitest';
import { onePole } from '../support/amplifiers.js';
import { demandsOf, verdictOn, type Asked } from '../support/bench.js';
import { at, netlist, type Bench, type Circuit } from '../support/netlists.js';
import { magnitude, type Complex } from '../support/nodal.js';
import { interpolated, SIMULATED, spice } from '../support/spice.js';

// Source: ngspice 45 (eecircuit-engine), netlist of our own, one-pole amplifier. Relation: GBW = NG·f/√((1−ε)⁻²−1) and f(−3 dB) = GBW/NG.

const DECADE = 100;
const DECADES_BELOW = 3;

const BENCHES: readonly (readonly [string, Bench])[] = [
  ['follower', { topology: 'follower' }],
  ['follower behind 10 kΩ', { topology: 'follower', source: 10e3 }],
  ['non-inverting × 2', { topology: 'non-inverting', feedback: 10e3, input: 10e3 }],
  ['non-inverting × 8 behind 1 kΩ', { topology: 'non-inverting', feedback: 70e3, input: 10e3, source: 1e3 }],
  ['non-inverting × 101', { topology: 'non-inverting', feedback: 100e3, input: 1e3 }],
  ['non-inverting, reference of 5 kΩ', { topology: 'non-inverting', feedback: 70e3, input: 10e3, referenceResistance: 5e3 }],
  ['inverting × 1', { topology: 'inverting', feedback: 10e3, input: 10e3 }],
  ['inverting × 0.5', { topology: 'inverting', feedback: 10e3, input: 20e3 }],
  ['inverting × 10 before 1 kΩ of source', { topology: 'inverting', feedback: 100e3, input: 10e3, source: 1e3, referenceResistance: 5e3 }],
  ['difference × 1', { topology: 'difference', feedback: 10e3, input: 10e3, positiveInput: 10e3, toReference: 10e3 }],
  ['difference × 10', { topology: 'difference', feedback: 100e3, input: 10e3, positiveInput: 10e3, toReference: 100e3 }],
  [
    'difference with 2 kΩ of source and 3 kΩ of reference',
    { topology: 'difference', feedback: 47e3, input: 10e3, positiveInput: 22e3, toReference: 82e3, source: 2e3, referenceResistance: 3e3 },
  ],
];

const FREQUENCY = 2e3;

const SWINGS: Readonly<Record<Bench['topology'], string>> = {
  follower: 'input: 1..2 V',
  'non-inverting': 'input: 2.49..2.51 V',
  inverting: 'input: 2.49..2.51 V',
  difference: 'differential: -10..10 mV, commonMode: 2.5..2.5 V',
};

function asked(bench: Bench, limits: string): Asked {
  return { supply: '5 V', reference: '2.5 V', signal: `${SWINGS[bench.topology]}, frequency: 2 kHz`, more: [`limits: {${limits}}`] };
}

function required(bench: Bench, limits: string): number {
  return demandsOf(bench, asked(bench, limits))['gain-bandwidth']?.required ?? Number.NaN;
}

function judged(bench: Bench, limits: string, gainBandwidth: number): string {
  const figure = { parameter: 'gainBandwidth', kind: 'min', value: gainBandwidth, condition: {} } as const;
  return verdictOn(demandsOf(bench, asked(bench, limits)), 'gain-bandwidth', [figure]).outcome;
}

const DIFFERENTIAL = { positive: 'dc 0 ac 0.5', negative: 'dc 0 ac -0.5' };
const COMMON = { positive: 'dc 0 ac 1', negative: 'dc 0 ac 1' };

function circuit(name: string, bench: Bench, gainBandwidth: number, inputs?: Circuit['drive']['inputs']): Circuit {
  const driven = inputs ?? (bench.topology === 'difference' ? DIFFERENTIAL : { input: 'dc 0 ac 1' });
  return { name, bench, amplifier: onePole(gainBandwidth), drive: { supply: 0, reference: 0, inputs: driven } };
}

interface Response {
  readonly magnitudeError: number;
  readonly vectorError: number;
  /** Hz. */
  readonly bandwidth: number;
}

/** The response of each circuit from three decades below the top frequency to three above. */
async function responses(circuits: readonly Circuit[]): Promise<Response[]> {
  const sweep = `.ac dec ${DECADE} ${FREQUENCY / 10 ** DECADES_BELOW} ${FREQUENCY * 10 ** DECADES_BELOW}`;
  const run = await spice(netlist(circuits, sweep, ...circuits.map(({ name }) => at('out', name))));
  const frequencies = run.real('frequency');
  return circuits.map(({ name }) => responseOf(frequencies, run.complex(at('out', name))));
}

function responseOf(frequencies: readonly number[], output: readonly Complex[]): Response {
  const dc = output[0]!;
  const top = output[DECADE * DECADES_BELOW]!;
  const sizes = output.map((value) => magnitude(value) / magnitude(dc));
  // Falling with frequency, so the curve is read backwards: frequency over magnitude.
  const bandwidth = interpolated([...sizes].reverse(), [...frequencies].reverse(), Math.SQRT1_2);
  return { magnitudeError: 1 - magnitude(top) / magnitude(dc), vectorError: magnitude([dc[0] - top[0], dc[1] - top[1]]) / magnitude(dc), bandwidth };
}

const LIMITS = [
  { limits: 'gainError: 1 %', error: 0.01, kind: 'magnitudeError' },
  { limits: 'gainError: 0.1 %', error: 0.001, kind: 'magnitudeError' },
  { limits: 'gainError: 1 %, gainErrorKind: vector', error: 0.01, kind: 'vectorError' },
] as const;

describe('one-pole amplifier at the least gain bandwidth, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const [name, bench] of BENCHES) {
    it(`${name}: the error at the top frequency is the limit, and 0.9 × the gain bandwidth breaks it`, async () => {
      const least = LIMITS.map(({ limits }) => required(bench, limits));
      const circuits = least.flatMap((hertz, k) => [circuit(`at${k}`, bench, hertz), circuit(`below${k}`, bench, 0.9 * hertz)]);
      const found = await responses(circuits);
      for (const [k, { limits, error, kind }] of LIMITS.entries()) {
        expect(Math.abs(found[2 * k]![kind] / error - 1), `${kind} ${error}`).toBeLessThan(0.01);
        expect(found[2 * k + 1]![kind], `${kind} at 0.9 ×`).toBeGreaterThan(1.1 * error);
        expect(judged(bench, limits, least[k]!)).toBe('pass');
        expect(judged(bench, limits, 0.9 * least[k]!)).toBe('fail');
      }
    });

    it(`${name}: −3 dB at the gain bandwidth over the product's noise gain`, async () => {
      const demands = demandsOf(bench, asked(bench, 'gainError: 1 %'));
      const hertz = demands['gain-bandwidth']!.required;
      // Resistors of tolerance zero, so the lower corner of the noise gain is the nominal one.
      const noiseGain = demands['stable-gain']!.required;
      const [found] = await responses([circuit('a', bench, hertz)]);
      expect(Math.abs((found!.bandwidth * noiseGain) / hertz - 1)).toBeLessThan(0.005);
    });
  }

  it('a matched difference stage cancels common mode at any gain bandwidth: both legs share one closed-loop factor', async () => {
    const bench: Bench = { topology: 'difference', feedback: 100e3, input: 10e3, positiveInput: 10e3, toReference: 100e3 };
    const hertz = required(bench, 'gainError: 1 %');
    const run = await spice(netlist([circuit('a', bench, hertz, COMMON)], `.ac lin 1 ${FREQUENCY} ${FREQUENCY}`, at('out', 'a')));
    expect(magnitude(run.complex(at('out', 'a'))[0]!)).toBeLessThan(1e-6);
  });
});
