import type { Problem } from '../quantities/problem.js';
import { suggest } from '../quantities/suggest.js';
import { isBlank } from './blank.js';
import type { ListOptions, ListQuestion, ListResult } from './list.js';
import { matchMapping } from './mapping.js';
import type { WorkbookSheet } from './workbook.js';

export type SheetChoice =
  | { readonly ok: true; readonly sheet: WorkbookSheet }
  | { readonly ok: false; readonly code: 'I103' | 'I107'; readonly message: string; readonly fix: string; readonly question: ListQuestion | null };

/** The sheet that holds the list: the one asked for by name or number, the only one with cells, or the only one a saved mapping knows. Else a question. */
export function chosenSheet(sheets: readonly WorkbookSheet[], { sheet, mappings = [] }: Pick<ListOptions, 'sheet' | 'mappings'>): SheetChoice {
  if (sheet !== undefined) return askedSheet(sheets, sheet);
  const filled = sheets.filter(({ records }) => records.some((record) => !isBlank(record)));
  const known = filled.filter(({ records }) => matchMapping(records, mappings) !== null);
  const [only] = filled.length === 1 ? filled : known.length === 1 ? known : [];
  if (only !== undefined) return { ok: true, sheet: only };
  if (filled.length === 0) return { ok: false, code: 'I103', message: 'the workbook has no sheet with a cell', fix: 'a header row and one row for each part', question: null };
  const names = filled.map(({ name }) => name);
  return {
    ok: false,
    code: 'I107',
    message: `the workbook has ${filled.length} sheets with cells: ${names.join(', ')}`,
    fix: names.map((name) => `--sheet "${name}"`).join(' or '),
    question: { words: 'Which sheet holds the list?', samples: [], choices: names.map((name) => ({ words: name, answer: { sheet: name } })) },
  };
}

function askedSheet(sheets: readonly WorkbookSheet[], asked: string): SheetChoice {
  const folded = asked.trim().toLowerCase();
  const found = sheets.find(({ name }) => name.trim().toLowerCase() === folded) ?? (/^\d+$/u.test(folded) ? sheets[Number(folded) - 1] : undefined);
  if (found !== undefined) return { ok: true, sheet: found };
  const names = sheets.map(({ name }) => name);
  return { ok: false, code: 'I107', message: `the workbook has no sheet "${asked}"; it has ${names.join(', ')}`, fix: `--sheet "${suggest(asked, names)[0] ?? names[0] ?? ''}"`, question: null };
}

/** The file as messages and origins name it: the sheet is part of the place. */
export const sheetLabel = (file: string, sheet: string): string => `${file} [${sheet}]`;

/** What `railfit import` takes for a file that messages name so. */
export function importOperand(label: string): string {
  const [, file = label, sheet] = /^(.*) \[(.*)\]$/su.exec(label) ?? [];
  const quoted = file.includes(' ') ? `"${file}"` : file;
  return sheet === undefined ? quoted : `${quoted} --sheet "${sheet}"`;
}

/** A sheet has rows and no lines. */
export function withoutLines(result: ListResult): ListResult {
  const plain = (problem: Problem): Problem => {
    if (problem.place === undefined) return problem;
    const { line: _line, ...place } = problem.place;
    return { ...problem, place };
  };
  return result.ok ? { ...result, warnings: result.warnings.map(plain) } : { ...result, problems: result.problems.map(plain) };
}
