import { describe, expect, it } from 'vitest';
import { BACK, interview, type Asker } from '../../../src/cli/guided/interview.js';
import { fieldsOf } from '../../../src/cli/guided/judge-answer.js';
import type { Answers } from '../../../src/cli/guided/question.js';
import { QUESTIONS } from '../../../src/cli/guided/questions.js';
import type { Known, Problem } from '../../../src/index.js';
import { renderKnown } from '../../../src/presentation/known-text.js';
import { draftFile } from '../../../src/spec/draft-file.js';
import { readStage } from '../../../src/spec/read.js';
import { fieldAt } from '../../../src/spec/schema.js';
import type { Topology } from '../../../src/spec/spec.js';
import { buildStage, type Stage } from '../../../src/stage/index.js';
import { specOf } from '../../support/stage-file.js';

const STYLE = { width: 100, ascii: false, colour: false, top: 20, all: false, sources: false, gluedUnits: false };

/** What one interview came to. */
interface Held {
  readonly answers: Answers;
  /** Every question put, in its words, and what was refused or told after it. */
  readonly log: readonly string[];
}

/** Answers question by question: the first text that is not refused is taken, the empty one when there is none left. */
async function hold(texts: readonly string[], given: Answers = new Map()): Promise<Held> {
  const left = [...texts];
  const log: string[] = [];
  const next = (): string => left.shift() ?? '';
  const asker: Asker = {
    text: ({ words, suggested, refuse }) => {
      log.push(words.split('\n')[0] ?? '');
      for (let tries = 0; tries < 9; tries += 1) {
        const text = next() || suggested || '';
        const problems = refuse(text);
        if (problems.length === 0) return Promise.resolve(text);
        log.push(...problems.map(({ code, message, fix }: Problem) => `refused ${text}: ${code} ${message} | ${fix ?? ''}`));
      }
      throw new Error(`nothing is good enough for: ${words}`);
    },
    choose: ({ words, choices }) => {
      const value = next();
      log.push(words);
      if (value !== BACK && !choices.some((choice) => choice.value === value)) throw new Error(`${words} is not answered by "${value}"`);
      return Promise.resolve(value);
    },
    tell: (known: Known) => void log.push(renderKnown(known, STYLE)),
  };
  const answers = await interview(asker, { given, last: [] });
  expect(left).toEqual([]);
  return { answers, log };
}

/** The stage of the file that the answers make, read back as a file. */
function stageOf(answers: Answers): Stage {
  const values = fieldsOf(answers);
  const coupling = values.get('signal.coupling') === 'ac' ? 'ac' : 'dc';
  const built = buildStage(specOf(draftFile({ topology: values.get('topology') as Topology, coupling, values })));
  if (!built.ok) throw new Error(built.problems.map(({ message }) => message).join());
  return built.stage;
}

describe('questions', () => {
  it('each fill a field of the stage file, or steer the others', () => {
    const unknown = QUESTIONS.filter(({ id, field }) => fieldAt(id) === undefined && field === undefined);
    expect(unknown).toEqual([]);
  });

  it('have examples that their own field takes', () => {
    const base = 'topology: non-inverting\nsupply: 3.0..4.2 V\ngain: 2\nsignal: {input: 0.1..0.2 V}\n';
    for (const { id, example, field } of QUESTIONS) {
      if (example === undefined || id === 'name') continue;
      const texts = id === 'load' ? [example] : example.split(/, (?:or )?/u);
      for (const text of texts) {
        const path = field?.(text) ?? id;
        const read = readStage(base, { overrides: [{ path, text, option: path }] });
        const own = read.ok ? [] : read.problems.filter(({ code, place }) => place?.path === path && !['S108', 'S102'].includes(code));
        expect(own, `${id} ${text}`).toEqual([]);
      }
    }
  });

  it('stand for assumptions that a bare stage makes', () => {
    const built = buildStage(specOf('topology: non-inverting\nsupply: 5 V\ngain: 8\nsignal: {input: 25 mV..330 mV, frequency: 1 kHz}\n'));
    const still = buildStage(specOf('topology: non-inverting\nsupply: 5 V\ngain: 8\nsignal: {input: 25 mV..330 mV}\n'));
    const made = [built, still].flatMap((one) => (one.ok ? one.stage.assumptions : []));
    const stale = QUESTIONS.flatMap(({ pending = [] }) => pending).filter((start) => !made.some((sentence) => sentence.startsWith(start)));
    expect(stale).toEqual([]);
  });
});

describe('an interview', () => {
  it('of a follower asks for no gain and no reference', async () => {
    const { answers, log } = await hold(['follower', '5 V ± 5 %', 'dc', '1..4 V']);
    expect(stageOf(answers)).toMatchObject({ topology: 'follower', gain: 1, output: { min: 1, max: 4 } });
    expect(log.filter((line) => /How much gain, or|rest on/u.test(line))).toEqual([]);
  });

  it('of an AC-coupled follower asks what it rests on, and takes mid-supply by Enter', async () => {
    const { answers } = await hold(['follower', '5 V', 'ac', '1 Vpk']);
    expect(stageOf(answers)).toMatchObject({ coupling: 'ac', output: { min: 1.5, max: 3.5 } });
  });

  it('solves gain and reference from an output range', async () => {
    const { answers, log } = await hold(['inverting', '5 V', 'dc', '1..2 V', '1..4 V']);
    expect(fieldsOf(answers).get('signal.output')).toBe('1..4 V');
    expect(stageOf(answers).gain).toBeCloseTo(-3, 2);
    expect(log.join('\n')).toContain('Gain 3 V/V solved from signal.output');
  });

  it('of a difference stage asks for both inputs, in the way that is known', async () => {
    const coupled = await hold(['difference', '5 V', 'differential', '-180 mV..180 mV', '3.3 V..3.85 V', '10']);
    const { topology, outputNominal } = stageOf(coupled.answers);
    expect([topology, outputNominal.min.toFixed(6), outputNominal.max.toFixed(6)]).toEqual(['difference', '0.700000', '4.300000']);
    const each = await hold(['difference', '5 V', 'each', '1.2..1.4 V', '1.2..1.3 V', '10', '1 V']);
    expect(stageOf(each.answers).outputNominal.max).toBeCloseTo(3, 9);
  });

  it('refuses in the words of the stage file and asks again', async () => {
    const { log } = await hold(['non-inverting', '5 mv', '4.2..3.0 V', '3.0..4.2 V', 'dc', '25..330', '25 mV..330 mV', '0.5', '8']);
    expect(log.filter((line) => line.startsWith('refused'))).toMatchInlineSnapshot(`
      [
        "refused 5 mv: Q003 unit written v, not V: letter case is not reliable here, so m may mean milli or mega | 5 MV or 5 mV",
        "refused 4.2..3.0 V: Q007 the range runs downwards | 3.0..4.2 V",
        "refused 25..330: Q001 330 has no unit; a voltage is expected | 25..330 V",
        "refused 0.5: S110 a non-inverting stage has a gain of 1 + Rf/Rg, never below 1; an inverting or a difference stage can attenuate | topology: inverting",
      ]
    `);
  });

  it('finds a contradiction when the last figure of the circuit is known, and not before', async () => {
    const { answers, log } = await hold(['non-inverting', '3.3 V', 'dc', '1.6..1.7 V', '8', 'ground', '1.65 V']);
    const { min, max } = stageOf(answers).outputNominal;
    expect([min.toFixed(6), max.toFixed(6)]).toEqual(['1.250000', '2.050000']);
    expect(log.filter((line) => line.startsWith('refused'))).toEqual([expect.stringMatching(/^refused ground: S201 .*above the 3\.3 V supply/u)]);
  });

  it('goes back as often as asked, and forgets what was answered there', async () => {
    const { answers, log } = await hold(['non-inverting', '3.3 V', 'dc', '0..1 V', '8', BACK, BACK, '0..0.2 V', '8']);
    expect(fieldsOf(answers).get('signal.input')).toBe('0..0.2 V');
    expect(log.filter((line) => line.startsWith('From which voltage'))).toHaveLength(2);
  });

  it('cannot go back before its first question', async () => {
    const { log } = await hold([BACK, '5 V', 'dc', '1..2 V'], new Map([['topology', 'follower']]));
    expect(log[1]).toMatch(/^refused back: Q\d{3} /u);
  });

  it('tells each demand when it becomes known, and each thing once', async () => {
    const { log } = await hold(['non-inverting', '3.0..4.2 V', 'dc', '25 mV..330 mV', '8', 'ground', '10 kΩ to ground', '2 kHz', '-20..60 °C', '1 kΩ', '35 mV', '', '', '', '']);
    expect(log.join('\n')).toMatchInlineSnapshot(`
      "What does the stage do?
      Which single supply does it run from, over its tolerance or discharge?
      How does the signal come in?
      From which voltage to which does the input go, against ground?
      How much gain, or from where to where must the output go?
      What does the signal rest on at the output?
        Output   200 mV..2.64 V, 197 mV..2.69 V at the corners
        Inputs   25 mV..330 mV
        Asks     input range low at most 25 mV: lowest common mode 25 mV
        Asks     input range high at most 2.67 V: common mode 330 mV on a supply of 3 V
        Asks     output low at most 197 mV: lowest output 197 mV
        Asks     output high at most 313 mV: highest output 2.69 V, least room on a supply of 3 V
        Asks     minimum stable gain at most 7.86 V/V: noise gain 7.86 V/V at its lower corner
        Assumed  Resistors chosen from E96: feedback 93.1 kΩ, input 13.3 kΩ, gain 8 V/V
        Assumed  Resistor tolerance 1 %
        Assumed  Supply peak is the top of the supply
      What hangs on the output, and where does it go?
        Asks     output current at least 289 µA: 289 µA out of the output at the peak, feedback network
                 included, resistors nominal
        Assumed  Stability: the part's own compensation is assumed to hold
      Up to which frequency must it follow?
        Asks     slew rate at least 15.6 mV/µs: 1.242 V peak at 2 kHz
        Asks     gain bandwidth at least 112 kHz: noise gain 8 V/V, magnitude error 1 % at 2 kHz
      Between which temperatures does it work?
        Asks     lowest temperature at most -20 °C: lowest temperature -20 °C
        Asks     highest temperature at least 60 °C: highest temperature 60 °C
      What resistance has the source that drives it?
      How far off may the output be at rest?
        Asks     DC error at most 35 mV: DC error 35 mV allowed at the output, noise gain 8.14 V/V at its
                 upper corner
      How much supply current may one amplifier take?
      How much gain may be missing at the top frequency?
        Assumed  Gain error 1 % at the top frequency
      How much of the wanted swing may be missing at each rail?
        Assumed  Swing loss 0 V: the whole wanted swing must be there
      What is the stage called?"
    `);
    const told = log.flatMap((entry) => entry.split('\n')).filter((line) => /^ {2}(?:Asks|Assumed|Output) /u.test(line));
    expect(new Set(told).size).toBe(told.length);
  });
});

describe('an interview of a topology with a feed of its own', () => {
  const heldAs = async (texts: readonly string[]): Promise<{ stage: Stage; file: string; log: readonly string[] }> => {
    const { answers, log } = await hold(texts);
    const values = fieldsOf(answers);
    const coupling = values.get('signal.coupling') === 'ac' ? 'ac' : 'dc';
    return { stage: stageOf(answers), file: draftFile({ topology: values.get('topology') as Topology, coupling, values }), log };
  };
  const line = (file: string, key: string): string | undefined => file.split('\n').find((one) => one.startsWith(`${key}:`));

  it('sums as many legs as are told, and one that rests on the supply', async () => {
    const { stage, file, log } = await heldAs(['summing', '5 V', 'dc', '0.5..4.5 V', '100 kΩ', 'more', 'supply', '100 kΩ', 'last', '30 kΩ', '']);
    expect(line(file, 'legs')).toBe('legs: {first: {input: 0.5..4.5 V, resistance: 100 kΩ}, second: {input: supply, resistance: 100 kΩ}}');
    expect([stage.noiseGain.nominal.toFixed(6), stage.outputNominal.max.toFixed(6)]).toEqual(['1.600000', '2.350000']);
    expect(log.filter((one) => one.includes('third'))).toEqual([]);
  });

  it('goes back over a leg, and forgets what it led to', async () => {
    const { file } = await heldAs(['summing', '5 V', 'dc', '0.5..4.5 V', '100 kΩ', 'more', '0..1 V', BACK, BACK, 'last', '', '3 V']);
    expect(line(file, 'legs')).toBe('legs: {first: {input: 0.5..4.5 V, resistance: 100 kΩ}}');
  });

  it('asks of a photodiode which end is at the node, and solves the resistor from the output', async () => {
    const { stage, file } = await heldAs(['transimpedance', '3.0..4.2 V', '0..1.2 µA', 'out-of-node', '80 pF', '', '0.1..1.9 V', '']);
    expect(line(file, 'photodiode')).toBe('photodiode: {current: 0..1.2 µA, direction: out-of-node, capacitance: 80 pF}');
    expect([stage.gain.toFixed(0), stage.outputNominal.min.toFixed(6)]).toEqual(['1500000', '0.100000']);
  });

  it('asks of a shunt in a line which voltage that has', async () => {
    const { stage, log } = await heldAs(['high-side-sense', '5 V', '0..2 A', '50 mΩ', '10.8..13.2 V', '0.4', '500 mV']);
    expect(stage.outputNominal.max).toBeCloseTo(0.54, 3);
    const low = await heldAs(['low-side-sense', '5 V', '0..3 A', '20 mΩ', '40', '']);
    // E96 resistors give 40.05.
    expect(low.stage.outputNominal.max).toBeCloseTo(2.403, 3);
    expect([log, low.log].map((one) => one.some((text) => text.includes('line the shunt sits in')))).toEqual([true, false]);
  });

  it('asks of a filter its corner and Q, and takes a gain of 1 by Enter', async () => {
    const { stage, file } = await heldAs(['sallen-key-low-pass', '5 V', 'dc', '1..2 V', '1 kHz', '0.707', '', '']);
    expect([line(file, 'filter'), stage.gain]).toEqual(['filter: {corner: 1 kHz, q: 0.707}', 1]);
  });

  it('asks of an integrator what bounds it', async () => {
    const { file } = await heldAs(['integrator', '5 V', 'dc', '2.5..3 V', '100 kΩ', '100 nF', '20 ms', '']);
    expect(line(file, 'integrator')).toBe('integrator: {resistance: 100 kΩ, capacitance: 100 nF, window: 20 ms}');
  });

  it('asks of an oscillator no signal, no source and no error at rest', async () => {
    const { file, log } = await heldAs(['relaxation-oscillator', '3.0..4.2 V', '2 kHz', '1.1 nF']);
    expect([line(file, 'oscillator'), line(file, 'signal')]).toEqual(['oscillator: {frequency: 2 kHz, capacitance: 1.1 nF}', undefined]);
    expect(log.filter((one) => /signal come in|source that drives|at rest|gain/u.test(one))).toEqual([]);
  });
});
