import { confirmationJson, document, shortlistJson } from '../json.js';
import { verdictJson } from '../verdict-json.js';
import type { Report } from '../../report.js';
import type { JudgedPart } from '../../screening/index.js';
import type { ChosenPart, Review, ReviewedStage } from './review.js';

/** The document `report`: what the page shows and what makes it again. Each stage carries the document that `shortlist --json` prints. */
export function reportJson(review: Review): string {
  const { name, time, tool, command, symbols, top, all } = review;
  return document('report', { name, time, tool, command, symbols, top, all, stages: review.stages.map((stage) => stageJson(stage, review)) });
}

/** The same on one line, as a page embeds it. */
export const reportLine = (review: Review): string => JSON.stringify(JSON.parse(reportJson(review)));

function stageJson(stage: ReviewedStage, { top, all }: Review): object {
  const { file, sha256, text, changes, chosen, report } = stage;
  return {
    file,
    sha256,
    text,
    changes: changes.map(({ path, text: value, option }) => ({ path, text: value, option })),
    chosen: chosen === null ? null : chosenJson(stage, chosen),
    outcomes: outcomesJson(report),
    shortlist: JSON.parse(shortlistJson(report, { top, all })) as object,
  };
}

function chosenJson({ report }: ReviewedStage, { judged, rank, by, withdrawn }: ChosenPart): object {
  const { part, outcome, proof } = judged;
  const origin = (id: string, slot: string): ReturnType<typeof report.origin> => report.origin(id, slot);
  return { part: part.id, by, ...(withdrawn === undefined ? {} : { withdrawn }), rank, outcome, proof, confirm: judged.confirm.map(confirmationJson), verdicts: judged.verdicts.map((verdict) => verdictJson(verdict, part.id, origin)) };
}

/** Every part of the catalog in short: rank, or the checks it fails or leaves open. */
function outcomesJson({ fit, undecided, rejected }: Report): object[] {
  const fits = fit.flatMap((line) => [line, ...line.variants].map((one) => ({ part: one.part.id, outcome: one.outcome, rank: line.rank, checks: [] })));
  return [...fits, ...[...undecided, ...rejected].map(outJson)];
}

function outJson({ part, outcome, verdicts }: JudgedPart): object {
  const decisive = outcome === 'undecided' ? 'unknown' : 'fail';
  return { part: part.id, outcome, rank: null, checks: verdicts.filter((verdict) => verdict.outcome === decisive).map(({ check }) => check) };
}
