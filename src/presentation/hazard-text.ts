import { formatDecibels, formatQuantity } from '../quantities/format.js';
import type { PartHazard } from '../screening/index.js';
import { figureWords } from './words.js';

const volts = (value: number): string => formatQuantity(value, 'V');

/** A hazard as a caution to the reader. */
export function hazardText(hazard: PartHazard): string {
  switch (hazard.kind) {
    case 'phase-reversal':
      return 'reverses its phase: when an input leaves its range, at overload or power-up, the output jumps to the other rail';
    case 'clamp':
      return 'diodes join the inputs: from about 0.7 V between them, at steps or with the output at its rail, current flows through the source';
    case 'crossover': {
      const { region, inputs } = hazard;
      return `the input pairs hand over ${volts(region.min)}..${volts(region.max)} below V+, where this stage takes them (${volts(inputs.min)}..${volts(inputs.max)} below V+): ${stepText(hazard)}`;
    }
    case 'sink-limit':
      return `near V- the output sinks ${formatQuantity(hazard.current, 'A', { round: 'down' })} at most; with more it stays ${volts(hazard.beyond)} above V- instead of ${volts(hazard.within)}`;
    case 'reversal-unknown':
    case 'clamp-unknown':
    case 'overdrive':
    case 'recovery':
    case 'ripple':
    case 'start-up':
      return circumstanceText(hazard);
  }
}

type Crossover = Extract<PartHazard, { kind: 'crossover' }>;

/** How large the step is, how often it comes, and what it distorts. */
function stepText({ step, moves, frequency }: Crossover): string {
  const size = step === null ? '' : ` by up to ${formatQuantity(step.volts, 'V', { round: 'up' })}`;
  if (!moves) return `the offset steps there${size}`;
  const often = frequency === null ? 'twice a period' : `twice a period (${formatQuantity(2 * frequency, 'Hz')})`;
  const distortion = step?.distortion == null || step.distortion === 0 ? '' : `, distortion up to ${formatDecibels(step.distortion)}`;
  return `the offset steps there${size}, ${often}${distortion}`;
}

type Circumstance = Exclude<PartHazard, { kind: 'phase-reversal' | 'clamp' | 'crossover' | 'sink-limit' }>;

function circumstanceText(hazard: Circumstance): string {
  switch (hazard.kind) {
    case 'reversal-unknown':
      return 'whether it reverses its phase is not known, and an input of this stage can leave its range';
    case 'clamp-unknown':
      return `whether diodes join the inputs is not known, and this stage takes them up to ${volts(hazard.apart)} apart`;
    case 'overdrive':
      return `an input goes ${volts(hazard.beyond)} beyond a rail; ${hazard.endures === null ? 'what the inputs endure there is not known' : `the inputs endure ${formatQuantity(hazard.endures, 'V', { round: 'down' })} there`}`;
    case 'recovery':
      return hazard.time === null ? 'how long the output needs to recover from an overload is not known' : `after an overload the output needs ${formatQuantity(hazard.time, 's', { round: 'up' })} to recover`;
    // Rounded as the check prints it once there is a limit: one figure, one number.
    case 'ripple':
      return hazard.output === null
        ? `what passes of the supply ripple is not known: ${missingWords(hazard.missing)}`
        : `of the supply ripple ${formatQuantity(hazard.output, 'V')} peak reaches the output at ${formatQuantity(hazard.frequency, 'Hz')}`;
    case 'start-up':
      return hazard.time === null
        ? `on for ${formatQuantity(hazard.on, 's')} at a time, and how long it needs to start is not known: ${missingWords(hazard.missing)}`
        : `needs ${formatQuantity(hazard.time, 's', { round: 'up' })} of the ${formatQuantity(hazard.on, 's')} it is on to start`;
  }
}

const missingWords = (missing: Extract<PartHazard, { kind: 'ripple' }>['missing']): string => `no ${missing.map(({ figure }) => figureWords(figure)).join(' and no ')}`;
