import { confirmationJson, document, documentOf, shortlistDocument } from '../json.js';
import { verdictJson } from '../verdict-json.js';
import type { Report } from '../../report.js';
import type { JudgedPart } from '../../screening/index.js';
import type { ChosenPart, Review, ReviewedStage } from './review.js';

/** The document `report`: what the page shows and what makes it again. Each stage carries the document that `shortlist --json` prints. */
export const reportJson = (review: Review): string => document('report', bodyOf(review));

/** The same on one line, as a page embeds it. */
export const reportLine = (review: Review): string => JSON.stringify(documentOf('report', bodyOf(review)));

function bodyOf(review: Review): Readonly<Record<string, unknown>> {
  const { name, time, tool, command, symbols, top, all } = review;
  return { name, time, tool, command, symbols, top, all, stages: review.stages.map((stage) => stageJson(stage, review)) };
}

function stageJson(stage: ReviewedStage, { top, all }: Review): object {
  const { file, sha256, text, changes, chosen, report } = stage;
  return {
    file,
    sha256,
    text,
    changes: changes.map(({ path, text: value, option }) => ({ path, text: value, option })),
    chosen: chosen === null ? null : chosenJson(stage, chosen),
    outcomes: outcomesJson(report),
    shortlist: shortlistDocument(report, { top, all }),
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

const outJson = ({ part, outcome, deciding }: JudgedPart): object => ({ part: part.id, outcome, rank: null, checks: deciding });
