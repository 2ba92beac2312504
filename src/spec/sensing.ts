import type { Draft } from './draft.js';
import { present } from './present.js';
import type { PhotodiodeSpec, ShuntSpec } from './spec.js';
import { readInterval, readSwing, readValue } from './value.js';
import { readChoice } from './words.js';

/** A, F; undefined when absent, or when what it cannot do without is missing or refused. */
export function readPhotodiode(draft: Draft): PhotodiodeSpec | undefined {
  const current = readSwing(draft, 'photodiode.current');
  const direction = readChoice<PhotodiodeSpec['direction']>(draft, 'photodiode.direction');
  const capacitance = readValue(draft, 'photodiode.capacitance');
  const more = present({ dark: readValue(draft, 'photodiode.dark'), ambient: readSwing(draft, 'photodiode.ambient') });
  if (current === undefined || direction === undefined || capacitance === undefined) return undefined;
  return { current, direction, capacitance, ...more };
}

/** Ω, A, V; undefined when absent, or when what it cannot do without is missing or refused. */
export function readShunt(draft: Draft): ShuntSpec | undefined {
  const resistance = readValue(draft, 'shunt.resistance');
  const current = readSwing(draft, 'shunt.current');
  const more = present({ tolerance: readValue(draft, 'shunt.tolerance'), bus: readInterval(draft, 'shunt.bus') });
  return resistance === undefined || current === undefined ? undefined : { resistance, current, ...more };
}
