import { describe, expect, it } from 'vitest';
import { deriveDemands } from '../../src/demands/index.js';
import type { Figure } from '../../src/parts/figures.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import { imperfect, type Imperfections } from '../support/amplifiers.js';
import { stageOf, verdictOn, type Asked } from '../support/bench.js';
import { cornerBenches } from '../support/corner-bench.js';
import { corners } from '../support/corners.js';
import { at, netlist, type Bench, type Circuit, type Drive } from '../support/netlists.js';
import { SIMULATED, spice } from '../support/spice.js';

// Source: ngspice 45 (eecircuit-engine), netlist of our own: offset that moves with common mode and supply, currents at both pins,
// finite gain about half the supply. Relation: NG × [Vos + Ib·|Rp − Rn| + (Ios/2)(Rp + Rn) + ΔVcm/CMRR + ΔVS/PSRR + ΔVo/A0] (method section 5).

interface Case {
  readonly name: string;
  readonly bench: Bench;
  readonly asked: Asked;
  /** Reference in volts, and the ends of each input: written by hand. Common mode and output are farthest from half the supply together. */
  readonly reference: number;
  readonly inputs: readonly Readonly<Record<string, number>>[];
  /**
   * Bias current is charged through |Rp − Rn| + t(Rp + Rn). A follower has no resistors to state a tolerance for, so the
   * default of 1 % stands there: volts that are charged beyond what exact resistors give, written by hand.
   */
  readonly charged?: number;
}

const SUPPLIES = [4.5, 5.5] as const;
const RATED = 5;
const LIMIT = ['limits: {dcError: 10 V}'];

const CASES: readonly Case[] = [
  {
    name: 'follower behind 10 kΩ',
    bench: { topology: 'follower', source: 10e3 },
    asked: { supply: '4.5..5.5 V', signal: 'input: 0.5..1.5 V', more: LIMIT },
    reference: 0,
    inputs: [{ input: 0.5 }, { input: 1.5 }],
    charged: 0.01 * 10e3 * 100e-9,
  },
  {
    name: 'non-inverting × 8, + side lighter',
    bench: { topology: 'non-inverting', feedback: 70e3, input: 10e3, source: 1e3 },
    asked: { supply: '4.5..5.5 V', signal: 'input: 25 mV..330 mV', more: LIMIT },
    reference: 0,
    inputs: [{ input: 0.025 }, { input: 0.33 }],
  },
  {
    name: 'non-inverting × 3 about a reference of 2 kΩ, + side heavier',
    bench: { topology: 'non-inverting', feedback: 20e3, input: 8e3, source: 47e3, referenceResistance: 2e3 },
    asked: { supply: '4.5..5.5 V', reference: '0.5 V', signal: 'input: 0.5..1 V', more: LIMIT },
    reference: 0.5,
    inputs: [{ input: 0.5 }, { input: 1 }],
  },
  {
    name: 'inverting × 2 about 1 V with 5 kΩ',
    bench: { topology: 'inverting', feedback: 20e3, input: 9e3, source: 1e3, referenceResistance: 5e3 },
    asked: { supply: '4.5..5.5 V', reference: '1 V', signal: 'input: 0.3..1.2 V', more: LIMIT },
    reference: 1,
    inputs: [{ input: 0.3 }, { input: 1.2 }],
  },
  {
    name: 'difference × 2, unequal legs',
    bench: { topology: 'difference', feedback: 20e3, input: 10e3, positiveInput: 22e3, toReference: 44e3 },
    asked: { supply: '4.5..5.5 V', reference: '1 V', signal: 'positive: 0.5..0.7 V, negative: 0.4..0.6 V', more: LIMIT },
    reference: 1,
    inputs: [0.5, 0.7].flatMap((positive) => [0.4, 0.6].map((negative) => ({ positive, negative }))),
  },
];

const FIGURES: readonly Figure[] = [
  { parameter: 'offsetVoltage', kind: 'max', value: 1e-3, condition: { supply: RATED } },
  { parameter: 'biasCurrent', kind: 'max', value: 100e-9, condition: {} },
  { parameter: 'offsetCurrent', kind: 'max', value: 30e-9, condition: {} },
  { parameter: 'commonModeRejection', kind: 'min', value: 1e4, condition: {} },
  { parameter: 'supplyRejection', kind: 'min', value: 2e3, condition: {} },
  { parameter: 'openLoopGain', kind: 'min', value: 2e4, condition: {} },
];

/** Each imperfection with either sign, under the name of its term. The sign of the open-loop gain is what keeps the loop stable. */
const ALONE: Readonly<Record<string, (sign: number) => Imperfections>> = {
  offset: (sign) => ({ offset: sign * 1e-3 }),
  'bias current': (sign) => ({ intoPlus: sign * 100e-9, intoMinus: sign * 100e-9 }),
  'offset current': (sign) => ({ intoPlus: sign * 15e-9, intoMinus: sign * -15e-9 }),
  'common mode': (sign) => ({ commonModeRejection: sign * 1e4 }),
  supply: (sign) => ({ supplyRejection: sign * 2e3 }),
  'open-loop gain': () => ({ openLoopGain: 2e4 }),
};

/** All imperfections at once, in every combination of signs. */
const TOGETHER: readonly Imperfections[] = corners(5).map(([a = 1, b = 1, c = 1, d = 1, e = 1]) => ({
  offset: a * 1e-3,
  intoPlus: b * 100e-9 + c * 15e-9,
  intoMinus: b * 100e-9 - c * 15e-9,
  commonModeRejection: d * 1e4,
  supplyRejection: e * 2e3,
  openLoopGain: 2e4,
}));

/** Largest distance of the output from that of the same stage without errors, over all ends of supply and signal, V. */
async function largestError(one: Case, benches: readonly Bench[], variants: readonly Imperfections[]): Promise<number> {
  const drives = SUPPLIES.flatMap((supply) => one.inputs.map((inputs): Drive => ({ supply, reference: one.reference, inputs })));
  const amplifiers = [imperfect({}, RATED), ...variants.map((variant) => imperfect(variant, RATED))];
  const sets = benches.flatMap((bench) => drives.map((drive) => ({ bench, drive })));
  const circuits = sets.flatMap((set, s) => amplifiers.map((amplifier, k): Circuit => ({ ...set, amplifier, name: `c${s}k${k}` })));
  const run = await spice(netlist(circuits, '.op', ...circuits.map(({ name }) => at('out', name))));
  const errors = sets.flatMap((_, s) => {
    const exact = run.value(at('out', `c${s}k0`));
    return variants.map((_variant, k) => Math.abs(run.value(at('out', `c${s}k${k + 1}`)) - exact));
  });
  return Math.max(...errors);
}

function verdict(one: Case, tolerance: number): Verdict {
  return verdictOn(deriveDemands(stageOf(one.bench, { ...one.asked, tolerance })), 'dc-error', FIGURES);
}

function term(of: Verdict, name: string): number {
  const found = of.terms.find((candidate) => candidate.name === name);
  if (found === undefined) throw new Error(`no term ${name}; there are ${of.terms.map((candidate) => candidate.name).join(', ')}`);
  return found.value;
}

describe('DC error at the output, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const one of CASES) {
    it(`${one.name}: every term alone, exact resistors`, async () => {
      const judged = verdict(one, 0);
      expect(judged.terms.map(({ name }) => name)).toEqual(Object.keys(ALONE));
      for (const [name, variant] of Object.entries(ALONE)) {
        const simulated = await largestError(one, [one.bench], [variant(1), variant(-1)]);
        const exact = term(judged, name) - (name === 'bias current' ? (one.charged ?? 0) : 0);
        expect(Math.abs(exact / simulated - 1), `${name}: ${exact} V, simulated ${simulated} V`).toBeLessThan(1e-3);
      }
    });

    it(`${one.name}: all together with the worst signs, exact resistors`, async () => {
      const simulated = await largestError(one, [one.bench], TOGETHER);
      const exact = (verdict(one, 0).offered as number) - (one.charged ?? 0);
      expect(Math.abs(exact / simulated - 1)).toBeLessThan(1e-3);
    });

    it(`${one.name}: with 1 % resistors the sum covers every corner and is at most 5 % above it`, async () => {
      // One run a corner: 32 signs at every end of supply and signal make a netlist large enough.
      const largest: number[] = [];
      for (const bench of cornerBenches(one.bench, 0.01)) largest.push(await largestError(one, [bench], TOGETHER));
      const charged = verdict(one, 1).offered as number;
      expect(charged).toBeGreaterThanOrEqual(Math.max(...largest));
      expect(charged).toBeLessThanOrEqual(1.05 * Math.max(...largest));
    });
  }
});
