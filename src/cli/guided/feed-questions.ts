import { all, has, isAc, isDc, isOutput, of } from './asked-when.js';
import type { Answers, Question } from './question.js';

const NUMBERS = ['first', 'second', 'third', 'fourth'] as const;
const inputs = (way: string) => (answers: Answers): boolean => answers.get('inputs') === way;

/** One leg of a sum, and whether another one follows. */
function legQuestions(number: (typeof NUMBERS)[number], at: number): Question[] {
  const before = NUMBERS[at - 1];
  const asked = (answers: Answers): boolean => has('legs')(answers) && (before === undefined || (answers.get(`after.${before}`) === 'more' && reached(before, answers)));
  const more: Question = {
    id: `after.${number}`,
    field: () => null,
    words: `Is there another leg after the ${number}?`,
    choices: [{ value: 'more', words: 'yes' }, { value: 'last', words: 'no, these are all' }],
    asked,
  };
  return [
    { id: `legs.${number}.input`, words: `From which voltage to which does the ${number} leg go, against ground?`, example: '0.5..4.5 V, supply, ground', asked: all(asked, isDc) },
    { id: `legs.${number}.amplitude`, words: `How large is the signal of the ${number} leg: peak, peak-to-peak or rms?`, example: '100 mVpk, 200 mVpp', asked: all(asked, isAc) },
    { id: `legs.${number}.resistance`, words: 'Through which resistor?', example: '100 kΩ', asked },
    ...(at === NUMBERS.length - 1 ? [] : [more]),
  ];
}

/** A leg counts only when all before it do. */
function reached(number: (typeof NUMBERS)[number], answers: Answers): boolean {
  const before = NUMBERS[NUMBERS.indexOf(number) - 1];
  return before === undefined || (answers.get(`after.${before}`) === 'more' && reached(before, answers));
}

/** What feeds the stage. */
export const FEED: readonly Question[] = [
  {
    id: 'signal.coupling',
    words: 'How does the signal come in?',
    choices: [
      { value: 'dc', words: 'directly: its lowest and highest voltage count' },
      { value: 'ac', words: 'through a capacitor: its size about the middle counts' },
    ],
    asked: (answers) => has('signal.input')(answers) || has('legs')(answers),
  },
  { id: 'signal.input', words: 'From which voltage to which does the input go, against ground?', example: '25 mV..330 mV', asked: all(has('signal.input'), isDc) },
  { id: 'signal.amplitude', words: 'How large is the signal: peak, peak-to-peak or rms?', example: '100 mVpk, 200 mVpp, 70 mVrms', asked: all(has('signal.amplitude'), isAc) },
  ...NUMBERS.flatMap(legQuestions),
  {
    id: 'inputs',
    field: () => null,
    words: 'How are the two inputs known?',
    choices: [
      { value: 'differential', words: 'by their difference and their mean, as of a bridge' },
      { value: 'each', words: 'each on its own, independent of the other' },
    ],
    asked: of('difference'),
  },
  { id: 'signal.differential', words: 'From where to where does the difference go, plus input less minus input?', example: '-180 mV..180 mV', asked: all(of('difference'), inputs('differential')) },
  { id: 'signal.commonMode', words: 'And the mean of the two, against ground?', example: '3.3 V..3.85 V', asked: all(of('difference'), inputs('differential')) },
  { id: 'signal.positive', words: 'From where to where does the plus input go, against ground?', example: '1.2..1.4 V', asked: all(of('difference'), inputs('each')) },
  { id: 'signal.negative', words: 'And the minus input?', example: '1.2..1.3 V', asked: all(of('difference'), inputs('each')) },
  { id: 'photodiode.current', words: 'How much current does the photodiode give, from the least to the most light?', example: '0..1.2 µA', asked: has('photodiode') },
  {
    id: 'photodiode.direction',
    words: 'Which end of the photodiode is at the summing node?',
    choices: [
      { value: 'out-of-node', words: 'the cathode: it pulls current out, the output rises with light' },
      { value: 'into-node', words: 'the anode: it pushes current in, the output falls with light' },
    ],
    asked: has('photodiode'),
  },
  { id: 'photodiode.capacitance', words: 'How much capacitance have diode and wiring?', example: '80 pF', asked: has('photodiode') },
  { id: 'photodiode.dark', words: 'How much dark current at 25 °C?', example: '200 pA', asked: has('photodiode'), without: () => 'not counted' },
  { id: 'shunt.current', words: 'From which current to which does it go?', example: '0..3 A, -2..2 A', asked: has('shunt') },
  { id: 'shunt.resistance', words: 'Through which shunt?', example: '20 mΩ', asked: has('shunt') },
  { id: 'shunt.bus', words: 'Which voltage has the line the shunt sits in?', example: '10.8..13.2 V', asked: has('shunt.bus') },
  { id: 'filter.corner', words: 'At which corner frequency?', example: '1 kHz', asked: has('filter') },
  { id: 'filter.q', words: 'With which Q: 0.577 Bessel, 0.707 Butterworth, above it a peak?', example: '0.707', asked: has('filter') },
  { id: 'integrator.resistance', words: 'Which resistor leads from the signal to the amplifier?', example: '100 kΩ', asked: has('integrator') },
  { id: 'integrator.capacitance', words: 'Which capacitor holds the sum?', example: '100 nF', asked: has('integrator') },
  { id: 'integrator.window', words: 'How long is it from one reset to the next?', example: '20 ms', asked: has('integrator') },
  { id: 'oscillator.frequency', words: 'At which frequency shall it run?', example: '2 kHz', asked: has('oscillator') },
  { id: 'oscillator.capacitance', words: 'With which timing capacitor?', example: '1.1 nF', asked: has('oscillator'), without: () => 'chosen' },
  {
    id: 'gain',
    field: (text) => (isOutput(text) ? 'signal.output' : 'gain'),
    words: 'How much gain, or from where to where must the output go?',
    example: '8, 20 dB, or 0.2..2.64 V',
    asked: (answers) => has('gain')(answers) && !of('follower')(answers),
    without: (answers) => (of('sallen-key-low-pass', 'multiple-feedback-low-pass')(answers) ? 'a gain of 1' : null),
  },
  {
    id: 'resistors.feedback',
    field: (text) => (isOutput(text) ? 'signal.output' : 'resistors.feedback'),
    words: 'Which resistor from the output back (volts per ampere), or from where to where must the output go?',
    example: '1.5 MΩ, or 0.1..1.9 V',
    asked: of('transimpedance'),
  },
  { id: 'feedback', field: () => 'resistors.feedback', words: 'Which resistor from the output back to the legs?', example: '30 kΩ', asked: has('legs'), without: () => '100 kΩ' },
];
