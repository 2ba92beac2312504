import { channels } from './channels.js';
import { seal, type AnyCheck } from './check.js';
import { dcError } from './dc-error.js';
import { gainBandwidth } from './gain-bandwidth.js';
import { inputHigh } from './input-high.js';
import { inputLow } from './input-low.js';
import { lifecycle } from './lifecycle.js';
import { outputCurrent } from './output-current.js';
import { outputHigh } from './output-high.js';
import { outputLow } from './output-low.js';
import { packageWish } from './package.js';
import { price } from './price.js';
import { qualification } from './qualification.js';
import { slewRate } from './slew-rate.js';
import { stableGain } from './stable-gain.js';
import { status } from './status.js';
import { supplyCurrent } from './supply-current.js';
import { supplyHigh } from './supply-high.js';
import { supplyLow } from './supply-low.js';
import { supplyPeak } from './supply-peak.js';
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
  seal(dcError),
  seal(supplyCurrent),
  seal(temperatureLow),
  seal(temperatureHigh),
  seal(channels),
  seal(packageWish),
  seal(qualification),
  seal(status),
  seal(lifecycle),
  seal(price),
];

export type { AnyCheck } from './check.js';
