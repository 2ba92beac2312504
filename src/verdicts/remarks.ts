import type { Finding, Remarks, Remedy, SingleFinding } from './finding.js';

/** Remedies hold on the worst reading: that of the other outlook would promise too much. */
export function remediesOf(pessimistic: Finding): readonly Remedy[] {
  if (pessimistic.kind === 'words' || pessimistic.kind === 'undecided') return [];
  return pessimistic.kind === 'vertices' ? pessimistic.findings.flatMap(remediesOf) : (pessimistic.remedies ?? []);
}

/** What stands beside the numbers shown; fields that do not apply are left out. */
export function remarksOf(shown: SingleFinding, remedies: readonly Remedy[]): Remarks {
  if (shown.kind === 'undecided') return {};
  const { adds, termUnit, notes, measures, uncharged } = shown;
  return {
    ...(adds === undefined ? {} : { adds }),
    ...(termUnit === undefined ? {} : { termUnit }),
    ...(notes === undefined || notes.length === 0 ? {} : { notes }),
    ...(measures === undefined ? {} : { measures }),
    ...(uncharged === undefined ? {} : { uncharged }),
    ...(remedies.length === 0 ? {} : { remedies }),
  };
}
