import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { readStage } from '../../src/spec/read.js';
import { requireBuilt } from '../support/built.js';
import { onTerminal, type Place, type Step } from '../support/terminal.js';

const ENTER = '\r';
const CTRL_C = '\u0003';
const CTRL_D = '\u0004';
const ERASE_LINE = '\u0015';
const DOWN = '\u001b[B';

let place: Place;

beforeEach(() => {
  requireBuilt();
  const folder = mkdtempSync(join(tmpdir(), 'railfit-'));
  place = { folder, catalog: join(folder, 'catalog.sqlite') };
});
afterEach(() => { rmSync(place.folder, { recursive: true, force: true }); });

const answer = (question: string, text: string): Step => [question, `${text}${ENTER}`];

/** The tank-level stage of the README, with three slips on the way. */
const SESSION: readonly Step[] = [
  ['What does the stage do?', DOWN],
  ['> makes a voltage larger (non-inverting)', ENTER],
  answer('Which single supply', '5 mv'),
  ['letter case is not reliable here', ERASE_LINE],
  answer('Which single supply', '5 V ± 5 %'),
  ['directly', ENTER],
  answer('From which voltage', '40 mV..520 mV'),
  answer('How much gain', '80'),
  // 80 V/V cannot be, which shows once the reference is known: back to the gain.
  answer('rest on', ''),
  ['above the 5 V supply', `${ERASE_LINE}back${ENTER}`],
  answer('How much gain', '8'),
  answer('rest on', ''),
  answer('What hangs on the output', '10M'),
  ['10M has no unit', ERASE_LINE],
  answer('What hangs on the output', '10 kΩ to ground'),
  answer('Up to which frequency', '1 kHz'),
  answer('Between which temperatures', '-20..60 °C'),
  answer('What resistance has the source', ''),
  answer('How far off may the output be', '60 mV'),
  answer('How much supply current', '1 mA'),
  answer('How much gain may be missing', ''),
  answer('How much of the wanted swing', ''),
  answer('What is the stage called', 'Tank level, first amplifier'),
  answer('Which file', ''),
];

/** A follower, with nothing but what is needed. */
const FOLLOWER: readonly Step[] = [
  answer('Which single supply', '5 V'),
  ['directly', ENTER],
  answer('From which voltage', '1..4 V'),
  ...['What hangs', 'Up to which', 'Between which', 'What resistance', 'How far off', 'How much supply', 'How much of', 'What is the stage called'].map((question) => answer(question, '')),
];

const FILE = 'tank-level-first-amplifier.yaml';

describe('guided entry, recorded on a pseudo-terminal', () => {
  it('refuses a wrong unit with the reason, takes the correction, tells the demands, writes the file and ends with the shortlist', () => {
    const { exit, screens, restored, cursor } = onTerminal(['draft', '--ask'], SESSION, place);
    expect({ exit, restored, cursor }).toEqual({ exit: 0, restored: true, cursor: true });

    // What stood on the screen when the wrong unit was refused, and when a load could be milli or mega.
    expect(lastLines(screens[3], 4)).toMatchInlineSnapshot(`
      "
      ? Which single supply does it run from, over its tolerance or discharge?
        [5 V ± 5 %, 3.0..4.2 V] 5 mv
      error[Q003]: unit written v, not V: letter case is not reliable here, so m may mean milli or mega
         fix: 5 MV or 5 mV
      "
    `);
    expect(lastLines(screens[9], 4)).toMatchInlineSnapshot(`
      "
      error[S201]: the output is asked to swing 3.2 V..41.6 V, above the 5 V supply: no amplifier on this
        supply does that (see gain, supply)
         fix: write gain: 8.81
              or back, to change an answer before this one
      "
    `);
    expect(lastLines(screens[13], 4)).toMatchInlineSnapshot(`
      "
      ? What hangs on the output, and where does it go?
        [10 kΩ to ground, 100 pF; Enter: nothing] 10M
      error[Q002]: 10M has no unit: SI and IEC 60062 read mega (10 MΩ), SPICE reads milli (10 mΩ)
         fix: 10 MΩ, 10meg or 10 mΩ
      "
    `);

    const [questions = '', answered = ''] = (screens.at(-1) ?? '').split(`\nwrote ${FILE}\n`);
    expect(`\n${questions}`).toMatchInlineSnapshot(`
      "
      Each answer is checked as it is given; back returns to the question before.
      Ctrl-C ends, and nothing is written before the last answer.

      > What does the stage do? makes a voltage larger (non-inverting)
      > Which single supply does it run from, over its tolerance or discharge?
        [5 V ± 5 %, 3.0..4.2 V] 5 V ± 5 %
      > How does the signal come in? directly: its lowest and highest voltage count
      > From which voltage to which does the input go, against ground?
        [25 mV..330 mV] 40 mV..520 mV
      > How much gain, or from where to where must the output go?
        [8, 20 dB, or 0.2..2.64 V] 80
      > What does the signal rest on at the output?
        [ground, mid-supply, 1.25 V ± 1 %; Enter: ground] back
      > How much gain, or from where to where must the output go?
        [8, 20 dB, or 0.2..2.64 V] 8
      > What does the signal rest on at the output?
        [ground, mid-supply, 1.25 V ± 1 %; Enter: ground]
        Output   320 mV..4.16 V, 314 mV..4.23 V at the corners
        Inputs   40 mV..520 mV
        Asks     input range low at most 40 mV: lowest common mode 40 mV
        Asks     input range high at most 4.23 V: common mode 520 mV on a supply of 4.75 V
        Asks     output low at most 314 mV: lowest output 314 mV
        Asks     output high at most 516 mV: highest output 4.23 V, least room on a supply of 4.75 V
        Asks     minimum stable gain at most 7.86 V/V: noise gain 7.86 V/V at its lower corner
        Assumed  Resistors chosen from E96: feedback 93.1 kΩ, input 13.3 kΩ, gain 8 V/V
        Assumed  Reference ground
        Assumed  Resistor tolerance 1 %
        Assumed  Supply peak is the top of the supply
      > What hangs on the output, and where does it go?
        [10 kΩ to ground, 100 pF; Enter: nothing] 10 kΩ to ground
        Asks     output current at least 455 µA: 455 µA out of the output at the peak, feedback network
                 included, resistors nominal
        Assumed  Stability: the part's own compensation is assumed to hold
      > Up to which frequency must it follow?
        [2 kHz, 20 Hz..2 kHz; Enter: speed is not judged] 1 kHz
        Asks     slew rate at least 12.3 mV/µs: 1.954 V peak at 1 kHz
        Asks     gain bandwidth at least 56.1 kHz: noise gain 8 V/V, magnitude error 1 % at 1 kHz
      > Between which temperatures does it work?
        [-20..60 °C; Enter: 25 °C] -20..60 °C
        Asks     lowest temperature at most -20 °C: lowest temperature -20 °C
        Asks     highest temperature at least 60 °C: highest temperature 60 °C
      > What resistance has the source that drives it?
        [1 kΩ; Enter: 0 Ω]
        Assumed  Source resistance 0 Ω
      > How far off may the output be at rest?
        [20 mV; Enter: not judged] 60 mV
        Asks     DC error at most 60 mV: DC error 60 mV allowed at the output, noise gain 8.14 V/V at its
                 upper corner
      > How much supply current may one amplifier take?
        [80 µA; Enter: not judged] 1 mA
        Asks     supply current at most 1 mA: supply current 1 mA allowed per amplifier
      > How much gain may be missing at the top frequency?
        [1 %; Enter: 1 %]
        Assumed  Gain error 1 % at the top frequency
      > How much of the wanted swing may be missing at each rail?
        [20 mV; Enter: none]
        Assumed  Swing loss 0 V: the whole wanted swing must be there
      > What is the stage called?
        [Tank level, first amplifier; Enter: no name] Tank level, first amplifier
      > Which file shall it be written to? tank-level-first-amplifier.yaml
      "
    `);

    const text = readFileSync(join(place.folder, FILE), 'utf8');
    expect(readStage(text).ok).toBe(true);
    expect(text.split('\n').filter((line) => line !== '' && !/^ *#/u.test(line)).join('\n')).toMatchInlineSnapshot(`
      "name: Tank level, first amplifier
      topology: non-inverting
      supply: 5 V ± 5 %
      gain: 8
      resistors:
      capacitors:
      signal:
        input: 40 mV..520 mV
        coupling: dc
        frequency: 1 kHz
      load: 10 kΩ to ground
      temperature: -20..60 °C
      limits:
        dcError: 60 mV
        supplyCurrent: 1 mA
      wishes:
      margins:"
    `);

    // The shortlist is the one of the file, to the letter.
    const again = onTerminal(['shortlist', FILE], [], place);
    expect(again.screens.at(-1)).toContain('parts fit');
    expect(answered.trim().endsWith((again.screens.at(-1) ?? 'nothing').trim())).toBe(true);
  });

  it.each<[string, readonly Step[]]>([
    ['at a choice', [['What does the stage do?', CTRL_C]]],
    ['while an answer stands refused', [['What does the stage do?', ENTER], answer('Which single supply', '5 mv'), ['letter case', CTRL_C]]],
    ['at the last question', [['What does the stage do?', ENTER], ...FOLLOWER, ['Which file', CTRL_C]]],
  ])('Ctrl-C %s ends it: nothing written, terminal as before', (_where, steps) => {
    const seen = onTerminal(['draft', '--ask'], steps, place);
    expect({ ...seen, screens: null }).toEqual({ exit: 130, restored: true, cursor: true, screens: null });
    expect(seen.screens.at(-1)).toMatch(/\ninterrupted: nothing was written \(exit 130\)$/u);
    expect(readdirSync(place.folder)).toEqual([]);
  });

  it('the end of input ends it like Ctrl-C', () => {
    const seen = onTerminal(['draft', 'follower', '--ask'], [['Which single supply', CTRL_D]], place);
    expect({ ...seen, screens: null }).toEqual({ exit: 130, restored: true, cursor: true, screens: null });
    expect(seen.screens.at(-1)).toContain('interrupted: nothing was written (exit 130)');
  });

  it('a file that exists is refused by name, and another one taken', () => {
    writeFileSync(join(place.folder, 'follower.yaml'), 'mine\n');
    const steps: readonly Step[] = [...FOLLOWER, answer('Which file', ''), ['exists and is not written over', ERASE_LINE], answer('Which file', 'buffer.yaml')];
    const { exit } = onTerminal(['draft', 'follower', '--ask'], steps, place);
    expect(exit).toBe(0);
    expect(readFileSync(join(place.folder, 'follower.yaml'), 'utf8')).toBe('mine\n');
    expect(existsSync(join(place.folder, 'buffer.yaml'))).toBe(true);
  });

  it('with -o of a file that exists nothing is asked', () => {
    writeFileSync(join(place.folder, 'mine.yaml'), 'mine\n');
    const { exit, screens } = onTerminal(['draft', '--ask', '-o', 'mine.yaml'], [], place);
    expect(exit).toBe(2);
    expect(screens.at(-1)).toContain('error[C110]: -o: mine.yaml exists and is not written over');
    expect(screens.at(-1)).not.toContain('What does the stage do?');
  });
});

const lastLines = (screen: string | undefined, count: number): string => `\n${(screen ?? '').split('\n').slice(-count).join('\n')}\n`;
