import { foldWords } from './canonical-header.js';
import type { ListColumn } from './list.js';

/** Header of the column by which a look-up sheet is known: what is wanted, in words. */
export const SHEET_HEADER = 'look up';

/** The column that says in words what to look up. */
export const isSheetNote = ({ header }: Pick<ListColumn, 'header'>): boolean => foldWords(header) === foldWords(SHEET_HEADER);

/** A file that was written to be filled in, not to be a list. */
export const isSheet = (columns: readonly ListColumn[]): boolean => columns.some(isSheetNote);
