import type { JudgedPart } from '../../screening/index.js';
import type { Verdict } from '../../verdicts/verdict.js';
import { csvText } from '../csv-cell.js';
import { cornerText } from '../verdict-words.js';
import { verdictSentence } from '../verdict-sentence.js';
import type { Review, ReviewedStage } from './review.js';

const HEADER = ['stage', 'file', 'rank', 'part', 'tier', 'outcome', 'chosen', 'check', 'verdict', 'required', 'offered', 'unit', 'sense', 'spare', 'margin', 'basis', 'reason', 'worst case', 'text'];

type CsvRow = (string | number | null)[];

/** Every verdict of every part on every stage of the review, one row each; SI numbers, unrounded. */
export function reportCsv(review: Review): string {
  return csvText([HEADER, ...review.stages.flatMap(stageRows)]);
}

function stageRows(stage: ReviewedStage): CsvRow[] {
  const { report } = stage;
  const fits = report.fit.flatMap((line) => [line, ...line.variants].map((one) => ({ one: one satisfies JudgedPart, rank: line.rank })));
  const others = [...report.undecided, ...report.rejected].map((one) => ({ one, rank: null }));
  return [...fits, ...others].flatMap(({ one, rank }) => one.verdicts.map((verdict) => rowOf(stage, { one, rank, verdict })));
}

interface Line {
  readonly one: JudgedPart;
  readonly rank: number | null;
  readonly verdict: Verdict;
}

function rowOf({ file, report, chosen }: ReviewedStage, { one, rank, verdict }: Line): CsvRow {
  const { part, outcome } = one;
  const { required, offered, known } = verdict;
  const value = typeof offered === 'string' ? offered : (offered ?? known);
  const limit = typeof required === 'number' ? required : (required?.join(' or ') ?? null);
  const corner = verdict.worstAt === null ? null : plain(cornerText(verdict.worstAt)) || null;
  const chosenWord = chosen?.judged.part.id === part.id ? 'yes' : null;
  return [report.stage.name, file, rank, part.id, part.tier, outcome, chosenWord, verdict.check, verdict.outcome, limit, value, verdict.unit, verdict.sense, verdict.spare, verdict.margin, verdict.basis, verdict.reason, corner, plain(verdictSentence(verdict))];
}

const plain = (text: string): string => text.replaceAll('\u00a0', ' ');
