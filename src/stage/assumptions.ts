import { formatQuantity } from '../quantities/format.js';
import type { SignalSpec, StageSpec, Topology } from '../spec/spec.js';
import type { Circuit } from './circuit.js';
import { gainForm } from './gain-form.js';
import { USUAL } from './usual.js';

/** Every default that was taken and everything done on the user's behalf, one sentence each, in a fixed order. */
export function assumptionsOf(spec: StageSpec, circuit: Circuit, solved: readonly string[]): string[] {
  return [...spec.notes, ...solved, ...circuit.notes, ...gainNotes(spec, circuit), ...defaults(spec), ...signalNotes(spec, circuit), ...referenceNotes(spec, circuit)];
}

/** A gain that series resistance takes further away than the resistors are known. */
export function gainCautions(spec: StageSpec, circuit: Circuit): string[] {
  const bare = bareGain(spec, circuit);
  if (bare === null || circuit.resistors === null) return [];
  const asked = Math.sign(circuit.gain) * (spec.gain?.value ?? Math.abs(bare));
  if (Math.abs(circuit.gain / asked - 1) <= circuit.resistors.tolerance || Math.abs(circuit.gain / bare - 1) < 1e-9) return [];
  const [series, of] = gainForm(spec.topology) === 'non-inverting' ? [spec.reference?.resistance, 'reference'] : [spec.source?.resistance, 'source'];
  return [`gain ${gainText(circuit.gain)} instead of ${gainText(asked)}: ${series?.text ?? ''} ${of} in series with ${formatQuantity(circuit.resistors.input, 'Ω', { digits: 3 })}`];
}

/** A stage that has one gain at DC and another where the bypass of the reference shorts its resistance; peaks of the output in V. */
export function bypassCautions(spec: StageSpec, circuit: Circuit, peaks: { readonly direct: number; readonly signal: number }): string[] {
  const { resistance, bypass } = spec.reference ?? {};
  if (circuit.signalCorners === undefined || resistance === undefined || bypass === undefined) return [];
  const volts = (peak: number): string => formatQuantity(peak, 'V', { digits: 3 });
  const swing = peaks.signal > peaks.direct * (1 + 1e-9) ? `, where the output swings ${volts(peaks.signal)} about its middle instead of ${volts(peaks.direct)}` : '';
  return [`the bypass of ${bypass.text} takes the ${resistance.text} of the reference out of the gain at signal frequencies${swing}; output range, output current and DC error are judged with the gain at DC`];
}

const gainText = (gain: number): string => formatQuantity(gain, 'V/V', { digits: 3 }).replace(/ V\/V$/u, '');

/** Signed gain of the resistors alone; null without any. */
function bareGain({ topology }: StageSpec, { resistors, gain }: Circuit): number | null {
  if (resistors === null || gainForm(topology) === null) return null;
  const ratio = resistors.feedback / resistors.input;
  return gainForm(topology) === 'non-inverting' ? 1 + ratio : Math.sign(gain) * ratio;
}

/** What of the reference is written and not counted. */
function referenceNotes(spec: StageSpec, circuit: Circuit): string[] {
  const { load, reference } = spec;
  const { resistance, bypass } = reference ?? {};
  const isWeak = load?.to === 'reference' && load.resistance !== undefined && resistance !== undefined && resistance.value > 0;
  return [
    ...(isWeak ? [`load to the reference: taken as a stiff voltage, its ${resistance.text} is not counted for the load`] : []),
    ...(bypass === undefined || isBypassed(circuit) ? [] : [`bypass ${bypass.text} is not counted: ${unbypassed(spec)}`]),
  ];
}

/** Whether the network of either input carries the capacitor across the reference. */
function isBypassed({ network }: Circuit): boolean {
  return network !== null && [network.plus, network.minus].some(({ elements }) => elements.some(({ name }) => name === 'bypass'));
}

function unbypassed({ reference, signal }: StageSpec): string {
  if ((reference?.resistance?.value ?? 0) === 0) return 'the reference has no resistance';
  return signal.coupling === 'ac' ? 'the resistance is the bias resistor at the + input' : 'the reference does not reach the inputs';
}

/** Series resistance of source or reference changes the gain: said, since the resistors alone do not show it. */
function gainNotes(spec: StageSpec, circuit: Circuit): string[] {
  const bare = bareGain(spec, circuit);
  if (bare === null || Math.abs(circuit.gain / bare - 1) < 1e-9) return [];
  return [`gain ${formatQuantity(circuit.gain, 'V/V', { digits: 4 })} with the series resistance of source or reference, ${formatQuantity(bare, 'V/V', { digits: 4 })} without`];
}

/** Driven by currents or by its own output: no source, no coupling. */
const OWN_DRIVE: readonly Topology[] = ['transimpedance', 'low-side-sense', 'high-side-sense', 'relaxation-oscillator'];
/** Made with capacitors whose tolerance counts. */
const WITH_CAPACITORS: readonly Topology[] = ['sallen-key-low-pass', 'multiple-feedback-low-pass', 'integrator', 'relaxation-oscillator', 'transimpedance'];

function defaults(spec: StageSpec): string[] {
  const { topology, positions, reference, signal, source, load, temperature, resistors, capacitors, limits, supplyPeak } = spec;
  const oscillates = topology === 'relaxation-oscillator';
  const hasSource = topology !== 'summing' && !OWN_DRIVE.includes(topology);
  const taken: readonly (string | false | null)[] = [
    positions['signal.coupling'] === undefined && !OWN_DRIVE.includes(topology) && 'signal.coupling dc',
    reference === undefined && signal.output === undefined && topology !== 'follower' && !oscillates && 'reference ground',
    source === undefined && hasSource && 'source resistance 0 Ω',
    load === undefined && 'no load at the output',
    temperature === undefined && 'temperature 25 °C',
    topology !== 'follower' && resistors?.tolerance === undefined && 'resistor tolerance 1 %',
    (WITH_CAPACITORS.includes(topology) || capacitors?.feedback !== undefined) && capacitors?.tolerance === undefined && 'capacitor tolerance 5 %',
    limits.swingLoss === undefined && !oscillates && 'swing loss 0 V: the whole wanted swing must be there',
    ...(oscillates ? [] : [usualGainError(spec), usualMargin(spec), usualNoise(spec), unasked(spec)]),
    spec.dutyCycle !== undefined && spec.battery !== undefined && 'battery life counts the stage as always on',
    supplyPeak === undefined && 'supply peak is the top of the supply',
  ];
  return taken.filter((sentence) => typeof sentence === 'string');
}

const FILTERS: readonly Topology[] = ['sallen-key-low-pass', 'multiple-feedback-low-pass'];

/** A filter has a corner to keep, whatever the signal; an edge is held to its time. */
function usualGainError({ topology, signal, limits }: StageSpec): string | null {
  if (limits.gainError !== undefined) return null;
  const error = formatQuantity(USUAL.gainError * 100, '%');
  if (FILTERS.includes(topology)) {
    const isCorner = (limits.gainErrorKind ?? (signal.frequency === undefined ? 'corner' : 'magnitude')) === 'corner';
    const top = signal.frequency === undefined || isEdge(signal) ? 'the corner' : 'the top frequency';
    return isCorner ? `corner off by at most ${error}` : `gain error ${error} up to ${top}`;
  }
  return signal.frequency === undefined || isEdge(signal) ? null : `gain error ${error} at the top frequency`;
}

function usualMargin({ load, limits }: StageSpec): string | null {
  const { capacitance } = load ?? {};
  if (limits.phaseMargin !== undefined || capacitance === undefined || capacitance.value === 0) return null;
  return `phase margin ${formatQuantity(USUAL.phaseMargin, '°')} with the load of ${formatQuantity(capacitance.value, 'F')}`;
}

function usualNoise({ limits, signal }: StageSpec): string | null {
  if (signal.observation !== undefined || (limits.outputNoise ?? limits.snr) === undefined) return null;
  return `noise counted from ${formatQuantity(USUAL.lowestNoise, 'Hz')} on`;
}

const isEdge = ({ shape }: SignalSpec): boolean => shape === 'step' || shape === 'pulse';

/** Which speed of the amplifier is not asked, since nothing says how fast the signal is. */
function unasked({ topology, signal, limits }: StageSpec): string | null {
  const hasEdge = isEdge(signal);
  if (!hasEdge && signal.frequency !== undefined) return null;
  // A filter has a corner to keep, and settling asks a bandwidth, whatever the signal is.
  const hasBandwidth = limits.settling !== undefined || FILTERS.includes(topology);
  if (!hasEdge) return `no signal frequency: slew rate ${hasBandwidth ? 'is' : 'and gain bandwidth are'} not asked`;
  return signal.edge === undefined && limits.settling === undefined ? 'no edge: slew rate is not asked' : null;
}

function signalNotes(spec: StageSpec, circuit: Circuit): string[] {
  const isStabilityAsked = spec.limits.phaseMargin !== undefined || spec.load?.capacitance !== undefined;
  return [
    ...(spec.signal.coupling === 'ac' ? [averageNote(spec.signal)] : []),
    ...feedbackCapacitorNotes(spec, circuit),
    ...(isStabilityAsked || circuit.network === null ? [] : ["stability: the part's own compensation is assumed to hold"]),
  ];
}

/** Where an AC-coupled signal stands about its bias. */
function averageNote({ shape, duty }: SignalSpec): string {
  if (shape === 'step') return 'AC-coupled step: up to Vpp each side of the bias';
  if (shape !== 'pulse') return 'AC-coupled: the signal is taken to swing symmetrically about its average';
  return duty === undefined ? 'free duty: up to Vpp each side of the bias' : `duty ${duty.text}: the pulse stands about its average, which is the bias`;
}

/** A capacitor across the feedback resistor rolls the gain off by itself; without a feedback resistor it does nothing. */
function feedbackCapacitorNotes({ capacitors, topology }: StageSpec, { network, resistors }: Circuit): string[] {
  const { feedback } = capacitors ?? {};
  if (feedback === undefined || topology === 'transimpedance') return [];
  const isThere = network?.minus.elements.some(({ name }) => name === 'feedback capacitor') === true;
  if (!isThere || resistors === null) return [`feedback capacitor ${feedback.text} is not counted: this stage has no feedback resistor it lies across`];
  const pole = formatQuantity(1 / (2 * Math.PI * resistors.feedback * feedback.value), 'Hz');
  return [`feedback capacitor ${feedback.text}: its own roll-off from ${pole} on belongs to the stage and is not charged to the amplifier`];
}
