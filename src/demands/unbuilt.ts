import type { Stage } from '../stage/index.js';
import { closedLoopOf } from './closed-loop.js';
import type { CheckId, UnbuiltDemand } from './demand.js';

/**
 * Limits the stage writes whose check does not exist yet, or not for this topology: every part is undecided on them, never silently
 * passed.
 */
export function unbuilt(stage: Stage): UnbuiltDemand[] {
  const { limits } = stage.asked;
  const { distortion, settling, frequencyError, phaseMargin } = limits;
  const noise = limits.outputNoise ?? limits.snr;
  const oscillates = stage.response.kind === 'oscillator';
  const found: (UnbuiltDemand | null)[] = [
    phaseMargin !== undefined && oscillates ? demand('phase-margin', { required: phaseMargin.value, unit: '°', sense: 'at-least', text: phaseMargin.text }) : null,
    noise !== undefined && oscillates ? demand('noise', { required: noise.value, ...(limits.outputNoise ? { unit: 'V', sense: 'at-most' } : { unit: 'V/V', sense: 'at-least' }), text: noise.text }) : null,
    distortion !== undefined && oscillates ? demand('distortion', { required: distortion.value, unit: '1', sense: 'at-most', text: distortion.text }) : null,
    settling !== undefined && closedLoopOf(stage) === null
      ? demand('settling', { required: settling.within.value, unit: 's', sense: 'at-most', text: `${settling.within.text} to ${settling.to.text}` })
      : null,
    frequencyError !== undefined && !oscillates ? demand('frequency-error', { required: frequencyError.value, unit: '1', sense: 'at-most', text: frequencyError.text }) : null,
  ];
  return found.filter((one) => one !== null);
}

interface Written {
  readonly required: number | null;
  readonly unit: string | null;
  readonly sense: UnbuiltDemand['sense'];
  readonly text: string;
}

function demand(check: CheckId, written: Written): UnbuiltDemand {
  const { text, ...rest } = written;
  return { check, ...rest, because: `the stage file writes it: ${text}`, source: 'this version has no such check yet', built: false };
}
