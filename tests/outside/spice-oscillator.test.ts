import { describe, expect, it } from 'vitest';
import { oscillatorDifferentialInput, oscillatorPeriod, oscillatorThresholds } from '../../src/formulas/oscillator.js';
import { slewedOscillation } from '../../src/formulas/oscillator-edges.js';
import { buildStage } from '../../src/stage/index.js';
import type { Figure } from '../../src/parts/figures.js';
import { deriveDemands } from '../../src/demands/index.js';
import { verdictOn } from '../support/bench.js';
import { exactFigures } from '../support/exact-part.js';
import { specOf } from '../support/stage-file.js';
import { oscillate } from '../support/live-oscillator.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';

// Source: ngspice 45 (eecircuit-engine), transient of our own drawing with an output of two levels and a hard limit of its slope.
// Relation: thresholds (V+/Ra + VO/Rc)/(1/Ra + 1/Rb + 1/Rc); RC·ln of the ways to the levels (Franco, 3rd ed. 2002, ch. 10, from memory).

type Row = readonly [name: string, resistors: readonly [number, number, number], levels: readonly [supply: number, high: number, low: number]];

const ROWS: readonly Row[] = [
  ['equal resistors, rail to rail', [100e3, 100e3, 100e3], [5, 4.99, 0.01]],
  ['equal resistors, conventional output', [100e3, 100e3, 100e3], [5, 3.5, 0.05]],
  ['narrow thresholds', [47e3, 68e3, 220e3], [3.3, 3.2, 0.1]],
  ['wide thresholds on an empty cell', [100e3, 100e3, 22e3], [3, 2.9, 0.05]],
];

const TIMING = { resistance: 330e3, capacitance: 1.1e-9 };
const TIME_CONSTANT = TIMING.resistance * TIMING.capacitance;

describe('relaxation oscillator, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const [name, [toSupply, toGround, toOutput], [supply, high, low]] of ROWS) {
    it(`${name}: period, duty, thresholds and what stands between the inputs`, async () => {
      const stage = { supply, high, low, toSupply, toGround, toOutput };
      const ours = oscillatorPeriod(stage, TIME_CONSTANT);
      const { upper, lower } = oscillatorThresholds(stage);
      const found = await oscillate({ ...TIMING, toSupply, toGround, toOutput }, { supply, high, low, slewRate: 1e8 }, ours.frequency);
      shown(name, [1 / ours.frequency, found.period], [ours.duty, found.duty], [upper, found.upper], [lower, found.lower]);
      expect(Math.abs(1 / ours.frequency / found.period - 1)).toBeLessThan(0.002);
      expect(Math.abs(ours.duty - found.duty)).toBeLessThan(0.001);
      expect(Math.abs(upper - found.upper)).toBeLessThan(0.002);
      expect(Math.abs(lower - found.lower)).toBeLessThan(0.002);
      expect(Math.abs(oscillatorDifferentialInput(stage) / found.differential - 1)).toBeLessThan(0.005);
    });
  }

  for (const slewRate of [100e3, 20e3]) {
    it(`edges of ${slewRate} V/s: period and duty`, async () => {
      const stage = { supply: 3.3, high: 3.2, low: 0.1, toSupply: 100e3, toGround: 100e3, toOutput: 100e3 };
      const ours = slewedOscillation(stage, TIME_CONSTANT, slewRate)!;
      const found = await oscillate({ ...TIMING, toSupply: 100e3, toGround: 100e3, toOutput: 100e3 }, { supply: 3.3, high: 3.2, low: 0.1, slewRate }, ours.frequency);
      // Ours counts from edge to edge, at their beginnings; the bench from middle to middle.
      shown(`edges of ${slewRate} V/s`, [1 / ours.frequency, found.period], [ours.duty, found.duty], [(0.8 * 3.1) / slewRate, found.edge]);
      expect(Math.abs(1 / ours.frequency / found.period - 1)).toBeLessThan(0.01);
      expect(Math.abs(ours.duty - found.duty)).toBeLessThan(0.01);
      expect(Math.abs((0.8 * 3.1) / slewRate / found.edge - 1)).toBeLessThan(0.01);
    });
  }
});

const FILE = `topology: relaxation-oscillator
supply: 3.3 V
oscillator: {frequency: 2 kHz, resistance: 330 kΩ, capacitance: 1.1 nF, toSupply: 100 kΩ, toGround: 100 kΩ, toOutput: 100 kΩ}
resistors: {tolerance: 1 %}
capacitors: {tolerance: 1 %}
limits: {frequencyError: 40 %}
`;

describe('verdicts on the oscillator, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  const built = buildStage(specOf(FILE));
  if (!built.ok) throw new Error(built.problems.map(({ message }) => message).join('\n'));
  const demands = deriveDemands(built.stage);
  const resistors = { toSupply: 100e3, toGround: 100e3, toOutput: 100e3 };
  const ideal = oscillatorPeriod({ supply: 3.3, high: 3.3, low: 0, ...resistors }, TIME_CONSTANT).frequency;

  const heads = [['near both rails, fast', 0.02, 0.02, 1e7], ['a conventional output', 1.3, 0.05, 1e7], ['slow edges', 0.02, 0.02, 60e3], ['both', 0.9, 0.1, 60e3]] as const;
  for (const [name, top, bottom, slewRate] of heads) {
    it(`${name}: what the verdict has for levels and for edges is that of the circuit, and together never less`, async () => {
      const rails = ([['outputHighHeadroom', top], ['outputLowHeadroom', bottom]] as const).map(([parameter, value]): Figure => ({ parameter, kind: 'max', value, condition: { load: { kind: 'current', amperes: 1 } } }));
      const verdict = verdictOn(demands, 'frequency-error', [...exactFigures({ slewRate }), ...rails]);
      const error = async (high: number, low: number, rate: number): Promise<number> => Math.abs(1 / (await oscillate({ ...TIMING, ...resistors }, { supply: 3.3, high, low, slewRate: rate }, ideal)).period / ideal - 1);
      const term = (wanted: string): number => verdict.terms.find(({ name: found }) => found === wanted)?.value ?? 0;
      const [levels, edges, both] = [await error(3.3 - top, bottom, 1e8), await error(3.3, 0, slewRate), await error(3.3 - top, bottom, slewRate)];
      shown(`verdict, ${name}`, [term('levels'), levels], [term('edges'), edges], [verdict.offered as number, both]);
      // The period agrees within 1 % of itself.
      expect(Math.abs(term('levels') - levels)).toBeLessThan(0.01);
      expect(Math.abs(term('edges') - edges)).toBeLessThan(0.01);
      expect(verdict.offered as number).toBeGreaterThan(both - 0.001);
    });
  }

  it('an edge as long as the stage allows is what its slew rate demand makes', async () => {
    const slewRate = demands['slew-rate']!.required;
    const found = await oscillate({ ...TIMING, ...resistors }, { supply: 3.3, high: 3.3, low: 0, slewRate }, ideal);
    // 5 % of the half period of 2 kHz, the default.
    shown('longest edge', [0.05 * 250e-6, found.edge]);
    expect(Math.abs((0.05 * 250e-6) / found.edge - 1)).toBeLessThan(0.01);
  });
});
