import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { between, coupled, GROUND, legs, resistors, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

const difference = (more: Partial<StageSpec>): readonly string[] =>
  stageOf(stageSpec('difference', coupled(swing(0.1, 1), swing(1, 2)), { resistors: resistors(10e3, 10e3), reference: GROUND, ...more })).cautions;

describe('what the resistors let through of the voltage both inputs share', () => {
  it('is told with the rejection they leave: 2·0.0202 of 2 V at a gain of 1 and 1 %', () => {
    // + leg 0.99/(0.99 + 1.01) = 0.495, times 1 + 1.01/0.99: 1.0000; less 1.0202 of the - leg: -0.0202 of 2 V.
    expect(difference({})).toEqual(['the network with its resistors of ±1 % leaves 34 dB of common-mode rejection: the voltage both inputs share moves the output by up to 40.5 mV, whatever the amplifier; it is not in the DC error']);
  });

  it('counts from the reference, which is no error', () => {
    expect(difference({ reference: voltage(1.5) })[0]).toContain('up to 10.2 mV');
  });

  it('is silent with matched resistors, and below a thousandth of the swing', () => {
    expect(difference({ resistors: resistors(10e3, 10e3, 0) })).toEqual([]);
    // 0.9 V of swing; 2 V times 4·t/2.
    expect(difference({ resistors: resistors(10e3, 10e3, 0.00022) })).toEqual([]);
    expect(difference({ resistors: resistors(10e3, 10e3, 0.00023) })).toHaveLength(1);
  });

  it('takes the middle of two inputs that are given each for itself', () => {
    const separate = stageOf(stageSpec('difference', legs(swing(2, 3), swing(2, 2)), { resistors: resistors(10e3, 10e3), reference: GROUND }));
    // 2.5 V at most.
    expect(separate.cautions[0]).toContain('up to 50.6 mV');
  });

  it('of a shunt in the supply line is that of the bus, without current', () => {
    const sense = stageSpec('high-side-sense', { coupling: 'dc', shape: 'band-limited' }, {
      shunt: { resistance: value(0.1), current: swing(0, 5), bus: between(4, 12) }, resistors: resistors(10e3, 10e3), reference: GROUND,
    });
    expect(stageOf(sense).cautions[0]).toContain('up to 243 mV');
  });

  it('is nothing to a stage whose inputs share none', () => {
    const inverting = stageSpec('inverting', { coupling: 'dc', shape: 'band-limited', input: swing(1, 2) }, { resistors: resistors(10e3, 10e3), reference: voltage(2) });
    expect(stageOf(inverting).cautions).toEqual([]);
  });
});
