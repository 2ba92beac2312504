import type { CellReader, Draft } from './part-draft.js';
import type { Statement } from './header-words.js';
import type { Status } from '../parts/part.js';
import { foldPhrase } from './header-parts.js';
import { isMissing } from './text-cell.js';
import type { WordResult } from './words.js';
import { readInputType, readLifecycle, readStatus, readYesNo } from './words.js';

type WordField = 'status' | 'lifecycle' | 'phaseReversal' | 'inputClamp' | 'inputType' | 'crossoverFree';

export const statusCell: CellReader = wordCell('status', readStatus);
export const lifecycleCell: CellReader = wordCell('lifecycle', readLifecycle);

/**
 * Where the column exists, an approved part must have a status. `words` are the list's own (`Preferred` is approved). A lifecycle
 * word in it is kept as lifecycle: status and lifecycle are different things, and which was meant is asked.
 */
export function requiredStatusCell(words: ReadonlyMap<string, Status>): CellReader {
  return (draft, cell, report) => {
    if (isMissing(cell)) return report({ code: 'I501', reason: NO_STATUS, fix: 'one of approved, conditional, restricted, not-approved' }, 'error');
    const own = words.get(foldPhrase(cell));
    if (own !== undefined) return void (draft.status = own);
    const status = readStatus(cell);
    if (status.ok) return void (draft.status = status.word);
    const lifecycle = readLifecycle(cell);
    if (!lifecycle.ok) return report({ ...status.fault, fix: status.fault.fix?.startsWith('one of') === true ? `${status.fault.fix}, or --word "${cell.trim()}=approved"` : status.fault.fix ?? '' }, 'error');
    draft.lifecycle ??= lifecycle.word;
    report({ code: 'I519', reason: `${cell.trim()} is a lifecycle word in a status column: kept as lifecycle, and the part has no approval`, fix: 'a status, and the lifecycle in a column of its own' }, 'warning');
  };
}

const NO_STATUS = 'status is required in an approved list: without it the part can be neither offered nor excluded';

export const STATEMENT_CELLS: Readonly<Record<Statement, CellReader>> = {
  phaseReversal: wordCell('phaseReversal', readYesNo),
  inputClamp: wordCell('inputClamp', readYesNo),
  inputType: wordCell('inputType', readInputType),
  crossoverFree: wordCell('crossoverFree', readYesNo),
};

function wordCell<Key extends WordField>(key: Key, read: (text: string) => WordResult<NonNullable<Draft[Key]>>): CellReader {
  return (draft, cell, report) => {
    if (isMissing(cell)) return;
    const result = read(cell);
    if (result.ok) draft[key] = result.word;
    else report(result.fault, 'error');
  };
}
