import type { Parameter } from '../parts/figures.js';
import type { FieldKind } from '../quantities/kinds.js';
import type { IdentityField, Statement } from './header-words.js';

/**
 * The words hardware lists use for their columns (common practice). One line a meaning. Words are compared without case and
 * punctuation, behind the limit kind, the unit and the condition, which are read from the header by themselves. `[word]` may be left out.
 * A line is added here, and nowhere else, when a list is found that says it differently.
 */
export const FIGURE_WORDS: Readonly<Partial<Record<Parameter, readonly string[]>>> = {
  supplyAbsoluteMaximum: ['abs supply [voltage]', 'absolute supply [voltage]', 'supply [voltage] abs', 'supply [voltage] absolute', 'vs abs', 'vcc abs', 'vdd abs', 'v+ abs', 'amr supply', 'supply amr'],
  inputLowHeadroom: ['input low headroom', 'input headroom low [side]'],
  inputHighHeadroom: ['input high headroom', 'input headroom high [side]', 'input headroom from v+', 'input from v+'],
  outputLowHeadroom: ['vol', 'v ol', 'output low', 'output voltage low', 'output low voltage', '[output] swing [from] low [side]', '[output] swing low [side] [from rail]', '[output] swing from lower rail', '[output] swing from v', '[output] swing to v', '[output] swing from ground', '[output] swing from gnd', '[output] swing from rail low [side]', 'low side [output] swing', 'swing to ground', 'output low headroom', 'low side headroom', 'sat low', 'output sat low'],
  outputHighHeadroom: ['[output] swing [from] high [side]', '[output] swing high [side] [from rail]', '[output] swing from upper rail', '[output] swing from v+', '[output] swing to v+', '[output] swing from supply', '[output] swing from rail high [side]', 'high side [output] swing', 'v+ voh', 'vcc voh', 'vs voh', 'vdd voh', 'voh from v+', 'voh from rail', 'voh below v+', 'output high headroom', 'high side headroom', 'sat high', 'output sat high'],
  slewRate: ['sr', 'slew', 'slew rate', 'slewrate', 'slewing rate'],
  gainBandwidth: ['gbw', 'gbp', 'gbwp', 'gain bandwidth [product]', 'gain bw [product]', 'gain bandwidth prod', 'bandwidth gbw', 'unity gain bandwidth', 'ugbw'],
  minimumStableGain: ['min stable gain', 'minimum stable gain', 'stable gain', 'acl', 'stable [at] gain', 'gain stable', 'lowest stable gain'],
  openLoopGain: ['aol', 'a ol', 'avol', 'avd', 'a0', 'open loop gain', 'openloop gain', 'open loop voltage gain', 'large signal [voltage] gain', 'dc gain'],
  offsetVoltage: ['vos', 'v os', 'vio', 'v io', 'voff', 'voffset', 'offset', '[input] offset voltage', 'input offset', 'offset v'],
  offsetDrift: ['vos drift', 'tcvos', 'tc vos', 'dvos dt', 'vos tc', 'vio drift', 'offset drift', '[input] offset [voltage] drift', 'offset tc', 'offset tempco', 'drift'],
  biasCurrent: ['ib', 'i b', 'iib', 'ibias', 'bias current', 'input bias', 'input bias current', 'input current', 'bias'],
  offsetCurrent: ['ios', 'i os', 'iio', '[input] offset current'],
  commonModeRejection: ['cmrr', 'cmr', 'common mode rejection [ratio]'],
  supplyRejection: ['psrr', 'psr', 'svrr', 'ksvr', 'power supply rejection [ratio]', 'supply rejection [ratio]'],
  voltageNoise: ['en', 'vn', 'e n', 'noise', 'input noise', '[input] voltage noise [density]', 'noise density', 'input noise [voltage] density', 'white noise'],
  noiseCorner: ['noise corner', '1 f corner', 'corner frequency', 'fc noise', '1 f noise corner'],
  currentNoise: ['in', 'i n', '[input] current noise [density]', 'noise current [density]'],
  quiescentCurrent: ['iq', 'i q', 'icc', 'idd', 'is', 'isy', 'isupply', 'supply current', 'quiescent [current]', 'quiescent supply current', 'current consumption', 'consumption', 'operating current'],
  outputCurrent: ['iout at swing', 'output current at swing', 'usable output current', 'iout usable', 'linear output current'],
  shortCircuitCurrent: ['isc', 'short circuit [current]', 'short circuit output current', 'ishort', 'output short circuit [current]'],
  phaseMargin: ['pm', 'phase margin'],
  unityCrossover: ['unity crossover', 'unity gain crossover', 'unity gain frequency'],
  outputResistance: ['ro', 'zo', 'rout', 'zout', 'output resistance', 'output impedance', 'open loop output impedance', 'open loop output resistance'],
  capacitiveLoad: ['cload', 'c load', 'cl', 'load capacitance', 'capacitive load', 'capacitive load drive'],
  inputCapacitance: ['cin', 'c in', 'input capacitance'],
  thermalResistance: ['theta ja', 'rth ja', 'rthja', 'rθja', 'θja', 'thermal resistance'],
  junctionTemperature: ['tj', 'junction temperature', 'tj maximum'],
  inputCrossover: ['input crossover', 'crossover region'],
  inputOverdrive: ['input overdrive', 'input beyond rail', 'input beyond rails', 'input beyond supply', 'input overvoltage'],
  overdriveCurrent: ['overdrive current', 'input current rating', 'input clamp current', 'input current amr', 'input current abs'],
  differentialInput: ['vid', 'v id', 'differential input [voltage]', 'input differential [voltage]', 'vid abs', 'differential input amr'],
  overloadRecovery: ['overload recovery [time]', 'overdrive recovery [time]', 'output recovery [time]', 'trec', 'recovery time'],
  startUpTime: ['start up [time]', 'startup [time]', 'turn on [time]', 'power up [time]', 'ton', 'wake up [time]'],
  supplyRejectionCorner: ['psrr corner', 'psr corner', 'supply rejection corner'],
};

/** Meanings one column can have that fill several figures, or need a look at the cells. */
export const SPECIAL_WORDS = {
  supplyRange: ['supply', 'supply range', 'supply voltage', 'supply voltage range', 'operating supply [voltage]', 'operating voltage', 'vs', 'v s', 'vcc', 'vdd', 'v+', 'vsupply', 'vsup', 'power supply', 'single supply'],
  temperatureRange: ['temp', 'temperature', 'temp range', 'temperature range', 'operating temp [range]', 'operating temperature [range]', 'operating range', 'ambient temperature [range]', 'ta', 'ta range'],
  bothSwings: ['swing from rail', 'swing from rails', 'output swing from rail', 'output swing from rails', 'swing to rail', 'output headroom', 'rail headroom', 'swing from either rail', 'dropout'],
  outputHighVoltage: ['voh', 'v oh', 'output high', 'output voltage high', 'output high voltage'],
  commonModeLow: ['cmvr low', 'vcm low', 'icmr low', 'vicm low', 'cm range low', 'input range low', '[input] common mode [voltage] low', '[input] common mode range low', 'input [voltage] low', 'input low side', 'cmir low'],
  commonModeHigh: ['cmvr high', 'vcm high', 'icmr high', 'vicm high', 'cm range high', 'input range high', '[input] common mode [voltage] high', '[input] common mode range high', 'input [voltage] high', 'input high side', 'cmir high'],
  commonModeHighFromRail: ['cmvr high from v+', 'vcm high from v+', 'icmr high from v+', 'input range high from v+', 'cmvr high re v+'],
  commonModeRange: ['cmvr', 'icmr', 'vicm', 'vicr', 'vcm', 'cmir', 'cm range', 'vcm range', 'input range', 'input voltage range', '[input] common mode range', '[input] common mode voltage [range]'],
  outputCurrentPlain: ['iout', 'i out', 'io', 'output current', 'output drive', 'drive current'],
} as const satisfies Record<string, readonly string[]>;

/** Identity columns beside their canonical names. */
export const IDENTITY_TERMS: Readonly<Partial<Record<IdentityField, readonly string[]>>> = {
  id: ['internal p n', 'internal pn', 'internal part number', 'internal part no', 'internal part', 'internal number', 'internal id', 'part id', 'part number', 'part no', 'part', 'p n', 'pn', 'ipn', 'house number', 'house part number', 'item', 'item number', 'item no', 'article', 'article number', 'stock number', 'company part number', 'our part number', 'cpn', 'material number'],
  description: ['descr', 'desc', 'part description', 'type description', 'text'],
  status: ['approval', 'approval status', 'approved status', 'design status', 'avl status', 'release status'],
  lifecycle: ['life cycle', 'lifecycle status', 'life cycle status', 'production status', 'lcs', 'lifecycle state'],
  package: ['pkg', 'case', 'outline', 'footprint', 'package type', 'package outline', 'housing'],
  channels: ['ch', 'chan', 'channel', 'channel count', 'number of channels', 'no of channels', 'amplifiers', 'amps', 'number of amplifiers', 'sections'],
  qualification: ['qual', 'qualification grade', 'aec', 'aec q100', 'automotive', 'grade', 'qual grade'],
  class: ['generic class', 'amplifier class', 'part class'],
  family: ['part family', 'die', 'die family', 'base part', 'drop in group'],
};

export const STATEMENT_TERMS: Readonly<Record<Statement, readonly string[]>> = {
  phaseReversal: ['phase inversion'],
  inputClamp: ['input clamps', 'clamp diodes', 'input clamp diodes', 'differential clamp'],
  inputType: ['input stage', 'input device', 'technology'],
  crossoverFree: ['zero crossover', 'no crossover', 'crossover free input', 'without crossover'],
};

/** Price, with its currency and quantity in the header. */
export const PRICE_WORDS: readonly string[] = ['price', 'unit price', 'cost', 'unit cost', 'piece price'];

/** Inputs or outputs to the rails, in words (`RRIO`) or as yes and no. */
export const RAIL_WORDS = {
  words: ['rail to rail', 'rail2rail', 'rr', 'r r', 'r2r', 'rail to rail i o', 'rrio type', 'rr type', 'rail'],
  input: ['rail to rail input', 'rri', 'rr input', 'rr in', 'input rail to rail', 'rail to rail in'],
  output: ['rail to rail output', 'rro', 'rr output', 'rr out', 'output rail to rail', 'rail to rail out'],
  both: ['rail to rail input and output', 'rail to rail input output', 'rrio', 'rail to rail in out'],
  ground: ['ground sensing', 'gnd sensing', 'input to ground', 'inputs to ground', 'inputs include ground', 'single supply input'],
} as const satisfies Record<string, readonly string[]>;

/** A condition that stands in a column of its own and holds for the swings of its row. */
export const LOAD_WORDS: readonly string[] = ['load', 'rl', 'r load', 'rload', 'load resistance', 'swing load', 'test load', 'load for swing'];

/** Columns a hardware list has and no check reads. Kept as text; those with a kind of quantity are read, so that a slip is told. */
export const KNOWN_WORDS: readonly { readonly words: readonly string[]; readonly field: FieldKind | null }[] = [
  { field: 'resistance', words: ['[recommended] rl minimum', 'rload minimum', '[recommended] load minimum', 'recommended rl', 'recommended load', 'minimum load [resistance]', 'lowest load [resistance]'] },
  { field: 'voltage', words: ['0 1 [to] 10 hz noise', 'noise 0 1 [to] 10 hz', '0 1hz [to] 10hz noise', 'low frequency noise', 'lf noise', 'flicker noise', 'noise vpp', 'peak to peak noise'] },
  { field: null, words: ['mpn', 'maker p n', 'maker pn', 'maker part number', 'maker part no', 'manufacturer part number', 'maker', 'manufacturer', 'mfr', 'mfg', 'vendor', 'supplier', 'vendor code', 'maker code'] },
  { field: null, words: ['approved by', 'approved on', 'approval date', 'review date', 'reviewed', 'reviewer', 'date', 'owner'] },
  { field: null, words: ['msl', 'rohs', 'reach', 'halogen free', 'lead finish', 'lead free', 'esd', 'esd hbm', 'esd cdm', 'hbm', 'cdm', 'operating life'] },
  { field: null, words: ['second source', 'alternative', 'alternate', 'replacement', 'quantity', 'qty', 'moq', 'currency', 'stock', 'lead time', 'price date'] },
  { field: null, words: ['datasheet', 'datasheet revision', 'document', 'revision', 'rev', 'document revision', 'notes', 'note', 'remark', 'remarks', 'comment', 'comments'] },
  { field: null, words: ['shutdown', 'enable', 'disable', 'sd pin'] },
];

/** Words of an approval or lifecycle column beside the canonical ones. An unknown word is a question. */
export const LIFECYCLE_TERMS: Readonly<Record<string, 'preliminary' | 'active' | 'nrnd' | 'last-time-buy' | 'obsolete'>> = {
  production: 'active', 'in production': 'active', 'mass production': 'active', released: 'active', 'not recommended for new design': 'nrnd',
  'not recommended for new designs': 'nrnd', 'not for new design': 'nrnd', 'not for new designs': 'nrnd', ltb: 'last-time-buy', 'last buy': 'last-time-buy',
  'end of life': 'obsolete', eol: 'obsolete', discontinued: 'obsolete', preview: 'preliminary', sampling: 'preliminary', prototype: 'preliminary',
};

/** Words for "not known" in a cell. */
export const MISSING_WORDS: readonly string[] = ['', '-', '–', 'n/a', 'n.a.', 'na', '#n/a', 'null', 'tbd', '?'];
