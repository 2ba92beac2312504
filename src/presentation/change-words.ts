import type { Change, Move } from '../explanation/index.js';
import { asciiText } from '../quantities/ascii.js';
import { formatQuantity } from '../quantities/format.js';
import { safeLine } from './safe-text.js';
import { GLUE, glued, held } from './spelling.js';

/** What the fields that most often move are called. */
const WORDS: Readonly<Record<string, string>> = {
  'limits.swingLoss': 'swing loss at each rail',
  'limits.gainError': 'gain error',
  'limits.dcError': 'DC error',
  'limits.outputNoise': 'output noise',
  'limits.snr': 'signal to noise',
  'limits.distortion': 'distortion',
  'limits.supplyCurrent': 'supply current',
  'limits.settling.within': 'settling time',
  'limits.settling.to': 'settled to within',
  'limits.phaseMargin': 'phase margin',
  'limits.junctionTemperature': 'junction temperature',
  'limits.frequencyError': 'frequency error',
  'wishes.price': 'price',
  'wishes.package': 'package',
  'wishes.status': 'status',
  'wishes.lifecycle': 'lifecycle',
  'wishes.qualification': 'qualification',
  'margins.slewRate': 'margin on slew rate',
  'margins.gainBandwidth': 'margin on gain bandwidth',
  'margins.outputHeadroom': 'extra head-room at each rail',
  'signal.frequency': 'signal frequency',
  'signal.input': 'signal at the input',
  'source.resistance': 'source resistance',
  'load.resistance': 'load resistance',
  'load.capacitance': 'load capacitance',
  'load.isolation': 'isolation resistor',
  'load.to': 'load to',
  'resistors.feedback': 'feedback resistor',
  'resistors.input': 'input resistor',
  'capacitors.feedback': 'feedback capacitor',
  'reference.value': 'reference',
  'reference.resistance': 'resistance of the reference',
};

export const fieldWords = (path: string): string => WORDS[path] ?? path;

const isLimit = (path: string): boolean => path.startsWith('limits.') || path === 'wishes.price' || path.startsWith('margins.');

/** `supply current ≤ 85 µA instead of 80 µA (× 1.07)`. */
export function moveText(move: Move): string {
  const { path, direction } = move;
  const sign = isLimit(path) && direction !== null ? `${direction === 'up' ? '≤' : '≥'}${GLUE}` : '';
  const was = move.was === '' ? '' : ` instead of ${shown(move.was)}`;
  const factor = factorText(move);
  return `${fieldWords(path)} ${sign}${shown(move.text)}${was}${factor === '' ? '' : ` (${factor})`}`;
}

const shown = (text: string): string => held(glued(safeLine(text.replace(/^\[(.*)\]$/u, '$1'))));

/** `× 1.07`, `÷ 1.4`; of a swing given up its share of the span; nothing of words. */
export function factorText({ path, direction, factor, value }: Move): string {
  if (direction === null || value === null || factor <= 1) return '';
  if (path === 'limits.swingLoss' || path === 'margins.outputHeadroom') return `${held(`${formatQuantity(100 * (factor - 1), '1', { digits: 2, round: 'up' })} %`)} of the swing`;
  return `${direction === 'up' ? '×' : '÷'}${GLUE}${formatQuantity(factor, '1', { digits: 3, round: 'up' })}`;
}

/** Options that make the change. */
export function changeOptions({ moves }: Pick<Change, 'moves'>): string[] {
  return moves.flatMap(({ path, text }) => ['--set', `${path}=${pasted(text)}`]);
}

/** Without blanks where a figure allows it, and in ASCII, which any terminal can type. */
const pasted = (text: string): string => (text.startsWith('[') || /^[^\d-]/u.test(text) ? text : asciiText(text).replaceAll(' ', ''));
