import { describe, expect, it } from 'vitest';
import { noiseTerms, type NoiseTerms } from '../../src/checks/noise-sources.js';
import type { Figure } from '../../src/parts/figures.js';
import { readingsOf } from '../../src/parts/readings.js';
import type { PartUnderTest } from '../../src/parts/reading.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { published, type Given } from '../support/check-values.js';
import { assumed, max, min, typ, under } from '../support/parts.js';
import { between, dc, demandsOf, exactly, resistors, source, stageSpec, swing, value, voltage } from '../support/stages.js';

const LIMITS = { outputNoise: value(1e-3) };

function termsOf(spec: StageSpec, figures: readonly Figure[], rules: Partial<PartUnderTest> = {}): NoiseTerms {
  return noiseTerms(demandsOf({ ...spec, limits: LIMITS }).noise!, readingsOf(under(figures, rules)));
}

/** Noise is read at its best: what is printed, at the printed gain bandwidth. */
const PRINTED = { outlook: 'optimistic' } as const;
const rms = ({ terms }: NoiseTerms): number => Math.hypot(...terms.map(({ value: volts }) => volts));
const named = ({ terms }: NoiseTerms, name: string): number => terms.find((term) => term.name === name)?.value ?? 0;
const kelvin = (degrees: number): Pick<StageSpec, 'temperature'> => ({ temperature: exactly(degrees - 273.15) });

describe('somebody else\'s noise', () => {
  // The published example has a current-noise corner; a list has none, so its current noise is given as the white level that does as much.
  published('NOI-08', (of) => {
    const spec = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(of('R2_ohm'), of('R1_ohm'), 0), source: source(of('R3_ohm')), ...kelvin(of('T_K')) });
    const pole = of('GBW_Hz') / 3;
    const white = Math.PI / 2 * pole;
    const flicker = of('fci_Hz') * Math.log(pole / of('fL_Hz'));
    const current = of('in_A_rtHz') * Math.sqrt(1 + flicker / white);
    return rms(termsOf(spec, [max('voltageNoise', of('en_V_rtHz')), max('noiseCorner', of('fce_Hz')), max('currentNoise', current), min('gainBandwidth', of('GBW_Hz'))], PRINTED));
  });

  published('NOI-12', (of) => {
    const spec = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors((of('NG') - 1) * 1e-3, 1e-3, 0) });
    return named(termsOf(spec, [max('voltageNoise', of('en_V_rtHz')), max('noiseCorner', 0), max('currentNoise', 0), min('gainBandwidth', of('GBW_Hz'))], PRINTED), 'amplifier voltage noise');
  });

  const diode = (of: Given, degrees = 300): StageSpec =>
    stageSpec('transimpedance', { coupling: 'dc', shape: 'band-limited', observation: value(1e3) }, {
      photodiode: { current: swing(0, 1e-9), direction: 'out-of-node', capacitance: value(of('Cin_F')) },
      resistors: { feedback: value(of('Rf_ohm')) }, capacitors: { feedback: value(of('Cf_F')) }, reference: voltage(0.5), ...kelvin(degrees),
    });
  const figures = (of: Given, density: number): readonly Figure[] => [max('voltageNoise', density), max('noiseCorner', 0), max('currentNoise', 0), min('gainBandwidth', of('GBW_Hz'))];
  published('NOI-13', (of) => named(termsOf(diode(of), figures(of, of('en_V_rtHz')), PRINTED), 'amplifier voltage noise'));
  published('NOI-14', (of) => named(termsOf(diode(of, of('T_K')), figures(of, 1e-9), PRINTED), 'feedback resistor'));
});

const SPEC = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(90e3, 10e3), source: source(1e3), temperature: between(0, 85) });
const FULL: readonly Figure[] = [max('voltageNoise', 20e-9), max('noiseCorner', 100), max('currentNoise', 1e-12), min('gainBandwidth', 0.6e6), typ('gainBandwidth', 1e6)];

describe('the terms', () => {
  it('are the amplifier\'s own, white and 1/f, its current at each pin, and every resistor by name', () => {
    const { terms, missing } = termsOf(SPEC, FULL);
    expect(missing).toEqual([]);
    expect(terms.map(({ name }) => name)).toEqual([
      'amplifier voltage noise', 'amplifier 1/f noise', 'amplifier current noise, + input', 'amplifier current noise, − input', 'source resistor', 'feedback resistor', 'gain leg resistor',
    ]);
    expect(terms.map(({ slot }) => slot)).toEqual(['voltageNoise.max', 'noiseCorner.max', 'currentNoise.max', 'currentNoise.max', null, null, null]);
  });

  it('grow with the bandwidth: the worst reading stands at the most of it, the best at the least printed', () => {
    const [worst, best] = [termsOf(SPEC, FULL), termsOf(SPEC, FULL, PRINTED)];
    expect(named(worst, 'source resistor') / named(best, 'source resistor')).toBeCloseTo(Math.sqrt(1 / 0.6), 6);
    // By hand: NG·√(4kT·R·(π/2)·GBW/NG) at 85 °C.
    expect(named(worst, 'source resistor') / (10 * Math.sqrt(4 * 1.380649e-23 * 358.15 * 1e3 * (Math.PI / 2) * 0.1e6))).toBeCloseTo(1, 3);
  });

  it('hold the shot noise of a photodiode and the step of a converter', () => {
    const photodiode = { current: swing(0, 1e-6), direction: 'out-of-node', capacitance: value(50e-12) } as const;
    const spec = stageSpec('transimpedance', { coupling: 'dc', shape: 'band-limited' }, { photodiode, resistors: { feedback: value(1e6) }, reference: voltage(0.5), converter: { bits: 12, range: swing(0, 4.096) } });
    const found = termsOf(spec, [...FULL, typ('inputCapacitance', 5e-12)]);
    expect(named(found, 'photodiode shot noise') / named(found, 'feedback resistor')).toBeCloseTo(Math.sqrt((2 * 1.602176634e-19 * 1e-6 * 1e6) / (4 * 1.380649e-23 * 298.15)), 6);
    expect(named(found, 'quantisation')).toBeCloseTo(1e-3 / Math.sqrt(12), 12);
    // The capacitance of its own input counts, and where it is not known that is assumed.
    const without = termsOf(spec, FULL);
    expect(without.terms[0]).toMatchObject({ basis: 'assumed' });
    expect(named(without, 'amplifier voltage noise')).toBeLessThan(named(found, 'amplifier voltage noise'));
  });
});

describe('a figure that is missing', () => {
  const without = (parameter: Figure['parameter']): Figure[] => FULL.filter((one) => one.parameter !== parameter);

  it.each([['voltageNoise', 20e-9], ['noiseCorner', 100], ['currentNoise', 1e-12]] as const)('is named, with the value of it that adds a given square: %s', (parameter, was) => {
    const [whole, found] = [termsOf(SPEC, FULL), termsOf(SPEC, without(parameter))];
    expect(found.missing.map(({ missing }) => missing.figure)).toEqual([parameter]);
    const square = rms(whole) ** 2 - rms(found) ** 2;
    expect(found.missing[0]!.turnsAt(square)!.value / was).toBeCloseTo(1, 3);
  });

  it('is not missed where it adds nothing: current noise at pins that are driven, the corner of an amplifier without noise', () => {
    expect(termsOf(stageSpec('follower', dc(1, 2)), without('currentNoise')).missing).toEqual([]);
    expect(termsOf(SPEC, [...without('noiseCorner').filter(({ parameter }) => parameter !== 'voltageNoise'), max('voltageNoise', 0)]).missing).toEqual([]);
  });

  it('is borrowed from the class, as nothing on the best reading', () => {
    const classWorst = { noiseCorner: 1e3, currentNoise: 5e-12 };
    const worst = termsOf(SPEC, without('noiseCorner'), { classWorst });
    expect(worst.terms.find(({ name }) => name === 'amplifier 1/f noise')).toMatchObject({ basis: 'borrowed' });
    expect(named(termsOf(SPEC, without('noiseCorner'), { classWorst, ...PRINTED }), 'amplifier 1/f noise')).toBe(0);
    expect(termsOf(SPEC, without('noiseCorner'), { classWorst, strict: true }).missing).toHaveLength(1);
  });

  it('leaves only the converter without a gain bandwidth, and an assumed one lets nothing through at its best', () => {
    const spec = { ...SPEC, converter: { bits: 12, range: swing(0, 4.096) } };
    const found = termsOf(spec, without('gainBandwidth'));
    expect(found.terms.map(({ name }) => name)).toEqual(['quantisation']);
    expect(found.missing).toMatchObject([{ missing: { figure: 'gainBandwidth' } }]);
    const best = termsOf(spec, [...without('gainBandwidth'), assumed(typ('gainBandwidth', 1e6))], PRINTED);
    expect([best.terms.map(({ name }) => name), best.missing]).toEqual([['quantisation'], []]);
  });
});
