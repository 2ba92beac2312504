import { describe, expect, it } from 'vitest';
import { excitation, moved } from '../../src/stage/excitation.js';
import { ac, coupled, dc, legs, swing, value } from '../support/stages.js';

describe('the signal as points at the inputs', () => {
  it('has two ends, their centre and half the way between', () => {
    const drive = excitation(dc(1, 2));
    expect(drive.points).toEqual([{ input: 1 }, { input: 2 }]);
    expect(drive.centre).toEqual({ input: 1.5 });
    expect(drive.steps).toEqual([{ input: 0.5 }]);
  });

  it('has one point when it does not move', () => {
    expect(excitation(dc(1, 1)).points).toEqual([{ input: 1 }]);
  });

  it('AC-coupled, deviates both ways from the bias', () => {
    expect(excitation(ac(0.3)).points).toEqual([{ input: -0.3 }, { input: 0.3 }]);
  });

  it.each([
    ['sine', undefined, -0.3, 0.3, 1],
    ['pulse', 0.1, -0.06, 0.54, 1],
    ['pulse', undefined, -0.6, 0.6, 0.5],
    ['step', undefined, -0.6, 0.6, 0.5],
  ] as const)('AC-coupled %s of duty %s and 0.6 Vpp stands at %f..%f V about the bias', (shape, duty, low, high, share) => {
    const drive = excitation({ ...ac(0.3), shape, ...(duty === undefined ? {} : { duty: value(duty) }) });
    expect(drive.points.map((point) => point['input'])).toEqual([expect.closeTo(low, 12), expect.closeTo(high, 12)]);
    expect(drive.stepShare).toBe(share);
    expect((high - low) * drive.stepShare).toBeCloseTo(0.6, 12);
  });

  it('DC-coupled pulses and steps stand between their extremes', () => {
    expect(excitation({ ...dc(1, 2), shape: 'pulse' }).points).toEqual([{ input: 1 }, { input: 2 }]);
    expect(excitation({ ...dc(1, 2), shape: 'step' }).stepShare).toBe(1);
  });

  it('has every combination of independent legs', () => {
    expect(excitation(legs(swing(1, 2), swing(3, 4))).points).toEqual([
      { positive: 1, negative: 3 }, { positive: 1, negative: 4 }, { positive: 2, negative: 3 }, { positive: 2, negative: 4 },
    ]);
  });

  it('turns differential and common mode into legs: positive - negative, and their mean', () => {
    const drive = excitation(coupled(swing(-1, 1), swing(2, 3)));
    expect(drive.points).toEqual([
      { positive: 1.5, negative: 2.5 }, { positive: 2.5, negative: 3.5 }, { positive: 2.5, negative: 1.5 }, { positive: 3.5, negative: 2.5 },
    ]);
    expect(moved(drive.centre, drive.steps[0]!)).toEqual({ positive: 3, negative: 2 });
  });

  it('is refused when nothing is driven', () => {
    expect(() => excitation({ coupling: 'dc', shape: 'sine' })).toThrow(RangeError);
  });
});
