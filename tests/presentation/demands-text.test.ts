import { describe, expect, it } from 'vitest';
import { renderDemands } from '../../src/presentation/demands-text.js';
import { sampleDemands, styleOf } from '../support/sample-report.js';

describe('what a stage asks', () => {
  it('at 100 columns', () => { expect(`\n${renderDemands(sampleDemands(), styleOf(100))}`).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise gain 8 V/V, input 25 mV..330 mV, output 200 mV..2.64 V
            (197 mV..2.69 V at the corners), up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V    Load  10 kΩ to ground    Temperature  -20 °C..60 °C
    Limits  DC error at the output ≤ 40 mV, supply current per amplifier ≤ 90 µA, gain error ≤ 1 %,
            1 channel, status approved

    Corners output 197 mV..2.69 V    common mode 25 mV..330 mV    noise gain 7.86 V/V..8.14 V/V
            resistors 70 kΩ, 10 kΩ ±1 %

     Check                asks of any amplifier  because
     lowest supply        at most 3 V            lowest supply 3 V; method [1]
     highest supply       at least 4.2 V         highest supply 4.2 V; method [1]
     supply peak          at least 4.5 V         supply peak 4.5 V; method [1]
     input range low      at most 25 mV          lowest common mode 25 mV; method [2]
     input range high     at most 2.67 V         common mode 330 mV on a supply of 3 V; method [2]
     output low           at most 197 mV         lowest output 197 mV; method [3]
     output high          at most 313 mV         highest output 2.69 V, least room on a supply of 3 V;
                                                 method [3]
     output current       at least 297 µA        297 µA out of the output at the peak, feedback network
                                                 included, resistors nominal; method [4]
     slew rate            at least 15.6 mV/µs    1.242 V peak at 2 kHz; method [5]
     gain bandwidth       at least 112 kHz       noise gain 8 V/V, magnitude error 1 % at 2 kHz;
                                                 method [6]
     minimum stable gain  at most 7.86 V/V       noise gain 7.86 V/V at its lower corner; method [7]
     DC error             at most 40 mV          DC error 40 mV allowed at the output, noise gain
                                                 8.14 V/V at its upper corner; method [8]
     supply current       at most 90 µA          supply current 90 µA allowed per amplifier; method [9]
     lowest temperature   at most -20 °C         lowest temperature -20 °C; method [10]
     highest temperature  at least 60 °C         highest temperature 60 °C; method [10]
     channels             at least 1             1 amplifier in one package; method [11]
     status               approved               one of approved; method [11]

    Methods
     [1] M0: the supply at its ends
     [2] M1: common mode at the pins over all corners (Franco, Design with Operational Amplifiers and
         Analog Integrated Circuits, 3rd ed. 2002, ch. 1-2, from memory)
     [3] M1 and M6: room at every corner, at the current that flows there
     [4] M6: load and feedback network; resistive and capacitive peaks add as phasors
     [5] M2: 2π·f·Vp, exact worst case for any signal band-limited to f (Bernstein; Boas, Entire
         Functions, 1954, ch. 11, from memory)
     [6] M3: one-pole amplifier, noise gain (Franco, Design with Operational Amplifiers and Analog
         Integrated Circuits, 3rd ed. 2002, ch. 6, from memory)
     [7] M9: minimum stable gain against the noise gain at high frequency (Graeme, Photodiode
         Amplifiers: Op Amp Solutions, 1996, from memory)
     [8] M5: sum of magnitudes at the worst corner (Franco, Design with Operational Amplifiers and
         Analog Integrated Circuits, 3rd ed. 2002, ch. 5, from memory)
     [9] M8: quiescent current
     [10] the ambient range of the stage against the specified range of the part
     [11] a wish of the team

    Assumed stability: the part's own compensation is assumed to hold
    "
  `); });
  it('at 60 columns in ASCII', () => { expect(`\n${renderDemands(sampleDemands(), styleOf(60, { ascii: true }))}`).toMatchInlineSnapshot(`
    "
    Stage   Soil-moisture probe
            non-inverting, gain 8 V/V, noise gain 8 V/V, input
            25 mV..330 mV, output 200 mV..2.64 V (197 mV..2.69 V
            at the corners), up to 2 kHz
    Supply  3 V..4.2 V single, peak 4.5 V
            Load  10 kohm to ground    Temperature  -20 C..60 C
    Limits  DC error at the output <= 40 mV, supply current per
            amplifier <= 90 uA, gain error <= 1 %, 1 channel,
            status approved

    Corners output 197 mV..2.69 V    common mode 25 mV..330 mV
            noise gain 7.86 V/V..8.14 V/V
            resistors 70 kohm, 10 kohm +/-1 %

     lowest supply at most 3 V
        lowest supply 3 V; method [1]
     highest supply at least 4.2 V
        highest supply 4.2 V; method [1]
     supply peak at least 4.5 V
        supply peak 4.5 V; method [1]
     input range low at most 25 mV
        lowest common mode 25 mV; method [2]
     input range high at most 2.67 V
        common mode 330 mV on a supply of 3 V; method [2]
     output low at most 197 mV
        lowest output 197 mV; method [3]
     output high at most 313 mV
        highest output 2.69 V, least room on a supply of 3 V;
        method [3]
     output current at least 297 uA
        297 uA out of the output at the peak, feedback network
        included, resistors nominal; method [4]
     slew rate at least 15.6 mV/us
        1.242 V peak at 2 kHz; method [5]
     gain bandwidth at least 112 kHz
        noise gain 8 V/V, magnitude error 1 % at 2 kHz;
        method [6]
     minimum stable gain at most 7.86 V/V
        noise gain 7.86 V/V at its lower corner; method [7]
     DC error at most 40 mV
        DC error 40 mV allowed at the output, noise gain
        8.14 V/V at its upper corner; method [8]
     supply current at most 90 uA
        supply current 90 uA allowed per amplifier; method [9]
     lowest temperature at most -20 C
        lowest temperature -20 C; method [10]
     highest temperature at least 60 C
        highest temperature 60 C; method [10]
     channels at least 1
        1 amplifier in one package; method [11]
     status approved
        one of approved; method [11]

    Methods
     [1] M0: the supply at its ends
     [2] M1: common mode at the pins over all corners (Franco,
         Design with Operational Amplifiers and Analog
         Integrated Circuits, 3rd ed. 2002, ch. 1-2, from
         memory)
     [3] M1 and M6: room at every corner, at the current that
         flows there
     [4] M6: load and feedback network; resistive and capacitive
         peaks add as phasors
     [5] M2: 2pi*f*Vp, exact worst case for any signal
         band-limited to f (Bernstein; Boas, Entire Functions,
         1954, ch. 11, from memory)
     [6] M3: one-pole amplifier, noise gain (Franco, Design with
         Operational Amplifiers and Analog Integrated Circuits,
         3rd ed. 2002, ch. 6, from memory)
     [7] M9: minimum stable gain against the noise gain at high
         frequency (Graeme, Photodiode Amplifiers: Op Amp
         Solutions, 1996, from memory)
     [8] M5: sum of magnitudes at the worst corner (Franco,
         Design with Operational Amplifiers and Analog
         Integrated Circuits, 3rd ed. 2002, ch. 5, from memory)
     [9] M8: quiescent current
     [10] the ambient range of the stage against the specified
          range of the part
     [11] a wish of the team

    Assumed stability: the part's own compensation is assumed to
            hold
    "
  `); });
  it('says where no amplifier can help, and what the stage avoids', () => {
    const text = renderDemands(sampleDemands({ 'signal.input': '0 mV..330 mV', avoid: '[crossover, overdrive]' }), styleOf(100));
    expect(text.split('\n').filter((line) => /note:|not judged by this version \(|crossover  |overdrive  /u.test(line))).toMatchInlineSnapshot(`
      [
        " input crossover      not reached                the stage takes the inputs 2.67 V..4.2 V below V+,",
        " overdrive            the stage does not say it  the stage does not say whether an input can leave",
        "note: No amplifier meets output low: at the rail no output stage is left any room. limits.swingLoss",
      ]
    `);
  });
});
