import { describe, expect, it } from 'vitest';
import { explain, shortlist, withWaysOut } from '../../src/engine.js';
import type { PartSource } from '../../src/parts/part.js';
import { renderExplanation } from '../../src/presentation/explain-text.js';
import { renderShortlist } from '../../src/presentation/shortlist-text.js';
import { CONTEXT, styleOf } from '../support/sample-report.js';
import { demo, SHIPPED } from '../support/trials.js';

const SOURCE: PartSource = { parts: SHIPPED, sha256: '0'.repeat(64), origin: () => null };

/** The block of an answer that starts with these words. */
const block = (text: string, start: string): string => `\n${text.split('\n\n').find((one) => one.startsWith(start)) ?? 'no such block'}\n`;

function changesOf(id: string, width: number, { stage, set = [] }: { readonly stage: string; readonly set?: readonly string[] }): string {
  const made = demo(stage, set)!;
  const explanation = explain(made.stage, SOURCE, { part: SHIPPED.find((part) => part.id === id)!, changing: made.changing });
  const changes = set.flatMap((pair) => ['--set', pair]);
  return block(renderExplanation(explanation, styleOf(width), { ...CONTEXT, changes }), 'What would let it in');
}

function emptyOf(stage: string, set: readonly string[], width: number): string {
  const made = demo(stage, set)!;
  const report = withWaysOut(shortlist(made.stage, SOURCE), SOURCE, made.changing);
  const text = renderShortlist(report, styleOf(width), { ...CONTEXT, changes: set.flatMap((pair) => ['--set', pair]) });
  const [first = ''] = text.split('\n\n');
  return ['', first, '', ...['One demand', 'These', 'Smallest'].map((start) => block(text, start).trim()).filter((one) => one !== 'no such block')].join('\n');
}

describe('what would let it in', () => {
  it('one limit, at 80 columns', () => { expect(changesOf('GX-CMOS-1M-RRIO', 80, { stage: 'soil-moisture-probe' })).toMatchInlineSnapshot(`
    "
    What would let it in (judged again in full, all 17 checks):
      1  DC error ≤ 53 mV instead of 35 mV (× 1.52)
           railfit explain GX-CMOS-1M-RRIO probe.yaml --set limits.dcError=53mV
      or calibrate the offset once at 25 °C: the DC error falls to 20.1 mV of 35 mV,
         its drift still counted. Computed without the offset term, all other checks
         in full.
      Kept fixed: supply, signal, load, temperature, approval. mayChange in the
      stage names what may move.
    "
  `); }, 60_000);
  it('two limits, at 40 columns', () => { expect(changesOf('GX-CMOS-100M', 40, { stage: 'light-meter' })).toMatchInlineSnapshot(`
    "
    What would let it in (judged again in
    full, all 17 checks):
      1  DC error ≤ 16.6 mV instead of 15 mV
           (× 1.11)
         and supply current ≤ 10 mA instead
           of 100 µA (× 100)
           railfit explain GX-CMOS-100M \\
             probe.yaml \\
             --set limits.dcError=16.6mV \\
             --set limits.supplyCurrent=10mA
      One change alone is never enough: the
      2 checks that do not pass depend on
      different inputs.
      or calibrate the offset once at 25 °C:
         the DC error falls to 13.6 mV of
         15 mV, its drift still counted, and
         supply current ≤ 10 mA instead of
         100 µA (× 100). Computed without
         the offset term, all other checks
         in full.
      Kept fixed: supply, signal, load,
      temperature, approval. mayChange in
      the stage names what may move.
    "
  `); }, 60_000);
  it('a component and a limit that was asked on the command line, at 80 columns', () => {
    expect(changesOf('GX-CMOS-10M-RRIO', 80, { stage: 'reference-buffer', set: ['load=10nF', 'limits.supplyCurrent=200 µA'] })).toMatchInlineSnapshot(`
      "
      What would let it in (judged again in full, all 15 checks):
        1  an isolation resistor in front of the load: a pole at 482 kHz at the load,
             head-room of the load current through it
           isolation resistor 33 Ω
           and supply current ≤ 900 µA instead of 200 µA (× 4.5)
             railfit explain GX-CMOS-10M-RRIO probe.yaml --set load=10nF \\
               --set load.isolation=33ohm --set limits.supplyCurrent=900uA
        One change alone is never enough: the 2 checks that do not pass depend on
        different inputs.
        Kept fixed: supply, signal, load, temperature, approval. mayChange in the
        stage names what may move.
      "
    `);
  }, 60_000);
  it('nothing that may move, at 80 columns', () => { expect(changesOf('GX-CMOS-MICRO', 80, { stage: 'soil-moisture-probe' })).toMatchInlineSnapshot(`
    "
    What would let it in: nothing that may move. No input that may move brings gain
    bandwidth round.
      With what is kept fixed it would: gain 4.27 instead of 8 V/V (÷ 1.88).
      or: signal frequency 1.06 kHz instead of 2 kHz (÷ 1.89), and DC error ≤ 39 mV
        instead of 35 mV (× 1.12).
      Kept fixed: supply, signal, load, temperature, approval. mayChange in the
      stage names what may move.
    "
  `); }, 60_000);
});

describe('where nothing fits', () => {
  it('an output wanted at a rail, at 80 columns', () => { expect(emptyOf('pump-current', ['limits.swingLoss=0 V'], 80)).toMatchInlineSnapshot(`
    "
    No amplifier on this supply reaches 0 V: an output stage always keeps a little
    of the rail. limits.swingLoss may give up that end of the swing. Give up the
    lowest 17.2 mV, 22 mA at the input, and 1 part fits; 76.2 mV, 96 mA at the
    input, and 15 parts fit. Of the parts that fail nothing else, GX-ZD-MICRO-FINE
    comes nearest: it needs 17.2 mV there.
    0 of 95 parts fit, 0 cannot be decided, 95 do not fit.

    One demand by itself rules out every part:
      output low, where the stage leaves 0 V  18 parts fail nothing else
      Of 95 parts, GX-ZD-MICRO-FINE comes nearest on output low: needs 16.2 mV, the
      stage leaves 0 V.
    Smallest changes that let parts in (each judged again in full; figures rounded
    to the safe side):
      1  swing loss at each rail ≤ 17.2 mV instead of 0 V (0.72 % of the swing)
         22 mA at the input; lets in 1 part, first GX-ZD-MICRO-FINE
           railfit shortlist probe.yaml --set limits.swingLoss=17.2mV
      2  swing loss at each rail ≤ 76.2 mV instead of 0 V (3.2 % of the swing)
         96 mA at the input; lets in 15 parts, first GX-CMOS-1M-RRIO-FINE
           railfit shortlist probe.yaml --set limits.swingLoss=76.2mV
      3  swing loss at each rail ≤ 97 mV instead of 0 V (4.1 % of the swing)
         and DC error ≤ 84 mV instead of 80 mV (× 1.05)
         130 mA at the input; lets in 16 parts, first GX-CMOS-1M-RRIO-FINE
           railfit shortlist probe.yaml --set limits.swingLoss=97mV \\
             --set limits.dcError=84mV
      4  swing loss at each rail ≤ 37 mV instead of 0 V (1.6 % of the swing)
         and supply current ≤ 1.6 mA instead of 1.5 mA (× 1.07)
         47 mA at the input; lets in 8 parts, first GX-CMOS-1M-GS-FINE
           railfit shortlist probe.yaml --set limits.swingLoss=37mV \\
             --set limits.supplyCurrent=1.6mA
      Giving up swing first, then by the largest single factor. mayChange in the
      stage names what may move."
  `); }, 60_000);
  it('three demands that only together rule out every part, at 100 columns', () => { expect(emptyOf('vent-motor-control', ['limits.supplyCurrent=20 µA'], 100)).toMatchInlineSnapshot(`
    "
    No part of 95 fits. They fail supply current (87), output current (39), output low (12), output high
    (12) and 8 more checks. Nearest is GX-NANO-ECO (G): gain bandwidth short by 210 Hz (5.1 %); 4 checks
    cannot be decided.
    0 of 95 parts fit, 0 cannot be decided, 95 do not fit.

    These 3 demands together rule out every part; without any one of them some would be left:
      supply current ≤ 20 µA     alone leaves 8 parts; 39 parts fail nothing else
      gain bandwidth ≥ 4.21 kHz  alone leaves 94 parts; 1 part fails nothing else
      output current ≥ 14.6 mA   alone leaves 56 parts; 6 parts fail nothing else
      Of the 7 parts that the others leave, GX-CMOS-MICRO comes nearest on output current: gives 4 mA,
      the stage draws 14.6 mA.
    Smallest changes that let parts in (each judged again in full; figures rounded to the safe side):
      1  swing loss at each rail ≤ 653 mV instead of 0 V (28 % of the swing)
         and supply current ≤ 350 µA instead of 20 µA (× 17.5)
         330 mV at the input; lets in 2 parts, first GX-BIP-GS
           railfit shortlist probe.yaml --set limits.swingLoss=653mV --set limits.supplyCurrent=350uA
      2  supply current ≤ 1.45 mA instead of 20 µA (× 72.5)
         lets in 1 part, first GX-CMOS-10M-RRIO-FINE
           railfit shortlist probe.yaml --set limits.supplyCurrent=1.45mA
      3  DC error ≤ 76 mV instead of 60 mV (× 1.27)
         and supply current ≤ 2.7 mA instead of 20 µA (× 135)
         lets in 4 parts, first GX-CMOS-10M-RRIO-FINE
           railfit shortlist probe.yaml --set limits.dcError=76mV --set limits.supplyCurrent=2.7mA
      4  lower feedback resistors, same gain
         feedback resistor 10 kΩ instead of 20 kΩ
         and supply current ≤ 2.7 mA instead of 20 µA (× 135)
         lets in 4 parts, first GX-CMOS-10M-RRIO-FINE
           railfit shortlist probe.yaml --set resistors.feedback=10kohm \\
             --set limits.supplyCurrent=2.7mA
      Sorted by the largest single factor. mayChange in the stage names what may move."
  `); }, 60_000);
});
