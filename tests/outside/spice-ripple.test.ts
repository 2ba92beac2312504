import { describe, expect, it } from 'vitest';
import { min, typ } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { magnitude } from '../support/nodal.js';
import { SIMULATED, spice } from '../support/spice.js';
import { dc, midSupply, resistors, stageSpec, value, voltage } from '../support/stages.js';
import type { StageSpec } from '../../src/spec/spec.js';

// Source: ngspice 45 (eecircuit-engine), netlist of our own: a one-pole amplifier whose inputs are shifted by the supply over a rejection
// that falls above a corner. Relation: A/PSRR(f)·|1/(1/A + β)| with PSRR(f) = R/√(1 + (f/fc)²).

const REJECTION = 1e4;
const CORNER = 250;
const GAIN_BANDWIDTH = 1e6;
/** So much gain at DC that its end is not seen. */
const OPEN_LOOP_GAIN = 1e9;
const AMPLITUDE = 0.04;
/** A value a decade: from far below the corner to far above the loop. */
const SWEEP = '.ac dec 1 10 10meg';

interface Case {
  readonly name: string;
  readonly spec: StageSpec;
  /** Everything outside the amplifier, AC grounds as 0; nodes p, n and out, `#` for the number of the circuit. */
  readonly around: readonly string[];
}

const CASES: readonly Case[] = [
  { name: 'follower', spec: stageSpec('follower', dc(1, 2)), around: ['Vp# p# 0 0', 'Vn# n# out# 0'] },
  { name: 'non-inverting × 10', spec: stageSpec('non-inverting', dc(0.1, 0.4), { resistors: resistors(9e3, 1e3, 0) }), around: ['Vp# p# 0 0', 'Rf# out# n# 9k', 'Rg# n# 0 1k'] },
  { name: 'inverting × 2', spec: stageSpec('inverting', dc(2, 3), { resistors: resistors(20e3, 10e3, 0), reference: voltage(2.5) }), around: ['Vp# p# 0 0', 'Rf# out# n# 20k', 'Rg# n# 0 10k'] },
  {
    name: 'inverting × 10 with 100 pF across the feedback',
    spec: stageSpec('inverting', dc(2.4, 2.6), { resistors: resistors(100e3, 10e3, 0), reference: midSupply(), capacitors: { feedback: value(100e-12) } }),
    around: ['Vp# p# 0 0', 'Rf# out# n# 100k', 'Cf# out# n# 100p', 'Rg# n# 0 10k'],
  },
];

const amplifier = ['Ga# 0 o# p# n# 1', 'Gb# 0 o# inj 0 1', `Ro# o# 0 ${OPEN_LOOP_GAIN}`, `Co# o# 0 ${1 / (2 * Math.PI * GAIN_BANDWIDTH)}`, 'Eo# out# 0 o# 0 1'];

const NETLIST = [
  'supply ripple',
  'Vs vcc 0 dc 0 ac 1',
  `Gi 0 inj vcc 0 ${1 / REJECTION}`,
  'Ri inj x 1',
  `Li x 0 ${1 / (2 * Math.PI * CORNER)}`,
  ...CASES.flatMap(({ around }, at) => [...amplifier, ...around].map((line) => line.replaceAll('#', String(at)))),
  SWEEP,
  '.end',
].join('\n');

const FIGURES = [min('supplyRejection', REJECTION), min('supplyRejectionCorner', CORNER), min('gainBandwidth', GAIN_BANDWIDTH), typ('gainBandwidth', GAIN_BANDWIDTH)];
const judge = judgingBy('supply-ripple');

describe('supply ripple at the output', () => {
  it('is as simulated', SIMULATED, async () => {
    const run = await spice(NETLIST);
    const frequencies = run.real('frequency');
    expect(frequencies).toHaveLength(7);
    for (const [at, { name, spec }] of CASES.entries()) {
      const simulated = run.complex(`v(out${at})`);
      for (const [k, frequency] of frequencies.entries()) {
        const told = judge({ ...spec, supplyRipple: { amplitude: value(AMPLITUDE), frequency: value(frequency) }, limits: { supplyRipple: value(1) } }, FIGURES).offered;
        expect(Number(told) / (AMPLITUDE * magnitude(simulated[k] ?? [0, 0])), `${name} at ${frequency} Hz`).toBeCloseTo(1, 4);
      }
    }
  });
});
