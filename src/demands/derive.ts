import type { Stage } from '../stage/index.js';
import { batteryBudget } from './battery.js';
import { dcError } from './dc-error.js';
import type { Demands } from './demand.js';
import { distortion } from './distortion.js';
import { frequencyError } from './frequency-error.js';
import { gainBandwidth } from './gain-bandwidth.js';
import { inputHigh, inputLow } from './input-range.js';
import { junctionTemperature } from './junction-temperature.js';
import { noise } from './noise.js';
import { operatingOf } from './operating.js';
import { outputCurrent } from './output-current.js';
import { outputHeadroom } from './output-headroom.js';
import { phaseMargin } from './phase-margin.js';
import { settling } from './settling.js';
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
    'phase-margin': phaseMargin(stage),
    noise: noise(stage),
    distortion: distortion(stage),
    'dc-error': dcError(stage),
    settling: settling(stage),
    'frequency-error': frequencyError(stage),
    'supply-current': supplyCurrent(stage),
    'temperature-low': temperatureLow(stage),
    'temperature-high': temperatureHigh(stage),
    'junction-temperature': junctionTemperature(stage),
    channels: channels(stage),
    package: wantedPackage(stage),
    qualification: qualification(stage),
    status: status(stage),
    lifecycle: lifecycle(stage),
    price: price(stage),
    battery: batteryBudget(stage),
    unbuilt: unbuilt(stage),
  };
}
