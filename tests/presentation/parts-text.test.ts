import { describe, expect, it } from 'vitest';
import { renderPart } from '../../src/presentation/part-text.js';
import { renderParts } from '../../src/presentation/parts-text.js';
import { SAMPLE_PARTS, sampleSource, styleOf } from '../support/sample-report.js';

const lines = SAMPLE_PARTS.map((part) => ({ part }));

describe('the catalog as a list', () => {
  it('at 100 columns', () => { expect(`\n${renderParts({ total: 6, parts: lines }, styleOf(100))}`).toMatchInlineSnapshot(`
    "
     Part          Class                   Supply              Gain  Current     Price
                                                          bandwidth
     TEAM-0005  A  350 kHz, zero-drift     1.8 V..5.5 V     300 kHz    35 µA  0.72 EUR
     TEAM-0012  A  1 MHz, low offset       1.8 V..5.5 V   1 MHz typ    62 µA  0.34 EUR
     TEAM-0031  A  1 MHz, 1 mV offset      1.8 V..5.5 V     700 kHz    70 µA  0.22 EUR
     TEAM-0001  A  1 MHz, general purpose  1.8 V..5.5 V     700 kHz    98 µA  0.14 EUR
     TEAM-0007  A  10 kHz, nanopower       1.8 V..5.5 V  10 kHz typ     1 µA  0.55 EUR
     GX-LV-1M   G  1 MHz, 2 mV offset      1.8 V..5.5 V   1 MHz typ    75 µA  0.21 EUR

     A on the approved list; G generic set: a class of parts, not something to order; typ: no limit is
     known
    6 parts: 5 approved, 1 generic.
    "
  `); });
  it('at 40 columns', () => { expect(`\n${renderParts({ total: 6, parts: lines.slice(0, 2) }, styleOf(40))}`).toMatchInlineSnapshot(`
    "
     TEAM-0005 A
        350 kHz, zero-drift; supply
        1.8 V..5.5 V; gain
        bandwidth 300 kHz; current 35 µA;
        price 0.72 EUR
     TEAM-0012 A
        1 MHz, low offset; supply
        1.8 V..5.5 V; gain bandwidth
        1 MHz typ; current 62 µA; price
        0.34 EUR

     A on the approved list; typ: no limit
     is known
    2 of 6 parts: 2 approved, 0 generic.
    "
  `); });
  it('with what each fails', () => {
    const failing = [{ part: lines[3]?.part, failing: ['dc-error', 'supply-current'] }].flatMap(({ part, failing: checks }) => (part === undefined ? [] : [{ part, failing: checks }]));
    expect(`\n${renderParts({ total: 6, parts: failing }, styleOf(100))}`).toMatchInlineSnapshot(`
      "
       Part          Supply             Gain  Current     Price  Fails
                                   bandwidth
       TEAM-0001  A  1.8 V..5.5 V    700 kHz    98 µA  0.14 EUR  DC error, supply current
         1 MHz, general purpose

       A on the approved list
      1 of 6 parts: 1 approved, 0 generic.
      "
    `);
  });
  it('says when nothing matches', () => { expect(renderParts({ total: 6, parts: [] }, styleOf(100))).toBe('Nothing matches; the catalog has 6 parts.\n'); });
});

describe('one part', () => {
  const [first] = SAMPLE_PARTS;
  if (first === undefined) throw new Error('no sample part');
  const origin = (slot: string): ReturnType<ReturnType<typeof sampleSource>['origin']> => sampleSource().origin(first.id, slot);
  it('at 100 columns', () => { expect(`\n${renderPart(first, origin, styleOf(100))}`).toMatchInlineSnapshot(`
    "
    TEAM-0005: on the approved list
    Description     350 kHz, zero-drift
    Status          approved
    Lifecycle       active
    Package         SOT-23-5
    Channels        1
    Price           0.72 EUR at 1000
    Input type      fet
    Phase reversal  no

     Figure                   kind      value  condition                 from
     supply voltage           min       1.8 V                            approved.csv row 2, J
     supply voltage           max       5.5 V                            approved.csv row 2, K
     absolute maximum supply  max         6 V                            approved.csv row 2, L
     input head-room to V-    max     -100 mV                            approved.csv row 2, M
     input head-room to V+    max       1.2 V                            approved.csv row 2, N
     output head-room to V-   max       25 mV  10 kΩ to mid-supply, 3 V  approved.csv row 2, O
     output head-room to V+   max       30 mV  10 kΩ to mid-supply, 3 V  approved.csv row 2, P
     output head-room to V-   max      200 mV  2 mA, 3 V                 approved.csv row 2, Q
     output head-room to V+   max      220 mV  2 mA, 3 V                 approved.csv row 2, R
     output current           min        5 mA                            approved.csv row 2, S
     minimum stable gain      max       1 V/V                            approved.csv row 2, T
     open-loop gain           min      100 dB                            approved.csv row 2, U
     bias current             max       20 pA  85 °C                     approved.csv row 2, V
     offset current           max       20 pA  85 °C                     approved.csv row 2, W
     supply rejection         min       80 dB                            approved.csv row 2, X
     specified temperature    min      -40 °C                            approved.csv row 2, Y
     specified temperature    max      125 °C                            approved.csv row 2, Z
     slew rate                min   100 mV/µs                            approved.csv row 2, AA
     gain bandwidth           min     300 kHz                            approved.csv row 2, AB
     offset voltage           max       15 µV                            approved.csv row 2, AC
     offset drift             max    80 nV/°C                            approved.csv row 2, AD
     common-mode rejection    min      100 dB                            approved.csv row 2, AE
     quiescent current        max       35 µA                            approved.csv row 2, AF

    23 figures. What is not listed is not known.
    "
  `); });
  it('at 40 columns with sources', () => { expect(`\n${renderPart({ ...first, figures: first.figures.slice(0, 3) }, origin, styleOf(40, { sources: true }))}`).toMatchInlineSnapshot(`
    "
    TEAM-0005: on the approved list
    Description     350 kHz, zero-drift
    Status          approved
    Lifecycle       active
    Package         SOT-23-5
    Channels        1
    Price           0.72 EUR at 1000
    Input type      fet
    Phase reversal  no

     supply voltage min 1.8 V
        from approved.csv (sha256 41bb07d2)
        line 2, row 2, column J,
        supplyVoltage min = "1.8"
     supply voltage max 5.5 V
        from approved.csv (sha256 41bb07d2)
        line 2, row 2, column K,
        supplyVoltage max = "5.5"
     absolute maximum supply max 6 V
        from approved.csv (sha256 41bb07d2)
        line 2, row 2, column L,
        supplyAbsoluteMaximum max = "6"

    3 figures. What is not listed is not
    known.
    "
  `); });
});
