import { describe, expect, it } from 'vitest';
import { deriveDemands } from '../../src/demands/index.js';
import type { Figure } from '../../src/parts/figures.js';
import type { Stage } from '../../src/stage/index.js';
import { clamped, ideal, type OutputLoss } from '../support/amplifiers.js';
import { stageOf, verdictOn, type Asked } from '../support/bench.js';
import { cornerBenches } from '../support/corner-bench.js';
import { at, netlist, outputCurrent, type Bench, type Circuit, type Drive, type Load } from '../support/netlists.js';
import { settledPeriods, sine } from '../support/settled.js';
import { SIMULATED, spice } from '../support/spice.js';

// Source: ngspice 45 (eecircuit-engine), netlists of our own: operating points with real resistors at either end of their tolerance.
// Relation: extremes of output and common mode over all corners; load plus feedback current at each of them (method sections 1 and 6).

interface Case {
  readonly name: string;
  readonly bench: Bench;
  readonly asked: Asked;
  /** Supply and reference that belong together, volts: written by hand. */
  readonly rails: readonly (readonly [number, number])[];
  readonly inputs: Readonly<Record<string, readonly [number, number]>>;
  readonly load?: Load;
}

const CASES: readonly Case[] = [
  {
    name: 'follower, load to the supply',
    bench: { topology: 'follower', source: 1e3 },
    asked: { supply: '3.0..4.2 V', signal: 'input: 0.3..2.4 V', more: ['load: {resistance: 2 kΩ, to: supply}'] },
    rails: [[3, 0], [4.2, 0]],
    inputs: { input: [0.3, 2.4] },
    load: { ohms: 2e3, to: 'supply' },
  },
  {
    name: 'non-inverting to ground',
    bench: { topology: 'non-inverting', feedback: 70e3, input: 10e3, source: 1e3 },
    asked: { supply: '3.0..4.2 V', signal: 'input: 25 mV..330 mV', tolerance: 1, more: ['load: {resistance: 10 kΩ, to: ground}'] },
    rails: [[3, 0], [4.2, 0]],
    inputs: { input: [0.025, 0.33] },
    load: { ohms: 10e3, to: 'ground' },
  },
  {
    name: 'non-inverting about a reference with tolerance and resistance',
    bench: { topology: 'non-inverting', feedback: 47e3, input: 22e3, referenceResistance: 2e3 },
    asked: { supply: '4.75..5.25 V', reference: '2.5 V ± 2 %', signal: 'input: 2.1..2.9 V', tolerance: 5, more: ['load: {resistance: 1 kΩ, to: reference}'] },
    rails: [[4.75, 2.45], [4.75, 2.55], [5.25, 2.45], [5.25, 2.55]],
    inputs: { input: [2.1, 2.9] },
    load: { ohms: 1e3, to: 'reference' },
  },
  {
    name: 'inverting about half the supply, toleranced source',
    bench: { topology: 'inverting', feedback: 27e3, input: 10e3, source: 2e3 },
    asked: { supply: '4.5..5.5 V', reference: 'mid-supply', signal: 'input: 1.9..3.1 V', tolerance: 1, sourceTolerance: 10, more: ['load: {resistance: 5 kΩ, to: ground}'] },
    rails: [[4.5, 2.25], [5.5, 2.75]],
    inputs: { input: [1.9, 3.1] },
    load: { ohms: 5e3, to: 'ground' },
  },
  {
    name: 'inverting about half the supply with a tolerance of its own, attenuating',
    bench: { topology: 'inverting', feedback: 9e3, input: 15e3, referenceResistance: 5e3 },
    asked: { supply: '3.0..5.5 V', reference: 'mid-supply', referenceTolerance: 1, signal: 'input: 1.2..3.4 V', tolerance: 2 },
    rails: [[3, 1.485], [3, 1.515], [5.5, 2.7225], [5.5, 2.7775]],
    inputs: { input: [1.2, 3.4] },
  },
  {
    name: 'difference, independent legs',
    bench: { topology: 'difference', feedback: 40e3, input: 20e3, positiveInput: 20e3, toReference: 40e3 },
    asked: { supply: '4.75..5.25 V', reference: '2.5 V ± 1 %', signal: 'positive: 0.9..1.5 V, negative: 1.0..1.4 V', tolerance: 1, more: ['load: {resistance: 2 kΩ, to: supply}'] },
    rails: [[4.75, 2.475], [4.75, 2.525], [5.25, 2.475], [5.25, 2.525]],
    inputs: { positive: [0.9, 1.5], negative: [1, 1.4] },
    load: { ohms: 2e3, to: 'supply' },
  },
  {
    name: 'difference, unequal legs with source and reference resistance',
    bench: { topology: 'difference', feedback: 47e3, input: 33e3, positiveInput: 30e3, toReference: 47e3, source: 2e3, referenceResistance: 3e3 },
    asked: { supply: '4.75..5.25 V', reference: '2 V', signal: 'positive: 0.8..1.8 V, negative: 0.9..1.3 V', tolerance: 5, more: ['load: {resistance: 3 kΩ, to: ground}'] },
    rails: [[4.75, 2], [5.25, 2]],
    inputs: { positive: [0.8, 1.8], negative: [0.9, 1.3] },
    load: { ohms: 3e3, to: 'ground' },
  },
];

function points(inputs: Case['inputs']): Record<string, number>[] {
  return Object.entries(inputs).reduce<Record<string, number>[]>(
    (done, [name, ends]) => done.flatMap((point) => ends.map((volts) => ({ ...point, [name]: volts }))),
    [{}],
  );
}

interface Found {
  readonly supply: number;
  readonly output: number;
  readonly commonMode: number;
  readonly current: number;
}

/** Operating points of an ideal amplifier in any number of circuits, in one run. */
async function operatingPoints(circuits: readonly (Omit<Circuit, 'name' | 'amplifier'>)[]): Promise<Found[]> {
  const named = circuits.map((circuit, k): Circuit => ({ ...circuit, name: `c${k}`, amplifier: ideal }));
  const run = await spice(netlist(named, '.op', ...named.flatMap(({ name }) => [at('out', name), at('plus', name), outputCurrent(name)])));
  return named.map(({ name, drive }) => ({
    supply: drive.supply,
    output: run.value(at('out', name)),
    commonMode: run.value(at('plus', name)),
    current: run.value(outputCurrent(name)),
  }));
}

/** Every end of every resistor, with every pair of rails and every end of the signal. */
async function bruteForce(one: Case): Promise<Found[]> {
  const drives = one.rails.flatMap(([supply, reference]) => points(one.inputs).map((inputs): Drive => ({ supply, reference, inputs })));
  const benches = cornerBenches(one.bench, (one.asked.tolerance ?? 0) / 100, (one.asked.sourceTolerance ?? 0) / 100);
  return operatingPoints(benches.flatMap((bench) => drives.map((drive) => ({ bench, drive, ...(one.load === undefined ? {} : { load: one.load }) }))));
}

const least = (values: readonly number[]): number => Math.min(...values);
const most = (values: readonly number[]): number => Math.max(...values);

function near(actual: number, simulated: number, scale: number, what: string): void {
  expect(Math.abs(actual - simulated), `${what}: ${actual}, simulated ${simulated}`).toBeLessThanOrEqual(1e-4 * scale);
}

describe('corners by brute force over ± tolerance of each resistor, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const one of CASES) {
    it(`${one.name}: extremes of output and common mode, and the room left at both rails`, async () => {
      const stage = stageOf(one.bench, one.asked);
      const found = await bruteForce(one);
      const outputs = found.map(({ output }) => output);
      const pins = found.map(({ commonMode }) => commonMode);
      near(stage.output.min, least(outputs), most(outputs), 'lowest output');
      near(stage.output.max, most(outputs), most(outputs), 'highest output');
      near(stage.commonMode.min, least(pins), most(pins), 'lowest common mode');
      near(stage.commonMode.max, most(pins), most(pins), 'highest common mode');
      const demands = deriveDemands(stage);
      near(demands['output-high'].required, least(found.map(({ supply, output }) => supply - output)), most(outputs), 'room above');
      near(demands['input-high'].required, least(found.map(({ supply, commonMode }) => supply - commonMode)), most(pins), 'room above the pins');
    });
  }
});

/** The product's stage with exact resistors, and what is simulated at each of its vertices. */
async function nominalVertices(one: Case): Promise<{ stage: Stage; found: Found[] }> {
  const { sourceTolerance: _left, ...asked } = one.asked;
  const stage = stageOf(one.bench, { ...asked, tolerance: 0 });
  const { bench, load } = one;
  const circuits = stage.vertices.map(({ supply, reference, inputs }) => ({ bench, drive: { supply, reference, inputs }, ...(load === undefined ? {} : { load }) }));
  return { stage, found: await operatingPoints(circuits) };
}

describe('current at the output pin, ngspice 45 (eecircuit-engine), netlist of our own, nominal resistors', SIMULATED, () => {
  for (const one of CASES) {
    it(`${one.name}: load and feedback current of every vertex, and the largest of all`, async () => {
      const { stage, found } = await nominalVertices(one);
      const largest = most(found.map(({ current }) => Math.abs(current)));
      for (const [k, vertex] of stage.vertices.entries()) near(vertex.loadCurrent + vertex.networkCurrent, found[k]!.current, largest, `vertex ${k}`);
      near(deriveDemands(stage)['output-current'].required, largest, largest, 'output current asked');
    });
  }

  it('resistive and capacitive load: the peak of a sine is the centre plus the phasor sum', async () => {
    const bench: Bench = { topology: 'non-inverting', feedback: 3e3, input: 1e3 };
    const signal = 'input: 0.1..1.1 V, frequency: 10 kHz';
    const stage = stageOf(bench, { supply: '5 V', signal, more: ['load: {resistance: 2 kΩ, to: ground, capacitance: 10 nF}'] });
    const drive = { supply: 5, reference: 0, inputs: { input: 'sin(0.6 0.5 10k)' } };
    const circuit: Circuit = { name: 'a', bench, amplifier: ideal, drive, load: { ohms: 2e3, farad: 10e-9, to: 'ground' } };
    const run = await spice(netlist([circuit], '.tran 0.1u 300u 100u 0.1u', outputCurrent('a')));
    const peak = most(run.real(outputCurrent('a')));
    near(deriveDemands(stage)['output-current'].required, peak, 10 * peak, 'peak current');
  });
});

describe('the vertex trap: least room and largest current stand at different ends of the supply', SIMULATED, () => {
  const bench: Bench = { topology: 'inverting', feedback: 9e3, input: 10e3 };
  const asked: Asked = { supply: '3.0..5.5 V', reference: 'mid-supply', signal: 'input: 0.2..1.2 V', more: ['load: {resistance: 1 kΩ, to: ground}'] };
  const load: Load = { ohms: 1e3, to: 'ground' };
  const SUPPLIES = [3, 5.5] as const;

  /** What the top of a sine falls short of the ideal one at either end of the supply, V. */
  async function missing(loss: OutputLoss): Promise<number[]> {
    const sampling = { frequency: 100, points: 1000 };
    const inputs = { input: sine(0.7, 0.5, sampling) };
    const circuits = SUPPLIES.map((supply, k): Circuit => ({ name: `c${k}`, bench, amplifier: clamped(1e6, loss), drive: { supply, reference: supply / 2, inputs }, load }));
    const periods = await settledPeriods(circuits, sampling);
    return SUPPLIES.map((supply, k) => 0.95 * supply - 0.18 - most(periods[k]!));
  }

  function verdict(loss: OutputLoss) {
    const figures = [1e-3, 10e-3].map((amperes): Figure => {
      return { parameter: 'outputHighHeadroom', kind: 'max', value: loss.high + loss.ohms * amperes, condition: { supply: 3, load: { kind: 'current', amperes } } };
    });
    return verdictOn(deriveDemands(stageOf(bench, asked)), 'output-high', figures);
  }

  const NOTHING = 2e-5;

  it('the two vertices, simulated: 0.33 V of room with 2.8 mA at 3 V, 0.455 V with 5.3 mA at 5.5 V', async () => {
    const drives = SUPPLIES.map((supply) => ({ bench, load, drive: { supply, reference: supply / 2, inputs: { input: 0.2 } } }));
    const [low, high] = await operatingPoints(drives);
    expect(3 - low!.output).toBeCloseTo(0.33, 6);
    expect(5.5 - high!.output).toBeCloseTo(0.455, 6);
    expect(low!.current).toBeCloseTo(2.8e-3, 6);
    expect(high!.current).toBeCloseTo(5.3e-3, 6);
  });

  it('90 Ω clips only at 5.5 V, where the room is not least: rejected there', async () => {
    const loss: OutputLoss = { low: 0, high: 0, ohms: 90 };
    const [at3, at55] = await missing(loss);
    expect(at3).toBeLessThan(NOTHING);
    expect(at55).toBeGreaterThan(0.01);
    expect(verdict(loss)).toMatchObject({ outcome: 'fail', worstAt: { supply: 5.5 } });
  });

  it('0.3 V and 20 Ω clip only at 3 V, where the current is not largest: rejected there', async () => {
    const loss: OutputLoss = { low: 0, high: 0.3, ohms: 20 };
    const [at3, at55] = await missing(loss);
    expect(at3).toBeGreaterThan(0.01);
    expect(at55).toBeLessThan(NOTHING);
    expect(verdict(loss)).toMatchObject({ outcome: 'fail', worstAt: { supply: 3 } });
  });

  it('70 Ω clips nowhere, though the largest current would not fit the least room: accepted', async () => {
    const loss: OutputLoss = { low: 0, high: 0, ohms: 70 };
    expect(70 * 5.3e-3).toBeGreaterThan(0.33);
    for (const volts of await missing(loss)) expect(Math.abs(volts)).toBeLessThan(NOTHING);
    expect(verdict(loss)).toMatchObject({ outcome: 'pass', worstAt: { supply: 5.5 } });
  });
});
