import { oscillatorDifferentialInput } from '../formulas/oscillator.js';
import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { hasEdge } from './bandwidth-criteria.js';
import type { ClampDemand } from './hazard-demand.js';
import { pinsAreStill } from './input-range.js';
import { slewRate } from './slew-rate.js';

const SOURCE = 'M9: voltage between the inputs at a step, while slewing, at an overload and in an oscillator (own algebra)';

/** How far the stage takes the inputs of the amplifier apart, V; what slewing adds depends on the part. */
export function clamp(stage: Stage): ClampDemand {
  const ways = [...stepped(stage), ...oscillating(stage), ...overloaded(stage)];
  const worst = ways.reduce<Way>((most, next) => (next.apart > most.apart ? next : most), { apart: 0, why: 'the amplifier holds its inputs together' });
  return {
    check: 'clamp',
    required: worst.apart,
    unit: 'V',
    sense: 'at-least',
    because: `${worst.why}, and the file says avoid`,
    source: SOURCE,
    avoided: stage.asked.avoid.includes('clamp'),
    slewing: slewingOf(stage),
    supply: stage.supply.max,
  };
}

/** What takes the inputs apart, and how far, V. */
interface Way {
  readonly apart: number;
  readonly why: string;
}

const volts = (value: number): string => formatQuantity(value, 'V');

/** The signal has stepped and the output has not moved yet: the step referred to the input. Filters, integrators and photodiodes round it. */
function stepped(stage: Stage): Way[] {
  if (!hasEdge(stage) || stage.response.kind !== 'amplifier') return [];
  const apart = stage.outputStep / stage.noiseGain.min;
  return [{ apart, why: `a step of ${volts(stage.outputStep)} at the output stands as ${volts(apart)} between the inputs until the output follows` }];
}

/** Just after switching the + input has jumped while the capacitor stands still. */
function oscillating({ response, supply }: Stage): Way[] {
  if (response.kind !== 'oscillator') return [];
  const apart = oscillatorDifferentialInput({ ...response, supply: supply.max, high: supply.max, low: 0 });
  return [{ apart, why: `the thresholds stand ${volts(apart)} apart on ${volts(supply.max)}` }];
}

/** The input beyond a rail, the output at its end: the feedback no longer holds the inputs together. */
function overloaded(stage: Stage): Way[] {
  const beyond = stage.asked.overdrive?.value ?? 0;
  if (beyond === 0 || stage.response.kind === 'oscillator') return [];
  const apart = Math.max(0, ...stage.vertices.map(({ supply, reference }) => overloadAt(stage, { supply, reference, beyond })));
  return [{ apart, why: `an input ${volts(beyond)} beyond a rail, with the output at its end, stands ${volts(apart)} from the other` }];
}

/**
 * With NG = 1/β, the output at 0 or V+: a moving + input against Vref + (vo − Vref)/NG, a − input at [(NG−1)(vi − Vref) + vo − Vref]/NG
 * from a + input at Vref. Both legs of a difference stage may be driven: all of the supply and the overdrive.
 */
function overloadAt(stage: Stage, at: { readonly supply: number; readonly reference: number; readonly beyond: number }): number {
  const { supply, reference, beyond } = at;
  const gain = stage.noiseGain.max;
  if (stage.topology === 'difference' || stage.topology === 'high-side-sense') return supply + beyond;
  if (stage.topology === 'integrator') return Math.max(supply + beyond - reference, reference + beyond);
  if (pinsAreStill(stage)) {
    const high = ((gain - 1) * (supply + beyond - reference) - reference) / gain;
    const low = ((gain - 1) * (reference + beyond) - (supply - reference)) / gain;
    return Math.max(high, low);
  }
  const share = 1 - 1 / gain;
  return beyond + share * Math.max(supply - reference, reference);
}

/** A part slower than the slope lets its output lag by up to the whole swing. */
function slewingOf(stage: Stage): ClampDemand['slewing'] {
  const slope = stage.response.kind === 'oscillator' ? undefined : slewRate(stage)?.required;
  if (slope === undefined || slope === 0) return null;
  const margin = stage.asked.margins.slewRate ?? 1;
  return { slewRate: slope / margin, apart: Math.max(stage.outputStep, 2 * stage.signalPeak) / stage.noiseGain.min };
}
