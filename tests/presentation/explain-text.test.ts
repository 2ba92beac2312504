import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { renderExplanation } from '../../src/presentation/explain-text.js';
import { CONTEXT, SAMPLE_PARTS, sampleExplanation, sampleReport, styleOf } from '../support/sample-report.js';

const shown = (id: string, width: number, more: Parameters<typeof styleOf>[1] = {}, changes = {}): string =>
  `\n${renderExplanation(sampleExplanation(id, changes), styleOf(width, more), CONTEXT)}`;

describe('a part that does not fit', () => {
  it('at 100 columns', () => { expect(shown('TEAM-0001', 100)).toMatchInlineSnapshot(`
    "
    TEAM-0001 does not fit: 3 of 17 checks fail, 14 pass, 0 cannot be decided.
    Part    approved list, 1 MHz, general purpose, SOT-23-5, conditional, active, 1 channel, 0.14 EUR
    Stage   Soil-moisture probe: non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV,
            output 200 mV..2.64 V (197 mV..2.69 V at the corners), up to 2 kHz on 3 V..4.2 V

    FAIL  DC error   47.7 mV, allowed 40 mV: over by 7.7 mV (20 %)
          Worst case at -20 °C, 4.2 V supply
          Terms at the output, each × noise gain 8.141:
            offset          40.7 mV  5 mV limit; approved.csv row 5, AC
            offset drift     733 µV  2 µV/°C typical as printed, × 45 K; approved.csv row 5, AD
            bias current    1.28 µV  20 pA limit (85 °C) through 7.85 kΩ; approved.csv row 5, V
            offset current   794 nV  20 pA limit (85 °C), half of it through 9.75 kΩ; approved.csv
                                     row 5, W
            common mode     5.63 mV  69.5 dB limit over 2.08 V of common mode; approved.csv row 5, AE
            supply           488 µV  80 dB limit over 600 mV of supply; approved.csv row 5, X
            open-loop gain   155 µV  100 dB limit over 1.9 V of output; approved.csv row 5, U
            sum             47.7 mV  root-sum-square 41.1 mV, shown for scale
          Figures count as printed here; with deratings and estimates it would be 49.2 mV.

    FAIL  supply current   98 µA, allowed 90 µA: over by 8 µA (8.9 %)
            98 µA limit; approved.csv row 5, AF

    FAIL  status   conditional, wanted approved

    PASS  lowest supply        1.2 V spare               highest supply       1.3 V spare
          supply peak          1.5 V spare               input range low      125 mV spare
          input range high     1.47 V spare              output low           129 mV spare (typical)
          output high          224 mV spare (typical)    output current       16 times
          slew rate            19 times                  gain bandwidth       6.2 times
          minimum stable gain  7.8 times                 lowest temperature   20 °C spare
          highest temperature  65 °C spare               channels             has 1

    Swing   2.92 V of 3 V between the rails can be used: head-room takes 0.21 dB of the dynamic range

    Does it hang on borrowed or typical figures?
      DC error: with offset drift as printed 47.7 mV (fails), derated still 49.2 mV (fails); the limit
        is 40 mV. The verdict does not depend on them.
      Not output low, output high: they pass with these figures at their best and at their worst.

    Parts that fit as things stand: TEAM-0005 (rank 1, 0.72 EUR), TEAM-0012 (rank 2, 0.34 EUR), GX-LV-1M
      (rank 3, 0.21 EUR).

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0001 probe.yaml --all        the passing checks in full
            railfit explain TEAM-0001 probe.yaml --sources    every cell a figure came from
            railfit shortlist probe.yaml                      all parts on this stage

    The datasheet of the chosen part governs, and prototypes are measured. Where failure can hurt
    someone, qualified review and the applicable codes decide.
    "
  `); });
  it('at 40 columns in ASCII', () => { expect(shown('TEAM-0001', 40, { ascii: true })).toMatchInlineSnapshot(`
    "
    TEAM-0001 does not fit: 3 of 17 checks
    fail, 14 pass, 0 cannot be decided.
    Part    approved list, 1 MHz, general
            purpose, SOT-23-5, conditional,
            active, 1 channel, 0.14 EUR
    Stage   Soil-moisture probe:
            non-inverting, gain 8 V/V, noise
            gain 8 V/V, input 25 mV..330 mV,
            output 200 mV..2.64 V
            (197 mV..2.69 V at the corners),
            up to 2 kHz on 3 V..4.2 V

    FAIL  DC error   47.7 mV, allowed 40 mV:
          over by 7.7 mV (20 %)
          Worst case at -20 C, 4.2 V supply
          Terms at the output, each x noise
          gain 8.141:
            offset 40.7 mV
               5 mV limit; approved.csv
               row 5, AC
            offset drift 733 uV
               2 uV/C typical as printed,
               x 45 K; approved.csv row 5,
               AD
            bias current 1.28 uV
               20 pA limit (85 C) through
               7.85 kohm; approved.csv
               row 5, V
            offset current 794 nV
               20 pA limit (85 C), half of
               it through 9.75 kohm;
               approved.csv row 5, W
            common mode 5.63 mV
               69.5 dB limit over 2.08 V of
               common mode; approved.csv
               row 5, AE
            supply 488 uV
               80 dB limit over 600 mV of
               supply; approved.csv row 5, X
            open-loop gain 155 uV
               100 dB limit over 1.9 V of
               output; approved.csv row 5, U
            sum 47.7 mV
               root-sum-square 41.1 mV,
               shown for scale
          Figures count as printed here;
          with deratings and estimates it
          would be 49.2 mV.

    FAIL  supply current   98 uA, allowed
          90 uA: over by 8 uA (8.9 %)
            98 uA limit; approved.csv row 5,
            AF

    FAIL  status   conditional, wanted
          approved

    PASS  lowest supply        1.2 V spare
          highest supply       1.3 V spare
          supply peak          1.5 V spare
          input range low      125 mV spare
          input range high     1.47 V spare
          output low 129 mV spare (typical)
          output high 224 mV spare (typical)
          output current       16 times
          slew rate            19 times
          gain bandwidth       6.2 times
          minimum stable gain  7.8 times
          lowest temperature   20 C spare
          highest temperature  65 C spare
          channels             has 1

    Swing   2.92 V of 3 V between the rails
            can be used: head-room takes
            0.21 dB of the dynamic range

    Does it hang on borrowed or typical
    figures?
      DC error: with offset drift as printed
        47.7 mV (fails), derated still
        49.2 mV (fails); the limit is 40 mV.
        The verdict does not depend on them.
      Not output low, output high: they pass
        with these figures at their best and
        at their worst.

    Parts that fit as things stand:
      TEAM-0005 (rank 1, 0.72 EUR),
      TEAM-0012 (rank 2, 0.34 EUR), GX-LV-1M
      (rank 3, 0.21 EUR).

    Assumed stability: the part's own
            compensation is assumed to hold
    Data    catalog of 6 parts (5 approved,
            1 generic, sha256 9f2c1e40),
            rules 1

    Next    railfit explain TEAM-0001 \\
              probe.yaml --all
            railfit explain TEAM-0001 \\
              probe.yaml --sources
            railfit shortlist probe.yaml

    The datasheet of the chosen part
    governs, and prototypes are measured.
    Where failure can hurt someone,
    qualified review and the applicable
    codes decide.
    "
  `); });
  it('fails on the best reading and says what the worst one gives', () => { expect(shown('TEAM-0007', 80)).toMatchInlineSnapshot(`
    "
    TEAM-0007 does not fit: 2 of 17 checks fail, 15 pass, 0 cannot be decided.
    Part    approved list, 10 kHz, nanopower, SOT-23-5, approved, active, 1 channel,
            0.55 EUR
    Stage   Soil-moisture probe: non-inverting, gain 8 V/V, noise gain 8 V/V, input
            25 mV..330 mV, output 200 mV..2.64 V (197 mV..2.69 V at the corners), up
            to 2 kHz on 3 V..4.2 V

    FAIL  slew rate   has 4 V/ms, the stage needs 15.6 mV/µs: short by 11.6 mV/µs
          (75 %)
            4 V/ms typical as printed; approved.csv row 6, AA
          Figures count as printed here; with deratings and estimates it would be
          2.4 V/ms.

    FAIL  gain bandwidth   has 10 kHz, the stage needs 112 kHz: short by 102 kHz
          (92 %)
            10 kHz typical as printed; approved.csv row 6, AB
          Figures count as printed here; with deratings and estimates it would be
          6 kHz.

    PASS  lowest supply        1.2 V spare     highest supply       1.3 V spare
          supply peak          1.5 V spare     input range low      125 mV spare
          input range high     1.47 V spare    output low           163 mV spare
          output high          258 mV spare    output current       16 times
          minimum stable gain  7.8 times       DC error             71 % spare
          supply current       98 % spare      lowest temperature   20 °C spare
          highest temperature  65 °C spare     channels             has 1
          status               approved

    Swing   2.92 V of 3 V between the rails can be used: head-room takes 0.21 dB of
            the dynamic range

    Does it hang on borrowed or typical figures?
      slew rate: with slew rate as printed 4 V/ms (fails), derated still 2.4 V/ms
        (fails); the limit is 15.6 mV/µs. The verdict does not depend on them.
      gain bandwidth: with gain bandwidth as printed 10 kHz (fails), derated still
        6 kHz (fails); the limit is 112 kHz. The verdict does not depend on them.

    Parts that fit as things stand: TEAM-0005 (rank 1, 0.72 EUR), TEAM-0012 (rank 2,
      0.34 EUR), GX-LV-1M (rank 3, 0.21 EUR).

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0007 probe.yaml --all    the passing checks in full
            railfit explain TEAM-0007 probe.yaml --sources
            railfit shortlist probe.yaml                  all parts on this stage

    The datasheet of the chosen part governs, and prototypes are measured. Where
    failure can hurt someone, qualified review and the applicable codes decide.
    "
  `); });
});

describe('a part that cannot be decided', () => {
  it('says what is missing, where the cell is, where it decides and what to do', () => { expect(shown('TEAM-0031', 100)).toMatchInlineSnapshot(`
    "
    TEAM-0031 cannot be decided: 16 of 17 checks pass, 1 open, 0 fail. It is not counted as fitting.
    Part    approved list, 1 MHz, 1 mV offset, SOT-23-5, approved, active, 1 channel, 0.22 EUR
    Stage   Soil-moisture probe: non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV,
            output 200 mV..2.64 V (197 mV..2.69 V at the corners), up to 2 kHz on 3 V..4.2 V

    ?     DC error   at least 10.5 mV, allowed 40 mV: a figure is not known
          Worst case at -20 °C, 4.2 V supply
          Terms at the output, each × noise gain 8.141:
            offset          8.14 mV  1 mV limit; approved.csv row 4, AC
            bias current    1.28 µV  20 pA limit (85 °C) through 7.85 kΩ; approved.csv row 4, V
            offset current   794 nV  20 pA limit (85 °C), half of it through 9.75 kΩ; approved.csv
                                     row 4, W
            common mode     1.69 mV  80 dB limit over 2.08 V of common mode; approved.csv row 4, AD
            supply           488 µV  80 dB limit over 600 mV of supply; approved.csv row 4, X
            open-loop gain   155 µV  100 dB limit over 1.9 V of output; approved.csv row 4, U
            offset drift    unknown  cell is "TBD"; approved.csv row 4, I
            known           10.5 mV
          Decides at: offset drift maximum of 80.5 µV/°C. At or below it this check passes, above it
          does not.

    PASS  lowest supply        1.2 V spare     highest supply       1.3 V spare
          supply peak          1.5 V spare     input range low      125 mV spare
          input range high     1.47 V spare    output low           164 mV spare
          output high          259 mV spare    output current       16 times
          slew rate            19 times        gain bandwidth       6.2 times
          minimum stable gain  7.8 times       supply current       22 % spare
          lowest temperature   20 °C spare     highest temperature  65 °C spare
          channels             has 1           status               approved
          caution: output low: offset drift not known and not charged: 445 µV/°C uses the spare up
          caution: output high: offset drift not known and not charged: 707 µV/°C uses the spare up

    Swing   2.92 V of 3 V between the rails can be used: head-room takes 0.21 dB of the dynamic range

    What would decide it:
      offset drift maximum: 80.5 µV/°C or less decides DC error
          belongs in approved.csv row 4, I (cell is "TBD")
          for scale: parts of the catalog have 80 nV/°C to 3 µV/°C (2 parts)
    If it is so, TEAM-0031 would rank 1 of 4: 0.22 EUR, approved.
    Or accept it for this run, written into the report as an assumption:
      railfit explain TEAM-0031 probe.yaml --assume TEAM-0031.offsetDrift=80.58uV/C

    What to do
      - or measure offset drift on a few samples at the corner above; samples do not replace a limit

    Parts that fit as things stand: TEAM-0005 (rank 1, 0.72 EUR), TEAM-0012 (rank 2, 0.34 EUR), GX-LV-1M
      (rank 3, 0.21 EUR).

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0031 probe.yaml --all        the passing checks in full
            railfit explain TEAM-0031 probe.yaml --sources    every cell a figure came from
            railfit shortlist probe.yaml                      all parts on this stage

    The datasheet of the chosen part governs, and prototypes are measured. Where failure can hurt
    someone, qualified review and the applicable codes decide.
    "
  `); });
  it('beyond the data says how far the points reach and which one to add', () => {
    const text = shown('TEAM-0005', 200, {}, { 'load.resistance': '600 Ω' });
    expect(text).toMatch(/head-room of the heaviest point +220 mV/u);
    expect(text).toMatch(/the list covers up to 2 mA \(1\.5 × = 3 mA\); 4\.\d+ mA flows here/u);
    expect(text).toMatch(/a new column "output high headroom max \(mV\) @ 4\.\d mA, [\d.]+ V"/u);
    expect(text).toMatch(/Decides at: output head-room to V\+ maximum of \d+ mV at 4\.\d+ mA, (?:3|4\.2) V\./u);
  });
  it('the value it offers to assume does decide', () => {
    const offered = /--assume TEAM-0031\.offsetDrift=([\d.]+)uV/u.exec(shown('TEAM-0031', 100))?.[1];
    const parts = SAMPLE_PARTS.map((part): Part => {
      const drift: Figure = { parameter: 'offsetDrift', kind: 'max', value: Number(offered) * 1e-6, condition: {}, assumed: true };
      return part.id === 'TEAM-0031' ? { ...part, figures: [...part.figures, drift] } : part;
    });
    expect(sampleReport({}, parts).fit.map((one) => one.part.id)).toContain('TEAM-0031');
  });

  it('a hazard the stage avoids and does not describe is open, never passed', () => {
    expect(shown('TEAM-0005', 80, {}, { avoid: 'overdrive' })).toMatchInlineSnapshot(`
      "
      TEAM-0005 cannot be decided: 17 of 18 checks pass, 1 open, 0 fail. It is not
      counted as fitting.
      Part    approved list, 350 kHz, zero-drift, SOT-23-5, approved, active,
              1 channel, 0.72 EUR
      Stage   Soil-moisture probe: non-inverting, gain 8 V/V, noise gain 8 V/V, input
              25 mV..330 mV, output 200 mV..2.64 V (197 mV..2.69 V at the corners), up
              to 2 kHz on 3 V..4.2 V

      ?     overdrive   the stage does not say what it takes its inputs to
            caution: write overdrive (how far an input goes beyond a rail), or
              sequencing

      PASS  lowest supply        1.2 V spare     highest supply       1.3 V spare
            supply peak          1.5 V spare     input range low      125 mV spare
            input range high     1.47 V spare    output low           172 mV spare
            output high          267 mV spare    output current       16 times
            slew rate            6.4 times       gain bandwidth       2.6 times
            minimum stable gain  7.8 times       DC error             97 % spare
            supply current       61 % spare      lowest temperature   20 °C spare
            highest temperature  65 °C spare     channels             has 1
            status               approved

      Swing   2.92 V of 3 V between the rails can be used: head-room takes 0.21 dB of
              the dynamic range

      Nothing to look up: overdrive stays open whatever is known of the part.

      No part fits as things stand.

      Assumed stability: the part's own compensation is assumed to hold
      Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

      Next    railfit explain TEAM-0005 probe.yaml --all    the passing checks in full
              railfit explain TEAM-0005 probe.yaml --sources
              railfit shortlist probe.yaml                  all parts on this stage

      The datasheet of the chosen part governs, and prototypes are measured. Where
      failure can hurt someone, qualified review and the applicable codes decide.
      "
    `);
  });
});

describe('a part that fits', () => {
  it('on limits', () => { expect(shown('TEAM-0005', 100)).toMatchInlineSnapshot(`
    "
    TEAM-0005 fits: all 17 checks pass, all of it on limits. Rank 1; 3 parts fit.
    Part    approved list, 350 kHz, zero-drift, SOT-23-5, approved, active, 1 channel, 0.72 EUR
    Stage   Soil-moisture probe: non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV,
            output 200 mV..2.64 V (197 mV..2.69 V at the corners), up to 2 kHz on 3 V..4.2 V

    PASS  lowest supply        1.2 V spare     highest supply       1.3 V spare
          supply peak          1.5 V spare     input range low      125 mV spare
          input range high     1.47 V spare    output low           172 mV spare
          output high          267 mV spare    output current       16 times
          slew rate            6.4 times       gain bandwidth       2.6 times
          minimum stable gain  7.8 times       DC error             97 % spare
          supply current       61 % spare      lowest temperature   20 °C spare
          highest temperature  65 °C spare     channels             has 1
          status               approved

    Swing   2.92 V of 3 V between the rails can be used: head-room takes 0.21 dB of the dynamic range

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0005 probe.yaml --all        the passing checks in full
            railfit explain TEAM-0005 probe.yaml --sources    every cell a figure came from
            railfit shortlist probe.yaml                      all parts on this stage

    The datasheet of the chosen part governs, and prototypes are measured. Where failure can hurt
    someone, qualified review and the applicable codes decide.
    "
  `); });
  it('on typical figures, in full and with sources', () => { expect(shown('TEAM-0012', 120, { all: true, sources: true })).toMatchInlineSnapshot(`
    "
    TEAM-0012 fits: all 17 checks pass, 3 figures to confirm. Rank 2; 3 parts fit.
    Part    approved list, 1 MHz, low offset, SOT-23-5, approved, active, 2 channels, 0.34 EUR
    Stage   Soil-moisture probe: non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output 200 mV..2.64 V
            (197 mV..2.69 V at the corners), up to 2 kHz on 3 V..4.2 V

    PASS  lowest supply   works from 1.8 V, the stage goes down to 3 V: 1.2 V spare
            1.8 V limit; approved.csv (sha256 41bb07d2) line 3, row 3, column J, supplyVoltage min = "1.8"

    PASS  highest supply   works up to 5.5 V, the stage goes up to 4.2 V: 1.3 V spare
            5.5 V limit; approved.csv (sha256 41bb07d2) line 3, row 3, column K, supplyVoltage max = "5.5"

    PASS  supply peak   absolute maximum 6 V, the stage peaks at 4.5 V: 1.5 V spare
            6 V limit; approved.csv (sha256 41bb07d2) line 3, row 3, column L, supplyAbsoluteMaximum max = "6"

    PASS  input range low   needs -100 mV, the stage leaves 25 mV: 125 mV spare
          Worst case at 3 V supply, 25 mV input
            -100 mV limit; approved.csv (sha256 41bb07d2) line 3, row 3, column M, inputLowHeadroom max = "-0.1"

    PASS  input range high   needs 1.2 V, the stage leaves 2.67 V: 1.47 V spare
          Worst case at 3 V supply, 330 mV input
            1.2 V limit; approved.csv (sha256 41bb07d2) line 3, row 3, column N, inputHighHeadroom max = "1.2"

    PASS  output low   needs 31.3 mV, the stage leaves 197 mV: 166 mV spare (typical)
          Worst case at 3 V supply, 25 mV input, 22.1 µA sourced
            head-room       25 mV  25 mV limit (10 kΩ to mid-supply, 3 V), no current towards this rail; approved.csv
                                   (sha256 41bb07d2) line 3, row 3, column O, outputLowHeadroom max@R10000:mid-supply,V3 =
                                   "0.025"
            offset        4.07 mV  500 µV limit × noise gain 8.141; approved.csv (sha256 41bb07d2) line 3, row 3, column AC,
                                   offsetVoltage max = "0.0005"
            offset drift   2.2 mV  2 µV/°C typical × 3, × 45 K, × noise gain 8.141; approved.csv (sha256 41bb07d2) line 3,
                                   row 3, column AD, offsetDrift typ = "0.000002"
            sum           31.3 mV

    PASS  output high   needs 52.2 mV, the stage leaves 313 mV: 261 mV spare (typical)
          Worst case at 3 V supply, 330 mV input, 302 µA sourced
            head-room     45.9 mV  220 mV limit (2 mA, 3 V), at 302 µA, between two load points; approved.csv
                                   (sha256 41bb07d2) line 3, row 3, column R, outputHighHeadroom max@I0.002,V3 = "0.22"
            offset        4.07 mV  500 µV limit × noise gain 8.141; approved.csv (sha256 41bb07d2) line 3, row 3, column AC,
                                   offsetVoltage max = "0.0005"
            offset drift   2.2 mV  2 µV/°C typical × 3, × 45 K, × noise gain 8.141; approved.csv (sha256 41bb07d2) line 3,
                                   row 3, column AD, offsetDrift typ = "0.000002"
            sum           52.2 mV

    PASS  output current   gives 5 mA, the stage draws 297 µA: 16 times
          Worst case at 3 V supply
            5 mA limit; approved.csv (sha256 41bb07d2) line 3, row 3, column S, outputCurrent min = "0.005"

    PASS  slew rate   has 300 mV/µs, the stage needs 15.6 mV/µs: 19 times (typical)
            500 mV/µs typical × 0.6; approved.csv (sha256 41bb07d2) line 3, row 3, column AA, slewRate typ = "500000"

    PASS  gain bandwidth   has 600 kHz, the stage needs 112 kHz: 5.3 times (typical)
            1 MHz typical × 0.6; approved.csv (sha256 41bb07d2) line 3, row 3, column AB, gainBandwidth typ = "1000000"

    PASS  minimum stable gain   stable from 1 V/V, the stage has 7.86 V/V: 7.8 times
            1 V/V limit; approved.csv (sha256 41bb07d2) line 3, row 3, column T, minimumStableGain max = "1"

    PASS  DC error   8.6 mV, allowed 40 mV: 78 % spare (typical)
          Worst case at -20 °C, 4.2 V supply
          Terms at the output, each × noise gain 8.141:
            offset          4.07 mV  500 µV limit; approved.csv (sha256 41bb07d2) line 3, row 3, column AC, offsetVoltage
                                     max = "0.0005"
            offset drift     2.2 mV  2 µV/°C typical × 3, × 45 K; approved.csv (sha256 41bb07d2) line 3, row 3, column AD,
                                     offsetDrift typ = "0.000002"
            bias current    1.28 µV  20 pA limit (85 °C) through 7.85 kΩ; approved.csv (sha256 41bb07d2) line 3, row 3,
                                     column V, biasCurrent max@T85 = "2e-11"
            offset current   794 nV  20 pA limit (85 °C), half of it through 9.75 kΩ; approved.csv (sha256 41bb07d2) line 3,
                                     row 3, column W, offsetCurrent max@T85 = "2e-11"
            common mode     1.69 mV  80 dB limit over 2.08 V of common mode; approved.csv (sha256 41bb07d2) line 3, row 3,
                                     column AE, commonModeRejection min = "10000"
            supply           488 µV  80 dB limit over 600 mV of supply; approved.csv (sha256 41bb07d2) line 3, row 3,
                                     column X, supplyRejection min = "10000"
            open-loop gain   155 µV  100 dB limit over 1.9 V of output; approved.csv (sha256 41bb07d2) line 3, row 3,
                                     column U, openLoopGain min = "100000"
            sum              8.6 mV  root-sum-square 4.95 mV, shown for scale

    PASS  supply current   62 µA, allowed 90 µA: 31 % spare
            62 µA limit; approved.csv (sha256 41bb07d2) line 3, row 3, column AF, quiescentCurrent max = "0.000062"

    PASS  lowest temperature   specified from -40 °C, the stage goes down to -20 °C: 20 °C spare
            -40 °C limit; approved.csv (sha256 41bb07d2) line 3, row 3, column Y, temperature min = "-40"

    PASS  highest temperature   specified up to 125 °C, the stage goes up to 60 °C: 65 °C spare
            125 °C limit; approved.csv (sha256 41bb07d2) line 3, row 3, column Z, temperature max = "125"

    PASS  channels   has 2

    PASS  status   approved

    Swing   2.92 V of 3 V between the rails can be used: head-room takes 0.21 dB of the dynamic range

          caution: 1 of 2 sections idle: it draws 62 µA of the 124 µA of the package; an idle section is tied off as a
            follower inside its input range

    Does it hang on borrowed or typical figures?
      output low: with offset drift as printed 29.8 mV (passes), derated still 31.3 mV (passes); the limit is 197 mV. The
        verdict does not depend on them.
      output high: with offset drift as printed 50.7 mV (passes), derated still 52.2 mV (passes); the limit is 313 mV. The
        verdict does not depend on them.
      slew rate: with slew rate as printed 500 mV/µs (passes), derated still 300 mV/µs (passes); the limit is 15.6 mV/µs.
        The verdict does not depend on them.
      gain bandwidth: with gain bandwidth as printed 1 MHz (passes), derated still 600 kHz (passes); the limit is 112 kHz.
        The verdict does not depend on them.
      DC error: with offset drift as printed 7.14 mV (passes), derated still 8.6 mV (passes); the limit is 40 mV. The
        verdict does not depend on them.

    Confirm these 3 before release:
      offset drift: typical × 3, × 45 K, × noise gain 8.141
      slew rate: typical × 0.6; 15.7 mV/µs or more is enough
      gain bandwidth: typical × 0.6; 113 kHz or more is enough

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40aa55aa55), rules 1

    Next    railfit shortlist probe.yaml    all parts on this stage

    The datasheet of the chosen part governs, and prototypes are measured. Where failure can hurt someone, qualified review
    and the applicable codes decide.
    "
  `); });
});
