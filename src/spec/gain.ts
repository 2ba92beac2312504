import type { Draft } from './draft.js';
import type { Complaint } from './problems.js';
import type { Topology, Value } from './spec.js';
import { refuse } from './refuse.js';
import { readValue } from './value.js';

/** Gain as a magnitude, V/V. What a topology cannot give is refused with the reason. */
export function readGain(draft: Draft, topology: Topology | undefined): Value | undefined {
  const read = readValue(draft, 'gain');
  if (read === undefined) return undefined;
  const complaint = impossible(read.value, topology);
  if (complaint !== null) return refuse(draft, 'gain', { code: 'S110', ...complaint });
  return { value: Math.abs(read.value), text: magnitudeText(read.text) };
}

function impossible(gain: number, topology: Topology | undefined): Omit<Complaint, 'code'> | null {
  if (topology === undefined || TURNS[topology] === undefined) return null;
  if (gain < 0) return { message: `a ${topology} stage does not invert: its gain is above 0; ${TURNS[topology]}`, fix: topology === 'follower' ? '1' : String(-gain) };
  return OUT_OF_REACH[topology]?.(gain) ?? null;
}

const ONLY_INVERTING = 'only an inverting stage turns the sign';

/** Where the sign counts: how to turn it. In an inverting stage −8 and 8 mean the same. */
const TURNS: Readonly<Partial<Record<Topology, string>>> = {
  follower: ONLY_INVERTING,
  'non-inverting': ONLY_INVERTING,
  difference: 'exchange positive and negative to turn the sign',
  'low-side-sense': 'write shunt.current with the other sign to turn it',
  'high-side-sense': 'write shunt.current with the other sign to turn it',
  'sallen-key-low-pass': 'only a multiple-feedback filter turns the sign',
};

const OUT_OF_REACH: Readonly<Partial<Record<Topology, (gain: number) => Omit<Complaint, 'code'> | null>>> = {
  follower: (gain) => (gain === 1 ? null : { message: 'a follower has a gain of exactly 1; a non-inverting stage gains more', fix: '1, or topology: non-inverting' }),
  'non-inverting': (gain) => {
    if (gain > 1) return null;
    if (gain === 1) return { message: 'a non-inverting stage with a gain of exactly 1 is a follower', fix: 'topology: follower' };
    return { message: 'a non-inverting stage has a gain of 1 + Rf/Rg, never below 1; an inverting or a difference stage can attenuate', fix: 'topology: inverting' };
  },
  'low-side-sense': (gain) => (gain > 1 ? null : { message: 'a low-side stage has a gain of 1 + Rf/Rg, above 1: it makes the small voltage of the shunt larger', fix: '40' }),
  'sallen-key-low-pass': (gain) => (gain >= 1 ? null : { message: 'a Sallen-Key filter has a gain of 1 or more; a multiple-feedback filter can attenuate', fix: '1, or topology: multiple-feedback-low-pass' }),
};

/** `−8 V/V (inverting)` → `8 V/V`. */
function magnitudeText(text: string): string {
  return text.replace(/^[−-]/, '').replace(/ \(inverting\)$/, '');
}
