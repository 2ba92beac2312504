import type { AnyDemand } from '../demands/index.js';
import type { DemandsReport } from '../report.js';
import type { Stage } from '../stage/index.js';
import { amount, checkAmount, range } from './amounts.js';
import { displayWidth, flow, LABEL, padded, paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { finished, glued } from './spelling.js';
import { assumptionLines, stageCautions, stageLines } from './stage-text.js';
import type { Style } from './style.js';
import { tableLines } from './table.js';
import { checkWords } from './words.js';

/** What the stage asks of any amplifier, each with what it came from and the method; no part is looked at. */
export function renderDemands({ stage, demands }: DemandsReport, style: Style): string {
  const sources = [...new Set(demands.map(({ source }) => source))];
  const rows = demands.map((demand) => [checkWords(demand.check), requiredText(demand), `[${sources.indexOf(demand.source) + 1}]`, glued(safeLine(demand.because))]);
  const columns = [
    { title: 'Check', key: true },
    { title: 'asks of any amplifier', key: true },
    { title: 'method', name: 'method', moves: 1 },
    { title: 'because', name: '', wraps: true },
  ] as const;
  const blocks = [
    [...stageLines(stage, style), ...stageCautions(stage, style)],
    cornerLines(stage, style),
    tableLines({ columns, rows }, style),
    noRoom(demands, style),
    ['Methods', ...sources.flatMap((source, at) => sourceLines(source, at, style))],
    assumptionLines(stage.assumptions, style),
  ];
  return finished(blocks.flatMap((block) => (block.length === 0 ? [] : [...block, ''])), style);
}

/** To nearest, as in the sentence beside it: the same number reads the same. */
export function requiredText(demand: AnyDemand): string {
  if (demand.sense === 'one-of') return demand.required.map(safeLine).join(' or ');
  if (typeof demand.required !== 'number' || demand.unit === null) return 'built' in demand ? 'not judged by this version' : 'the stage does not say it';
  const words = demand.sense === 'at-least' ? 'at least' : 'at most';
  const unbuilt = 'built' in demand ? ' (not judged by this version)' : '';
  return `${words} ${checkAmount(demand, demand.required)}${unbuilt}`;
}

function cornerLines(stage: Stage, style: Style): string[] {
  const { output, commonMode, noiseGain, resistors, gainUnit } = stage;
  const fitted = resistors === null ? [] : [resistors.feedback, resistors.input, resistors.positiveInput, resistors.toReference].flatMap((ohms) => (ohms === undefined || !Number.isFinite(ohms) ? [] : [amount(ohms, 'Ω')]));
  const pieces = [
    `output ${range(output.min, output.max, 'V')}`,
    `common mode ${range(commonMode.min, commonMode.max, 'V')}`,
    ...(gainUnit === null ? [] : [`noise gain ${range(noiseGain.min, noiseGain.max, 'V/V')}`]),
    ...(fitted.length === 0 ? [] : [`resistors ${fitted.join(', ')} ±${amount((resistors?.tolerance ?? 0) * 100, '%')}`]),
  ];
  return flow(pieces, style, { lead: padded('Corners', LABEL) });
}

function noRoom(demands: readonly AnyDemand[], style: Style): string[] {
  const out = demands.filter(({ check, required }) => (check === 'output-low' || check === 'output-high') && typeof required === 'number' && required <= 0);
  return out.flatMap(({ check }) =>
    paragraph(`No amplifier meets ${checkWords(check)}: at the rail no output stage is left any room. limits.swingLoss may give up that end of the swing.`, style, { lead: 'note: ', indent: 6 }),
  );
}

function sourceLines(source: string, at: number, style: Style): string[] {
  const lead = ` [${at + 1}] `;
  return paragraph(safeLine(source), style, { lead, indent: displayWidth(lead) });
}
