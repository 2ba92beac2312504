import { describe, expect, it } from 'vitest';
import { inputCrossoverDistortion } from '../../src/formulas/input-crossover.js';
import { period, SIMULATED, spice } from '../support/spice.js';
import { harmonics } from '../support/waveforms.js';

// Source: ngspice 45 (eecircuit-engine), netlist of our own: a follower of 10 MHz whose offset steps by dV where its input passes Vx.
// Relation: THD = √{dV²·D(1−D) − (2·dV·sin(πD)/π)²/2}/(Vp/√2).

const FREQUENCY = 1e3;
const LEVEL = 2.5;
const PEAK = 2;
const STEP = 10e-3;
const POINTS = 8192;

const netlist = (crossover: number): string =>
  [
    'follower with a step of its offset',
    `Vin in 0 sin(${LEVEL} ${PEAK} ${FREQUENCY})`,
    `Bos p 0 V = v(in) + ${STEP} * (v(in) > ${crossover} ? 1 : 0)`,
    'Ga 0 o p out 1',
    'Ro o 0 1e9',
    `Co o 0 ${1 / (2 * Math.PI * 10e6)} ic=${LEVEL}`,
    'Eo out 0 o 0 1',
    `.tran ${0.25 / FREQUENCY / 1024} ${2 / FREQUENCY} 0 ${0.25 / FREQUENCY / 1024} uic`,
    '.end',
  ].join('\n');

describe('input crossover', () => {
  it.each([[2.5], [3.3], [4.1], [1.2]])('at %s V distorts a sine of 0.5..4.5 V as simulated', SIMULATED, async (crossover) => {
    const run = await spice(netlist(crossover));
    const samples = period(run.real('time'), run.real('v(out)'), [1 / FREQUENCY, 1 / FREQUENCY, POINTS]);
    const told = inputCrossoverDistortion({ step: STEP, crossover, level: LEVEL, peak: PEAK });
    expect(told / harmonics(samples).distortion).toBeCloseTo(1, 2);
  });
});
