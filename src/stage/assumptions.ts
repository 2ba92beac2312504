import { formatQuantity } from '../quantities/format.js';
import type { StageSpec } from '../spec/spec.js';
import type { Circuit } from './circuit.js';

/** Every default that was taken and everything done on the user's behalf, one sentence each, in a fixed order. */
export function assumptionsOf(spec: StageSpec, circuit: Circuit, solved: readonly string[]): string[] {
  return [...spec.notes, ...solved, ...circuit.notes, ...gainNotes(spec, circuit), ...defaults(spec), ...signalNotes(spec)];
}

/** Series resistance of source or reference changes the gain: said, since the resistors alone do not show it. */
function gainNotes(spec: StageSpec, circuit: Circuit): string[] {
  const fitted = circuit.resistors;
  if (fitted === null) return [];
  const ratio = fitted.feedback / fitted.input;
  const bare = spec.topology === 'non-inverting' ? 1 + ratio : ratio;
  if (Math.abs(Math.abs(circuit.gain) / bare - 1) < 1e-9) return [];
  return [`gain ${formatQuantity(circuit.gain, 'V/V', { digits: 4 })} with the series resistance of source or reference, ${formatQuantity(bare, 'V/V', { digits: 4 })} without`];
}

function defaults(spec: StageSpec): string[] {
  const taken: [boolean, string][] = [
    [spec.positions['signal.coupling'] === undefined, 'signal.coupling dc'],
    [spec.reference === undefined && spec.signal.output === undefined && spec.topology !== 'follower', 'reference ground'],
    [spec.source === undefined, 'source resistance 0 Ω'],
    [spec.load === undefined, 'no load at the output'],
    [spec.temperature === undefined, 'temperature 25 °C'],
    [spec.topology !== 'follower' && spec.resistors?.tolerance === undefined, 'resistor tolerance 1 %'],
    [spec.limits.swingLoss === undefined, 'swing loss 0 V: the whole wanted swing must be there'],
    [spec.limits.gainError === undefined && spec.signal.frequency !== undefined, 'gain error 1 % at the top frequency'],
    [spec.signal.frequency === undefined, 'no signal frequency: slew rate and gain bandwidth are not asked'],
    [spec.supplyPeak === undefined, 'supply peak is the top of the supply'],
  ];
  return taken.filter(([applies]) => applies).map(([, sentence]) => sentence);
}

function signalNotes(spec: StageSpec): string[] {
  const notes: string[] = [];
  if (spec.signal.coupling === 'ac') notes.push('AC-coupled: the signal is taken to swing symmetrically about its average');
  if (spec.limits.phaseMargin !== undefined) return notes;
  const capacitance = spec.load?.capacitance;
  notes.push(
    capacitance === undefined || capacitance.value === 0
      ? "stability: the part's own compensation is assumed to hold"
      : `stability with ${capacitance.text} at the output is not judged by this version: the part's own compensation is assumed; measure it`,
  );
  return notes;
}
