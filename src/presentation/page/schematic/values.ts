import type { Stage } from '../../../stage/index.js';
import { said, saidRange } from '../drawing/said.js';

type Pin = 'plus' | 'minus';

/** Value of a resistor or capacitor of the stage by its name in the network of a pin, Ω or F; null: there is none. */
export function valueOf({ network }: Stage, pin: Pin, name: string): number | null {
  return network?.[pin].elements.find((element) => element.name === name)?.value ?? null;
}

export const ohms = (name: string, value: number): string => `${name} ${said(value, 'Ω', 4)}`;
export const farads = (name: string, value: number): string => `${name} ${said(value, 'F', 4)}`;

/** Resistance in series with the signal, Ω; 0 without. */
export const sourceResistance = (stage: Stage): number => valueOf(stage, 'plus', 'source') ?? valueOf(stage, 'minus', 'source') ?? 0;

/** Extremes of an input over all corners, as labelled: AC-coupled by its peak. */
export function inputWords({ vertices, coupling }: Stage, name: string, unit: string): string {
  const values = vertices.flatMap(({ inputs }) => inputs[name] ?? []);
  if (values.length === 0) return '';
  const [least, most] = [Math.min(...values), Math.max(...values)];
  return coupling === 'ac' ? `${said(Math.max(most, -least), unit)} peak` : saidRange(least, most, unit);
}

export const supplyWords = ({ supply }: Stage): string => `V+ ${saidRange(supply.min, supply.max, 'V')}`;

export const outputWords = ({ outputNominal }: Stage): string => saidRange(outputNominal.min, outputNominal.max, 'V');

/** `Vref 1.8 V, half the supply`. */
export function referenceWords({ ends }: Stage): string {
  const volts = `Vref ${said(ends.referenceVoltage, 'V')}`;
  return ends.reference === 'mid-supply' ? `${volts}, mid-supply` : volts;
}
