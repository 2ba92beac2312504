import { describe, expect, it } from 'vitest';
import type { Form, Quantity } from '../../src/prediction/index.js';
import type { Stage } from '../../src/stage/index.js';
import type { Driven } from '../support/drawings.js';
import { wholePeriod, wholeResponse, wholeStart, wholeTransient, type LiveHeadroom, type Period, type Trace, type WholeAmplifier, type WholeStage } from '../support/live-prediction.js';
import { halfPower, peaking } from '../support/live-stage.js';
import { figuresOf, headroomPoints, numberOf, predicted, type Figures, type Point } from '../support/predicted.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { BENCHES, built, type Bench } from '../support/twelve.js';
import { harmonics } from '../support/waveforms.js';

// Source: ngspice 45 (eecircuit-engine), AC and transient analyses of our own drawings with an amplifier of elements: a limited
// transconductance into a capacitor, a buffered RC, an output resistance, and ends that give way with the current at the output.
// Relation: the closed loop as first-order equations, carried on by matrix exponentials between its limits (own algebra).

const SUPPLY = 5;
const LOAD = 'load: {resistance: 10 kΩ, to: ground, capacitance: 200 pF}';
const LOADED = { resistance: 10e3, capacitance: 200e-12 };
const MARGIN = 65;

/** What the drawing is driven with: the middle and half the swing of its source (V or A), and what stands still. */
interface Drive {
  readonly middle: number;
  readonly half: number;
  readonly still: Omit<Driven, 'input'>;
  /** The other leg moves against it. */
  readonly both?: true;
  readonly more?: readonly string[];
  /** Of the swing of the stage, what is left at its frequency. */
  readonly share?: number;
  /** Until it repeats itself; 4 unless said. */
  readonly periods?: number;
}

const DRIVES: Readonly<Record<string, Drive>> = {
  follower: { middle: 2.5, half: 2, still: {} },
  'non-inverting': { middle: 0.2625, half: 0.2375, still: {} },
  inverting: { middle: 2.5, half: 0.5, still: { reference: 2.5 } },
  // Leg b of the drawing rests at ground, not at 2.5 V: leg a makes up for it.
  summing: { middle: 3.75, half: 2.25, still: { reference: 2.5 } },
  difference: { middle: 2.5, half: 0.09, still: { reference: 2.5 }, both: true },
  transimpedance: { middle: 15e-6, half: 15e-6, still: { reference: 0.5 }, periods: 12 },
  'low-side-sense': { middle: 1.5, half: 1.5, still: {} },
  'high-side-sense': { middle: 1, half: 1, still: { reference: 0.5, other: 12 } },
  'sallen-key-low-pass': { middle: 2.5, half: 0.5, still: {} },
  'multiple-feedback-low-pass': { middle: 2.5, half: 0.4, still: { reference: 2.5 } },
  integrator: { middle: 2.5, half: 0.5, still: { reference: 2.5 }, more: ['rbleed n out 15k'], share: 1 / Math.hypot(1, 2 * Math.PI * 1e3 * 15e3 * 10e-9) },
};

const LOSSY: Bench = {
  name: '10 kΩ and 10 nF with 15 kΩ across it',
  topology: 'integrator',
  file: 'supply: 5 V\nreference: 2.5 V\nintegrator: {resistance: 10 kΩ, capacitance: 10 nF}\nresistors: {feedback: 15 kΩ, tolerance: 0 %}\ncapacitors: {tolerance: 0 %}\nsignal: {input: 2..3 V, shape: sine, frequency: 1 kHz}',
  parts: () => ({ input: 10e3, c: 10e-9 }),
};

const ONE_EACH: readonly Bench[] = [...new Map([...BENCHES].reverse().map((bench) => [bench.topology, bench])).values()].reverse().map((bench) => (bench.topology === 'integrator' ? LOSSY : bench));

/** Typical and guaranteed figures that suit the stage, and the amplifier they make on the bench. */
interface Trial {
  readonly figures: Figures;
  readonly low: readonly Point[];
  readonly high: readonly Point[];
}

const OPEN: readonly Point[] = [[1e-3, 1e-3, 1e-5], [2e-3, 2e-3, 5e-3]];

function loopOf(stage: Stage): Figures {
  const about = stage.response.kind === 'transimpedance' ? 200 : stage.response.kind === 'amplifier' ? 40 * stage.noiseGain.nominal : 150 * stage.noiseGain.nominal;
  const typical = about * stage.frequency!;
  return { gainBandwidth: [typical, 0.6 * typical], unityCrossover: typical, phaseMargin: MARGIN, openLoopGain: [2e5, 4e4], outputResistance: 150, inputCapacitance: 2e-12 };
}

function slewing(stage: Stage): Trial {
  const slope = 2 * Math.PI * stage.frequency! * peakOf(stage);
  return { figures: { ...loopOf(stage), slewRate: [0.75 * slope, 0.5 * slope], outputCurrent: 1, offsetVoltage: 0 }, low: OPEN, high: OPEN };
}

const peakOf = ({ topology, outputPeak }: Stage): number => outputPeak * (DRIVES[topology]!.share ?? 1);

/** Ends that cut a sixth and a quarter off the upper half of the swing, and give way with the current. */
function clipping(stage: Stage): Trial {
  const { min, max } = stage.outputNominal;
  const room = SUPPLY - (min + max) / 2 - peakOf(stage);
  const cut = (share: number): number => room + share * peakOf(stage);
  const high: readonly Point[] = [[cut(0.15), cut(0.24), 5e-5], [cut(0.15) + 0.01, cut(0.24) + 0.02, 1e-3]];
  const slope = 2 * Math.PI * stage.frequency! * peakOf(stage);
  return { figures: { ...loopOf(stage), slewRate: 30 * slope, outputCurrent: 1, offsetVoltage: 0 }, low: OPEN, high };
}

const headroom = (points: readonly Point[], form: 0 | 1): LiveHeadroom => {
  const [a, b] = points as readonly [Point, Point];
  return { volts: a[form], from: a[2], ohms: (b[form] - a[form]) / (b[2] - a[2]) };
};

function amplifierOf({ figures, low, high }: Trial, form: 0 | 1): WholeAmplifier {
  const value = (name: keyof Figures): number => {
    const found = figures[name]!;
    return typeof found === 'number' ? found : found[form];
  };
  return {
    gainBandwidth: value('gainBandwidth'),
    pole: value('unityCrossover') * Math.tan((MARGIN * Math.PI) / 180),
    slewRate: value('slewRate'),
    openLoopGain: value('openLoopGain'),
    outputResistance: value('outputResistance'),
    inputCapacitance: value('inputCapacitance'),
    high: headroom(high, form),
    low: headroom(low, form),
  };
}

function wholeStage(bench: Bench, stage: Stage, of: { readonly amplifier: WholeAmplifier; readonly source: (middle: number, half: number) => string }): WholeStage {
  const { middle, half, still, both, more } = DRIVES[bench.topology]!;
  const driven = { supply: SUPPLY, ...still, input: of.source(middle, half), ...(both === undefined ? {} : { other: of.source(middle, -half) }) };
  return { topology: bench.topology, parts: bench.parts(stage), driven, amplifier: of.amplifier, load: LOADED, ...(more === undefined ? {} : { more }) };
}

const FORMS = [['typical', 0], ['worst', 1]] as const;
const stageOf = (bench: Bench): Stage => built(bench, '', LOAD);
const formsOf = (stage: Stage, { figures, low, high }: Trial): readonly Form[] => {
  const { typical, worst } = predicted(stage, [...figuresOf(figures), ...headroomPoints('outputLowHeadroom', low, SUPPLY), ...headroomPoints('outputHighHeadroom', high, SUPPLY)]);
  return [typical, worst];
};

/** Both numbers shown, and no more than this apart. */
function near(what: string, { ours, theirs, within }: { readonly ours: number; readonly theirs: number; readonly within: number }): void {
  shown(what, [ours, theirs]);
  expect(Math.abs(ours / theirs - 1), what).toBeLessThan(within);
}

describe.each(ONE_EACH)('$topology predicted, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, (bench) => {
  const stage = stageOf(bench);
  const frequency = stage.frequency!;
  const number = (forms: readonly Form[], form: 0 | 1, quantity: Quantity): number => numberOf(forms[form]!, quantity);

  it('−3 dB and peaking within 1 %', async () => {
    const trial = slewing(stage);
    const forms = formsOf(stage, trial);
    const peaks: number[] = [];
    for (const [name, form] of FORMS) {
      const amplifier = amplifierOf(trial, form);
      const curve = await wholeResponse(wholeStage(bench, stage, { amplifier, source: SMALL }), [frequency * 1e-3, amplifier.gainBandwidth * 100]);
      near(`${bench.topology}, ${name}, −3 dB`, { ours: number(forms, form, 'bandwidth'), theirs: halfPower(curve), within: 0.01 });
      peaks.push(peaking(curve));
      // The part with the most gain bandwidth counts where it peaks more.
      near(`${bench.topology}, ${name}, peaking`, { ours: 10 ** (number(forms, form, 'peaking') / 20), theirs: form === 0 ? peaks[0]! : Math.max(...peaks, await fastestPeak(bench, stage, trial)), within: 0.01 });
    }
  });

  it('slew-limited peak and distortion within 2 %', async () => {
    const trial = slewing(stage);
    const forms = formsOf(stage, trial);
    for (const [name, form] of FORMS) {
      const { output: samples } = await sineOf(bench, stage, amplifierOf(trial, form));
      const ours = (number(forms, form, 'outputHigh') - number(forms, form, 'outputLow')) / 2;
      near(`${bench.topology}, ${name}, slewing peak`, { ours, theirs: (Math.max(...samples) - Math.min(...samples)) / 2, within: 0.02 });
      near(`${bench.topology}, ${name}, slewing distortion`, { ours: number(forms, form, 'distortion'), theirs: harmonics(samples).distortion, within: 0.02 });
    }
  });

  it('clipped fraction, level and distortion within 2 %', async () => {
    const trial = clipping(stage);
    const forms = formsOf(stage, trial);
    for (const [name, form] of FORMS) {
      const { output: samples, held } = await sineOf(bench, stage, amplifierOf(trial, form));
      const top = Math.max(...samples);
      near(`${bench.topology}, ${name}, highest output`, { ours: number(forms, form, 'outputHigh'), theirs: top, within: 0.02 });
      near(`${bench.topology}, ${name}, clipped fraction`, { ours: number(forms, form, 'clipped'), theirs: held, within: 0.02 });
      near(`${bench.topology}, ${name}, clipping distortion`, { ours: number(forms, form, 'distortion'), theirs: harmonics(samples).distortion, within: 0.02 });
    }
  });

  it('settling within 5 %, edges within 2 %', async () => {
    const trial = slewing(stage);
    const forms = formsOf(stage, trial);
    for (const [name, form] of FORMS) {
      const settling = number(forms, form, 'settling');
      const way = { amplifier: amplifierOf(trial, form), duration: 2.5 * settling };
      const [there, back] = [await stepOf(bench, stage, { ...way, sign: 1 }), await stepOf(bench, stage, { ...way, sign: -1 })];
      const [up, down] = there.isRising ? [there, back] : [back, there];
      near(`${bench.topology}, ${name}, settling`, { ours: settling, theirs: Math.max(up.found, down.found), within: 0.05 });
      near(`${bench.topology}, ${name}, rise`, { ours: number(forms, form, 'rise'), theirs: up.edge, within: 0.02 });
      near(`${bench.topology}, ${name}, fall`, { ours: number(forms, form, 'fall'), theirs: down.edge, within: 0.02 });
    }
  });
});

const SMALL = (middle: number, half: number): string => `dc ${middle} ac ${half}`;

const POINTS = 4096;

async function fastestPeak(bench: Bench, stage: Stage, trial: Trial): Promise<number> {
  const amplifier = { ...amplifierOf(trial, 1), gainBandwidth: amplifierOf(trial, 0).gainBandwidth };
  return peaking(await wholeResponse(wholeStage(bench, stage, { amplifier, source: SMALL }), [stage.frequency! * 1e-3, amplifier.gainBandwidth * 100]));
}

function sineOf(bench: Bench, stage: Stage, amplifier: WholeAmplifier): Promise<Period> {
  const frequency = stage.frequency!;
  return wholePeriod(wholeStage(bench, stage, { amplifier, source: (middle, half) => `sin(${middle} ${half} ${frequency})` }), { frequency, periods: DRIVES[bench.topology]!.periods ?? 4, points: POINTS });
}

interface Stepped {
  /** To 0.1 % of the step, and 10 % to 90 %, s. */
  readonly found: number;
  readonly edge: number;
  readonly isRising: boolean;
}

async function stepOf(bench: Bench, stage: Stage, { amplifier, duration, sign }: { readonly amplifier: WholeAmplifier; readonly duration: number; readonly sign: 1 | -1 }): Promise<Stepped> {
  const start = duration / 50;
  const source = (middle: number, half: number): string => `pwl(0 ${middle - sign * half} ${start} ${middle - sign * half} ${start * (1 + 1e-6)} ${middle + sign * half})`;
  const { times, output } = await wholeTransient(wholeStage(bench, stage, { amplifier, source }), start + duration, 8000);
  const [first, last] = [output[0]!, output.at(-1)!];
  const crossed = (level: number): number => times.findIndex((_, at) => (last > first ? output[at]! >= level : output[at]! <= level));
  const timeAt = (share: number): number => {
    const level = first + share * (last - first);
    const at = crossed(level);
    return times[at - 1]! + ((level - output[at - 1]!) / (output[at]! - output[at - 1]!)) * (times[at]! - times[at - 1]!);
  };
  const outside = output.reduce((found, value, at) => (Math.abs(value - last) > 1e-3 * Math.abs(last - first) ? at : found), 0);
  return { found: times[outside]! - start, edge: timeAt(0.9) - timeAt(0.1), isRising: last > first };
}

describe('oscillator predicted, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  const OSCILLATOR: Bench = {
    name: '2 kHz',
    topology: 'relaxation-oscillator',
    file: 'supply: 5 V\noscillator: {frequency: 2 kHz, resistance: 330 kΩ, capacitance: 1.1 nF, toSupply: 100 kΩ, toGround: 100 kΩ, toOutput: 100 kΩ}\nresistors: {tolerance: 1 %}\ncapacitors: {tolerance: 1 %}',
    parts: () => ({ resistance: 330e3, capacitance: 1.1e-9, toSupply: 100e3, toGround: 100e3, toOutput: 100e3 }),
  };
  const loop: Figures = { gainBandwidth: [2e6, 1e6], unityCrossover: 2e6, phaseMargin: MARGIN, openLoopGain: [2e5, 4e4], outputResistance: 150, inputCapacitance: 2e-12, offsetVoltage: 0, outputCurrent: 1 };
  const NEAR: readonly Point[] = [[20e-3, 40e-3, 1e-4], [60e-3, 120e-3, 1e-3]];
  const FAR: readonly Point[] = [[0.8, 1.2, 1e-4], [0.9, 1.4, 1e-3]];
  const trials: readonly (readonly [string, Trial])[] = [
    ['near both rails, fast', { figures: { ...loop, slewRate: [2e6, 1e6] }, low: NEAR, high: NEAR }],
    ['a conventional output, slow', { figures: { ...loop, slewRate: [100e3, 60e3] }, low: NEAR, high: FAR }],
  ];

  it.each(trials)('%s: period within 1 %, duty and edges within 2 %', async (what, trial) => {
    const stage = stageOf(OSCILLATOR);
    const forms = formsOf(stage, trial);
    for (const [name, form] of FORMS) {
      const number = (quantity: Quantity): number => numberOf(forms[form]!, quantity);
      const whole: WholeStage = { topology: 'relaxation-oscillator', parts: OSCILLATOR.parts(stage), driven: { supply: SUPPLY, input: 0 }, amplifier: amplifierOf(trial, form), load: LOADED };
      const found = oscillationOf(await wholeStart(whole, 5 / 2e3, 20_000));
      near(`oscillator ${what}, ${name}, period`, { ours: 1 / number('frequency'), theirs: found.period, within: 0.01 });
      near(`oscillator ${what}, ${name}, duty`, { ours: number('duty'), theirs: found.duty, within: 0.02 });
      near(`oscillator ${what}, ${name}, rise`, { ours: number('rise'), theirs: found.rise, within: 0.02 });
      // The levels give way with a current that falls through each half period: ours are those of its beginning.
      for (const [ours, theirs] of [[number('outputHigh'), found.high], [number('outputLow'), found.low]] as const) expect(Math.abs(ours - theirs)).toBeLessThan(0.005 * SUPPLY);
    }
  });
});

interface Oscillated {
  readonly period: number;
  readonly duty: number;
  readonly rise: number;
  readonly high: number;
  readonly low: number;
}

/** The last whole period, from one rise through the middle of both levels to the next. */
function oscillationOf({ times, output }: Trace): Oscillated {
  const settled = output.slice(Math.floor(output.length / 2));
  const [high, low] = [Math.max(...settled), Math.min(...settled)];
  const crossings = (share: number, sign: 1 | -1): number[] => {
    const level = low + share * (high - low);
    return times.flatMap((time, k) => {
      const [a, b] = [output[k - 1], output[k]!];
      if (a === undefined || sign * (a - level) >= 0 || sign * (b - level) < 0) return [];
      return [times[k - 1]! + ((level - a) / (b - a)) * (time - times[k - 1]!)];
    });
  };
  const [from, to] = crossings(0.5, 1).slice(-2) as [number, number];
  const down = crossings(0.5, -1).find((time) => time > from)!;
  const top = crossings(0.9, 1).at(-1)!;
  const bottom = crossings(0.1, 1).filter((time) => time < top).at(-1)!;
  return { period: to - from, duty: (down - from) / (to - from), rise: top - bottom, high, low };
}

describe('integrator from its reset predicted, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  const RESET: Bench = {
    name: '10 kΩ and 10 nF',
    topology: 'integrator',
    file: 'supply: 5 V\nreference: 500 mV\nintegrator: {resistance: 10 kΩ, capacitance: 10 nF, window: 100 µs}\nresistors: {tolerance: 0 %}\ncapacitors: {tolerance: 0 %}\nsignal: {input: -3..0.5 V}',
    parts: () => ({ input: 10e3, c: 10e-9 }),
  };
  const loop: Figures = { gainBandwidth: [500e3, 250e3], unityCrossover: 500e3, phaseMargin: MARGIN, openLoopGain: [2e5, 4e4], outputResistance: 150, inputCapacitance: 2e-12, offsetVoltage: 0, outputCurrent: 1 };

  it('end of the ramp within 1 %, clipped fraction within 2 %', async () => {
    const stage = stageOf(RESET);
    const trial: Trial = { figures: { ...loop, slewRate: [200e3, 60e3] }, low: OPEN, high: [[1.5, 2.2, 5e-5], [1.51, 2.22, 1e-3]] };
    const forms = formsOf(stage, trial);
    for (const [name, form] of FORMS) {
      const whole: WholeStage = { topology: 'integrator', parts: RESET.parts(stage), driven: { supply: SUPPLY, reference: 0.5, input: -3 }, amplifier: amplifierOf(trial, form), load: LOADED, initial: 0.5 };
      const { output, held } = await wholeStart(whole, 100e-6, 4000);
      const top = Math.max(...output);
      near(`integrator from its reset, ${name}, highest`, { ours: numberOf(forms[form]!, 'outputHigh'), theirs: top, within: 0.01 });
      near(`integrator from its reset, ${name}, clipped fraction`, { ours: numberOf(forms[form]!, 'clipped'), theirs: held, within: 0.02 });
    }
  });
});
