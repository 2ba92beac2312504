import type { PartSource } from '../parts/part.js';
import type { StageAnswer } from './answer.js';
import { answerOf, isOtherAnswer } from './answer.js';
import { readStageFile, type StageFile } from './stage-file.js';

/** A stage file the team keeps. */
export interface KeptStage {
  readonly path: string;
  /** What messages call it. */
  readonly name: string;
  readonly part: string | null;
}

/** A kept stage judged on two catalogs; or why it could not be judged. */
export type JudgedAgain =
  | { readonly kept: KeptStage; readonly before: StageAnswer; readonly after: StageAnswer; readonly isOther: boolean }
  | { readonly kept: KeptStage; readonly failed: Extract<StageFile, { ok: false }> };

/** Judges every kept stage on the catalog as it was and as it is, in the order given. A file that is gone is told, and the others are judged all the same. */
export function judgeAgain(stages: readonly KeptStage[], before: PartSource, after: PartSource): JudgedAgain[] {
  return stages.map((kept) => {
    const file = readStageFile(kept.path, kept.name);
    if (!file.ok) return { kept, failed: file };
    // What the file itself names goes before the choice that was kept, as in `check`.
    const chosen = { ...kept, part: file.part ?? kept.part };
    const [was, is] = [answerOf(file.stage, before, chosen.part), answerOf(file.stage, after, chosen.part)];
    return { kept: chosen, before: was, after: is, isOther: isOtherAnswer(was, is) };
  });
}
