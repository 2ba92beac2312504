import type { Topology } from '../spec/spec.js';

/** How feedback and input resistor give the gain: 1 + Rf/Rg, or Rf/Rin, alone or in two matched legs. */
export type GainForm = 'non-inverting' | 'inverting' | 'difference';

const FORMS: Readonly<Record<Topology, GainForm | null>> = {
  follower: null,
  'non-inverting': 'non-inverting',
  inverting: 'inverting',
  summing: null,
  difference: 'difference',
  transimpedance: null,
  'low-side-sense': 'non-inverting',
  'high-side-sense': 'difference',
  'sallen-key-low-pass': 'non-inverting',
  'multiple-feedback-low-pass': 'inverting',
  integrator: null,
  'relaxation-oscillator': null,
};

/** Null where a gain is not made by one pair of resistors. */
export function gainForm(topology: Topology): GainForm | null {
  return FORMS[topology];
}
