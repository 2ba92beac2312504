import { describe, expect, it } from 'vitest';
import { ac, between, dc, load, midSupply, source, stageOf, stageSpec, value } from '../support/stages.js';

describe('assumptions', () => {
  it('print every default that was taken', () => {
    const stage = stageOf(stageSpec('inverting', dc(-0.5, -0.1), { gain: value(2), resistors: { feedback: value(20e3) } }));
    expect(stage.assumptions).toEqual([
      'input resistor 10 kΩ, exactly what the gain asks of the feedback resistor given',
      'signal.coupling dc', 'reference ground', 'source resistance 0 Ω', 'no load at the output', 'temperature 25 °C', 'resistor tolerance 1 %',
      'swing loss 0 V: the whole wanted swing must be there',
      'no signal frequency: slew rate and gain bandwidth are not asked', 'supply peak is the top of the supply',
      "stability: the part's own compensation is assumed to hold",
    ]);
  });

  it('are none where the stage says it itself', () => {
    const spec = stageSpec('follower', dc(1, 2, 1e3), {
      supplyPeak: value(5), reference: midSupply(), source: source(1), load: load(1e4), temperature: between(0, 50),
      limits: { swingLoss: value(0), gainError: value(0.01), phaseMargin: value(45) }, positions: { 'signal.coupling': { line: 1 } }, notes: ['said by the reader'],
    });
    expect(stageOf(spec).assumptions).toEqual(['said by the reader']);
  });

  const lines = (...from: Parameters<typeof stageSpec>): readonly string[] => stageOf(stageSpec(...from)).assumptions;
  const stability = (line: string): boolean => line.startsWith('stability');

  it('leave stability to the part only where neither a margin nor a load capacitance is written', () => {
    expect(lines('follower', dc(1, 2)).filter(stability)).toHaveLength(1);
    expect(lines('follower', dc(1, 2), { load: load(1e4, 'ground', 100e-12) }).filter(stability)).toEqual([]);
    expect(lines('follower', dc(1, 2), { limits: { phaseMargin: value(45) } }).filter(stability)).toEqual([]);
  });

  it('tell every limit nobody wrote, as the demand asks it', () => {
    const usual = (...from: Parameters<typeof stageSpec>): readonly string[] => lines(...from).filter((line) => /^(phase margin|gain error|corner off|noise counted)/u.test(line));
    const capacitive = { load: load(1e4, 'ground', 220e-12) };
    expect(usual('follower', dc(1, 2, 1e3), capacitive)).toEqual(['gain error 1 % at the top frequency', 'phase margin 45° with the load of 220 pF']);
    expect(usual('follower', dc(1, 2), { ...capacitive, limits: { phaseMargin: value(60) } })).toEqual([]);
    expect(usual('follower', dc(1, 2), { load: load(1e4, 'ground', 0) })).toEqual([]);
    expect(usual('follower', { ...dc(1, 2, 1e3), shape: 'step' })).toEqual([]);
    const filter = { filter: { corner: value(1e3) } };
    expect(usual('sallen-key-low-pass', dc(1, 2), filter)).toEqual(['corner off by at most 1 %']);
    expect(usual('sallen-key-low-pass', dc(1, 2, 100), filter)).toEqual(['gain error 1 % up to the top frequency']);
    expect(usual('sallen-key-low-pass', dc(1, 2), { ...filter, limits: { gainErrorKind: 'vector' } })).toEqual(['gain error 1 % up to the corner']);
    expect(usual('follower', dc(1, 2), { limits: { outputNoise: value(1e-3) } })).toEqual(['noise counted from 100 mHz on']);
    expect(usual('follower', { ...dc(1, 2), observation: value(10) }, { limits: { outputNoise: value(1e-3) } })).toEqual([]);
  });

  it('tell where AC-coupled pulses stand, and that without an edge no slew rate is asked', () => {
    const pulse = (more: object) => lines('follower', { ...ac(0.5), shape: 'pulse', ...more }, { reference: midSupply() });
    expect(pulse({})).toEqual(expect.arrayContaining(['free duty: up to Vpp each side of the bias', 'no edge: slew rate is not asked']));
    expect(pulse({ duty: value(0.3) })).toContain('duty 0.3: the pulse stands about its average, which is the bias');
    expect(pulse({ edge: value(1e-6) }).filter((line) => line.includes('edge'))).toEqual([]);
    expect(lines('follower', { ...dc(1, 2), shape: 'step' }, { limits: { settling: { within: value(1e-5), to: value(0.01) } } }).filter((line) => line.includes('slew'))).toEqual([]);
  });

  it('say of a bypass only where it is not counted, and why', () => {
    const bypassed = (ohms?: number) => ({ ...midSupply(0, ohms), bypass: value(1e-6) });
    const bypass = (all: readonly string[]): readonly string[] => all.filter((line) => line.startsWith('bypass'));
    expect(bypass(lines('inverting', dc(2, 3), { gain: value(1), reference: bypassed(5e3) }))).toEqual([]);
    expect(bypass(lines('inverting', dc(2, 3), { gain: value(1), reference: bypassed() }))).toEqual(['bypass 0.000001 is not counted: the reference has no resistance']);
    expect(bypass(lines('follower', ac(1), { reference: bypassed(5e3) }))[0]).toContain('the bias resistor at the + input');
    expect(bypass(lines('follower', dc(1, 2), { reference: bypassed(5e3) }))[0]).toContain('the reference does not reach the inputs');
  });

  it('leave the roll-off of a feedback capacitor to the stage, and say where there is none to lie across', () => {
    const capacitors = { feedback: value(10e-12) };
    expect(lines('inverting', dc(2, 3), { resistors: { feedback: value(100e3), input: value(100e3) }, reference: midSupply(), capacitors })).toContainEqual(expect.stringContaining('roll-off from 159 kHz'));
    expect(lines('follower', dc(2, 3), { capacitors })).toContainEqual(expect.stringContaining('no feedback resistor it lies across'));
  });

  it('name the tolerance of capacitors where it counts', () => {
    const filter = { corner: value(1e3), q: value(0.707) };
    expect(lines('sallen-key-low-pass', dc(1, 2, 100), { filter })).toContain('capacitor tolerance 5 %');
    expect(lines('sallen-key-low-pass', dc(1, 2, 100), { filter, capacitors: { tolerance: value(0.02) } })).not.toContain('capacitor tolerance 5 %');
    expect(lines('inverting', dc(2, 3), { gain: value(1), reference: midSupply(), capacitors: { feedback: value(10e-12) } })).toContain('capacitor tolerance 5 %');
    expect(lines('follower', dc(1, 2))).not.toContain('capacitor tolerance 5 %');
  });
});
