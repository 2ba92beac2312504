import { formatQuantity } from '../quantities/format.js';
import type { StageSpec } from '../spec/spec.js';
import type { Circuit } from './circuit.js';

/** Every default that was taken and everything done on the user's behalf, one sentence each, in a fixed order. */
export function assumptionsOf(spec: StageSpec, circuit: Circuit, solved: readonly string[]): string[] {
  return [...spec.notes, ...solved, ...circuit.notes, ...gainNotes(spec, circuit), ...defaults(spec), ...signalNotes(spec), ...referenceNotes(spec)];
}

/** A gain that series resistance takes further away than the resistors are known. */
export function gainCautions(spec: StageSpec, circuit: Circuit): string[] {
  const bare = bareGain(spec, circuit);
  if (bare === null || circuit.resistors === null) return [];
  const asked = Math.sign(circuit.gain) * (spec.gain?.value ?? Math.abs(bare));
  if (Math.abs(circuit.gain / asked - 1) <= circuit.resistors.tolerance || Math.abs(circuit.gain / bare - 1) < 1e-9) return [];
  const [series, of] = spec.topology === 'non-inverting' ? [spec.reference?.resistance, 'reference'] : [spec.source?.resistance, 'source'];
  return [`gain ${gainText(circuit.gain)} instead of ${gainText(asked)}: ${series?.text ?? ''} ${of} in series with ${formatQuantity(circuit.resistors.input, 'Ω', { digits: 3 })}`];
}

const gainText = (gain: number): string => formatQuantity(gain, 'V/V', { digits: 3 }).replace(/ V\/V$/u, '');

/** Signed gain of the resistors alone; null without any. */
function bareGain({ topology }: StageSpec, { resistors, gain }: Circuit): number | null {
  if (resistors === null) return null;
  const ratio = resistors.feedback / resistors.input;
  return topology === 'non-inverting' ? 1 + ratio : Math.sign(gain) * ratio;
}

/** What of the reference is written and not counted. */
function referenceNotes({ load, reference }: StageSpec): string[] {
  const { resistance, bypass } = reference ?? {};
  const isWeak = load?.to === 'reference' && load.resistance !== undefined && resistance !== undefined && resistance.value > 0;
  return [
    ...(isWeak ? [`load to the reference: taken as a stiff voltage, its ${resistance.text} is not counted for the load`] : []),
    ...(bypass === undefined ? [] : [`bypass ${bypass.text} is not used by this version`]),
  ];
}

/** Series resistance of source or reference changes the gain: said, since the resistors alone do not show it. */
function gainNotes(spec: StageSpec, circuit: Circuit): string[] {
  const bare = bareGain(spec, circuit);
  if (bare === null || Math.abs(circuit.gain / bare - 1) < 1e-9) return [];
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
