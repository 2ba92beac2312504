import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { CHECKS } from '../../src/checks/index.js';
import type { Demands } from '../../src/demands/index.js';
import type { Figure, Parameter } from '../../src/parts/figures.js';
import { PARAMETERS } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { readingsOf } from '../../src/parts/readings.js';
import { judgePart, judging } from '../../src/screening/index.js';
import type { LimitsSpec, StageSpec } from '../../src/spec/spec.js';
import type { Finding, NumberFinding } from '../../src/verdicts/finding.js';
import type { Outcome, Verdict } from '../../src/verdicts/verdict.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { FULL, max, partOf, typ } from '../support/parts.js';
import { ac, between, coupled, dc, demandsOf, fourResistors, load, midSupply, resistors, source, stageSpec, swing, value } from '../support/stages.js';

// Many cases a test: slow on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const SETTINGS = { seed: 5, numRuns: 150 };
const LIMITS: LimitsSpec = { dcError: value(0.02), supplyCurrent: value(80e-6), swingLoss: value(0.02) };

const STAGES: readonly StageSpec[] = [
  stageSpec('follower', dc(0.1, 2.5, 1e4), { supply: between(3, 4.2), source: source(1e4), load: load(2e3, 'supply'), temperature: between(-20, 85), limits: LIMITS }),
  stageSpec('non-inverting', dc(0.1, 0.5, 2e3), { resistors: resistors(70e3, 10e3), load: load(10e3), source: source(1e3), temperature: between(10, 35), limits: LIMITS }),
  stageSpec('inverting', ac(0.5, 1e4), { supply: between(4.5, 5.5), resistors: resistors(20e3, 10e3), reference: midSupply(0.01, 1e4), load: load(1e3, 'reference'), limits: LIMITS }),
  stageSpec('difference', coupled(swing(-0.2, 0.2), swing(1, 3), 1e3), {
    resistors: fourResistors({ r1: 1e4, r2: 2e4, r3: 1e4, r4: 2e4 }), reference: midSupply(), load: load(1e4), temperature: between(0, 60), limits: LIMITS,
  }),
  stageSpec('non-inverting', dc(0.1, 0.5, 2e3), {
    resistors: resistors(70e3, 10e3), load: load(10e3, 'ground', 1e-9), source: source(1e3), temperature: between(0, 60),
    limits: { ...LIMITS, outputNoise: value(300e-6), snr: value(2000), phaseMargin: value(45) },
  }),
];
const DEMANDS: readonly Demands[] = STAGES.map(demandsOf);
const demands = fc.constantFrom(...DEMANDS);
const anyPart: fc.Arbitrary<Part> = arbitraryParts.map((parts) => ({ ...parts[0]!, class: null }));

const verdictsOf = (asked: Demands, part: Part): ReadonlyMap<string, Verdict> => new Map(judgePart(judging(asked, [], false), part).verdicts.map((verdict) => [verdict.check, verdict]));

describe('the pessimistic reading', () => {
  /** One exception is in the contract itself: Ib·(Rp+Rn) for Ios unknown can be less than Ib·(|Rp−Rn| + t(Rp+Rn)). */
  const isExcepted = (check: string, part: Part): boolean => check === 'dc-error' && !part.figures.some(({ parameter }) => parameter === 'offsetCurrent');

  it('never offers more than the optimistic one, at any vertex', () => {
    let compared = 0;
    fc.assert(
      fc.property(demands, anyPart, (asked, part) => {
        const rules = { part, operating: asked.operating, strict: false, classWorst: null };
        for (const check of CHECKS.filter(({ id }) => !isExcepted(id, part))) {
          const worst = numbersIn(check.judge(asked, readingsOf({ ...rules, outlook: 'pessimistic' })));
          const best = numbersIn(check.judge(asked, readingsOf({ ...rules, outlook: 'optimistic' })));
          worst.forEach((finding, at) => {
            const other = best[at];
            if (finding === null || other == null) return;
            compared += 1;
            const ahead = finding.sense === 'at-least' ? other.offered - finding.offered : finding.offered - other.offered;
            expect(ahead >= -1e-9 * Math.abs(finding.offered), `${check.id} ${finding.offered} ${other.offered}`).toBe(true);
          });
        }
      }),
      SETTINGS,
    );
    expect(compared).toBeGreaterThan(300);
  });

  it('asks and decides at the same vertices as the optimistic one', () => {
    fc.assert(
      fc.property(demands, anyPart, (asked, part) => {
        const rules = { part, operating: asked.operating, strict: false, classWorst: null };
        // Without an output resistance a stated capacitive load may decide on one reading alone.
        for (const check of CHECKS.filter(({ id }) => id !== 'phase-margin')) {
          const kinds = (outlook: 'pessimistic' | 'optimistic'): unknown => numbersIn(check.judge(asked, readingsOf({ ...rules, outlook }))).map((one) => one === null);
          expect(kinds('pessimistic'), check.id).toEqual(kinds('optimistic'));
        }
      }),
      SETTINGS,
    );
  });
});

/** Findings in order; null where there is no number. */
function numbersIn(finding: Finding | null): (NumberFinding | null)[] {
  if (finding === null) return [];
  const all = finding.kind === 'vertices' ? finding.findings : [finding];
  return all.map((one) => (one.kind === 'numbers' ? one : null));
}

describe('taking every figure of a parameter away', () => {
  /**
   * For these the contract names what stands in: unity-gain stable, 0..70 °C, the operating maximum, 1.5 × the heaviest
   * point, and an offset that is not charged against head-room but told in a caution. Everywhere else less is never a pass.
   */
  const STAND_INS: Readonly<Partial<Record<Parameter, readonly string[]>>> = {
    minimumStableGain: ['stable-gain'], temperature: ['temperature-low', 'temperature-high'], supplyAbsoluteMaximum: ['supply-peak'],
    // A pole nobody stated is not counted, a stated capacitive load stands in for the output resistance; without one it is no pass.
    inputCapacitance: ['phase-margin'], phaseMargin: ['phase-margin'], unityCrossover: ['phase-margin'], outputResistance: ['phase-margin'],
    outputCurrent: ['output-current'], offsetVoltage: ['output-low', 'output-high'], offsetDrift: ['output-low', 'output-high'], offsetCurrent: ['dc-error'],
  };

  it('never turns an unknown or a fail into a pass', () => {
    const taken = fc.constantFrom(...(Object.keys(PARAMETERS) as Parameter[]));
    const someOf = fc.tuple(anyPart, fc.subarray([...FULL])).map(([part, figures]) => ({ ...part, figures: [...figures, ...part.figures.filter((own) => !figures.some(({ parameter }) => parameter === own.parameter))] }));
    fc.assert(
      fc.property(demands, someOf, taken, (asked, part, parameter) => {
        const before = verdictsOf(asked, part);
        const after = verdictsOf(asked, { ...part, figures: part.figures.filter((figure) => figure.parameter !== parameter) });
        for (const [check, { outcome }] of after) {
          if (outcome === 'pass' && STAND_INS[parameter]?.includes(check) !== true) expect(before.get(check)?.outcome, `${check} without ${parameter}`).toBe('pass');
        }
      }),
      { ...SETTINGS, numRuns: 300 },
    );
  });

  it.each([
    ['minimumStableGain', max('minimumStableGain', 100), 'stable-gain'],
    ['temperature', max('temperature', 60), 'temperature-high'],
    ['supplyAbsoluteMaximum', max('supplyAbsoluteMaximum', 2), 'supply-peak'],
  ] as const)('has a stand-in for %s only because the contract says so, and then the basis is assumed', (parameter, figure, check) => {
    const others = FULL.filter((one) => one.parameter !== parameter);
    const spec = stageSpec('follower', dc(1, 2), { temperature: between(25, 65) });
    expect(verdictsOf(demandsOf(spec), partOf([...others, figure])).get(check)?.outcome).toBe('fail');
    expect(verdictsOf(demandsOf(spec), partOf(others)).get(check)).toMatchObject({ outcome: 'pass', basis: 'assumed' });
  });
});

/** What a limit must be to say no more than the typical figure already does, SI. */
const FACTORS: Partial<Record<Parameter, number>> = {
  slewRate: 0.6, gainBandwidth: 0.6, offsetVoltage: 3, offsetDrift: 3, biasCurrent: 4, offsetCurrent: 4, quiescentCurrent: 1.4,
  commonModeRejection: 1 / 3.16, supplyRejection: 1 / 3.16, openLoopGain: 1 / 3.16,
  inputLowHeadroom: 1.5, inputHighHeadroom: 1.5, outputLowHeadroom: 1.5, outputHighHeadroom: 1.5,
};

describe('a limit of the derated value in place of a typical figure', () => {
  const typicals = fc.array(fc.double({ min: 0.05, max: 20, noNaN: true }), { minLength: FULL.length, maxLength: FULL.length }).map((scales) =>
    FULL.map((figure, at): Figure => ((PARAMETERS[figure.parameter].kinds as readonly string[]).includes('typ') ? typ(figure.parameter, Math.abs(figure.value) * scales[at]!, figure.condition) : figure)),
  );
  const replaceable = FULL.filter(({ parameter }) => FACTORS[parameter] !== undefined);

  it('keeps every pass', () => {
    let kept = 0;
    fc.assert(
      fc.property(demands, typicals, fc.nat(replaceable.length - 1), (asked, figures, which) => {
        const { parameter, condition } = replaceable[which]!;
        const limited = figures.map((figure): Figure =>
          figure.parameter === parameter && figure.condition === condition ? { ...figure, kind: replaceable[which]!.kind, value: figure.value * FACTORS[parameter]! } : figure,
        );
        const after = verdictsOf(asked, partOf(limited));
        for (const [check, { outcome }] of verdictsOf(asked, partOf(figures))) {
          if (outcome !== 'pass') continue;
          kept += 1;
          expect(after.get(check)?.outcome, `${check} with ${parameter}`).toBe('pass');
        }
      }),
      SETTINGS,
    );
    expect(kept).toBeGreaterThan(300);
  });
});

describe('a looser limit', () => {
  const ORDER: Record<Outcome, number> = { fail: 0, unknown: 1, pass: 2 };
  const factor = fc.double({ min: 1, max: 100, noNaN: true });
  /** Each loosened by a factor of at least 1. */
  const LOOSENED: Readonly<Record<string, (spec: StageSpec, by: number) => StageSpec>> = {
    'phase-margin': (spec, by) => ({ ...spec, limits: { ...spec.limits, phaseMargin: value(Math.max(1, 89 / by)) } }),
    noise: (spec, by) => ({ ...spec, limits: { ...spec.limits, outputNoise: value(10e-6 * by), snr: value(1e5 / by) } }),
    'dc-error': (spec, by) => ({ ...spec, limits: { ...spec.limits, dcError: value(0.002 * by) } }),
    'supply-current': (spec, by) => ({ ...spec, limits: { ...spec.limits, supplyCurrent: value(10e-6 * by) } }),
    'gain-bandwidth': (spec, by) => ({ ...spec, limits: { ...spec.limits, gainError: value(Math.min(0.5, 0.0001 * by)) } }),
    'slew-rate': (spec, by) => ({ ...spec, margins: { slewRate: 100 / by } }),
    'output-low': (spec, by) => ({ ...spec, limits: { ...spec.limits, swingLoss: value(0.001 * by) } }),
    'output-high': (spec, by) => ({ ...spec, margins: { outputHeadroom: value(0.5 / by) } }),
    price: (spec, by) => ({ ...spec, wishes: { price: { amount: 0.1 * by, currency: 'EUR', text: '' } } }),
  };
  const scaled = fc.array(fc.double({ min: 0.1, max: 10, noNaN: true }), { minLength: FULL.length, maxLength: FULL.length }).chain((scales) =>
    fc.boolean().map((typical) =>
      FULL.map((figure, at): Figure => {
        const kind = typical && (PARAMETERS[figure.parameter].kinds as readonly string[]).includes('typ') ? 'typ' : figure.kind;
        return { ...figure, kind, value: figure.value * scales[at]! };
      }),
    ),
  );

  it.each(Object.keys(LOOSENED))('never worsens %s', (check) => {
    fc.assert(
      fc.property(fc.constantFrom(...STAGES), scaled, fc.tuple(factor, factor), (spec, figures, factors) => {
        const [tight, loose] = [Math.min(...factors), Math.max(...factors)];
        const at = (by: number): Outcome => verdictsOf(demandsOf(LOOSENED[check]!(spec, by)), partOf(figures, { price: { amount: 1, currency: 'EUR', quantity: null } })).get(check)!.outcome;
        expect(ORDER[at(loose)]).toBeGreaterThanOrEqual(ORDER[at(tight)]);
      }),
      SETTINGS,
    );
  });
});

describe('the order in which figures are listed', () => {
  it('changes no number and no outcome', () => {
    fc.assert(
      fc.property(demands, anyPart, (asked, part) => {
        const reversed = verdictsOf(asked, { ...part, figures: [...part.figures].reverse() });
        for (const [check, { outcome, offered, offeredBest, known, basis }] of verdictsOf(asked, part)) {
          expect(reversed.get(check)).toMatchObject({ outcome, offered, offeredBest, known, basis });
        }
      }),
      SETTINGS,
    );
  });
});
