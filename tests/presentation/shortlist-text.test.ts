import { describe, expect, it } from 'vitest';
import { shortlist } from '../../src/engine.js';
import { renderShortlist } from '../../src/presentation/shortlist-text.js';
import { CONTEXT, SAMPLE_PARTS, sampleReport, sampleSource, sampleStage, styleOf } from '../support/sample-report.js';

const shown = (width: number, more: Parameters<typeof styleOf>[1] = {}, changes = {}): string => `\n${renderShortlist(sampleReport(changes), styleOf(width, more), CONTEXT)}`;

describe('a shortlist with something that fits', () => {
  it('at 40 columns, in ASCII, stands upright', () => { expect(shown(40, { ascii: true })).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise
            gain 8 V/V, input 25 mV..330 mV,
            output 200 mV..2.64 V
            (197 mV..2.69 V at the corners),
            up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V
            Load  10 kohm to ground
            Temperature  -20 C..60 C
    Limits  DC error at the output <= 40 mV,
            supply current per amplifier
            <= 90 uA, gain error <= 1 %,
            1 channel, status approved

    3 of 6 parts fit, 1 cannot be decided, 2
    do not fit.

     1 TEAM-0005 A
        350 kHz, zero-drift; tightest output
        low; 172 mV spare; DC error at the
        output 966 uV; current 35 uA; price
        at 1000: 0.72 EUR; proof limits
     2 TEAM-0012 A
        1 MHz, low offset; tightest supply
        current; 31 % spare; DC error at the
        output 8.61 mV; current 62 uA; price
        at 1000: 0.34 EUR; proof typical (3)
     3 GX-LV-1M G
        1 MHz, 2 mV offset; tightest supply
        current; 16 % spare; DC error at the
        output 24.8 mV; current 75 uA; price
        at 1000: 0.21 EUR; proof typical (3)
     ?  TEAM-0031 (A) 1 MHz, 1 mV offset -
          offset drift unknown: fits if
          80.5 uV/C or less

     A on the approved list; G generic set:
     a class of parts, not something to
     order; typical (n): rests on n figures
     that are not limits; ? cannot be
     decided
     Order: approved before generic, all
     limits before some typical, then merit:
     margins, price and current in equal
     shares.

    Why 1 is ahead of 2: 1 rests on limits
      only, 2 partly on figures that are not
      limits. In favour of 1: 27 uA less
      supply current, head-room to V-
      25.2 mV against 31.3 mV, head-room to
      V+ 46.1 mV against 52.2 mV, DC error
      966 uV against 8.61 mV. In favour of
      2: 0.38 EUR cheaper, slew rate
      300 mV/us against 100 mV/us, gain
      bandwidth 600 kHz against 300 kHz.
      No price and no weight of a share
      turns it: proof decides.

    Why the other 2 are out (one part can
    fail several checks):
      slew rate 1    gain bandwidth 1
      DC error 1    supply current 1
      status 1

    caution: TEAM-0012: 1 of 2 sections
             idle: it draws 62 uA of the
             124 uA of the package; an idle
             section is tied off as a
             follower inside its input range
    confirm: TEAM-0012, GX-LV-1M: these 3
             before release: offset drift
             (typical only); slew rate
             (15.7 mV/us or more); gain
             bandwidth (113 kHz or more)

    Assumed stability: the part's own
            compensation is assumed to hold
    Data    catalog of 6 parts (5 approved,
            1 generic, sha256 9f2c1e40),
            rules 1

    Next    railfit explain TEAM-0005 \\
              probe.yaml
            railfit explain TEAM-0001 \\
              probe.yaml
            railfit parts --failing \\
              slew-rate --stage probe.yaml
    "
  `); });
  it('at 60 columns', () => { expect(shown(60)).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise gain 8 V/V, input
            25 mV..330 mV, output 200 mV..2.64 V (197 mV..2.69 V
            at the corners), up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V
            Load  10 kΩ to ground    Temperature  -20 °C..60 °C
    Limits  DC error at the output ≤ 40 mV, supply current per
            amplifier ≤ 90 µA, gain error ≤ 1 %, 1 channel,
            status approved

    3 of 6 parts fit, 1 cannot be decided, 2 do not fit.

     #  Part          Tightest check  worst case       Price
                                                     at 1000
     1  TEAM-0005  A  output low      172 mV spare  0.72 EUR
        350 kHz, zero-drift; DC error at the output 966 µV;
        current 35 µA; proof limits
     2  TEAM-0012  A  supply current  31 % spare    0.34 EUR
        1 MHz, low offset; DC error at the output 8.61 mV;
        current 62 µA; proof typical (3)
     3  GX-LV-1M   G  supply current  16 % spare    0.21 EUR
        1 MHz, 2 mV offset; DC error at the output 24.8 mV;
        current 75 µA; proof typical (3)
     ?  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown:
          fits if 80.5 µV/°C or less

     A on the approved list; G generic set: a class of parts,
     not something to order; typical (n): rests on n figures
     that are not limits; ? cannot be decided
     Order: approved before generic, all limits before some
     typical, then merit: margins, price and current in equal
     shares.

    Why 1 is ahead of 2: 1 rests on limits only, 2 partly on
      figures that are not limits. In favour of 1: 27 µA less
      supply current, head-room to V- 25.2 mV against 31.3 mV,
      head-room to V+ 46.1 mV against 52.2 mV, DC error 966 µV
      against 8.61 mV. In favour of 2: 0.38 EUR cheaper, slew
      rate 300 mV/µs against 100 mV/µs, gain bandwidth 600 kHz
      against 300 kHz.
      No price and no weight of a share turns it: proof decides.

    Why the other 2 are out (one part can fail several checks):
      slew rate 1    gain bandwidth 1    DC error 1
      supply current 1    status 1

    caution: TEAM-0012: 1 of 2 sections idle: it draws 62 µA of
             the 124 µA of the package; an idle section is tied
             off as a follower inside its input range
    confirm: TEAM-0012, GX-LV-1M: these 3 before release: offset
             drift (typical only); slew rate (15.7 mV/µs
             or more); gain bandwidth (113 kHz or more)

    Assumed stability: the part's own compensation is assumed to
            hold
    Data    catalog of 6 parts (5 approved, 1 generic,
            sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0005 probe.yaml
            railfit explain TEAM-0001 probe.yaml
            railfit parts --failing slew-rate --stage \\
              probe.yaml
    "
  `); });
  it('at 80 columns', () => { expect(shown(80)).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output
            200 mV..2.64 V (197 mV..2.69 V at the corners), up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground
            Temperature  -20 °C..60 °C
    Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 90 µA,
            gain error ≤ 1 %, 1 channel, status approved

    3 of 6 parts fit, 1 cannot be decided, 2 do not fit.

     #  Part          Tightest check  worst case     DC error  Current     Price
                                                    at output      max   at 1000
     1  TEAM-0005  A  output low      172 mV spare     966 µV    35 µA  0.72 EUR
        350 kHz, zero-drift; proof limits
     2  TEAM-0012  A  supply current  31 % spare      8.61 mV    62 µA  0.34 EUR
        1 MHz, low offset; proof typical (3)
     3  GX-LV-1M   G  supply current  16 % spare      24.8 mV    75 µA  0.21 EUR
        1 MHz, 2 mV offset; proof typical (3)
     ?  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown: fits if 80.5 µV/°C
          or less

     A on the approved list; G generic set: a class of parts, not something to
     order; typical (n): rests on n figures that are not limits; ? cannot be decided
     Order: approved before generic, all limits before some typical, then merit:
     margins, price and current in equal shares.

    Why 1 is ahead of 2: 1 rests on limits only, 2 partly on figures that are not
      limits. In favour of 1: 27 µA less supply current, head-room to V- 25.2 mV
      against 31.3 mV, head-room to V+ 46.1 mV against 52.2 mV, DC error 966 µV
      against 8.61 mV. In favour of 2: 0.38 EUR cheaper, slew rate 300 mV/µs against
      100 mV/µs, gain bandwidth 600 kHz against 300 kHz.
      No price and no weight of a share turns it: proof decides.

    Why the other 2 are out (one part can fail several checks):
      slew rate 1    gain bandwidth 1    DC error 1    supply current 1    status 1

    caution: TEAM-0012: 1 of 2 sections idle: it draws 62 µA of the 124 µA of the
             package; an idle section is tied off as a follower inside its input
             range
    confirm: TEAM-0012, GX-LV-1M: these 3 before release: offset drift (typical
             only); slew rate (15.7 mV/µs or more); gain bandwidth (113 kHz or more)

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0005 probe.yaml    every check of the first
            railfit explain TEAM-0001 probe.yaml    the nearest that is out
            railfit parts --failing slew-rate --stage probe.yaml
    "
  `); });
  it('at 100 columns', () => { expect(shown(100)).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output 200 mV..2.64 V
            (197 mV..2.69 V at the corners), up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground    Temperature  -20 °C..60 °C
    Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 90 µA, gain error ≤ 1 %,
            1 channel, status approved

    3 of 6 parts fit, 1 cannot be decided, 2 do not fit.

     #  Part          Tightest check  worst case     DC error  Current     Price  Proof
                                                    at output      max   at 1000
     1  TEAM-0005  A  output low      172 mV spare     966 µV    35 µA  0.72 EUR  limits
        350 kHz, zero-drift
     2  TEAM-0012  A  supply current  31 % spare      8.61 mV    62 µA  0.34 EUR  typical (3)
        1 MHz, low offset
     3  GX-LV-1M   G  supply current  16 % spare      24.8 mV    75 µA  0.21 EUR  typical (3)
        1 MHz, 2 mV offset
     ?  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown: fits if 80.5 µV/°C or less

     A on the approved list; G generic set: a class of parts, not something to order; typical (n): rests
     on n figures that are not limits; ? cannot be decided
     Order: approved before generic, all limits before some typical, then merit: margins, price and
     current in equal shares.

    Why 1 is ahead of 2: 1 rests on limits only, 2 partly on figures that are not limits. In favour of
      1: 27 µA less supply current, head-room to V- 25.2 mV against 31.3 mV, head-room to V+ 46.1 mV
      against 52.2 mV, DC error 966 µV against 8.61 mV. In favour of 2: 0.38 EUR cheaper, slew rate
      300 mV/µs against 100 mV/µs, gain bandwidth 600 kHz against 300 kHz.
      No price and no weight of a share turns it: proof decides.

    Why the other 2 are out (one part can fail several checks):
      slew rate 1    gain bandwidth 1    DC error 1    supply current 1    status 1

    caution: TEAM-0012: 1 of 2 sections idle: it draws 62 µA of the 124 µA of the package; an idle
             section is tied off as a follower inside its input range
    confirm: TEAM-0012, GX-LV-1M: these 3 before release: offset drift (typical only); slew rate
             (15.7 mV/µs or more); gain bandwidth (113 kHz or more)

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0005 probe.yaml                    every check of the first
            railfit explain TEAM-0001 probe.yaml                    the nearest that is out
            railfit parts --failing slew-rate --stage probe.yaml    all that fail on slew rate
    "
  `); });
  it('at 120 columns, with everything', () => { expect(shown(120, { all: true, sources: true })).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output 200 mV..2.64 V (197 mV..2.69 V at the
            corners), up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground    Temperature  -20 °C..60 °C
    Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 90 µA, gain error ≤ 1 %, 1 channel, status
            approved

    3 of 6 parts fit, 1 cannot be decided, 2 do not fit.

     #  Part          Class                Tightest check  worst case     DC error  Current     Price  Proof
                                                                         at output      max   at 1000
     1  TEAM-0005  A  350 kHz, zero-drift  output low      172 mV spare     966 µV    35 µA  0.72 EUR  limits
     2  TEAM-0012  A  1 MHz, low offset    supply current  31 % spare      8.61 mV    62 µA  0.34 EUR  typical (3)
     3  GX-LV-1M   G  1 MHz, 2 mV offset   supply current  16 % spare      24.8 mV    75 µA  0.21 EUR  typical (3)
     ?  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown: fits if 80.5 µV/°C or less

     A on the approved list; G generic set: a class of parts, not something to order; typical (n): rests on n figures that
     are not limits; ? cannot be decided
     Order: approved before generic, all limits before some typical, then merit: margins, price and current in equal shares.

    Why 1 is ahead of 2: 1 rests on limits only, 2 partly on figures that are not limits. In favour of 1: 27 µA less supply
      current, head-room to V- 25.2 mV against 31.3 mV, head-room to V+ 46.1 mV against 52.2 mV, DC error 966 µV against
      8.61 mV. In favour of 2: 0.38 EUR cheaper, slew rate 300 mV/µs against 100 mV/µs, gain bandwidth 600 kHz against
      300 kHz.
      No price and no weight of a share turns it: proof decides.

    Why the other 2 are out (one part can fail several checks):
      slew rate 1    gain bandwidth 1    DC error 1    supply current 1    status 1

    Do not fit:
      TEAM-0001 (A) DC error over by 7.7 mV (20 %); supply current over by 8 µA (8.9 %); status conditional, wanted approved
      TEAM-0007 (A) slew rate short by 11.6 mV/µs (75 %); gain bandwidth short by 102 kHz (92 %)

    caution: TEAM-0012: 1 of 2 sections idle: it draws 62 µA of the 124 µA of the package; an idle section is tied off as a
             follower inside its input range
    confirm: TEAM-0012, GX-LV-1M: these 3 before release: offset drift (typical only); slew rate (15.7 mV/µs or more); gain
             bandwidth (113 kHz or more)

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40aa55aa55), rules 1

    Next    railfit explain TEAM-0005 probe.yaml                    every check of the first
            railfit explain TEAM-0001 probe.yaml                    the nearest that is out
            railfit parts --failing slew-rate --stage probe.yaml    all that fail on slew rate
    "
  `); });
  it('at 200 columns', () => { expect(shown(200)).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output 200 mV..2.64 V (197 mV..2.69 V at the corners), up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground    Temperature  -20 °C..60 °C
    Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 90 µA, gain error ≤ 1 %, 1 channel, status approved

    3 of 6 parts fit, 1 cannot be decided, 2 do not fit.

     #  Part          Class                Tightest check  worst case     DC error  Current     Price  Proof
                                                                         at output      max   at 1000
     1  TEAM-0005  A  350 kHz, zero-drift  output low      172 mV spare     966 µV    35 µA  0.72 EUR  limits
     2  TEAM-0012  A  1 MHz, low offset    supply current  31 % spare      8.61 mV    62 µA  0.34 EUR  typical (3)
     3  GX-LV-1M   G  1 MHz, 2 mV offset   supply current  16 % spare      24.8 mV    75 µA  0.21 EUR  typical (3)
     ?  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown: fits if 80.5 µV/°C or less

     A on the approved list; G generic set: a class of parts, not something to order; typical (n): rests on n figures that are not limits; ? cannot be decided
     Order: approved before generic, all limits before some typical, then merit: margins, price and current in equal shares.

    Why 1 is ahead of 2: 1 rests on limits only, 2 partly on figures that are not limits. In favour of 1: 27 µA less supply current, head-room to V- 25.2 mV against 31.3 mV, head-room to V+ 46.1 mV
      against 52.2 mV, DC error 966 µV against 8.61 mV. In favour of 2: 0.38 EUR cheaper, slew rate 300 mV/µs against 100 mV/µs, gain bandwidth 600 kHz against 300 kHz.
      No price and no weight of a share turns it: proof decides.

    Why the other 2 are out (one part can fail several checks):
      slew rate 1    gain bandwidth 1    DC error 1    supply current 1    status 1

    caution: TEAM-0012: 1 of 2 sections idle: it draws 62 µA of the 124 µA of the package; an idle section is tied off as a follower inside its input range
    confirm: TEAM-0012, GX-LV-1M: these 3 before release: offset drift (typical only); slew rate (15.7 mV/µs or more); gain bandwidth (113 kHz or more)

    Assumed stability: the part's own compensation is assumed to hold
    Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

    Next    railfit explain TEAM-0005 probe.yaml                    every check of the first
            railfit explain TEAM-0001 probe.yaml                    the nearest that is out
            railfit parts --failing slew-rate --stage probe.yaml    all that fail on slew rate
    "
  `); });
  it('in colour only the verdict words are coloured', () => {
    const lines = shown(100, { colour: true }).split('\n').filter((line) => line.includes('\u001b'));
    expect(lines).toMatchInlineSnapshot(`
      [
        " [33m?[39m  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown: fits if 80.5 µV/°C or less",
      ]
    `);
  });
  it('lists what to confirm for the first three only', () => {
    const [typical] = SAMPLE_PARTS.filter((part) => part.id === 'TEAM-0012');
    const parts = [1, 2, 3, 4, 5].flatMap((number) => (typical === undefined ? [] : [{ ...typical, id: `SAME-${number}` }]));
    const text = renderShortlist(sampleReport({}, parts), styleOf(200), CONTEXT);
    expect(text).toContain('confirm: SAME-1, SAME-2, SAME-3: these 3 before release');
    expect(text).toContain('confirm: 2 more parts have figures to confirm; "railfit explain PART" lists them');
  });
  it('cut to one line says how many more there are, and the counts stay complete', () => {
    const text = shown(100, { top: 1 });
    expect(text).toContain('3 of 6 parts fit, 1 cannot be decided, 2 do not fit.');
    expect(text).toContain(' … and 2 more that fit (--top 3 shows all)');
    expect(text).not.toContain(' 2  TEAM');
  });
});

describe('a shortlist where nothing fits', () => {
  it('says first which checks stand in the way and what is nearest', () => {
    expect(shown(100, {}, { 'limits.supplyCurrent': '0.5 µA' })).toMatchInlineSnapshot(`
      "
      No part of 6 fits. They fail supply current (6), slew rate (1), gain bandwidth (1), DC error (1) and
      1 more check. Nearest is TEAM-0005 (A): supply current over by 34.5 µA (69 times).
      0 of 6 parts fit, 0 cannot be decided, 6 do not fit.

      Stage   Soil-moisture probe
              non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output 200 mV..2.64 V
              (197 mV..2.69 V at the corners), up to 2 kHz
      Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground    Temperature  -20 °C..60 °C
      Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 500 nA, gain error ≤ 1 %,
              1 channel, status approved

      Nearest to fitting:
        TEAM-0005 (A) supply current over by 34.5 µA (69 times)
        TEAM-0007 (A) slew rate short by 11.6 mV/µs (75 %); gain bandwidth short by 102 kHz (92 %); supply
            current over by 500 nA (100 %)
        TEAM-0012 (A) supply current over by 61.5 µA (130 times)

      Why all 6 are out (one part can fail several checks):
        supply current 6    slew rate 1    gain bandwidth 1    DC error 1    status 1

      Assumed stability: the part's own compensation is assumed to hold
      Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

      Next    railfit explain TEAM-0005 probe.yaml                         the nearest that is out
              railfit parts --failing supply-current --stage probe.yaml    all that fail on supply current
      "
    `);
  });

  it('says first that no output stage reaches the rail, and what to give up', () => {
    expect(shown(100, {}, { 'signal.input': '0 mV..330 mV' })).toMatchInlineSnapshot(`
      "
      No amplifier on this supply reaches 0 V: an output stage always keeps a little of the rail.
      limits.swingLoss may give up that end of the swing. Of the parts that fail nothing else, TEAM-0005
      comes nearest: it needs 25.2 mV there.
      0 of 6 parts fit, 0 cannot be decided, 6 do not fit.

      Stage   Soil-moisture probe
              non-inverting, gain 8 V/V, noise gain 8 V/V, input 0 V..330 mV, output 0 V..2.64 V
              (0 V..2.69 V at the corners), up to 2 kHz
      Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground    Temperature  -20 °C..60 °C
      Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 90 µA, gain error ≤ 1 %,
              1 channel, status approved

      Nearest to fitting:
        TEAM-0005 (A) output low short by 25.2 mV
        TEAM-0012 (A) output low short by 29.8 mV
        TEAM-0031 (A) output low short by 33.1 mV

      Why all 6 are out (one part can fail several checks):
        output low 6    slew rate 1    gain bandwidth 1    DC error 1    supply current 1    status 1

      Assumed stability: the part's own compensation is assumed to hold
      Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

      Next    railfit shortlist probe.yaml --set limits.swingLoss=26mV
              railfit explain TEAM-0005 probe.yaml                     the nearest that is out
              railfit parts --failing output-low --stage probe.yaml    all that fail on output low
      "
    `);
  });

  it('what it offers to give up lets a part in', () => {
    const text = shown(100, {}, { 'signal.input': '0 mV..330 mV' });
    const loss = /limits\.swingLoss=(\d+)mV/u.exec(text)?.[1];
    expect(loss).toBeDefined();
    const report = shortlist(sampleStage({ 'signal.input': '0 mV..330 mV', 'limits.swingLoss': `${loss} mV` }), sampleSource());
    expect(report.fit.map((one) => one.part.id)).toContain('TEAM-0005');
  });

  it('says what the stage would have to say of a hazard it avoids', () => {
    expect(shown(100, {}, { avoid: 'overdrive' })).toMatchInlineSnapshot(`
      "
      No part is proven to fit; 4 of 6 parts cannot be decided. The others fail slew rate (1), gain
      bandwidth (1), DC error (1), supply current (1) and 1 more check. Nearest is TEAM-0001 (A): DC error
      over by 7.7 mV (20 %); supply current over by 8 µA (8.9 %); status conditional, wanted approved.
      0 of 6 parts fit, 4 cannot be decided, 2 do not fit.

      Stage   Soil-moisture probe
              non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output 200 mV..2.64 V
              (197 mV..2.69 V at the corners), up to 2 kHz
      Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground    Temperature  -20 °C..60 °C
      Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 90 µA, gain error ≤ 1 %,
              1 channel, status approved, no overdrive

       ?  TEAM-0005 (A) 350 kHz, zero-drift - overdrive: the stage does not say what it takes its inputs
            to
       ?  TEAM-0012 (A) 1 MHz, low offset - overdrive: the stage does not say what it takes its inputs to
       ?  TEAM-0031 (A) 1 MHz, 1 mV offset - offset drift unknown: passes if 80.5 µV/°C or less;
            overdrive: the stage does not say what it takes its inputs to
       ?  GX-LV-1M (G) 1 MHz, 2 mV offset - overdrive: the stage does not say what it takes its inputs to

       A on the approved list; G generic set: a class of parts, not something to order; ? cannot be
       decided

      Nearest to fitting:
        TEAM-0001 (A) DC error over by 7.7 mV (20 %); supply current over by 8 µA (8.9 %); status
            conditional, wanted approved
        TEAM-0007 (A) slew rate short by 11.6 mV/µs (75 %); gain bandwidth short by 102 kHz (92 %)

      Why the other 2 are out (one part can fail several checks):
        slew rate 1    gain bandwidth 1    DC error 1    supply current 1    status 1

      Assumed stability: the part's own compensation is assumed to hold
      Data    catalog of 6 parts (5 approved, 1 generic, sha256 9f2c1e40), rules 1

      Next    railfit explain TEAM-0005 probe.yaml                    what is missing
              railfit explain TEAM-0001 probe.yaml                    the nearest that is out
              railfit parts --failing slew-rate --stage probe.yaml    all that fail on slew rate
      "
    `);
  });

  it('counts a hundred and more that are out', () => {
    const [one] = sampleReport({ 'limits.supplyCurrent': '0.5 µA' }).rejected;
    const many = Array.from({ length: 104 }, (_, number) => (one === undefined ? [] : [{ ...one.part, id: `SAME-${number}` }])).flat();
    const text = renderShortlist(sampleReport({ 'limits.supplyCurrent': '0.5 µA' }, many), styleOf(100), CONTEXT);
    expect(text).toContain('Why all 104 are out (one part can fail several checks):');
  });

  it('says that the catalog is empty', () => {
    const text = renderShortlist(sampleReport({}, []), styleOf(100), CONTEXT);
    expect(text.split('\n').slice(0, 2)).toEqual(['No part fits: the catalog is empty.', '0 of 0 parts fit, 0 cannot be decided, 0 do not fit.']);
  });
});

describe('what comes from a list', () => {
  it('cannot move the cursor, reverse the line or break a command', () => {
    const parts = SAMPLE_PARTS.map((part, at) => (at === 0 ? { ...part, id: "T \u001b[2J'x", description: 'a\u202eb\u200bc\nd' } : part));
    const text = renderShortlist(sampleReport({}, parts), styleOf(120), CONTEXT);
    expect(text).toContain('T \\u{1b}[2J\'x');
    expect(text).toContain('a\\u{202e}b\\u{200b}c d');
    expect(text).toContain(String.raw`railfit explain 'T \u{1b}[2J'\''x' probe.yaml`);
  });

  it('without a stage file the commands name the part only', () => {
    const text = renderShortlist(sampleReport(), styleOf(100), { command: 'railfit', stageFile: null });
    expect(text.slice(text.indexOf('Next'))).toMatchInlineSnapshot(`
      "Next    railfit explain TEAM-0005    every check of the first
              railfit explain TEAM-0001    the nearest that is out
      "
    `);
  });
});
