import type { Stage } from '../stage/index.js';
import { dcError } from './dc-error.js';
import type { Demands } from './demand.js';
import { gainBandwidth } from './gain-bandwidth.js';
import { inputHigh, inputLow } from './input-range.js';
import { operatingOf } from './operating.js';
import { outputCurrent } from './output-current.js';
import { outputHeadroom } from './output-headroom.js';
import { slewRate } from './slew-rate.js';
import { stableGain } from './stable-gain.js';
import { supplyCurrent } from './supply-current.js';
import { supplyHigh, supplyLow, supplyPeak } from './supply.js';
import { temperatureHigh, temperatureLow } from './temperature.js';
import { unbuilt } from './unbuilt.js';
import { channels, lifecycle, price, qualification, status, wantedPackage } from './wishes.js';

/** What the stage asks of any amplifier, worst case, each with the figures it came from. */
export function deriveDemands(stage: Stage): Demands {
  return {
    operating: operatingOf(stage),
    'supply-low': supplyLow(stage),
    'supply-high': supplyHigh(stage),
    'supply-peak': supplyPeak(stage),
    'input-low': inputLow(stage),
    'input-high': inputHigh(stage),
    'output-low': outputHeadroom(stage, 'low'),
    'output-high': outputHeadroom(stage, 'high'),
    'output-current': outputCurrent(stage),
    'slew-rate': slewRate(stage),
    'gain-bandwidth': gainBandwidth(stage),
    'stable-gain': stableGain(stage),
    'dc-error': dcError(stage),
    'supply-current': supplyCurrent(stage),
    'temperature-low': temperatureLow(stage),
    'temperature-high': temperatureHigh(stage),
    channels: channels(stage),
    package: wantedPackage(stage),
    qualification: qualification(stage),
    status: status(stage),
    lifecycle: lifecycle(stage),
    price: price(stage),
    unbuilt: unbuilt(stage),
  };
}
