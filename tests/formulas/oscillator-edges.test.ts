import { describe, expect, it } from 'vitest';
import { slewedOscillation } from '../../src/formulas/oscillator-edges.js';
import { oscillatorPeriod, oscillatorThresholds } from '../../src/formulas/oscillator.js';
import { example, refuses } from '../support/examples.js';

const EQUAL = { supply: 5, high: 5, low: 0, toSupply: 1e4, toGround: 1e4, toOutput: 1e4 };

describe('relaxation oscillator with edges', () => {
  example('slewedOscillation(…) at 1 V/µs, RC = 100 µs', () => slewedOscillation(EQUAL, 1e-4, 1e6)!.frequency, 6843.96);

  it('is the ideal one with an endless slew rate, also with a conventional output', () => {
    const conventional = { ...EQUAL, high: 3.5, low: 0.05 };
    for (const stage of [EQUAL, conventional]) {
      const [slewed, ideal] = [slewedOscillation(stage, 1e-4, 1e13)!, oscillatorPeriod(stage, 1e-4)];
      expect(slewed.frequency / ideal.frequency).toBeCloseTo(1, 6);
      expect(slewed.duty).toBeCloseTo(ideal.duty, 6);
    }
  });

  it('agrees with the circuit stepped through time', () => {
    for (const slewRate of [2e5, 1e6]) {
      const step = 1e-9;
      let [out, cap, rising, time, started] = [0, 5 / 3, true, 0, 0];
      const { upper, lower } = oscillatorThresholds(EQUAL);
      const turns: number[] = [];
      while (turns.length < 4) {
        out = Math.max(0, Math.min(5, out + (rising ? 1 : -1) * slewRate * step));
        cap += ((out - cap) * step) / 1e-4;
        // The threshold moves with the output.
        const threshold = lower + ((upper - lower) * out) / 5;
        if (rising ? cap > threshold && out >= 5 : cap < threshold && out <= 0) {
          rising = !rising;
          if (rising) turns.push(time - started);
          if (rising) started = time;
        }
        time += step;
      }
      expect(slewedOscillation(EQUAL, 1e-4, slewRate)!.frequency * turns.at(-1)!).toBeCloseTo(1, 3);
    }
  });

  it('says when it cannot oscillate: levels inside the thresholds, or an edge longer than the swing', () => {
    expect(slewedOscillation({ ...EQUAL, high: 2.4 }, 1e-4, 1e6)).toBeNull();
    expect(slewedOscillation(EQUAL, 1e-4, 5e3)).toBeNull();
  });

  refuses(() => slewedOscillation(EQUAL, 0, 1), 'slewedOscillation: timeConstant must be finite, above 0, but is 0');
});
