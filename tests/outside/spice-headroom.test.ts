import { describe, expect, it } from 'vitest';
import { deriveDemands, type Demands } from '../../src/demands/index.js';
import type { Figure } from '../../src/parts/figures.js';
import { clamped, onePole, type OutputLoss } from '../support/amplifiers.js';
import { stageOf, verdictOn, type Asked } from '../support/bench.js';
import type { Bench, Circuit, Drive, Load } from '../support/netlists.js';
import { settledPeriods, sine } from '../support/settled.js';
import { SIMULATED } from '../support/spice.js';
import { harmonics } from '../support/waveforms.js';

// Source: ngspice 45 (eecircuit-engine), netlist of our own: one pole, clamp, and a resistor that carries the whole output current.
// Relation: head-room needed = V0 + Ron·I, I = load current + feedback current at the extreme (method section 6).

type Side = 'low' | 'high';

interface Case {
  readonly name: string;
  readonly side: Side;
  readonly bench: Bench;
  readonly asked: Asked;
  readonly load?: Load;
  /** Supply and reference that belong together, and middle and half span of each input, volts: written by hand. */
  readonly rails: readonly (readonly [number, number])[];
  readonly inputs: Readonly<Record<string, readonly [number, number]>>;
  /** Nothing flows towards this rail: the output needs its floor only. */
  readonly floorOnly?: true;
}

const toGround = { ohms: 1e3, to: 'ground' } as const;
const toSupply = { ohms: 1e3, to: 'supply' } as const;
const toReference = { ohms: 1e3, to: 'reference' } as const;
const TO_GROUND = ['load: {resistance: 1 kΩ, to: ground}'];
const TO_SUPPLY = ['load: {resistance: 1 kΩ, to: supply}'];
const TO_REFERENCE = ['load: {resistance: 1 kΩ, to: reference}'];

const follower = { bench: { topology: 'follower' }, inputs: { input: [2.5, 1.9] } } as const;
const nonInverting = {
  bench: { topology: 'non-inverting', feedback: 3e3, input: 1e3 },
  inputs: { input: [2.5, 0.48] },
} as const;
const inverting = { bench: { topology: 'inverting', feedback: 2e3, input: 1e3 }, inputs: { input: [2.5, 0.9] } } as const;
const difference = {
  bench: { topology: 'difference', feedback: 2e3, input: 1e3, positiveInput: 1e3, toReference: 2e3 },
  inputs: { positive: [1.5, 0.5], negative: [1.5, -0.4] },
} as const;
const LEGS = 'positive: 1..2 V, negative: 1.1..1.9 V';

const CASES: readonly Case[] = [
  {
    name: 'follower, load to ground', side: 'high', ...follower, load: toGround, rails: [[4.75, 0], [5.25, 0]],
    asked: { supply: '4.75..5.25 V', signal: 'input: 0.6..4.4 V', more: TO_GROUND },
  },
  {
    name: 'follower, load to ground', side: 'low', ...follower, load: toGround, rails: [[4.75, 0], [5.25, 0]], floorOnly: true,
    asked: { supply: '4.75..5.25 V', signal: 'input: 0.6..4.4 V', more: TO_GROUND },
  },
  {
    name: 'follower, load to the supply', side: 'low', ...follower, load: toSupply, rails: [[4.75, 0], [5.25, 0]],
    asked: { supply: '4.75..5.25 V', signal: 'input: 0.6..4.4 V', more: TO_SUPPLY },
  },
  {
    name: 'follower, load to the supply', side: 'high', ...follower, load: toSupply, rails: [[4.75, 0], [5.25, 0]], floorOnly: true,
    asked: { supply: '4.75..5.25 V', signal: 'input: 0.6..4.4 V', more: TO_SUPPLY },
  },
  ...(['high', 'low'] as const).map((side): Case => ({
    name: 'non-inverting, load to the reference beside the feedback path', side, ...nonInverting, load: toReference, rails: [[4.75, 2.5], [5.25, 2.5]],
    asked: { supply: '4.75..5.25 V', reference: '2.5 V', signal: 'input: 2.02..2.98 V', more: TO_REFERENCE },
  })),
  ...(['high', 'low'] as const).map((side): Case => ({
    name: 'inverting about half the supply, feedback path only', side, ...inverting, rails: [[4.75, 2.375], [5.25, 2.625]],
    asked: { supply: '4.75..5.25 V', reference: 'mid-supply', signal: 'input: 1.6..3.4 V' },
  })),
  {
    name: 'inverting, load to ground beside the feedback path', side: 'high', ...inverting, load: toGround, rails: [[4.75, 2.4], [4.75, 2.5], [5.25, 2.4], [5.25, 2.5]],
    asked: { supply: '4.75..5.25 V', reference: '2.4..2.5 V', signal: 'input: 1.6..3.4 V', more: TO_GROUND },
  },
  {
    name: 'inverting, load to the supply beside the feedback path', side: 'low', ...inverting, load: toSupply, rails: [[4.75, 2.5], [4.75, 2.6], [5.25, 2.5], [5.25, 2.6]],
    asked: { supply: '4.75..5.25 V', reference: '2.5..2.6 V', signal: 'input: 1.6..3.4 V', more: TO_SUPPLY },
  },
  {
    name: 'difference, load to ground beside the feedback path', side: 'high', ...difference, load: toGround, rails: [[4.75, 2.5], [5.25, 2.5]],
    asked: { supply: '4.75..5.25 V', reference: '2.5 V', signal: LEGS, more: TO_GROUND },
  },
  {
    name: 'difference, load to the supply beside the feedback path', side: 'low', ...difference, load: toSupply, rails: [[4.75, 2.5], [5.25, 2.5]],
    asked: { supply: '4.75..5.25 V', reference: '2.5 V', signal: LEGS, more: TO_SUPPLY },
  },
];

const SAMPLING = { frequency: 100, points: 1000 };
const GAIN_BANDWIDTH = 300e3;
const FLOOR = 0.02;
/** Far beyond the other rail: that side never clips. */
const NEVER = -20;

interface Rail {
  readonly volts: number;
  readonly ohms: number;
}

function judged(demands: Demands, side: Side, { volts, ohms }: Rail) {
  const figures = [0, 50e-3].map((amperes): Figure => {
    const parameter = side === 'high' ? 'outputHighHeadroom' : 'outputLowHeadroom';
    return { parameter, kind: 'max', value: volts + ohms * amperes, condition: { supply: 4.75, load: { kind: 'current', amperes } } };
  });
  return verdictOn(demands, `output-${side}`, figures);
}

/** The worst output the product still accepts: largest resistance above a floor, or largest floor where no current flows. */
function justAccepted(one: Case, demands: Demands): Rail {
  const rail = (size: number): Rail => (one.floorOnly ? { volts: size, ohms: 0 } : { volts: FLOOR, ohms: size });
  let [accepted, refused] = [0, 1e4];
  for (let step = 0; step < 80; step += 1) {
    const middle = (accepted + refused) / 2;
    if (judged(demands, one.side, rail(middle)).outcome === 'pass') accepted = middle;
    else refused = middle;
  }
  return rail(accepted);
}

interface Simulated {
  /** What the extreme of the sine falls short of the one without a clamp, V. */
  readonly missing: number;
  readonly distortion: number;
}

/** At every pair of rails: the stage with this output beside the same stage that never clips. */
async function simulate(one: Case, { volts, ohms }: Rail): Promise<Simulated[]> {
  const loss: OutputLoss = { low: one.side === 'low' ? volts : NEVER, high: one.side === 'high' ? volts : NEVER, ohms: Math.max(ohms, 1e-3) };
  const inputs = Object.fromEntries(Object.entries(one.inputs).map(([name, [middle, half]]) => [name, sine(middle, half, SAMPLING)]));
  const circuits = one.rails.flatMap(([supply, reference], k): Circuit[] => {
    const drive: Drive = { supply, reference, inputs };
    const common = { bench: one.bench, drive, ...(one.load === undefined ? {} : { load: one.load }) };
    return [
      { ...common, name: `free${k}`, amplifier: onePole(GAIN_BANDWIDTH) },
      { ...common, name: `clamped${k}`, amplifier: clamped(GAIN_BANDWIDTH, loss) },
    ];
  });
  const periods = await settledPeriods(circuits, SAMPLING);
  const extreme = (samples: readonly number[]): number => (one.side === 'high' ? Math.max(...samples) : -Math.min(...samples));
  return one.rails.map((_, k) => {
    const [free, held] = [periods[2 * k]!, periods[2 * k + 1]!];
    return { missing: extreme(free) - extreme(held), distortion: harmonics(held).distortion };
  });
}

describe('clamp against head-room, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const one of CASES) {
    const stage = stageOf(one.bench, one.asked);
    const demands = deriveDemands(stage);
    const swing = stage.outputNominal.max - stage.outputNominal.min;
    const side = one.side === 'high' ? 'top' : 'bottom';

    it(`${one.name}, ${side}: an output that just fits does not clip at any supply`, async () => {
      const rail = justAccepted(one, demands);
      expect(judged(demands, one.side, rail).outcome).toBe('pass');
      for (const { missing, distortion } of await simulate(one, rail)) {
        expect(Math.abs(missing)).toBeLessThan(2e-4);
        expect(distortion).toBeLessThan(2e-4);
      }
    });

    it(`${one.name}, ${side}: one that loses 2 % of the swing more clips where the product says`, async () => {
      const accepted = justAccepted(one, demands);
      const rail = { ...accepted, volts: accepted.volts + 0.02 * swing };
      const verdict = judged(demands, one.side, rail);
      expect(verdict.outcome).toBe('fail');
      const simulated = await simulate(one, rail);
      const worst = simulated.reduce((best, next) => (next.missing > best.missing ? next : best));
      expect(worst.missing).toBeGreaterThan(0.01 * swing);
      expect(worst.missing).toBeLessThan(0.0201 * swing);
      expect(worst.distortion).toBeGreaterThan(2e-3);
      const [supply] = one.rails[simulated.indexOf(worst)]!;
      if (one.side === 'high') expect(verdict.worstAt?.['supply']).toBe(supply);
    });
  }
});
