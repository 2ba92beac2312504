import { describe, expect, it } from 'vitest';
import { buildStage } from '../../src/stage/index.js';
import { BASE, codesOf, option, printed, problemsOf, specOf } from '../support/stage-file.js';

const codes = (line: string): string[] => {
  const read = codesOf(`${BASE}${line}\n`);
  if (read.length > 0) return read;
  const built = buildStage(specOf(`${BASE}${line}\n`));
  return built.ok ? [] : built.problems.map(({ code }) => code);
};

describe('hazards of the stage file', () => {
  it('are read in SI units', () => {
    const spec = specOf(`${BASE}overdrive: 500 mV\nsequencing: signal-first\nsupplyRipple: {amplitude: 50 mVpp, frequency: 100 kHz}\ndutyCycle: {on: 2 ms, every: 1 s}\nlimits: {supplyRipple: 2 mVpp, startUp: 200 µs}\n`);
    expect([spec.overdrive?.value, spec.sequencing, spec.supplyRipple?.amplitude.value, spec.supplyRipple?.frequency.value]).toEqual([0.5, 'signal-first', 0.025, 1e5]);
    expect([spec.dutyCycle?.on.value, spec.dutyCycle?.every.value, spec.limits.supplyRipple?.value, spec.limits.startUp?.value]).toEqual([2e-3, 1, 1e-3, 2e-4]);
  });

  it('may be given as options', () => {
    const spec = specOf(BASE, [option('overdrive', '0.3 V'), option('supplyRipple', '{amplitude: 10 mVpk, frequency: 1 MHz}')]);
    expect([spec.overdrive?.value, spec.supplyRipple?.frequency.value]).toEqual([0.3, 1e6]);
  });

  it.each([
    ['overdrive: -0.5 V', 'S110'], ['overdrive: 5 mA', 'Q004'], ['sequencing: signal-frist', 'S104'], ['overdriv: 0.5 V', 'S101'], ['supplyRipple: {amplitud: 50 mVpp, frequency: 1 kHz}', 'S101'],
    ['supplyRipple: {amplitude: 50 mVpp}', 'S102'], ['supplyRipple: {amplitude: 50 mV, frequency: 1 kHz}', 'Q014'], ['dutyCycle: {on: 2 ms}', 'S102'], ['dutyCycle: {on: 0 s, every: 1 s}', 'S110'],
    ['limits: {supplyRipple: 1 mVpk}', 'S102'], ['limits: {startUp: 0 s}', 'S110'],
  ])('%s is refused with %s', (line, code) => expect(codes(line)).toContain(code));

  it.each([
    ['dutyCycle: {on: 999 ms, every: 1 s}', []], ['dutyCycle: {on: 1 s, every: 1 s}', ['S220']], ['dutyCycle: {on: 2 s, every: 1 s}', ['S220']],
    ['dutyCycle: {on: 2 ms, every: 1 s}\nlimits: {startUp: 2 ms}', []], ['dutyCycle: {on: 2 ms, every: 1 s}\nlimits: {startUp: 2.01 ms}', ['S220']],
    ['supplyRipple: {amplitude: 9.9 Vpp, frequency: 1 kHz}', []], ['supplyRipple: {amplitude: 10 Vpp, frequency: 1 kHz}', ['S221']],
  ])('%j contradicts itself: %j', (lines, wanted) => expect(codes(lines)).toEqual(wanted));

  it('do not belong to a stage without an input', () => {
    const oscillator = 'topology: relaxation-oscillator\nsupply: 5 V\noscillator: {frequency: 1 kHz}\n';
    expect(codesOf(`${oscillator}overdrive: 0.5 V\nsupplyRipple: {amplitude: 50 mVpp, frequency: 1 kHz}\n`)).toEqual(['S108', 'S108']);
    expect(codesOf(`${oscillator}dutyCycle: {on: 1 ms, every: 1 s}\navoid: [clamp]\n`)).toEqual([]);
  });

  it('that are misspelt get what was meant', () => {
    expect(problemsOf(`${BASE}sequencing: signal-frist\n`).map(printed)).toMatchInlineSnapshot(`
      [
        "error[S104]: sequencing: signal-frist is not one of the words taken here, did you mean signal-first? accepted: supply-first or signal-first
        --> stage.yaml:5:13
         signal-frist
         ^^^^^^^^^^^^
         fix: signal-first",
      ]
    `);
  });
});
