import type { Answers, Question } from './question.js';

const isAc = (answers: Answers): boolean => answers.get('signal.coupling') === 'ac';
const isDifference = (answers: Answers): boolean => answers.get('topology') === 'difference';
const isFollower = (answers: Answers): boolean => answers.get('topology') === 'follower';
const legs = (answers: Answers): string | undefined => answers.get('legs');

/** A range of volts asked for in place of a gain. */
const isOutput = (text: string): boolean => /V\s*$/u.test(text) && !/V\s*\/\s*V\s*$/u.test(text);

const CIRCUIT: readonly Question[] = [
  {
    id: 'topology',
    words: 'What does the stage do?',
    choices: [
      { value: 'follower', words: 'passes a voltage on unchanged, so that its load does not weigh on it (follower)' },
      { value: 'non-inverting', words: 'makes a voltage larger (non-inverting)' },
      { value: 'inverting', words: 'makes a voltage larger or smaller and turns it over (inverting)' },
      { value: 'difference', words: 'takes the difference of two voltages (difference)' },
    ],
  },
  { id: 'supply', words: 'Which single supply does it run from, over its tolerance or discharge?', example: '5 V ± 5 %, 3.0..4.2 V' },
  {
    id: 'signal.coupling',
    words: 'How does the signal come in?',
    choices: [
      { value: 'dc', words: 'directly: its lowest and highest voltage count' },
      { value: 'ac', words: 'through a capacitor: its size about the middle counts' },
    ],
    asked: (answers) => !isDifference(answers),
  },
  { id: 'signal.input', words: 'From which voltage to which does the input go, against ground?', example: '25 mV..330 mV', asked: (answers) => !isDifference(answers) && !isAc(answers) },
  { id: 'signal.amplitude', words: 'How large is the signal: peak, peak-to-peak or rms?', example: '100 mVpk, 200 mVpp, 70 mVrms', asked: isAc },
  {
    id: 'legs',
    field: () => null,
    words: 'How are the two inputs known?',
    choices: [
      { value: 'differential', words: 'by their difference and their mean, as of a bridge' },
      { value: 'each', words: 'each on its own, independent of the other' },
    ],
    asked: isDifference,
  },
  { id: 'signal.differential', words: 'From where to where does the difference go, plus input less minus input?', example: '-180 mV..180 mV', asked: (answers) => legs(answers) === 'differential' },
  { id: 'signal.commonMode', words: 'And the mean of the two, against ground?', example: '3.3 V..3.85 V', asked: (answers) => legs(answers) === 'differential' },
  { id: 'signal.positive', words: 'From where to where does the plus input go, against ground?', example: '1.2..1.4 V', asked: (answers) => legs(answers) === 'each' },
  { id: 'signal.negative', words: 'And the minus input?', example: '1.2..1.3 V', asked: (answers) => legs(answers) === 'each' },
  { id: 'gain', field: (text) => (isOutput(text) ? 'signal.output' : 'gain'), words: 'How much gain, or from where to where must the output go?', example: '8, 20 dB, or 0.2..2.64 V', asked: (answers) => !isFollower(answers) },
  {
    id: 'reference',
    words: 'What does the signal rest on at the output?',
    example: 'ground, mid-supply, 1.25 V ± 1 %',
    asked: (answers) => !isFollower(answers) || isAc(answers),
    without: (answers) => (isOutput(answers.get('gain') ?? '') ? 'solved from the output' : needsMiddle(answers) ? null : 'ground'),
    suggested: (answers) => (needsMiddle(answers) && !isOutput(answers.get('gain') ?? '') ? 'mid-supply' : null),
    pending: ['reference ground'],
  },
];

/** About ground these would have to go below it. */
const needsMiddle = (answers: Answers): boolean => isAc(answers) || answers.get('topology') === 'inverting' || isDifference(answers);

const SURROUNDINGS: readonly Question[] = [
  { id: 'load', words: 'What hangs on the output, and where does it go?', example: '10 kΩ to ground, 100 pF', without: () => 'nothing', pending: ['no load at the output', 'stability'], shows: ['output-current'] },
  { id: 'signal.frequency', words: 'Up to which frequency must it follow?', example: '2 kHz, 20 Hz..2 kHz', without: () => 'speed is not judged', pending: ['no signal frequency'], shows: ['slew-rate', 'gain-bandwidth', 'output-current'] },
  { id: 'temperature', words: 'Between which temperatures does it work?', example: '-20..60 °C', without: () => '25 °C', pending: ['temperature 25'], shows: ['temperature-low', 'temperature-high'] },
  { id: 'source', words: 'What resistance has the source that drives it?', example: '1 kΩ', without: () => '0 Ω', pending: ['source resistance'] },
];

const NOT_JUDGED = (): string => 'not judged';

const LIMITS: readonly Question[] = [
  { id: 'limits.dcError', words: 'How far off may the output be at rest?', example: '20 mV', without: NOT_JUDGED, shows: ['dc-error'] },
  { id: 'limits.supplyCurrent', words: 'How much supply current may one amplifier take?', example: '80 µA', without: NOT_JUDGED, shows: ['supply-current'] },
  { id: 'limits.gainError', words: 'How much gain may be missing at the top frequency?', example: '1 %', asked: (answers) => (answers.get('signal.frequency') ?? '') !== '', without: () => '1 %', pending: ['gain error'], shows: ['gain-bandwidth'] },
  { id: 'limits.swingLoss', words: 'How much of the wanted swing may be missing at each rail?', example: '20 mV', without: () => 'none', pending: ['swing loss'], shows: ['output-low', 'output-high'] },
  { id: 'name', words: 'What is the stage called?', example: 'Tank level, first amplifier', without: () => 'no name' },
];

/** Every question, in the order asked: what the circuit is, what is around it, what it must keep. */
export const QUESTIONS: readonly Question[] = [...CIRCUIT, ...SURROUNDINGS, ...LIMITS];

/** What the circuit fixes by itself, told once it is known. */
export const CIRCUIT_SHOWS = ['input-low', 'input-high', 'output-low', 'output-high', 'stable-gain'] as const;

/** From here on the circuit is known: the last of its questions that is asked. */
export function closesCircuit(question: Question, answers: Answers): boolean {
  return CIRCUIT.filter(({ asked }) => asked?.(answers) !== false).at(-1) === question;
}

/** True once the question, or one after it, has been reached. */
export function isSurrounding(question: Question): boolean {
  return !CIRCUIT.includes(question);
}
