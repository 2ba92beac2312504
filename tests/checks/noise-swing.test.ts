import { describe, expect, it } from 'vitest';
import { noiseNotes, signalOf, swingOf } from '../../src/checks/noise-swing.js';
import { readingsOf } from '../../src/parts/readings.js';
import type { Figure } from '../../src/parts/figures.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { published } from '../support/check-values.js';
import { amperes, max, under } from '../support/parts.js';
import { between, dc, demandsOf, stageSpec, swing, value } from '../support/stages.js';

function of(spec: StageSpec, figures: readonly Figure[]) {
  const demands = demandsOf({ ...spec, limits: { snr: value(1000) } });
  return swingOf({ noise: demands.noise!, low: demands['output-low'], high: demands['output-high'] }, readingsOf(under(figures)));
}

const HEADROOM = [max('outputLowHeadroom', 0.1, amperes(1e-3, 5)), max('outputHighHeadroom', 0.3, amperes(1e-3, 5))];

describe('the swing that is really there', () => {
  it('is what is wanted, unless the head-room at the lowest supply leaves less', () => {
    expect(of(stageSpec('follower', dc(1, 2)), HEADROOM)).toEqual({ available: 1, wanted: 1, isKnown: true });
    const there = [max('outputLowHeadroom', 0.1, amperes(1e-3, 4.5)), max('outputHighHeadroom', 0.3, amperes(1e-3, 4.5))];
    const wide = of(stageSpec('follower', dc(0, 4.4), { supply: between(4.5, 5.5) }), there);
    expect(wide.available).toBeCloseTo(4.5 - 0.3 - 0.1, 12);
    expect(wide.wanted).toBe(4.4);
  });

  it('is what is wanted where a head-room is not known, and says so', () => {
    expect(of(stageSpec('follower', dc(0, 4.4)), [])).toEqual({ available: 4.4, wanted: 4.4, isKnown: false });
  });

  it('stays within the range of the converter', () => {
    expect(of(stageSpec('follower', dc(0.5, 4), { converter: { bits: 12, range: swing(0, 2.5) } }), HEADROOM)).toMatchObject({ available: 2, wanted: 2 });
  });

  it('is nothing where the head-rooms meet', () => {
    expect(of(stageSpec('follower', dc(4.8, 4.9)), HEADROOM).available).toBe(0);
  });
});

describe('the same noise in other words', () => {
  const SWING = { available: 4.8, wanted: 5, isKnown: true };
  // The dynamic range of 4.8 V over 100 µV, by somebody else.
  published('NOI-16', (given) => 20 * Math.log10(signalOf({ ...SWING, available: given('Vpp_V') }) / given('noise_rms_V')));

  it('is peak to peak, signal to noise with the swing that is there, and bits', () => {
    const [peaks, ratio, bits] = noiseNotes(100e-6, SWING);
    expect(peaks).toBe('660 µV peak to peak (6.6 × rms)');
    expect(ratio).toBe('SNR 84.6 dB with a sine of 4.8 V peak to peak; 5 V wanted, the head-room takes the rest');
    // log2(4.8/660 µV) = 12.83, (84.594 − 1.7609)/6.0206 = 13.76.
    expect(bits).toBe('12.8 noise-free bits; ENOB 13.8 by noise alone');
  });

  it('is told without bits where nothing swings, and not at all without noise', () => {
    expect(noiseNotes(100e-6, { ...SWING, available: 0 })).toHaveLength(1);
    expect(noiseNotes(0, SWING)).toEqual([]);
    expect(noiseNotes(100e-6, { ...SWING, isKnown: false })[1]).toContain('head-room not known');
  });
});
