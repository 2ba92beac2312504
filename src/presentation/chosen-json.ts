import type { ChosenReport, ChosenStage } from './chosen-text.js';
import { confirmationJson, document } from './json.js';
import { verdictJson } from './verdict-json.js';

/** The document `check`: every stage with the part chosen for it and all its verdicts. */
export function chosenJson({ stages }: ChosenReport): string {
  return document('check', { stages: stages.map(stageJson) });
}

function stageJson(one: ChosenStage): object {
  if (!('explanation' in one)) return { file: one.file, part: one.part, outcome: null, reason: one.reason, text: one.words, proof: null, confirm: [], verdicts: [] };
  const { judged, origin } = one.explanation;
  return {
    file: one.file,
    part: one.part,
    outcome: judged.outcome,
    proof: judged.proof,
    confirm: judged.confirm.map(confirmationJson),
    verdicts: judged.verdicts.map((verdict) => verdictJson(verdict, judged.part.id, (id, slot) => origin(id, slot))),
  };
}
