import { paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { finished } from './spelling.js';
import type { Style } from './style.js';
import { tableLines } from './table.js';
import { counted } from './words.js';

/** The team's stage files, after what was done to them. */
export interface StagesReport {
  readonly done: 'list' | 'add' | 'remove';
  /** The files it was done to. */
  readonly files: readonly string[];
  readonly stages: readonly { readonly file: string; readonly part: string | null; readonly name: string | null; readonly problem: string | null }[];
}

const COLUMNS = [
  { title: 'File', key: true },
  { title: 'Chosen part', name: 'chosen:', moves: 3 },
  { title: 'Stage', name: '', moves: 1 },
  { title: '', name: '', moves: 2 },
] as const;

/** What is saved, and what was just saved or forgotten. */
export function renderStages({ done, files, stages }: StagesReport, style: Style): string {
  const said = { list: '', add: 'Saved ', remove: 'Forgotten, the file is left alone: ' }[done];
  const rows = stages.map(({ file, part, name, problem }) => [safeLine(file), part === null ? 'none' : safeLine(part), name === null ? '' : safeLine(name), problem === null ? '' : safeLine(problem)]);
  const lines = [
    ...(done === 'list' ? [] : [...paragraph(`${said}${files.map(safeLine).join(', ')}.`, style), '']),
    ...(rows.length === 0 ? paragraph('No stage is saved. railfit stages add stage.yaml --part ID saves one with the part chosen for it.', style) : tableLines({ columns: COLUMNS, rows }, style)),
    ...(rows.length === 0 ? [] : ['', ...paragraph(`${counted(stages.length, 'saved stage')}. railfit check tells whether the chosen parts still fit.`, style)]),
  ];
  return finished(lines, style);
}
