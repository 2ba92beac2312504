import type { Condition, Figure, LimitKind, Parameter } from '../../src/parts/figures.js';
import type { DrawnStage } from './stage-drawn.js';

/** With how much trust a figure is read. */
export type Reading = 'pessimistic' | 'optimistic';
export const READINGS: readonly Reading[] = ['pessimistic', 'optimistic'];

/** How a figure is printed: a limit or a typical, at 25 °C or with no temperature said. */
export interface Print {
  readonly kind: LimitKind;
  readonly at25: boolean;
}

export function figureOf(parameter: Parameter, print: Print, value: number, condition: Condition = {}): Figure {
  return { parameter, kind: print.kind, value, condition: { ...condition, ...(print.at25 ? { temperature: 25 } : {}) } };
}

/** Factors of the written rules, by hand from their table: what a typical figure is multiplied by, and a 25 °C one far from 25 °C. */
const TYPICAL = { slewRate: 0.6, gainBandwidth: 0.6, offsetVoltage: 3, offsetDrift: 3, biasCurrent: 4, offsetCurrent: 4, commonModeRejection: 1 / 3.16, supplyRejection: 1 / 3.16, openLoopGain: 1 / 3.16 } as const;
const AWAY = { slewRate: 0.8, gainBandwidth: 0.8 } as const;

export function kelvin({ temperature }: DrawnStage): number {
  return Math.max(Math.abs(temperature.min - 25), Math.abs(temperature.max - 25));
}

const isFar = (stage: DrawnStage): boolean => kelvin(stage) > 15;

/** A figure that is multiplied as it counts in a reading. */
export function counted(parameter: keyof typeof TYPICAL, of: { print: Print; value: number; stage: DrawnStage }, reading: Reading): number {
  if (reading === 'optimistic') return of.value;
  const typical = of.print.kind === 'typ' ? TYPICAL[parameter] : 1;
  const away = of.print.at25 && isFar(of.stage) && parameter in AWAY ? AWAY[parameter as keyof typeof AWAY] : 1;
  return of.value * typical * away;
}

/** A head-room, which loses half its magnitude when typical; at the output 0.5 % per kelvin when rated at 25 °C and used far away. */
export function countedHeadroom(of: { print: Print; value: number; stage: DrawnStage }, reading: Reading, atOutput: boolean): number {
  if (reading === 'optimistic') return of.value;
  const typical = of.print.kind === 'typ' ? of.value + Math.abs(of.value) / 2 : of.value;
  return atOutput && of.print.at25 && isFar(of.stage) ? typical * (1 + 0.005 * kelvin(of.stage)) : typical;
}
