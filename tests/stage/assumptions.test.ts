import { describe, expect, it } from 'vitest';
import { between, dc, load, midSupply, source, stageOf, stageSpec, value } from '../support/stages.js';

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
});
