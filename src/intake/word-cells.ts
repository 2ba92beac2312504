import type { CellReader, Draft } from './part-draft.js';
import type { Statement } from './header-words.js';
import { isMissing } from './text-cell.js';
import type { WordResult } from './words.js';
import { readInputType, readLifecycle, readStatus, readYesNo } from './words.js';

type WordField = 'status' | 'lifecycle' | 'phaseReversal' | 'inputClamp' | 'inputType';

export const statusCell: CellReader = wordCell('status', readStatus);
export const lifecycleCell: CellReader = wordCell('lifecycle', readLifecycle);

/** Where the column exists, an approved part must have a status. */
export const requiredStatusCell: CellReader = (draft, cell, report) => {
  if (!isMissing(cell)) return statusCell(draft, cell, report);
  const reason = 'status is required in an approved list: without it the part can be neither offered nor excluded';
  return report({ code: 'I501', reason, fix: 'one of approved, conditional, restricted, not-approved' }, 'error');
};

export const STATEMENT_CELLS: Readonly<Record<Statement, CellReader>> = {
  phaseReversal: wordCell('phaseReversal', readYesNo),
  inputClamp: wordCell('inputClamp', readYesNo),
  inputType: wordCell('inputType', readInputType),
};

function wordCell<Key extends WordField>(key: Key, read: (text: string) => WordResult<NonNullable<Draft[Key]>>): CellReader {
  return (draft, cell, report) => {
    if (isMissing(cell)) return;
    const result = read(cell);
    if (result.ok) draft[key] = result.word;
    else report(result.fault, 'error');
  };
}
