import { describe, expect, it } from 'vitest';
import { hazardText } from '../../src/presentation/hazard-text.js';
import { cautionsOf } from '../../src/presentation/json.js';
import { hazardsOf } from '../../src/screening/hazards.js';
import { fitting } from '../support/fitting.js';
import { genericSet } from '../support/generic-list.js';
import { dc, demandsOf, stageSpec, value } from '../support/stages.js';

describe('hazards in words', () => {
  it('say what happens and when', () => {
    expect(hazardText({ kind: 'phase-reversal' })).toMatchInlineSnapshot(`"reverses its phase: when an input leaves its range, at overload or power-up, the output jumps to the other rail"`);
    expect(hazardText({ kind: 'clamp' })).toMatchInlineSnapshot(`"diodes join the inputs: from about 0.7 V between them, at steps or with the output at its rail, current flows through the source"`);
    expect(hazardText({ kind: 'crossover', region: { min: 0.8, max: 1.3 }, inputs: { min: 0.495, max: 1.705 }, moves: true, frequency: 1e3, step: { volts: 4.2e-3, distortion: 1e-3, basis: 'estimated' } })).toMatchInlineSnapshot(`"the input pairs hand over 800 mV..1.3 V below V+, where this stage takes them (495 mV..1.71 V below V+): the offset steps there by up to 4.2 mV, twice a period (2 kHz), distortion up to -60 dB"`);
    expect(hazardText({ kind: 'sink-limit', current: 30e-6, within: 0.02, beyond: 0.9 })).toMatchInlineSnapshot(`"near V- the output sinks 30 µA at most; with more it stays 900 mV above V- instead of 20 mV"`);
  });

  it('stand among the cautions of the part, between what it is and its idle sections', () => {
    const part = genericSet('GX-BIP-GS');
    const stage = stageSpec('follower', dc(1, 2), { load: { resistance: value(10e3), to: 'supply' } });
    const judged = { ...fitting('GX-BIP-GS'), part, hazards: hazardsOf(part, demandsOf(stage)) };
    expect(cautionsOf(judged)).toMatchInlineSnapshot(`
      [
        "a generic set: a class of parts, not something to order",
        "reverses its phase: when an input leaves its range, at overload or power-up, the output jumps to the other rail",
        "near V- the output sinks 30 µA at most; with more it stays 900 mV above V- instead of 20 mV",
        "1 of 2 sections idle: it draws 100 µA of the 200 µA of the package; an idle section is tied off as a follower inside its input range",
      ]
    `);
  });
});
