import { channels } from './channels.js';
import { seal, type AnyCheck } from './check.js';
import { clamp } from './clamp.js';
import { crossover } from './crossover.js';
import { dcError } from './dc-error.js';
import { distortion } from './distortion.js';
import { frequencyError } from './frequency-error.js';
import { gainBandwidth } from './gain-bandwidth.js';
import { inputHigh } from './input-high.js';
import { inputLow } from './input-low.js';
import { junctionTemperature } from './junction-temperature.js';
import { lifecycle } from './lifecycle.js';
import { noise } from './noise.js';
import { outputCurrent } from './output-current.js';
import { outputHigh } from './output-high.js';
import { outputLow } from './output-low.js';
import { overdrive } from './overdrive.js';
import { packageWish } from './package.js';
import { phaseMargin } from './phase-margin.js';
import { phaseReversal } from './phase-reversal.js';
import { price } from './price.js';
import { qualification } from './qualification.js';
import { settling } from './settling.js';
import { slewRate } from './slew-rate.js';
import { stableGain } from './stable-gain.js';
import { startUp } from './start-up.js';
import { status } from './status.js';
import { supplyCurrent } from './supply-current.js';
import { supplyHigh } from './supply-high.js';
import { supplyLow } from './supply-low.js';
import { supplyPeak } from './supply-peak.js';
import { supplyRipple } from './supply-ripple.js';
import { temperatureHigh } from './temperature-high.js';
import { temperatureLow } from './temperature-low.js';

/** Every check, in the order of the contract: the order of verdicts everywhere. */
export const CHECKS: readonly AnyCheck[] = [
  seal(supplyLow),
  seal(supplyHigh),
  seal(supplyPeak),
  seal(inputLow),
  seal(inputHigh),
  seal(outputLow),
  seal(outputHigh),
  seal(outputCurrent),
  seal(slewRate),
  seal(gainBandwidth),
  seal(stableGain),
  seal(phaseMargin),
  seal(noise),
  seal(distortion),
  seal(dcError),
  seal(supplyRipple),
  seal(settling),
  seal(startUp),
  seal(frequencyError),
  seal(supplyCurrent),
  seal(temperatureLow),
  seal(temperatureHigh),
  seal(junctionTemperature),
  seal(channels),
  seal(packageWish),
  seal(qualification),
  seal(status),
  seal(lifecycle),
  seal(price),
  seal(crossover),
  seal(phaseReversal),
  seal(clamp),
  seal(overdrive),
];

export type { AnyCheck, AnyComposition, AnyNumbers } from './check.js';
export { STANDS } from './in-numbers.js';
