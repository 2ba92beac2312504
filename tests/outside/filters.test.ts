import { describe } from 'vitest';
import { multipleFeedbackShift, twoIntegratorQ } from '../../src/formulas/filter-rules.js';
import { gainBandwidthForShift, multipleFeedback, sallenKey, stopBandFloor } from '../../src/formulas/filters.js';
import { halfPowerFrequency, peakOf } from '../../src/formulas/low-pass-response.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { measuredBandwidth, multipleFeedbackCircuit, sallenKeyCircuit } from '../support/filter-circuits.js';
import { solveFor } from '../support/loops.js';
import { fallsThrough, GROUND, highest, magnitude, solve, summit, type Element } from '../support/nodal.js';

const CIRCUIT = 'nodal analysis of the circuit';

describe('Sallen-Key', () => {
  published('GBW-24', (of) => halfPowerFrequency(sallenKey(unityGain(of), of('GBW_Hz'))));
  published('GBW-25', (of) => halfPowerFrequency(sallenKey(unityGain(of), of('GBW_Hz'))));
  for (const id of ['GBW-24', 'GBW-25']) {
    rederived(id, { by: CIRCUIT, within: 1e-6, value: (of) => measuredBandwidth(circuit(unityGain(of), of('GBW_Hz')), 1e3) });
  }
  published('GBW-26', (of) => peakOf(sallenKey(unityGain(of), of('GBW_Hz'))).gain);
  published('GBW-27', (of) => peakOf(sallenKey(unityGain(of), of('GBW_Hz'))).gain);
  published('GBW-28', (of) => peakOf(sallenKey(equalParts(of), of('GBW_Hz'))).gain);
  rederived('GBW-26', { by: CIRCUIT, within: 1e-6, value: (of) => measuredPeak(circuit(unityGain(of), of('GBW_Hz'))) });
  rederived('GBW-27', { by: CIRCUIT, within: 1e-6, value: (of) => measuredPeak(circuit(unityGain(of), of('GBW_Hz'))) });
  rederived('GBW-28', { by: CIRCUIT, within: 1e-6, value: (of) => measuredPeak(circuit(equalParts(of), of('GBW_Hz'))) });

  published('GBW-30', (of) => stopBandFloor(of('R1_ohm'), of('R2_ohm'), of('Ro_ohm')));
  rederived('GBW-30', {
    by: CIRCUIT,
    within: 1e-3,
    value: (of) => {
      const unit = 1 / (2 * Math.PI * 1e4 * of('R1_ohm'));
      const elements = sallenKeyCircuit({
        r: [of('R1_ohm'), of('R2_ohm')],
        c: [Math.SQRT2 * unit, Math.SQRT1_2 * unit],
        gain: 1,
        gainBandwidth: of('GBW_Hz'),
        outputResistance: of('Ro_ohm'),
      });
      return magnitude(solve(elements, of('f_Hz'))('out'));
    },
  });

  published('GBW-33', (of) => gainBandwidthForShift((gbw) => sallenKey(givenParts(of), gbw), 0.01));
  published('GBW-34', (of) => gainBandwidthForShift((gbw) => sallenKey(givenParts(of), gbw), 0.01));
  published('GBW-35', (of) => gainBandwidthForShift((gbw) => sallenKey(givenParts(of), gbw), 0.01));
  for (const id of ['GBW-33', 'GBW-34', 'GBW-35']) {
    const value = (of: Given): number => gainBandwidthByMeasurement((gbw) => circuit(givenParts(of), gbw));
    rederived(id, { by: `bisection on ${CIRCUIT}`, within: 1e-5, value });
  }
});

describe('multiple feedback', () => {
  const parts = (of: Given) => ({ r1: of('R1_ohm'), r2: of('R2_ohm'), r3: of('R3_ohm'), c1: of('C1_F'), c2: of('C2_F') });
  const measured = (of: Given): number => {
    const { r1, r2, r3, c1, c2 } = parts(of);
    return gainBandwidthByMeasurement((gainBandwidth) => multipleFeedbackCircuit({ r: [r1, r2, r3], c: [c1, c2], gainBandwidth }));
  };
  published('GBW-36', (of) => gainBandwidthForShift((gbw) => multipleFeedback(parts(of), gbw), 0.01));
  published('GBW-37', (of) => gainBandwidthForShift((gbw) => multipleFeedback(parts(of), gbw), 0.01));
  rederived('GBW-36', { by: `bisection on ${CIRCUIT}`, within: 1e-5, value: measured });
  rederived('GBW-37', { by: `bisection on ${CIRCUIT}`, within: 1e-5, value: measured });

  const shift = (of: Given) => {
    return multipleFeedbackShift({ q: of('Q'), gain: -of('H0'), naturalFrequency: of('f0_Hz'), gainBandwidth: of('GBW_Hz') });
  };
  published('GBW-40', (of) => shift(of).frequency);
  published('GBW-41', (of) => shift(of).q);
  // The rules are first-order: the exact pole differs in the second order, 2 % and 4 % of the shift here.
  rederived('GBW-40', { by: 'the exact pole of the cubic', within: 0.02, value: (of) => exactPole(of).frequency / of('f0_Hz') - 1 });
  rederived('GBW-41', { by: 'the exact pole of the cubic', within: 0.04, value: (of) => exactPole(of).q / of('Q') - 1 });
});

describe('two-integrator loop', () => {
  const q = (of: Given) => twoIntegratorQ({ q: of('Q'), naturalFrequency: of('f0_Hz'), gainBandwidth: of('GBW_Hz') });
  published('GBW-21', (of) => q(of) / of('Q') - 1);
  rederived('GBW-21', {
    by: 'the measured band-pass width of a circuit of three amplifiers',
    within: 0.02,
    value: (of) => {
      const r = 1e4;
      const c = 1 / (2 * Math.PI * of('f0_Hz') * r);
      const amplifier = (minus: string, output: string): Element => ({ plus: GROUND, minus, output, gainBandwidth: of('GBW_Hz') });
      const elements: Element[] = [
        { volts: 1, at: 'in' },
        { r: r * of('Q'), between: ['in', 'n1'] },
        { r: r * of('Q'), between: ['n1', 'b'] },
        { c, between: ['n1', 'b'] },
        amplifier('n1', 'b'),
        { r, between: ['b', 'n2'] },
        { c, between: ['n2', 'l'] },
        amplifier('n2', 'l'),
        { r, between: ['l', 'n3'] },
        { r, between: ['n3', 'i'] },
        amplifier('n3', 'i'),
        { r, between: ['i', 'n1'] },
      ];
      const gain = (f: number): number => magnitude(solve(elements, f)('b'));
      const centre = summit(gain, [of('f0_Hz') * 0.9, of('f0_Hz') * 1.1]);
      const half = gain(centre) / Math.SQRT2;
      const upper = fallsThrough(gain, half, centre);
      const lower = 1 / fallsThrough((period) => gain(1 / period), half, 1 / centre);
      return Math.sqrt(upper * lower) / (upper - lower) / of('Q') - 1;
    },
  });
});

interface Parts {
  readonly r1: number;
  readonly r2: number;
  readonly c1: number;
  readonly c2: number;
  readonly gain: number;
}

/** Unity gain, equal resistors: C1 = 2Q/(ω0·R), C2 = 1/(2Q·ω0·R). */
function unityGain(of: Given): Parts {
  const r = 1e4;
  const c = 1 / (2 * Math.PI * of('fc_Hz') * r);
  return { r1: r, r2: r, c1: 2 * of('Q') * c, c2: c / (2 * of('Q')), gain: of('K') };
}

/** Equal resistors and capacitors, K = 3 − 1/Q. */
function equalParts(of: Given): Parts {
  const c = 1 / (2 * Math.PI * of('fc_Hz') * 1e4);
  return { r1: 1e4, r2: 1e4, c1: c, c2: c, gain: of('K') };
}

function givenParts(of: Given): Parts {
  return { r1: of('R1_ohm'), r2: of('R2_ohm'), c1: of('C1_F'), c2: of('C2_F'), gain: 1 };
}

function circuit({ r1, r2, c1, c2, gain }: Parts, gainBandwidth: number): Element[] {
  return sallenKeyCircuit({ r: [r1, r2], c: [c1, c2], gain, gainBandwidth });
}

function measuredPeak(elements: readonly Element[]): number {
  return highest((f) => magnitude(solve(elements, f)('out')), 5e3, 2e4);
}

/** Gain-bandwidth that moves the measured −3 dB frequency by 1 % from the ideal circuit's. */
function gainBandwidthByMeasurement(circuitAt: (gainBandwidth: number) => Element[]): number {
  const ideal = measuredBandwidth(circuitAt(1e15), 2e3);
  return solveFor((gbw) => Math.abs(measuredBandwidth(circuitAt(gbw), 2e3) / ideal - 1), 0.01, [1e5, 1e8]);
}

/** Complex pole of the multiple-feedback stage at its smallest capacitor ratio, by Newton's method on the cubic. */
function exactPole(of: Given): { readonly frequency: number; readonly q: number } {
  const gain = -of('H0');
  const r2 = 1e4;
  const r3 = r2 / (1 + gain);
  const square = 1 / (2 * Math.PI * of('f0_Hz')) ** 2;
  const c2 = Math.sqrt(square / (4 * of('Q') ** 2 * r2 * r3 * (1 + gain)));
  const c1 = square / (r2 * r3 * c2);
  const { a, b, c } = multipleFeedback({ r1: r2 / gain, r2, r3, c1, c2 }, of('GBW_Hz'));
  const angular = 2 * Math.PI * of('f0_Hz');
  let [re, im] = [-angular / (2 * of('Q')), angular];
  for (let turn = 0; turn < 50; turn += 1) {
    const [re2, im2] = [re * re - im * im, 2 * re * im];
    const [re3, im3] = [re2 * re - im2 * im, re2 * im + im2 * re];
    const value = [1 + a * re + b * re2 + c * re3, a * im + b * im2 + c * im3] as const;
    const slope = [a + 2 * b * re + 3 * c * re2, 2 * b * im + 3 * c * im2] as const;
    const size = slope[0] ** 2 + slope[1] ** 2;
    re -= (value[0] * slope[0] + value[1] * slope[1]) / size;
    im -= (value[1] * slope[0] - value[0] * slope[1]) / size;
  }
  const natural = Math.hypot(re, im);
  return { frequency: natural / (2 * Math.PI), q: natural / (-2 * re) };
}
