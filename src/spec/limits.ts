import type { Draft } from './draft.js';
import { readDistortion, readNoise } from './noise.js';
import { present } from './present.js';
import type { GainErrorKind, LimitsSpec } from './spec.js';
import { refuseAbsent } from './refuse.js';
import { readValue } from './value.js';
import { readChoice } from './words.js';

/** Everything under `limits`. SI units; snr as a voltage ratio (V/V), distortion as a fraction of the signal. */
export function readLimits(draft: Draft): LimitsSpec {
  return present({
    swingLoss: readValue(draft, 'limits.swingLoss'),
    gainError: readValue(draft, 'limits.gainError'),
    gainErrorKind: readChoice<GainErrorKind>(draft, 'limits.gainErrorKind'),
    dcError: readValue(draft, 'limits.dcError'),
    outputNoise: readNoise(draft),
    snr: readValue(draft, 'limits.snr'),
    distortion: readDistortion(draft),
    supplyCurrent: readValue(draft, 'limits.supplyCurrent'),
    supplyCurrentPer: readChoice<'amplifier' | 'package'>(draft, 'limits.supplyCurrentPer'),
    settling: readSettling(draft),
    phaseMargin: readValue(draft, 'limits.phaseMargin'),
    junctionTemperature: readValue(draft, 'limits.junctionTemperature'),
    frequencyError: readValue(draft, 'limits.frequencyError'),
    supplyRipple: readValue(draft, 'limits.supplyRipple'),
    startUp: readValue(draft, 'limits.startUp'),
  });
}

function readSettling(draft: Draft): LimitsSpec['settling'] | undefined {
  const paths = ['limits.settling.within', 'limits.settling.to'] as const;
  const written = ['limits.settling', ...paths].some((path) => draft.fields.has(path));
  if (!written) return undefined;
  for (const path of paths) if (!draft.fields.has(path)) refuseAbsent(draft, path);
  const [within, to] = [readValue(draft, paths[0]), readValue(draft, paths[1])];
  return within === undefined || to === undefined ? undefined : { within, to };
}
