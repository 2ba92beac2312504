import { describe, expect, it } from 'vitest';
import { shortlist } from '../../src/engine.js';
import { failingCheck, openCheck, passingCheck } from '../../src/presentation/check-text.js';
import { verdictSentence } from '../../src/presentation/verdict-sentence.js';
import { comparisonText, shortfall, spareText } from '../../src/presentation/verdict-words.js';
import { CHECK_WORDS, REASON_WORDS, SAYINGS } from '../../src/presentation/words.js';
import { CODE_PAGES } from '../../src/cli/code-pages.js';
import { TOPICS } from '../../src/cli/help-topics.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import { problemsOf } from '../support/stage-file.js';
import { SAMPLE_PARTS, sampleSource, sampleStage, styleOf } from '../support/sample-report.js';

/** Words the house does not say: courtesies, alarms, a score, a verdict on the part itself, and a word for nothing. */
const BANNED = /\b(?:please|oops|sorry|unfortunately|invalid|illegal|bad|score|best part|N\/A|undefined|null|NaN|Infinity)\b|!/iu;

/** Stages that ask everything, each strict in another way. */
const STAGES: readonly Readonly<Record<string, string>>[] = [
  {},
  { supply: '1.2 V', 'signal.input': '10 mV..100 mV', supplyPeak: '1.4 V' },
  { supply: '12 V', supplyPeak: '14 V', 'signal.frequency': '100 kHz' },
  { temperature: '-55..150 °C', 'limits.dcError': '1 mV', 'limits.supplyCurrent': '5 µA', 'limits.junctionTemperature': '60 °C' },
  { 'load.capacitance': '10 nF', 'limits.phaseMargin': '89°', 'limits.outputNoise': '1 µVrms', 'limits.distortion': '-110 dB', 'load.resistance': '200 Ω' },
  { 'limits.settling': '{within: 1 µs, to: 0.1 %}', 'limits.snr': '110 dB', 'wishes.channels': '4', 'wishes.price': '0.1 EUR', 'wishes.package': '[SC-70-5]', 'wishes.qualification': 'AEC-Q100 grade 1', 'wishes.lifecycle': '[obsolete]' },
];

const VERDICTS: readonly Verdict[] = STAGES.flatMap((changes) => {
  const { fit, undecided, rejected } = shortlist(sampleStage(changes), sampleSource(SAMPLE_PARTS));
  return [...fit, ...undecided, ...rejected].flatMap(({ verdicts }) => verdicts);
});
const of = (outcome: Verdict['outcome']): Verdict[] => VERDICTS.filter((verdict) => verdict.outcome === outcome);
const isNumbers = ({ offered, required, unit }: Verdict): boolean => typeof offered === 'number' && typeof required === 'number' && unit !== null;
const origins = { part: SAMPLE_PARTS[0] ?? (() => { throw new Error('no sample part'); })(), origin: () => null };
const plain = (lines: readonly string[]): string => lines.join(' ').replaceAll('\u00a0', ' ').replace(/ +/gu, ' ');

const UNITS = String.raw`(?:[fpnuµmkMGT]?(?:V|A|Ω|F|Hz|s)(?:/(?:µs|ms|s|V))?|%|°C|°|dB|EUR)`;
const NUMBER_WITH_UNIT = new RegExp(String.raw`-?\d[\d.]* ?${UNITS}(?![\w])`, 'gu');

describe('sentences about checks', () => {
  it('are walked: most checks, in every outcome', () => {
    const seen = (outcome: Verdict['outcome']): Set<string> => new Set(of(outcome).map(({ check }) => check));
    expect(seen('fail').size).toBeGreaterThan(15);
    expect(seen('pass').size).toBeGreaterThan(15);
    expect(seen('unknown').size).toBeGreaterThan(2);
  });

  it('never say what the house does not say', () => {
    for (const verdict of VERDICTS) {
      const style = styleOf(100);
      const full = { pass: passingCheck, fail: failingCheck, unknown: openCheck }[verdict.outcome](verdict, origins, style);
      for (const text of [verdictSentence(verdict), comparisonText(verdict), plain(full)]) expect(text, verdict.check).not.toMatch(BANNED);
    }
  });

  it('of a fail quote both numbers with their units, and what lies between them', () => {
    for (const verdict of of('fail').filter(isNumbers)) {
      const text = plain(failingCheck(verdict, origins, styleOf(200)));
      expect(text, verdict.check).toMatch(/\b(?:short|over) by /u);
      if (verdict.check === 'channels') continue;
      expect(plain([comparisonText(verdict)]).match(NUMBER_WITH_UNIT)?.length ?? 0, plain([comparisonText(verdict)])).toBeGreaterThanOrEqual(2);
      expect(plain([shortfall(verdict)]).match(NUMBER_WITH_UNIT)?.length ?? 0, plain([shortfall(verdict)])).toBeGreaterThanOrEqual(1);
      expect(verdictSentence(verdict), verdict.check).toMatch(/(?:needs at least|allowed at most) .*\d.*: does not hold$/u);
    }
  });

  it('of a pass say what is left, and in full both numbers', () => {
    for (const verdict of of('pass').filter(isNumbers)) {
      expect(plain([spareText(verdict)]), verdict.check).toMatch(/\d.* spare$|\d times$|^met exactly$|^has \d+$/u);
      if (verdict.check === 'channels' || verdict.check === 'stable-gain') continue;
      expect(plain([comparisonText(verdict)]).match(NUMBER_WITH_UNIT)?.length ?? 0, plain([comparisonText(verdict)])).toBeGreaterThanOrEqual(2);
    }
  });

  it('of a bound say which way the rest of it goes: of what must be at least something no more is known', () => {
    const [atLeast, atMost] = (['at-least', 'at-most'] as const).map((sense) => of('unknown').find((verdict) => verdict.known !== null && verdict.sense === sense));
    if (atLeast === undefined || atMost === undefined) throw new Error('no such bound among the samples');
    expect(verdictSentence(atLeast)).toMatch(/ at most \d.*, needs at least /u);
    expect(verdictSentence(atMost)).toMatch(/ at least \d.*, allowed at most /u);
    expect(verdictSentence({ ...atLeast, known: null })).toMatch(/: a figure is missing .*; needs at least /u);
  });

  it('of an open check give the reason', () => {
    for (const verdict of of('unknown')) {
      expect(verdict.reason, verdict.check).not.toBeNull();
      expect(plain(openCheck(verdict, origins, styleOf(200))), verdict.check).toContain(REASON_WORDS[verdict.reason ?? 'missing-figure']);
    }
  });
});

describe('words and pages', () => {
  it('hold to the same', () => {
    const words = [...Object.values(CHECK_WORDS), ...Object.values(REASON_WORDS), ...Object.values(SAYINGS).flatMap((pair) => pair ?? [])];
    for (const word of words) expect(word).not.toMatch(BANNED);
    for (const { code, title, why } of CODE_PAGES) expect(`${title} ${why}`, code).not.toMatch(/\b(?:please|oops|sorry|unfortunately|illegal)\b|!/iu);
    for (const [topic, page] of Object.entries(TOPICS)) expect(JSON.stringify(page()), topic).not.toMatch(/\b(?:please|oops|sorry|unfortunately|undefined|NaN)\b|!/iu);
  });

  it.each([
    'topology: follower\nsupply: 5\nsignal: {input: 0..1 V}\n',
    'topology: folower\nsupply: 5 V\nsignal: {input: 0..1 V}\n',
    'topology: inverting\nsupply: ±5 V\ngain: zero\nlimits: {dcError: 0 mV, gainError: 100 %, phaseMargin: 200°}\n',
    'topology: non-inverting\nsupply: 4.2..3.0 V\nload: 10M\nsignal: {input: N/A, amplitude: 1 V}\ntemperature: warm\n',
    'topology: follower\n',
  ])('of a stage that is refused: what is meant instead, in the same tone (%#)', (text) => {
    const problems = problemsOf(text);
    expect(problems.length).toBeGreaterThan(0);
    for (const { message, fix } of problems) {
      expect(message.replaceAll('N/A', '')).not.toMatch(BANNED);
      expect(fix ?? '', message).not.toBe('');
    }
  });
});
