import { chosenPart, explain, type ChosenPart, type Part, type PartSource, type Report } from '../index.js';
import type { Catalog, WithdrawnPart } from '../catalog/index.js';
import { keptPath } from '../saved/index.js';
import { EXIT } from './exit-code.js';
import { findPart, withdrawnWords } from './find-part.js';
import type { JudgingOptions } from './judging-input.js';
import { RequestError } from './request-error.js';

export interface ChoiceOptions extends JudgingOptions {
  /** The chosen part, instead of the one kept with the stage or the first in order. */
  readonly part?: string;
}

interface Question {
  /** Null when options alone describe the stage. */
  readonly file: string | null;
  /** The part the stage file itself names. */
  readonly inFile: string | null;
  readonly report: Report;
  readonly source: PartSource;
  readonly catalog: Pick<Catalog, 'file' | 'savedStages' | 'withdrawn'>;
  readonly options: ChoiceOptions;
}

export interface Choice {
  readonly chosen: ChosenPart | null;
  readonly origin: Report['origin'];
  /** For stderr. */
  readonly note: string | null;
}

/** The part a review is about: named, else in the stage file, else kept with the stage, else first in order. One that was withdrawn is shown as it was. */
export function chosenFor(question: Question): Choice {
  const { options, report } = question;
  if (options.part !== undefined) return resolved(question, options.part, 'named');
  const kept = question.inFile ?? keptWith(question);
  if (kept !== null) return resolved(question, kept, 'saved');
  return { chosen: chosenPart(report, null, 'first'), origin: report.origin, note: null };
}

function keptWith({ file, catalog }: Question): string | null {
  if (file === null) return null;
  const path = keptPath(file, catalog.file);
  return catalog.savedStages().find((one) => one.path === path)?.part ?? null;
}

function resolved(question: Question, id: string, by: 'named' | 'saved'): Choice {
  const { report, source, catalog } = question;
  const found = findPart(source, id);
  if (found.ok) return { chosen: chosenPart(report, id, by), origin: report.origin, note: null };
  const was = catalog.withdrawn(id);
  if (was !== null) return asItWas(question, was, by);
  // Kept once, the catalog may have changed since; written in the file or on the command line, it is a slip.
  if (by === 'named' || question.inFile === id) throw new RequestError([found.problem], EXIT.request);
  return { chosen: chosenPart(report, null, 'first'), origin: report.origin, note: `note: ${id}, kept with ${question.file ?? 'the stage'}, is not in the catalog; the report is about the first in order` };
}

/** Judged beside the list, so that the shortlist stays what the list in force gives. */
function asItWas({ report, source }: Question, was: WithdrawnPart, by: 'named' | 'saved'): Choice {
  const judged = judgedBeside(report, source, was.part);
  const origin: Report['origin'] = (id, slot) => (id === was.part.id ? was.origin(slot) : report.origin(id, slot));
  return { chosen: { judged, rank: null, by, withdrawn: withdrawnWords(was) }, origin, note: `note: ${was.part.id} ${withdrawnWords(was)}; the report shows it as it was last` };
}

function judgedBeside({ stage, asking }: Report, source: PartSource, part: Part): ChosenPart['judged'] {
  return explain(stage, { ...source, parts: [...source.parts, part] }, { part, asking }).judged;
}
