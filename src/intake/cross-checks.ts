import type { LimitKind, Parameter } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import type { CellFault } from './cell-fault.js';
import { cellProblem } from './cell-fault.js';
import { medianWarnings } from './column-median.js';
import type { ReadPart } from './identity.js';
import type { ListColumn } from './list.js';
import { packageWarning, qualificationWarning } from './package-check.js';
import type { ProblemLog } from './problem-log.js';

/** A figure that counts in a cross-check, with its column. */
export interface Checked {
  readonly value: number;
  readonly column: ListColumn;
}

/** One warning of a cross-check, at the cell it doubts. */
export interface Doubt {
  readonly one: ReadPart;
  readonly column: ListColumn;
  readonly fault: CellFault;
}

/** Warns of figures that do not go together: within a part, and against the other rows. `suspect` columns have been told already. */
export function crossChecks(read: readonly ReadPart[], columns: readonly ListColumn[], { log, suspect }: { readonly log: ProblemLog; readonly suspect: ReadonlySet<number> }): void {
  const doubts = [...currentDoubts(read), ...read.flatMap((one) => [slewDoubt(one), packageWarning(one, columns), qualificationWarning(one, columns)].filter((doubt) => doubt !== null))];
  const told = new Set(doubts.map(({ one, column }) => `${one.record.row} ${column.number}`));
  const medians = medianWarnings(read).filter(({ one, column }) => !told.has(`${one.record.row} ${column.number}`));
  for (const { one, column, fault } of [...doubts, ...medians]) {
    if (suspect.has(column.number)) continue;
    log.add(cellProblem(fault, { file: log.file, record: one.record, column, part: one.part.id === '' ? null : one.part.id }, 'warning'));
  }
}

/** The first of these kinds a part has of a parameter. */
export function checkedFigure({ part, sources }: ReadPart, parameter: Parameter, kinds: readonly LimitKind[]): Checked | null {
  for (const kind of kinds) {
    const index = part.figures.findIndex((one) => one.parameter === parameter && one.kind === kind && one.assumed !== true);
    const [figure, column] = [part.figures[index], sources[index]];
    if (figure !== undefined && column != null) return { value: figure.value, column };
  }
  return null;
}

/** Gain bandwidth for each ampere of supply current, Hz/A: 0.5 to 100 MHz per mA (common practice for voltage-feedback amplifiers). */
const [LEAST, MOST] = [0.5e9, 100e9];

function currentDoubts(read: readonly ReadPart[]): Doubt[] {
  let [least, most] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  const unusual: Ratio[] = [];
  for (const one of read) {
    const ratio = ratioOf(one);
    if (ratio === null) continue;
    if (!isUsual(ratio.ratio)) unusual.push(ratio);
    else [least, most] = [Math.min(least, ratio.ratio), Math.max(most, ratio.ratio)];
  }
  const range = least > most ? '0.5 to 100 MHz per mA is usual' : `the other rows have ${words(least / 1e9)} to ${words(most / 1e9)} MHz per mA`;
  return unusual.map(({ one, bandwidth, current, ratio }) => {
    const factor = [1e3, 1e-3, 1e6, 1e-6].find((power) => isUsual(ratio * power));
    const fit = factor === undefined ? '' : `; ${amperes(current.value / factor)} would fit`;
    const reason = `${amperes(current.value)} for a part of ${hertz(bandwidth)} is far off: ${range}${fit}`;
    const fix = factor === undefined ? 'check the unit of both' : `${plainNumber(one, current.column, factor)}${amperes(current.value / factor)}`;
    return { one, column: current.column, fault: { code: 'I601', reason, fix } };
  });
}

interface Ratio {
  readonly one: ReadPart;
  readonly bandwidth: number;
  readonly current: Checked;
  /** Hz/A. */
  readonly ratio: number;
}

function ratioOf(one: ReadPart): Ratio | null {
  const bandwidth = checkedFigure(one, 'gainBandwidth', ['typ', 'min'])?.value ?? likelyBandwidth(one);
  const current = checkedFigure(one, 'quiescentCurrent', ['typ', 'max']);
  return bandwidth === null || current === null ? null : { one, bandwidth, current, ratio: bandwidth / current.value };
}

const isUsual = (ratio: number): boolean => ratio >= LEAST && ratio <= MOST;

/** `0.025 or `: the number of the cell in the header's unit, where it is a plain one. */
function plainNumber({ record }: ReadPart, column: ListColumn, factor: number): string {
  const cell = (record.cells[column.number - 1] ?? '').trim();
  return /^\d+(?:\.\d+)?$/u.test(cell) ? `${Number((Number(cell) / factor).toPrecision(12))} or ` : '';
}

/** A bandwidth that was refused for want of a unit, as it most likely is meant: by the first reading its fix offers. */
function likelyBandwidth({ faults }: ReadPart): number | null {
  const found = faults.find(({ column: { reading }, fault }) => reading.kind === 'measured' && reading.target === 'gainBandwidth' && (fault.code === 'Q001' || fault.code === 'Q002'));
  const result = found?.fault.fix === undefined ? null : parseQuantity(found.fault.fix.split(/ or |, /u)[0] ?? '', 'gbw');
  return result?.ok === true ? (result.quantity.nominal ?? null) : null;
}

/** Slew rate over 2π·GBW is the voltage that steers the whole tail current: tens of millivolts to some volts (common practice). */
const [LEAST_STEERING, MOST_STEERING] = [0.02, 20];

function slewDoubt(one: ReadPart): Doubt | null {
  const slew = checkedFigure(one, 'slewRate', ['typ', 'min']);
  const bandwidth = checkedFigure(one, 'gainBandwidth', ['typ', 'min']);
  if (slew === null || bandwidth === null) return null;
  const steering = slew.value / (2 * Math.PI * bandwidth.value);
  if (steering >= LEAST_STEERING && steering <= MOST_STEERING) return null;
  const factor = [1e3, 1e-3, 1e6, 1e-6].find((power) => steering * power >= LEAST_STEERING && steering * power <= MOST_STEERING);
  const fit = factor === undefined ? 'check the unit of both' : slewWords(slew.value * factor);
  const reason = `slew rate / (2π·GBW) is ${volts(steering)}, ${steering < LEAST_STEERING ? 'far below' : 'far above'} any input stage (20 mV to 20 V)`;
  return { one, column: slew.column, fault: { code: 'I607', reason, fix: fit } };
}

const words = (value: number): string => String(Number(value.toPrecision(2)));
const scaled = (value: number, units: readonly (readonly [number, string])[]): string => {
  const [size, unit] = units.find(([least]) => Math.abs(value) >= least) ?? units.at(-1) ?? [1, ''];
  return `${Number((value / size).toPrecision(3))} ${unit}`;
};
const amperes = (value: number): string => scaled(value, [[1, 'A'], [1e-3, 'mA'], [1e-6, 'µA'], [1e-9, 'nA']]);
const hertz = (value: number): string => (value >= 1e5 ? `${Number((value / 1e6).toPrecision(3))} MHz` : scaled(value, [[1e3, 'kHz'], [1, 'Hz']]));
const volts = (value: number): string => scaled(value, [[1, 'V'], [1e-3, 'mV'], [1e-6, 'µV'], [1e-9, 'nV']]);
const slewWords = (value: number): string => scaled(value, [[1e6, 'V/µs'], [1e3, 'V/ms'], [1, 'V/s']]);
