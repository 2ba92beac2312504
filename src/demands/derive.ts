import type { Stage } from '../stage/index.js';
import { batteryBudget } from './battery.js';
import { clamp } from './clamp.js';
import { crossover } from './crossover.js';
import { dcError } from './dc-error.js';
import type { Demands } from './demand.js';
import { distortion } from './distortion.js';
import { frequencyError } from './frequency-error.js';
import { gainBandwidth } from './gain-bandwidth.js';
import { inputHigh, inputLow } from './input-range.js';
import { junctionTemperature } from './junction-temperature.js';
import { noise } from './noise.js';
import { operatingOf } from './operating.js';
import { oneCircuit } from './one-circuit.js';
import { outputCurrent } from './output-current.js';
import { outputHeadroom } from './output-headroom.js';
import { overdrive } from './overdrive.js';
import { phaseMargin } from './phase-margin.js';
import { phaseReversal } from './phase-reversal.js';
import { settling } from './settling.js';
import { slewRate } from './slew-rate.js';
import { stableGain } from './stable-gain.js';
import { supplyCurrent } from './supply-current.js';
import { startUp } from './start-up.js';
import { supplyRipple } from './supply-ripple.js';
import { supplyHigh, supplyLow, supplyPeak } from './supply.js';
import { temperatureHigh, temperatureLow } from './temperature.js';
import { unbuilt } from './unbuilt.js';
import { channels, lifecycle, price, qualification, status, wantedPackage } from './wishes.js';

type Deriving = { readonly [Name in keyof Demands]: (stage: Stage) => Demands[Name] };

const DERIVING: Deriving = {
  operating: operatingOf,
  'supply-low': supplyLow,
  'supply-high': supplyHigh,
  'supply-peak': supplyPeak,
  'input-low': inputLow,
  'input-high': inputHigh,
  'output-low': (stage) => outputHeadroom(stage, 'low'),
  'output-high': (stage) => outputHeadroom(stage, 'high'),
  'output-current': outputCurrent,
  'slew-rate': slewRate,
  'gain-bandwidth': gainBandwidth,
  'stable-gain': stableGain,
  'phase-margin': phaseMargin,
  noise,
  distortion,
  'dc-error': dcError,
  'supply-ripple': supplyRipple,
  settling,
  'start-up': startUp,
  'frequency-error': frequencyError,
  'supply-current': supplyCurrent,
  'temperature-low': temperatureLow,
  'temperature-high': temperatureHigh,
  'junction-temperature': junctionTemperature,
  channels,
  package: wantedPackage,
  qualification,
  status,
  lifecycle,
  price,
  crossover,
  'phase-reversal': phaseReversal,
  clamp,
  overdrive,
  battery: batteryBudget,
  unbuilt,
};

/** What the stage asks of any amplifier, worst case, each with the figures it came from. */
export function deriveDemands(stage: Stage): Demands {
  return { ...demandsWhenAsked(stage) };
}

/** The same, each derived when it is first read: a stage that is tried for one check costs that check only. */
export function demandsWhenAsked(stage: Stage): Demands {
  const known = new Map<string, unknown>();
  const circuit = oneCircuit(stage);
  const demands = {};
  for (const [name, derive] of Object.entries<(stage: Stage) => unknown>(DERIVING)) {
    const get = (): unknown => {
      if (!known.has(name)) known.set(name, circuit.derived(name, stage, derive));
      return known.get(name);
    };
    Object.defineProperty(demands, name, { enumerable: true, get });
  }
  return demands as Demands;
}
