import { describe, expect, it } from 'vitest';
import { fullPowerFrequency } from '../../src/formulas/slew-rate.js';
import { idealConverterSignalToNoise } from '../../src/formulas/signal-to-noise.js';
import { rejectionOfResistors } from '../../src/formulas/rejection.js';
import { resistorNoise } from '../../src/formulas/noise.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { specOf } from '../support/stage-file.js';

// Worked examples as they stand in six sources beside Franco (2002), whose own (ch. 6 and 7) are entries of check-values.json. Numbering
// and figures are from memory; every answer is recomputed by hand. Resistors are chosen from E96, which alone is worth up to 1 %.

function stageOf(text: string): Stage {
  const built = buildStage(specOf(text));
  if (built.ok) return built.stage;
  throw new Error(built.problems.map(({ message }) => message).join('\n'));
}

describe('Mancini (ed.), Op Amps for Everyone (2002), ch. 4, single-supply design by two points (from memory)', () => {
  it('case 2: 0.2 V to 0.5 V become 1.5 V to 4.5 V: slope 10, intercept −0.5 V', () => {
    const stage = stageOf('topology: non-inverting\nsupply: 5 V\nsignal: {input: 0.2..0.5 V, output: 1.5..4.5 V}\nresistors: {tolerance: 0.1 %}\n');
    // By hand: (4.5 − 1.5)/(0.5 − 0.2) = 10; 1.5 − 10 · 0.2 = −0.5 = Vref(1 − 10).
    expect(Math.abs(stage.gain / 10 - 1)).toBeLessThan(0.01);
    expect(Math.abs(stage.vertices[0]!.reference / (0.5 / 9) - 1)).toBeLessThan(0.01);
    expect(Math.abs(stage.outputNominal.max / 4.5 - 1)).toBeLessThan(0.01);
  });

  it('case 3: −1 V to −0.1 V become 6 V to 1 V: slope −5.56, intercept 0.444 V', () => {
    const stage = stageOf('topology: inverting\nsupply: 10 V\nsignal: {input: -1..-0.1 V, output: 1..6 V}\nresistors: {tolerance: 0.1 %}\n');
    // By hand: (6 − 1)/(−1 + 0.1) = −5.556; 1 − 5.556 · 0.1 = 0.444 = Vref(1 + 5.556).
    expect(Math.abs(stage.gain / -5.5556 - 1)).toBeLessThan(0.01);
    expect(Math.abs((stage.vertices[0]!.reference * 6.5556) / 0.4444 - 1)).toBeLessThan(0.01);
    expect(Math.abs(stage.outputNominal.max / 6 - 1)).toBeLessThan(0.01);
  });
});

describe('other books (from memory)', () => {
  it('Sedra & Smith, Microelectronic Circuits, ch. 2: 1 V/µs and ±10 V make a full-power bandwidth of 15.9 kHz', () => {
    // By hand: 1e6/(2 · 3.14159 · 10) = 15 915.
    expect(fullPowerFrequency(1e6, 10)).toBeCloseTo(15_915.49, 1);
  });

  it('Horowitz & Hill, The Art of Electronics, on Johnson noise: 10 kΩ at room temperature, 10 kHz of bandwidth, 1.3 µV rms', () => {
    // By hand: √(4 · 1.3806e-23 · 293 · 1e4 · 1e4) = √1.618e-12.
    expect(resistorNoise(10e3, 293) * Math.sqrt(10e3) * 1e6).toBeCloseTo(1.272, 3);
  });

  it('Motchenbacher & Connelly, Low-Noise Electronic System Design (1993), ch. 1: 1 kΩ at 290 K has 4 nV/√Hz', () => {
    // By hand: 4 · 1.3806e-23 · 290 · 1e3 = 1.6015e-17.
    expect(resistorNoise(1e3, 290) * 1e9).toBeCloseTo(4.002, 3);
  });

  it('Jung (ed.), Op Amp Applications Handbook (2005), ch. 2: unity gain, one of four resistors off by 0.1 %: 66 dB', () => {
    // By hand: 20 · log(2/0.001) = 66.0.
    const rejection = rejectionOfResistors({ r1: 10e3, r2: 10e3, r3: 10e3, r4: 10.01e3 });
    expect(20 * Math.log10(Math.abs(rejection))).toBeCloseTo(66.02, 1);
  });

  it('Bennett (1948) and IEEE Std 1241-2010: 6.02 dB a bit and 1.76 dB; 12 bits 74.0 dB', () => {
    // By hand: 6.0206 · 12 + 1.7609.
    expect(idealConverterSignalToNoise(12)).toBeCloseTo(74.008, 3);
  });
});
