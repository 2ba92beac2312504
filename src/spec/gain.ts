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
  if (topology === 'inverting' || topology === undefined) return null;
  if (gain < 0) return { message: `a ${topology} stage does not invert: its gain is above 0; ${SIGN[topology]}`, fix: topology === 'follower' ? '1' : String(-gain) };
  if (topology === 'follower' && gain !== 1) return { message: 'a follower has a gain of exactly 1; a non-inverting stage gains more', fix: '1, or topology: non-inverting' };
  if (topology !== 'non-inverting') return null;
  if (gain === 1) return { message: 'a non-inverting stage with a gain of exactly 1 is a follower', fix: 'topology: follower' };
  if (gain < 1) return { message: 'a non-inverting stage has a gain of 1 + Rf/Rg, never below 1; an inverting or a difference stage can attenuate', fix: 'topology: inverting' };
  return null;
}

const SIGN = {
  follower: 'only an inverting stage turns the sign',
  'non-inverting': 'only an inverting stage turns the sign',
  difference: 'exchange positive and negative to turn the sign',
} as const;

/** `−8 V/V (inverting)` → `8 V/V`. */
function magnitudeText(text: string): string {
  return text.replace(/^[−-]/, '').replace(/ \(inverting\)$/, '');
}
