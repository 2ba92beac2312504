import { describe, expect, it } from 'vitest';
import { readStage } from '../../src/spec/read.js';
import { readSwept, sweptOverride } from '../../src/spec/sweep.js';
import { specOf } from '../support/stage-file.js';

const STAGE = `topology: non-inverting
supply: 3.0..4.2 V
gain: 8
signal: {input: 25 mV..330 mV, frequency: 20 Hz..2 kHz}
load: {resistance: 10 kΩ, to: supply, capacitance: 100 pF}
temperature: -20..60 °C
limits: {gainError: 1 %, dcError: 20 mV}
`;
const TOLERANT = STAGE.replace('3.0..4.2 V', '5 V +5/-10 %');

function texts(over: string, value: number, stage = STAGE): unknown {
  const read = readSwept(over, specOf(stage));
  if (!read.ok) return read.problems.map(({ code, message }) => `${code} ${message}`);
  const { field } = read;
  const override = sweptOverride(field, value);
  const again = readStage(stage, { overrides: [override] });
  return [field.path, field.from, field.to, field.unit, override.text, again.ok ? 'reads' : again.problems.map(({ message }) => message)];
}

describe('what is swept', () => {
  it.each<[string, number, unknown[], string?]>([
    ['supply=2.7V..5.5V', 3.3, ['supply', 2.7, 5.5, 'V', '3.3 V', 'reads']],
    ['supply=2.7..5.5 V', 3.3, ['supply', 2.7, 5.5, 'V', '3.3 V ± 5 %', 'reads'], STAGE.replace('3.0..4.2 V', '5 V ± 5 %')],
    ['supply=2.7..5.5 V', 4, ['supply', 2.7, 5.5, 'V', '4 V +5/-10 %', 'reads'], TOLERANT],
    ['gain=1..20', 7.5, ['gain', 1, 20, 'V/V', '7.5', 'reads']],
    ['frequency=100Hz..10kHz', 1500, ['signal.frequency', 100, 1e4, 'Hz', '20 Hz..1500 Hz', 'reads']],
    ['load=1kΩ..100k', 4700, ['load.resistance', 1000, 1e5, 'Ω', '4700 Ω', 'reads']],
    ['temperature=0..85 °C', 70.5, ['temperature', 0, 85, '°C', '-20 °C..70.5 °C', 'reads']],
    ['limits.dcError=5..50 mV', 0.0125, ['limits.dcError', 0.005, 0.05, 'V', '0.0125 V', 'reads']],
    ['limits.gainError=0.1..2 %', 0.0015, ['limits.gainError', 0.001, 0.02, '1', '0.15 %', 'reads']],
    ['limits.outputNoise=10..500 µVrms', 1e-4, ['limits.outputNoise', 1e-5, 5e-4, 'Vrms', '0.0001 Vrms', 'reads']],
    ['limits.distortion=-80..-50 dB', -65.5, ['limits.distortion', -80, -50, 'dB', '-65.5 dB', 'reads']],
    ['limits.phaseMargin=30°..75°', 45.5, ['limits.phaseMargin', 30, 75, '°', '45.5 °', 'reads']],
    ['limits.supplyCurrent=100nA..90µA', 1.2345e-7, ['limits.supplyCurrent', 1e-7, 9e-5, 'A', '1.2345e-7 A', 'reads']],
    ['wishes.price=0.1..1 EUR', 0.35, ['wishes.price', 0.1, 1, 'EUR', '0.35 EUR', 'reads']],
    ['load.capacitance=1pF..1nF', 4.7e-11, ['load.capacitance', 1e-12, 1e-9, 'F', '4.7e-11 F', 'reads']],
  ])('%s at %d', (over, value, expected, stage = STAGE) => {
    const [path, from, to, ...rest] = texts(over, value, stage) as [string, number, number, ...unknown[]];
    expect([path, ...rest]).toEqual([expected[0], ...expected.slice(3)]);
    expect(from).toBeCloseTo(expected[1] as number, 12);
    expect(to).toBeCloseTo(expected[2] as number, 9);
  });

  it.each([
    ['supply', 'C114 supply: no field and range'],
    ['suply=2..5 V', 'S101 suply is not a field of the stage file, did you mean supply?'],
    ['supply=5 V', 'C114 supply=5 V: two values are needed, the lower first'],
    ['supply=5 V ± 5 %', 'C114 supply=5 V ± 5 %: two values are needed, the lower first'],
    ['supply=5.5..2.7 V', 'Q007'],
    ['supply=2.7..5.5', 'Q001'],
    ['wishes.package=SOT-23..SC-70', 'C114 wishes.package has no values between two others'],
    ['wishes.channels=1..4', 'C114 wishes.channels has no values between two others'],
    ['limits.snr=70', 'C114 limits.snr=70: two values in dB are needed'],
  ])('%s is refused', (over, said) => {
    expect((texts(over, 1) as string[])[0]).toContain(said);
  });
});
