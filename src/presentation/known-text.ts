import type { AnyDemand } from '../demands/index.js';
import type { Stage } from '../stage/index.js';
import { range } from './amounts.js';
import { requiredText } from './demands-text.js';
import { padded, paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { finished, glued } from './spelling.js';
import type { Style } from './style.js';
import { capital, checkWords } from './words.js';

/** What has become known of a stage that is still being asked about. */
export interface Known {
  /** Given when output and input range are news. */
  readonly stage: Stage | null;
  readonly demands: readonly AnyDemand[];
  readonly assumptions: readonly string[];
}

/** One paragraph each: where the stage moves, what it asks of any amplifier and why, what is assumed. Empty when there is no news. */
export function renderKnown({ stage, demands, assumptions }: Known, style: Style): string {
  const lines = [
    ...(stage === null ? [] : [...told('Output', outputOf(stage), style), ...told('Inputs', range(stage.commonMode.min, stage.commonMode.max, 'V'), style)]),
    ...demands.flatMap((demand) => told('Asks', `${checkWords(demand.check)} ${requiredText(demand)}: ${glued(safeLine(demand.because))}`, style)),
    ...assumptions.flatMap((sentence) => told('Assumed', capital(glued(safeLine(sentence))), style)),
  ];
  return lines.length === 0 ? '' : finished(lines, style).replaceAll(/^/gmu, '  ').trimEnd();
}

function outputOf({ output, outputNominal }: Stage): string {
  return `${range(outputNominal.min, outputNominal.max, 'V')}, ${range(output.min, output.max, 'V')} at the corners`;
}

const LABEL = 9;

const told = (label: string, text: string, style: Style): string[] => paragraph(text, { ...style, width: style.width - 2 }, { lead: padded(label, LABEL) });
