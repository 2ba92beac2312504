import type { Stage } from '../stage/index.js';
import type { CheckId, UnbuiltDemand } from './demand.js';

/** Limits the stage writes whose check does not exist yet: every part is undecided on them, never silently passed. */
export function unbuilt(stage: Stage): UnbuiltDemand[] {
  const { limits, avoid } = stage.asked;
  const noise = limits.outputNoise ?? limits.snr;
  const found: (UnbuiltDemand | null)[] = [
    limits.phaseMargin === undefined ? null : demand('phase-margin', { required: limits.phaseMargin.value, unit: '°', sense: 'at-least', text: limits.phaseMargin.text }),
    noise === undefined ? null : demand('noise', limits.outputNoise ? { required: noise.value, unit: 'V', sense: 'at-most', text: noise.text } : { required: noise.value, unit: 'V/V', sense: 'at-least', text: noise.text }),
    limits.distortion === undefined ? null : demand('distortion', { required: limits.distortion.value, unit: '1', sense: 'at-most', text: limits.distortion.text }),
    limits.settling === undefined ? null : demand('settling', { required: limits.settling.within.value, unit: 's', sense: 'at-most', text: `${limits.settling.within.text} to ${limits.settling.to.text}` }),
    ...avoid.map((hazard) => demand(hazard, { required: null, unit: null, sense: null, text: 'avoid' })),
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
