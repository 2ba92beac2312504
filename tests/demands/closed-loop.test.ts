import { describe, expect, it } from 'vitest';
import { closedLoopOf } from '../../src/demands/closed-loop.js';
import { magnitudeAt } from '../../src/formulas/low-pass-response.js';
import { oscillatorStage, photodiodeStage } from '../support/shaped-stages.js';
import { ac, midSupply, resistors, stageOf, stageSpec, value } from '../support/stages.js';

describe('the stage as a low-pass', () => {
  const inverting = (farad?: number) =>
    stageOf(stageSpec('inverting', ac(0.1), { resistors: resistors(1e5, 1e4), reference: midSupply(), ...(farad === undefined ? {} : { capacitors: { feedback: value(farad) } }) }));

  it('of an amplifier has its −3 dB at GBW/NG, with a capacitor one pole more', () => {
    const loop = closedLoopOf(inverting())!;
    expect(loop.form).toBe('one-pole');
    expect(magnitudeAt(loop.at({ gainBandwidth: 11e6, inputCapacitance: 0 }), 1e6)).toBeCloseTo(10 * Math.SQRT1_2, 9);
    const filtered = closedLoopOf(inverting(1e-9))!;
    expect(filtered.form).toBe('more-poles');
    expect(magnitudeAt(filtered.at({ gainBandwidth: 1e13, inputCapacitance: 0 }), 1 / (2 * Math.PI * 1e5 * 1e-9))).toBeCloseTo(10 * Math.SQRT1_2, 5);
  });

  it('of a transimpedance stage counts the part’s own input capacitance', () => {
    const loop = closedLoopOf(stageOf(photodiodeStage({ amperes: 1e-6, farad: 50e-12, ohms: 1e5, capacitor: 4e-12 })))!;
    expect(loop.countsInput).toBe(true);
    const [without, with10] = [0, 10e-12].map((inputCapacitance) => loop.at({ gainBandwidth: 1e7, inputCapacitance }).b);
    expect(with10! / without!).toBeCloseTo(64 / 54, 9);
  });

  it('about an endless amplifier keeps its components, the capacitor chosen for the part too', () => {
    const loop = { gainBandwidth: 10e6, inputCapacitance: 0 };
    const fitted = closedLoopOf(stageOf(photodiodeStage({ amperes: 1e-6, farad: 50e-12, ohms: 1e5, capacitor: 4e-12 })))!;
    expect(fitted.idealAt(loop).a).toBeCloseTo(4e-7, 15);
    const open = closedLoopOf(stageOf(photodiodeStage({ amperes: 1e-6, farad: 50e-12, ohms: 1e5 })))!;
    expect(open.at(loop).a - open.idealAt(loop).a).toBeCloseTo(1 / (2 * Math.PI * 10e6), 15);
    expect(closedLoopOf(inverting(1e-9))!.idealAt(loop)).toMatchObject({ a: expect.closeTo(1e-4, 12) as number, b: 0 });
  });

  it('is none of an oscillator', () => {
    expect(closedLoopOf(stageOf(oscillatorStage(1e3)))).toBeNull();
  });
});
