import type { CheckId } from '../demands/index.js';
import type { Basis } from '../parts/basis.js';
import type { LimitKind, Parameter } from '../parts/figures.js';
import type { Reason } from '../verdicts/verdict.js';

/** Every figure as an engineer says it in a sentence. */
export const PARAMETER_WORDS: Readonly<Record<Parameter, string>> = {
  supplyVoltage: 'supply voltage',
  supplyAbsoluteMaximum: 'absolute maximum supply',
  inputLowHeadroom: 'input head-room to V-',
  inputHighHeadroom: 'input head-room to V+',
  outputLowHeadroom: 'output head-room to V-',
  outputHighHeadroom: 'output head-room to V+',
  slewRate: 'slew rate',
  gainBandwidth: 'gain bandwidth',
  minimumStableGain: 'minimum stable gain',
  openLoopGain: 'open-loop gain',
  offsetVoltage: 'offset voltage',
  offsetDrift: 'offset drift',
  biasCurrent: 'bias current',
  offsetCurrent: 'offset current',
  commonModeRejection: 'common-mode rejection',
  supplyRejection: 'supply rejection',
  voltageNoise: 'voltage noise',
  noiseCorner: 'noise corner',
  currentNoise: 'current noise',
  quiescentCurrent: 'quiescent current',
  outputCurrent: 'output current',
  shortCircuitCurrent: 'short-circuit current',
  phaseMargin: 'phase margin',
  unityCrossover: 'unity-gain crossover',
  outputResistance: 'open-loop output resistance',
  capacitiveLoad: 'capacitive load',
  inputCapacitance: 'input capacitance',
  temperature: 'specified temperature',
  thermalResistance: 'thermal resistance',
  junctionTemperature: 'junction temperature',
  inputCrossover: 'input crossover region',
  inputOverdrive: 'input overdrive',
  overdriveCurrent: 'overdrive current',
  differentialInput: 'differential input voltage',
  overloadRecovery: 'overload recovery time',
  startUpTime: 'start-up time',
  supplyRejectionCorner: 'supply rejection corner',
};

/** What a list states in words. */
const STATEMENT_WORDS: Readonly<Partial<Record<string, string>>> = { phaseReversal: 'phase reversal', inputClamp: 'input clamp' };

/** Every check as a line of text begins with it. */
export const CHECK_WORDS: Readonly<Record<CheckId, string>> = {
  'supply-low': 'lowest supply',
  'supply-high': 'highest supply',
  'supply-peak': 'supply peak',
  'input-low': 'input range low',
  'input-high': 'input range high',
  'output-low': 'output low',
  'output-high': 'output high',
  'output-current': 'output current',
  'slew-rate': 'slew rate',
  'gain-bandwidth': 'gain bandwidth',
  'stable-gain': 'minimum stable gain',
  'phase-margin': 'phase margin',
  noise: 'noise',
  distortion: 'distortion',
  'dc-error': 'DC error',
  'supply-ripple': 'supply ripple',
  settling: 'settling time',
  'start-up': 'start-up',
  'frequency-error': 'frequency error',
  'supply-current': 'supply current',
  'temperature-low': 'lowest temperature',
  'temperature-high': 'highest temperature',
  'junction-temperature': 'junction temperature',
  channels: 'channels',
  package: 'package',
  qualification: 'qualification',
  status: 'status',
  lifecycle: 'lifecycle',
  price: 'price',
  crossover: 'input crossover',
  'phase-reversal': 'phase reversal',
  clamp: 'input clamp',
  overdrive: 'overdrive',
};

/** Before the part's number, and before the stage's. */
export const SAYINGS: Readonly<Partial<Record<string, readonly [offered: string, required: string]>>> = {
  'supply-low': ['works from', 'the stage goes down to'],
  'supply-high': ['works up to', 'the stage goes up to'],
  'supply-peak': ['absolute maximum', 'the stage peaks at'],
  'input-low': ['needs', 'the stage leaves'],
  'input-high': ['needs', 'the stage leaves'],
  'output-low': ['needs', 'the stage leaves'],
  'output-high': ['needs', 'the stage leaves'],
  'output-current': ['gives', 'the stage draws'],
  'slew-rate': ['has', 'the stage needs'],
  'gain-bandwidth': ['has', 'the stage needs'],
  'stable-gain': ['stable from', 'the stage has'],
  'phase-margin': ['has', 'the stage needs'],
  'temperature-low': ['specified from', 'the stage goes down to'],
  'temperature-high': ['specified up to', 'the stage goes up to'],
  channels: ['has', 'wanted'],
  clamp: ['inputs endure', 'the stage brings'],
  overdrive: ['inputs endure', 'the stage brings'],
};

/** Checks whose excess is "over"; of the others a part is "short". */
export const OVER: ReadonlySet<string> = new Set(['dc-error', 'supply-current', 'price', 'noise', 'distortion', 'settling', 'frequency-error', 'junction-temperature', 'supply-ripple', 'start-up']);

export const KIND_WORDS: Readonly<Record<LimitKind, string>> = { min: 'minimum', typ: 'typical', max: 'maximum' };

/** What a number stands on. */
export const BASIS_WORDS: Readonly<Record<Basis, string>> = {
  guaranteed: 'limit',
  derated: 'typical only',
  estimated: 'estimate',
  assumed: 'assumption',
  borrowed: 'from the class',
};

/** Why a check cannot be decided. */
export const REASON_WORDS: Readonly<Record<Reason, string>> = {
  'missing-figure': 'a figure is not known',
  'beyond-data': 'this lies beyond what the figures cover',
  'no-counting-point': 'no head-room point counts here',
  currency: 'priced in another currency, which is not converted',
  'not-built': 'this version has no such check',
  'not-said': 'the stage does not say what it takes its inputs to',
  'typical-only': 'only a typical figure is known, and with its derating it does not reach',
  estimated: 'only an estimate, and it does not reach; as printed the figure would',
  assumed: 'rests on an assumption, which cannot fail a part',
  borrowed: 'figures borrowed from the class make up too much of it',
};

/** Of these a figure is better when it is larger, although its limit is a maximum, or smaller although it is a minimum. */
const ENDS: ReadonlySet<string> = new Set(['supplyVoltage', 'temperature', 'supplyAbsoluteMaximum', 'capacitiveLoad', 'junctionTemperature', 'inputOverdrive', 'overdriveCurrent', 'differentialInput']);

/** Which way from its turning point a figure passes. */
export function passingSide(parameter: string, kind: LimitKind): 'less' | 'more' {
  const larger = kind === 'min' ? 'more' : 'less';
  if (!ENDS.has(parameter)) return larger;
  return larger === 'more' ? 'less' : 'more';
}

/** Ratios that are spoken in decibels. */
export const DECIBEL_FIGURES: ReadonlySet<string> = new Set(['commonModeRejection', 'supplyRejection', 'openLoopGain']);

export function checkWords(check: string): string {
  return isCheck(check) ? CHECK_WORDS[check] : check.replaceAll('-', ' ');
}

/** A figure's words, `offset drift maximum` where the limit kind matters; identity columns are words already. */
export function figureWords(figure: string, kind: LimitKind | null = null): string {
  const words = isParameter(figure) ? PARAMETER_WORDS[figure] : (STATEMENT_WORDS[figure] ?? figure);
  return kind === null ? words : `${words} ${KIND_WORDS[kind]}`;
}

export const counted = (count: number, noun: string, more = `${noun}s`): string => `${count} ${count === 1 ? noun : more}`;

export const capital = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

const isCheck = (word: string): word is CheckId => word in CHECK_WORDS;
const isParameter = (word: string): word is Parameter => word in PARAMETER_WORDS;
