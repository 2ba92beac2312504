import type { Draft } from './draft.js';
import { present } from './present.js';
import { refuse } from './refuse.js';
import { field } from './schema.js';
import type { CapacitorsSpec, DrivesSpec, FilterSpec, IntegratorSpec, OscillatorSpec, SignalSpec } from './spec.js';
import { isUnder } from './tree.js';
import { readRange, readValue } from './value.js';

/** Corner in Hz and Q, or components in Ω and F. */
export function readFilter(draft: Draft): FilterSpec | undefined {
  if (!isWritten(draft, 'filter')) return undefined;
  return present({
    corner: readValue(draft, 'filter.corner'),
    q: readValue(draft, 'filter.q'),
    r1: readValue(draft, 'filter.r1'),
    r2: readValue(draft, 'filter.r2'),
    r3: readValue(draft, 'filter.r3'),
    c1: readValue(draft, 'filter.c1'),
    c2: readValue(draft, 'filter.c2'),
  });
}

/** F; tolerance as a fraction. */
export function readCapacitors(draft: Draft): CapacitorsSpec | undefined {
  if (!isWritten(draft, 'capacitors')) return undefined;
  return present({ feedback: readValue(draft, 'capacitors.feedback'), tolerance: readValue(draft, 'capacitors.tolerance') });
}

/** Ω, F, s. Something must bound the swing: the window, a resistor across the capacitor, or of an AC-coupled signal the lowest frequency. */
export function readIntegrator(draft: Draft, signal: SignalSpec): IntegratorSpec | undefined {
  const resistance = readValue(draft, 'integrator.resistance');
  const capacitance = readValue(draft, 'integrator.capacitance');
  const window = readValue(draft, 'integrator.window');
  if (isWritten(draft, 'integrator') && !draft.positions.has('resistors.feedback') && !draft.positions.has('integrator.window')) refuseUnbounded(draft, signal);
  return resistance === undefined || capacitance === undefined ? undefined : { resistance, capacitance, ...present({ window }) };
}

function refuseUnbounded(draft: Draft, { coupling, frequency }: SignalSpec): void {
  if (coupling === 'ac' && (frequency?.bottom !== undefined || (frequency === undefined && draft.positions.has('signal.frequency')))) return;
  const [why, fix] =
    coupling === 'ac'
      ? ['an AC-coupled integrator needs the lowest frequency, a window or resistors.feedback to bound its swing', 'signal: {frequency: 50 Hz..1 kHz}']
      : ['a DC-coupled integrator needs the time from one reset to the next, or resistors.feedback across its capacitor, or its output runs to a rail', 'integrator: {window: 20 ms}'];
  refuse(draft, 'integrator.window', { code: 'S102', message: `integrator.window is missing: ${why}; accepted: ${field('integrator.window').accepted}`, fix });
}

/** Hz, Ω, F; edge as a fraction of the half period. */
export function readOscillator(draft: Draft): OscillatorSpec | undefined {
  const frequency = readValue(draft, 'oscillator.frequency');
  const more = present({
    edge: readValue(draft, 'oscillator.edge'),
    resistance: readValue(draft, 'oscillator.resistance'),
    capacitance: readValue(draft, 'oscillator.capacitance'),
    toSupply: readValue(draft, 'oscillator.toSupply'),
    toGround: readValue(draft, 'oscillator.toGround'),
    toOutput: readValue(draft, 'oscillator.toOutput'),
  });
  return frequency === undefined ? undefined : { frequency, ...more };
}

/** Thresholds as shares of the supply; s. */
export function readDrives(draft: Draft): DrivesSpec | undefined {
  const threshold = readRange(draft, 'drives.threshold', 'the lower and the upper threshold');
  const maxEdge = readValue(draft, 'drives.maxEdge');
  return threshold === undefined ? undefined : { threshold, ...present({ maxEdge }) };
}

function isWritten(draft: Draft, map: string): boolean {
  return [...draft.fields.keys()].some((path) => isUnder(path, map));
}
