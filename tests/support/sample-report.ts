import { demandsOf, explain, shortlist } from '../../src/engine.js';
import type { Condition, Figure, LimitKind, Parameter } from '../../src/parts/figures.js';
import { figureSlot } from '../../src/parts/figures.js';
import type { Origin, Part, PartSource } from '../../src/parts/part.js';
import type { Style } from '../../src/presentation/style.js';
import type { Asking, DemandsReport, Explanation, Report } from '../../src/report.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { option, specOf } from './stage-file.js';

/** A small stage that asks most of what is judged. */
export const STAGE_TEXT = `name: Soil-moisture probe
topology: non-inverting
supply: 3.0..4.2 V
supplyPeak: 4.5 V
gain: 8
resistors: {feedback: 70 kΩ, input: 10 kΩ, tolerance: 1 %}
reference: ground
signal: {input: 25 mV..330 mV, frequency: 2 kHz, coupling: dc}
source: {resistance: 1 kΩ}
load: {resistance: 10 kΩ, to: ground}
temperature: -20..60 °C
limits: {swingLoss: 0 mV, gainError: 1 %, dcError: 40 mV, supplyCurrent: 90 µA}
wishes: {channels: 1, status: [approved]}
`;

export function sampleStage(changes: Readonly<Record<string, string>> = {}): Stage {
  const overrides = Object.entries(changes).map(([path, text]) => option(path, text));
  const built = buildStage(specOf(STAGE_TEXT, overrides));
  if (built.ok) return built.stage;
  throw new Error(built.problems.map(({ message }) => message).join('\n'));
}

type Row = readonly [Parameter, LimitKind, number, Condition?];

const figuresOf = (rows: readonly Row[]): Figure[] => rows.map(([parameter, kind, value, condition = {}]) => ({ parameter, kind, value, condition }));

const HEAVY = { load: { kind: 'current', amperes: 2e-3 }, supply: 3 } as const;
const LIGHT = { load: { kind: 'resistance', ohms: 10e3, to: 'mid-supply' }, supply: 3 } as const;

const COMMON: readonly Row[] = [
  ['supplyVoltage', 'min', 1.8], ['supplyVoltage', 'max', 5.5], ['supplyAbsoluteMaximum', 'max', 6],
  ['inputLowHeadroom', 'max', -0.1], ['inputHighHeadroom', 'max', 1.2],
  ['outputLowHeadroom', 'max', 0.025, LIGHT], ['outputHighHeadroom', 'max', 0.03, LIGHT],
  ['outputLowHeadroom', 'max', 0.2, HEAVY], ['outputHighHeadroom', 'max', 0.22, HEAVY], ['outputCurrent', 'min', 5e-3],
  ['minimumStableGain', 'max', 1], ['openLoopGain', 'min', 1e5],
  ['biasCurrent', 'max', 20e-12, { temperature: 85 }], ['offsetCurrent', 'max', 20e-12, { temperature: 85 }],
  ['supplyRejection', 'min', 1e4], ['temperature', 'min', -40], ['temperature', 'max', 125],
];

const BLANK: Omit<Part, 'id' | 'figures'> = {
  tier: 'approved', description: null, status: 'approved', lifecycle: 'active', package: 'SOT-23-5', channels: 1, qualification: null,
  class: null, family: null, price: null, phaseReversal: false, inputClamp: null, inputType: 'fet', crossoverFree: null,
};

function part(id: string, identity: Partial<Part>, rows: readonly Row[]): Part {
  return { ...BLANK, ...identity, id, figures: figuresOf([...COMMON, ...rows]) };
}

const price = (amount: number): Part['price'] => ({ amount, currency: 'EUR', quantity: 1000 });

/** Hand-written, no real part: one fits on limits, one on typical figures, one is a class, one lacks a figure, two are out. */
export const SAMPLE_PARTS: readonly Part[] = [
  part('TEAM-0005', { description: '350 kHz, zero-drift', price: price(0.72) }, [
    ['slewRate', 'min', 0.1e6], ['gainBandwidth', 'min', 0.3e6], ['offsetVoltage', 'max', 15e-6], ['offsetDrift', 'max', 0.08e-6],
    ['commonModeRejection', 'min', 1e5], ['quiescentCurrent', 'max', 35e-6],
  ]),
  part('TEAM-0012', { description: '1 MHz, low offset', channels: 2, price: price(0.34) }, [
    ['slewRate', 'typ', 0.5e6], ['gainBandwidth', 'typ', 1e6], ['offsetVoltage', 'max', 0.5e-3], ['offsetDrift', 'typ', 2e-6],
    ['commonModeRejection', 'min', 1e4], ['quiescentCurrent', 'max', 62e-6],
  ]),
  part('TEAM-0031', { description: '1 MHz, 1 mV offset', price: price(0.22) }, [
    ['slewRate', 'min', 0.3e6], ['gainBandwidth', 'min', 0.7e6], ['offsetVoltage', 'max', 1e-3], ['commonModeRejection', 'min', 1e4], ['quiescentCurrent', 'max', 70e-6],
  ]),
  part('TEAM-0001', { description: '1 MHz, general purpose', status: 'conditional', price: price(0.14) }, [
    ['slewRate', 'min', 0.3e6], ['gainBandwidth', 'min', 0.7e6], ['offsetVoltage', 'max', 5e-3], ['offsetDrift', 'typ', 2e-6],
    ['commonModeRejection', 'min', 3e3], ['quiescentCurrent', 'max', 98e-6],
  ]),
  part('TEAM-0007', { description: '10 kHz, nanopower', price: price(0.55) }, [
    ['slewRate', 'typ', 4e3], ['gainBandwidth', 'typ', 10e3], ['offsetVoltage', 'max', 1e-3], ['offsetDrift', 'max', 3e-6],
    ['commonModeRejection', 'min', 1e4], ['quiescentCurrent', 'max', 1e-6],
  ]),
  part('GX-LV-1M', { tier: 'generic', description: '1 MHz, 2 mV offset', class: 'low-voltage-1mhz', status: null, lifecycle: null, price: price(0.21) }, [
    ['slewRate', 'typ', 0.5e6], ['gainBandwidth', 'typ', 1e6], ['offsetVoltage', 'max', 2e-3], ['offsetDrift', 'typ', 2e-6],
    ['commonModeRejection', 'min', 3e3], ['quiescentCurrent', 'max', 75e-6],
  ]),
];

/** As an imported list would answer: row by part, column by figure; an empty drift cell of TEAM-0031 says TBD. */
function originOf(id: string, slot: string): Origin | null {
  const at = SAMPLE_PARTS.findIndex((one) => one.id === id);
  const found = SAMPLE_PARTS[at];
  if (found === undefined) return null;
  const column = found.figures.findIndex((figure) => figureSlot(figure) === slot) + 10;
  const header = slot.replace('.', ' ');
  if (found.tier === 'generic') return column < 10 ? null : { kind: 'generic', id, header, cell: String(found.figures[column - 10]?.value) };
  const cell = column < 10 ? 'TBD' : String(found.figures[column - 10]?.value);
  return { kind: 'cell', file: 'approved.csv', sha256: '41bb07d2c0ffee00', line: at + 2, row: at + 2, column: Math.max(column, 9), columnLetter: letterOf(Math.max(column, 9)), header, cell };
}

/** As a spreadsheet names the first 52 columns. */
const letterOf = (column: number): string => (column > 26 ? 'A' : '') + String.fromCharCode(65 + ((column - 1) % 26));

export function sampleSource(parts: readonly Part[] = SAMPLE_PARTS): PartSource {
  return { parts, sha256: '9f2c1e40aa55aa55', origin: originOf };
}

export function sampleReport(changes: Readonly<Record<string, string>> = {}, parts: readonly Part[] = SAMPLE_PARTS, asking?: Asking): Report {
  return shortlist(sampleStage(changes), sampleSource(parts), asking);
}

export function sampleExplanation(id: string, changes: Readonly<Record<string, string>> = {}): Explanation {
  const found = SAMPLE_PARTS.find((one) => one.id === id);
  if (found === undefined) throw new Error(`no sample part ${id}`);
  return explain(sampleStage(changes), sampleSource(), { part: found });
}

export const sampleDemands = (changes: Readonly<Record<string, string>> = {}): DemandsReport => demandsOf(sampleStage(changes));

export function styleOf(width: number, more: Partial<Style> = {}): Style {
  return { width, ascii: false, colour: false, top: 20, all: false, sources: false, gluedUnits: false, ...more };
}

export const CONTEXT = { command: 'railfit', stageFile: 'probe.yaml' };
