import { describe, expect, it } from 'vitest';
import { BASE, codesOf, DEMO, printedAll } from '../support/stage-file.js';

const withLines = (lines: string): string => `${BASE}${lines}\n`;

describe('all problems at once', () => {
  it('are told in file order, with line, column, the value and a caret', () => {
    const text = `topology: non-invertng
supply: 4.2..3.0 V
gian: 8
resistors: {feedback: 10M, input: 10 kΩ, tolerence: 1 %}
signal:
  input: 25 mV..330 mA
  frequency: 0 Hz
load: 10 kΩ to gnd, 100 pX
limits:
  gainErrorKind: magnitud
  dcError: "5"
  settling: {within: 20 µs}
wishes: {status: [approved, aproved]}
mayChange: [limits.dcErorr]
`;
    expect(printedAll(text)).toMatchInlineSnapshot(`
      "
      error[S104]: topology: non-invertng is not one of the words taken here, did you mean non-inverting? accepted: follower, non-inverting, inverting, summing, difference, transimpedance, low-side-sense, high-side-sense, sallen-key-low-pass, multiple-feedback-low-pass, integrator, relaxation-oscillator
        --> stage.yaml:1:11
         non-invertng
         ^^^^^^^^^^^^
         fix: non-inverting
      error[Q007]: supply: the range runs downwards
        --> stage.yaml:2:9
         4.2..3.0 V
         ^^^^^^^^^^
         fix: 3.0..4.2 V
      error[S101]: gian: gian is not a key of a stage, did you mean gain? accepted: name, topology, supply, supplyPeak, gain, resistors, reference, legs, photodiode, shunt, filter, integrator, oscillator, drives, capacitors, signal, source, load, temperature, following, converter, battery, overdrive, sequencing, supplyRipple, dutyCycle, limits, wishes, margins, mayChange, avoid, part
        --> stage.yaml:3:1
         fix: gain
      error[Q002]: resistors.feedback: 10M has no unit: SI and IEC 60062 read mega (10 MΩ), SPICE reads milli (10 mΩ)
        --> stage.yaml:4:23
         10M
           ^
         fix: 10 MΩ, 10meg or 10 mΩ
      error[S101]: resistors.tolerence: tolerence is not a key of resistors, did you mean tolerance? accepted: feedback, input, positiveInput, toReference, tolerance
        --> stage.yaml:4:42
         fix: tolerance
      error[Q004]: signal.input: a current where a voltage is expected; accepted: a voltage or a range: 25 mV..330 mV
        --> stage.yaml:6:10
         25 mV..330 mA
                    ^^
         fix: 25 mV..330 mV
      error[S110]: signal.frequency: 0 Hz: the top of the band is above 0 Hz (leave the field out for a steady signal)
        --> stage.yaml:7:14
         0 Hz
         ^^^^
         fix: 2 kHz
      error[S104]: load.to: gnd is not one of the words taken here, did you mean ground? accepted: ground, supply or reference
        --> stage.yaml:8:7
         10 kΩ to gnd, 100 pX
                  ^^^
         fix: ground
      error[Q011]: load.capacitance: unknown unit pX where a capacitance is expected
        --> stage.yaml:8:7
         10 kΩ to gnd, 100 pX
                           ^^
         fix: 100 pF
      error[S104]: limits.gainErrorKind: magnitud is not one of the words taken here, did you mean magnitude? accepted: magnitude or vector; corner for filters
        --> stage.yaml:10:18
         magnitud
         ^^^^^^^^
         fix: magnitude
      error[Q001]: limits.dcError: 5 has no unit; a voltage is expected
        --> stage.yaml:11:12
         5
         ^
         fix: 5 mV
      error[S102]: limits.settling.to: limits.settling.to is missing; accepted: a percentage: 0.1 %
        --> stage.yaml:12:3
         fix: limits: {settling: {to: 0.1 %}}
      error[S104]: wishes.status: aproved is not one of the words taken here, did you mean approved? accepted: approved, conditional, restricted, not-approved
        --> stage.yaml:13:29
         aproved
         ^^^^^^^
         fix: approved
      error[S101]: mayChange: limits.dcErorr is not a field of the stage file, did you mean limits.dcError? accepted under limits: swingLoss, gainError, gainErrorKind, dcError, outputNoise, snr, distortion, supplyCurrent, supplyCurrentPer, settling, phaseMargin, junctionTemperature, frequencyError, supplyRipple, startUp
        --> stage.yaml:14:13
         limits.dcErorr
         ^^^^^^^^^^^^^^
         fix: limits.dcError
      "
    `);
  });

  it('are told for a file where everything required is missing', () => {
    expect(printedAll('name: nothing else\n')).toMatchInlineSnapshot(`
      "
      error[S102]: topology: topology is missing; accepted: follower, non-inverting, inverting, summing, difference, transimpedance, low-side-sense, high-side-sense, sallen-key-low-pass, multiple-feedback-low-pass, integrator, relaxation-oscillator
        --> stage.yaml
         fix: topology: non-inverting
      error[S102]: supply: supply is missing; accepted: one voltage, a tolerance or a range: 5 V, 5 V ± 5 %, 3.0..4.2 V
        --> stage.yaml
         fix: supply: 5 V ± 5 %
      error[S102]: signal.input: signal.input is missing; accepted: a voltage or a range: 25 mV..330 mV
        --> stage.yaml
         fix: signal: {input: 25 mV..330 mV}
      "
    `);
  });
});

describe('fields and words', () => {
  it('names what was probably meant', () => {
    expect(printedAll(withLines('supply_peak: 6 V\ndcError: 5 mV\nfrequency: 2 kHz\nlimits.dcError: 5 mV\nquux: 1'))).toMatchInlineSnapshot(`
      "
      error[S101]: supply_peak: supply_peak is not a key of a stage, did you mean supplyPeak? accepted: name, topology, supply, supplyPeak, gain, resistors, reference, legs, photodiode, shunt, filter, integrator, oscillator, drives, capacitors, signal, source, load, temperature, following, converter, battery, overdrive, sequencing, supplyRipple, dutyCycle, limits, wishes, margins, mayChange, avoid, part
        --> stage.yaml:5:1
         fix: supplyPeak
      error[S101]: dcError: dcError is not a key of a stage, did you mean limits.dcError? accepted: name, topology, supply, supplyPeak, gain, resistors, reference, legs, photodiode, shunt, filter, integrator, oscillator, drives, capacitors, signal, source, load, temperature, following, converter, battery, overdrive, sequencing, supplyRipple, dutyCycle, limits, wishes, margins, mayChange, avoid, part
        --> stage.yaml:6:1
         fix: limits.dcError
      error[S101]: frequency: frequency is not a key of a stage, did you mean signal.frequency? accepted: name, topology, supply, supplyPeak, gain, resistors, reference, legs, photodiode, shunt, filter, integrator, oscillator, drives, capacitors, signal, source, load, temperature, following, converter, battery, overdrive, sequencing, supplyRipple, dutyCycle, limits, wishes, margins, mayChange, avoid, part
        --> stage.yaml:7:1
         fix: signal.frequency
      error[S101]: limits.dcError: limits.dcError is written as one map in the other
        --> stage.yaml:8:1
         fix: limits: {dcError: 20 mV}
      error[S101]: quux: quux is not a key of a stage; accepted: name, topology, supply, supplyPeak, gain, resistors, reference, legs, photodiode, shunt, filter, integrator, oscillator, drives, capacitors, signal, source, load, temperature, following, converter, battery, overdrive, sequencing, supplyRipple, dutyCycle, limits, wishes, margins, mayChange, avoid, part
        --> stage.yaml:9:1
         fix: leave it out
      "
    `);
  });

  it('says which topology a field belongs to', () => {
    expect(printedAll(withLines('photodiode: {current: 0..2 µA}').replace('input: 25 mV..330 mV', 'positive: 1 V'))).toMatchInlineSnapshot(`
      "
      error[S108]: signal.positive: signal.positive belongs to a difference stage, not to topology non-inverting
        --> stage.yaml:4:20
         1 V
         ^^^
         fix: input: 25 mV..330 mV
      error[S108]: photodiode: photodiode belongs to a transimpedance stage, not to topology non-inverting
        --> stage.yaml:5:1
         fix: leave it out
      "
    `);
  });

  it('gives the reason for a gain that the topology cannot have', () => {
    expect(printedAll(BASE.replace('gain: 8', 'gain: 0.5'))).toMatchInlineSnapshot(`
      "
      error[S110]: gain: a non-inverting stage has a gain of 1 + Rf/Rg, never below 1; an inverting or a difference stage can attenuate
        --> stage.yaml:3:7
         0.5
         ^^^
         fix: topology: inverting
      "
    `);
    expect(printedAll(BASE.replace('gain: 8', 'gain: 1'))).toMatchInlineSnapshot(`
      "
      error[S110]: gain: a non-inverting stage with a gain of exactly 1 is a follower
        --> stage.yaml:3:7
         1
         ^
         fix: topology: follower
      "
    `);
    expect(printedAll(BASE.replace('non-inverting', 'follower'))).toMatchInlineSnapshot(`
      "
      error[S110]: gain: a follower has a gain of exactly 1; a non-inverting stage gains more
        --> stage.yaml:3:7
         8
         ^
         fix: 1, or topology: non-inverting
      "
    `);
  });

  it('gives the reason for an amplitude without center, an input behind a capacitor, and an open supply', () => {
    const text = `topology: inverting\nsupply: min 4.5 V\ngain: 2\nsignal: {amplitude: 100 mVpk}\n`;
    expect(printedAll(text)).toMatchInlineSnapshot(`
      "
      error[S112]: supply: min 4.5 V leaves the upper end open; accepted: one voltage, a tolerance or a range: 5 V, 5 V ± 5 %, 3.0..4.2 V
        --> stage.yaml:2:9
         min 4.5 V
         ^^^^^^^^^
         fix: 5 V ± 5 %
      error[S108]: signal.amplitude: a DC-coupled amplitude needs signal.center, the voltage it swings about; accepted: center, input instead, or coupling: ac
        --> stage.yaml:4:21
         100 mVpk
         ^^^^^^^^
         fix: amplitude: 100 mVpk, center: 1.5 V
      "
    `);
    expect(printedAll(BASE.replace('{input', '{coupling: ac, input'))).toMatchInlineSnapshot(`
      "
      error[S108]: signal.input: AC-coupled: amplitude only, centred on the reference; extremes against ground do not pass a capacitor
        --> stage.yaml:4:31
         25 mV..330 mV
         ^^^^^^^^^^^^^
         fix: amplitude: 100 mVpk
      "
    `);
  });
});

describe('the text of the file', () => {
  it('explains what YAML stumbles on', () => {
    expect(printedAll(withLines('limits:\n\tdcError: 5 mV'))).toMatchInlineSnapshot(`
      "
      error[S100]: a tab stands where YAML wants spaces
        --> stage.yaml:6:1
         fix: two spaces for each level
      "
    `);
    expect(printedAll(withLines('limits:\n  dcError: >5 mV'))).toMatchInlineSnapshot(`
      "
      error[S100]: a value that starts with > is the start of a block of text to YAML
        --> stage.yaml:6:12
         fix: ">5 mV"
      "
    `);
    expect(printedAll(withLines('name: pump: current'))).toMatchInlineSnapshot(`
      "
      error[S100]: a second "key: value" on one line
        --> stage.yaml:5:7
         fix: a line of its own for each key, or a map: {key: value, key: value}
      "
    `);
    expect(printedAll(`${DEMO}---\n${DEMO}`)).toMatchInlineSnapshot(`
      "
      error[S100]: a second document starts here; a stage file holds one stage
        --> stage.yaml:29:1
         fix: one file for each stage
      "
    `);
  });

  it('refuses keys written twice and still reads the rest', () => {
    expect(printedAll(withLines('gain: 9\nload: 5'))).toMatchInlineSnapshot(`
      "
      error[S109]: gain: gain is written twice, first in line 3
        --> stage.yaml:5:1
         fix: keep one of the two
      error[Q001]: load.resistance: 5 has no unit; a resistance is expected
        --> stage.yaml:6:7
         5
         ^
         fix: 5 Ω or 5R
      "
    `);
  });

  it('refuses anchors, aliases and tags', () => {
    expect(printedAll(withLines('temperature: &t 25 °C\nname: *t\nsupplyPeak: !!str 6 V'))).toMatchInlineSnapshot(`
      "
      error[S111]: the anchor &t has no use in a stage file
        --> stage.yaml:5:17
         fix: leave out &t
      error[S111]: *t stands for a value written elsewhere; a stage file says every value where it is used
        --> stage.yaml:6:7
         fix: write the value itself
      error[S111]: the tag !!str has no use in a stage file: values are read as typed
        --> stage.yaml:7:19
         fix: leave it out
      "
    `);
  });

  it.each([
    ['? [a]\n: b', 'S103'],
    ['<<: {gain: 8}', 'S101'],
    ['__proto__: 1', 'S101'],
    ['constructor: 1', 'S101'],
    ['"": 1', 'S101'],
    ['name: "a\\qb"', 'S100'],
    ['wishes: {channels: 1', 'S100'],
    ['name: @b', 'S100'],
    ['name: *nowhere', 'S111'],
    ['wishes: {channels:1}', 'S101'],
  ])('%j: %s', (lines, code) => {
    expect(codesOf(withLines(lines))).toEqual([code]);
  });

  it('shows the caret in the value as typed, also when that is a piece of a longer one', () => {
    expect(printedAll(withLines('load: 10 kΩ to ground, 100 PF'))).toMatchInlineSnapshot(`
      "
      error[Q003]: load.capacitance: P in PF is peta (1e15) in SI
        --> stage.yaml:5:7
         10 kΩ to ground, 100 PF
                              ^^
         fix: 100 pF
      "
    `);
  });
});
