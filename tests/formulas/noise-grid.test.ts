import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BOLTZMANN } from '../../src/formulas/constants.js';
import { noiseGrid } from '../../src/formulas/noise-grid.js';
import { resistorNoise } from '../../src/formulas/noise.js';
import { pinResponse } from '../../src/formulas/pin-network.js';
import { published } from '../support/check-values.js';
import { refuses } from '../support/examples.js';
import { anyStage, divider, FOLLOWING, GROUNDED, resistor, sallenKeyNetworks, transimpedance } from './networks.js';

const source = { elements: [resistor('Rs', 10e3, ['ground', 'p'])], pin: 'p' };
const band = { temperature: 300, lowest: 0.1, following: null };

describe('grid of a stage', () => {
  it('holds the thermal density of the example at every frequency', () => {
    const { thermal, resistors } = noiseGrid({ plus: source, minus: FOLLOWING, ...band });
    expect(resistors).toEqual(['Rs']);
    for (const density of thermal[0]!) expect(density / 1.6568e-16).toBeCloseTo(1, 4);
  });
  it('spans the lowest frequency to 1e15 Hz and stands for all above', () => {
    const { frequency, weight, difference } = noiseGrid({ plus: source, minus: FOLLOWING, ...band });
    expect(frequency[0]).toBeGreaterThan(0.1);
    expect(frequency.at(-1)).toBe(1e15);
    const inverseSquares = frequency.reduce((sum, f, i) => sum + weight[i]! / (1e6 * (f / 1e6) ** 2 + 1e6), 0);
    expect(inverseSquares / (Math.PI / 2 - Math.atan(1e-7))).toBeCloseTo(1, 9);
    expect(difference.at(-1)).toBe(0);
    expect(difference).toHaveLength(frequency.length);
  });
  it('samples what each pin sees', () => {
    fc.assert(
      fc.property(anyStage, fc.nat(), (stage, pick) => {
        const grid = noiseGrid({ ...stage, ...band });
        const i = pick % grid.frequency.length;
        const plus = pinResponse(stage.plus, grid.frequency[i]!, stage.plusCapacitance);
        const minus = pinResponse(stage.minus, grid.frequency[i]!, stage.minusCapacitance);
        expect(grid.feedbackRe[i]).toBe(minus.fromOutput.re - plus.fromOutput.re);
        expect(grid.feedbackIm[i]).toBe(minus.fromOutput.im - plus.fromOutput.im);
        expect(grid.plusSquare[i]).toBeCloseTo(plus.impedance.re ** 2 + plus.impedance.im ** 2, 12);
        expect(grid.minusSquare[i]).toBeCloseTo(minus.impedance.re ** 2 + minus.impedance.im ** 2, 12);
        const together = 4 * BOLTZMANN * 300 * (plus.impedance.re + minus.impedance.re);
        expect(Math.abs(grid.thermalSum[i]! - together)).toBeLessThan(1e-12 * 4 * BOLTZMANN * 300 * Math.sqrt(grid.plusSquare[i]! + grid.minusSquare[i]!) + 1e-12 * together);
      }),
      { numRuns: 30 },
    );
  });
  it('stands closer where a filter has a resonance', () => {
    const resonant = noiseGrid({ ...sallenKeyNetworks([10e3, 10e3, 63.66e-9, 39.8e-12], 1), ...band });
    const plain = noiseGrid({ ...transimpedance(10e3, 10e-12, 10e-12), ...band });
    const near = ({ frequency }: { frequency: Float64Array }): number => frequency.filter((f) => f > 9e3 && f < 11e3).length;
    expect(near(resonant)).toBeGreaterThan(5 * near(plain));
  });
  published('NOI-01', (of) => {
    const plus = { elements: [resistor('Rp', of('Rp_ohm'), ['ground', 'p'])], pin: 'p' };
    const grid = noiseGrid({ plus, minus: divider(of('Rf_ohm'), of('Rg_ohm')), temperature: of('T_K'), lowest: 1, following: null });
    const current = of('in_A_rtHz') ** 2 * (grid.plusSquare[0]! + grid.minusSquare[0]!);
    return Math.sqrt(of('en_V_rtHz') ** 2 + current + grid.thermalSum[0]!) / grid.feedbackRe[0]!;
  });
  published('NOI-19', (of) => {
    const plus = { elements: [resistor('Ra', of('Ra_ohm'), ['ground', 'p']), resistor('Rb', of('Rb_ohm'), ['ground', 'p'])], pin: 'p' };
    const grid = noiseGrid({ plus, minus: divider(of('NG') - 1, 1), temperature: of('T_K'), lowest: 1, following: null });
    expect(Math.sqrt(grid.thermal[0]![0]! + grid.thermal[1]![0]!)).toBeCloseTo(resistorNoise(50e3, of('T_K')), 15);
    return Math.sqrt(grid.thermal[0]![0]! + grid.thermal[1]![0]!) / grid.feedbackRe[0]!;
  });

  const stage = { plus: GROUNDED, minus: FOLLOWING, ...band };
  refuses(() => noiseGrid({ ...stage, temperature: 0 }), 'noiseGrid: temperature must be finite, above 0, but is 0');
  refuses(() => noiseGrid({ ...stage, lowest: 0 }), 'noiseGrid: lowest must be finite, above 0, at most 1000000000000, but is 0');
  refuses(() => noiseGrid({ ...stage, following: { corner: 0, order: 1 } }), 'noiseGrid: following corner must be finite, above 0, but is 0');
  refuses(() => noiseGrid({ ...stage, following: { corner: 1, order: 0 } }), 'noiseGrid: following order must be finite, at least 1, but is 0');
  refuses(
    () => noiseGrid({ ...stage, plus: source, minus: { ...source, elements: [resistor('Rs', 1, ['output', 'p'])] } }),
    'noiseGrid: every resistor needs a name of its own, but Rs stands for two',
  );
});
