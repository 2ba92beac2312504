import { TOPOLOGY_WORDS } from '../topology-words.js';
import { all, has, isAc, isOutput, of } from './asked-when.js';
import { FEED } from './feed-questions.js';
import type { Answers, Question } from './question.js';

const wantsOutput = (answers: Answers): boolean => isOutput(answers.get('gain') ?? '') || isOutput(answers.get('resistors.feedback') ?? '');
const fallsWithLight = (answers: Answers): boolean => of('transimpedance')(answers) && answers.get('photodiode.direction') === 'into-node';

/** About ground these would have to go below it. */
const needsMiddle = (answers: Answers): boolean =>
  isAc(answers) || fallsWithLight(answers) || of('inverting', 'difference', 'summing', 'multiple-feedback-low-pass', 'integrator')(answers);

const CIRCUIT: readonly Question[] = [
  {
    id: 'topology',
    words: 'What does the stage do?',
    choices: Object.entries(TOPOLOGY_WORDS).map(([value, { does }]) => ({ value, words: `${does} (${value})` })),
  },
  { id: 'supply', words: 'Which single supply does it run from, over its tolerance or discharge?', example: '5 V ± 5 %, 3.0..4.2 V' },
  ...FEED,
  {
    id: 'reference',
    words: 'What does the signal rest on at the output?',
    example: 'ground, mid-supply, 1.25 V ± 1 %',
    asked: (answers) => has('reference')(answers) && (!of('follower')(answers) || isAc(answers)),
    without: (answers) => (wantsOutput(answers) ? 'solved from the output' : needsMiddle(answers) ? null : 'ground'),
    suggested: (answers) => (needsMiddle(answers) && !wantsOutput(answers) ? 'mid-supply' : null),
    pending: ['reference ground'],
  },
];

const NOT_JUDGED = (): string => 'not judged';

const SURROUNDINGS: readonly Question[] = [
  { id: 'load', words: 'What hangs on the output, and where does it go?', example: '10 kΩ to ground, 100 pF', without: () => 'nothing', pending: ['no load at the output', 'stability'], shows: ['output-current'] },
  { id: 'drives.threshold', words: 'Between which shares of the supply does the logic it drives switch?', example: '0.3..0.7', asked: has('drives'), without: () => '0.3..0.7' },
  { id: 'signal.frequency', words: 'Up to which frequency must it follow?', example: '2 kHz, 20 Hz..2 kHz', asked: has('signal.frequency'), without: () => 'speed is not judged', pending: ['no signal frequency'], shows: ['slew-rate', 'gain-bandwidth', 'output-current'] },
  { id: 'temperature', words: 'Between which temperatures does it work?', example: '-20..60 °C', without: () => '25 °C', pending: ['temperature 25'], shows: ['temperature-low', 'temperature-high'] },
  { id: 'source', words: 'What resistance has the source that drives it?', example: '1 kΩ', asked: has('source'), without: () => '0 Ω', pending: ['source resistance'] },
];

const LIMITS: readonly Question[] = [
  { id: 'limits.frequencyError', words: 'How far may the amplifier move the frequency?', example: '3 %', asked: has('limits.frequencyError'), without: NOT_JUDGED },
  { id: 'limits.dcError', words: 'How far off may the output be at rest?', example: '20 mV', asked: has('limits.dcError'), without: NOT_JUDGED, shows: ['dc-error'] },
  { id: 'limits.supplyCurrent', words: 'How much supply current may one amplifier take?', example: '80 µA', without: NOT_JUDGED, shows: ['supply-current'] },
  { id: 'limits.gainError', words: 'How much gain may be missing at the top frequency?', example: '1 %', asked: all(has('limits.gainError'), (answers) => (answers.get('signal.frequency') ?? '') !== ''), without: () => '1 %', pending: ['gain error'], shows: ['gain-bandwidth'] },
  { id: 'limits.swingLoss', words: 'How much of the wanted swing may be missing at each rail?', example: '20 mV', asked: has('limits.swingLoss'), without: () => 'none', pending: ['swing loss'], shows: ['output-low', 'output-high'] },
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
