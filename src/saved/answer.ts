import { shortlist } from '../engine.js';
import type { PartSource } from '../parts/part.js';
import type { JudgedPart, PartOutcome } from '../screening/index.js';
import type { Stage } from '../stage/index.js';

/** What a catalog answers to one stage, short enough to be held against another catalog's answer. */
export interface StageAnswer {
  /** Ids of what fits, by rank; the variants of a die behind it. */
  readonly fits: readonly string[];
  /** Ids of what cannot be decided. */
  readonly undecided: readonly string[];
  readonly rejected: number;
  /** The part chosen for the stage; null when none is. */
  readonly chosen: ChosenAnswer | null;
}

/** How the chosen part stands. */
export interface ChosenAnswer {
  /** `absent`: the catalog has no such part. */
  readonly outcome: PartOutcome | 'absent';
  readonly proof: 'limits' | 'typical' | null;
  /** Place among what fits. */
  readonly rank: number | null;
}

/** The answer to a stage, with the part chosen for it looked up. */
export function answerOf(stage: Stage, source: PartSource, part: string | null): StageAnswer {
  const report = shortlist(stage, source);
  const lines = report.fit.flatMap((line) => [line, ...line.variants].map((judged) => ({ judged, rank: line.rank })));
  const ranked = lines.find(({ judged }) => judged.part.id === part);
  const others = [...report.undecided, ...report.rejected];
  return {
    fits: lines.map(({ judged }) => judged.part.id),
    undecided: report.undecided.map((one) => one.part.id).sort(),
    rejected: report.rejected.length,
    chosen: part === null ? null : chosenAnswer(ranked?.judged ?? others.find((one) => one.part.id === part), ranked?.rank ?? null),
  };
}

function chosenAnswer(judged: JudgedPart | undefined, rank: number | null): ChosenAnswer {
  if (judged === undefined) return { outcome: 'absent', proof: null, rank: null };
  return { outcome: judged.outcome, proof: judged.proof, rank };
}

/** True when a reader of both would decide differently: what fits and in which order, what is open, how the chosen part stands. Parts that fit neither way do not matter. */
export function isOtherAnswer(before: StageAnswer, after: StageAnswer): boolean {
  const decides = ({ fits, undecided, chosen }: StageAnswer): string => JSON.stringify([fits, undecided, chosen?.outcome, chosen?.proof]);
  return decides(before) !== decides(after);
}
