import { describe, expect, it } from 'vitest';
import { shortlist } from '../../src/engine.js';
import { emptyReason } from '../../src/presentation/empty-answer.js';
import { GLUE } from '../../src/presentation/spelling.js';
import { buildStage } from '../../src/stage/index.js';
import { sampleSource, styleOf } from '../support/sample-report.js';
import { specOf } from '../support/stage-file.js';

function reasonOf(text: string): string {
  const built = buildStage(specOf(text));
  if (!built.ok) throw new Error(built.problems.map(({ message }) => message).join('\n'));
  return emptyReason(shortlist(built.stage, sampleSource()), styleOf(100)).join(' ').replaceAll(GLUE, ' ');
}

describe('why nothing fits, where a corner lies outside the supply', () => {
  it('tells a stage between two inputs of what both of them share, which hardly falls with the gain', () => {
    const at = (gain: number): string => reasonOf(`topology: high-side-sense
supply: 3.3 V ± 3 %
gain: ${gain}
shunt: {resistance: 50 mΩ, tolerance: 1 %, current: 50 mA..2 A, bus: 12 V}
`);
    // By hand: R2/R1 and R4/R3 at opposite ends move the output by 12 V of bus times their difference, -466 mV at a gain of 20; 50 mA add 50 mV.
    expect(at(20)).toContain('the output is asked to -415 mV, below ground');
    for (const gain of [2, 20]) expect(at(gain)).toContain('tighten the tolerance of the resistors, for what both inputs share comes through them, or raise the reference.');
  });

  it('tells any other of gain, tolerance and source', () => {
    const told = reasonOf('topology: non-inverting\nsupply: 3.3 V ± 5 %\ngain: 8\nsignal: {input: 25 mV..410 mV}\n');
    expect(told).toContain('above the supply: lower the gain, tighten the tolerance, or let input and reference share one source.');
  });
});
