import type { Document } from 'yaml';
import { LineCounter, parseDocument } from 'yaml';
import type { Problem } from '../quantities/problem.js';
import { convert } from './convert.js';
import { problemAt } from './problems.js';
import type { Position } from './spec.js';
import { explainSyntax } from './syntax.js';
import type { Node } from './tree.js';

export interface Source {
  readonly text: string;
  readonly file?: string | undefined;
  /** Set when the text is the value of an option: every position is then the option. */
  readonly option?: string;
}

export type DocumentResult =
  /** `root` is null for an empty document. */
  | { readonly ok: true; readonly root: Node | null; readonly problems: readonly Problem[] }
  | { readonly ok: false; readonly problems: readonly Problem[] };

/** A stage file is a page; anything longer is another kind of file. UTF-16 units. */
const LONGEST = 256 * 1024;
/** The deepest stage has three levels; beyond this the reader of YAML itself could run out of stack. */
const DEEPEST = 40;

/** YAML (or JSON, its subset) as a tree of texts with positions. Scalars stay as typed: no number, date or yes/no is guessed. */
export function parseTree(source: Source): DocumentResult {
  const text = source.text.replace(/^\uFEFF/, '');
  const unfit = unfitness(text);
  if (unfit !== null) return refuse(source, {}, unfit);
  const counter = new LineCounter();
  const at = positions(source, counter);
  try {
    const document = parseDocument(text, { schema: 'failsafe', lineCounter: counter, uniqueKeys: false, prettyErrors: false });
    const problems = syntaxProblems({ document, source, text, at });
    if (problems.length > 0) return { ok: false, problems };
    return { ok: true, ...convert(document.contents, { at, file: source.file }) };
  } catch {
    return refuse(source, {}, { message: 'the file cannot be read as YAML', fix: 'topology: non-inverting' });
  }
}

function positions(source: Source, counter: LineCounter): (offset: number) => Position {
  const { option } = source;
  if (option !== undefined) return () => ({ option });
  return (offset) => {
    const { line, col } = counter.linePos(offset);
    return { line: Math.max(line, 1), column: Math.max(col, 1) };
  };
}

/** One problem a line: what follows a first fault on a line is mostly its echo. */
function syntaxProblems(made: { document: Document; source: Source; text: string; at: (offset: number) => Position }): Problem[] {
  const seen = new Set<number | undefined>();
  return made.document.errors.flatMap((error) => {
    const { offset, ...complaint } = explainSyntax({ code: error.code, offset: error.pos[0], text: made.text });
    const at = made.at(offset);
    if (seen.has(at.line)) return [];
    seen.add(at.line);
    return [problemAt({ path: '', at, file: made.source.file }, { code: 'S100', ...complaint })];
  });
}

function refuse(source: Source, at: Position, complaint: { message: string; fix?: string }): DocumentResult {
  const spot = source.option === undefined ? at : { option: source.option };
  return { ok: false, problems: [problemAt({ path: '', at: spot, file: source.file }, { code: 'S100', ...complaint })] };
}

function unfitness(text: string): { message: string; fix?: string } | null {
  if (text.length > LONGEST) return { message: `the file has ${String(text.length)} characters; a stage file is a page (at most ${String(LONGEST)})` };
  const control = /[\0-\x08\x0B\x0C\x0E-\x1F\x7F]/.exec(text);
  if (control !== null) return { message: `the file holds the control character U+${hex(control[0])}: it is not a text file in UTF-8`, fix: 'save it as UTF-8 text' };
  if (depth(text) > DEEPEST || /(?:[-?:][ \t]+){40}/.test(text)) return { message: `the file is nested more than ${String(DEEPEST)} levels deep; a stage has three` };
  return null;
}

function hex(character: string): string {
  return character.charCodeAt(0).toString(16).toUpperCase().padStart(4, '0');
}

/** Open brackets at the deepest place, and levels of indentation: an upper bound that needs no parser. */
function depth(text: string): number {
  let [open, deepest] = [0, 0];
  for (const character of text) {
    if (character === '[' || character === '{') open += 1;
    else if ((character === ']' || character === '}') && open > 0) open -= 1;
    deepest = Math.max(deepest, open);
  }
  const indents = new Set(text.split('\n').map((line) => line.length - line.trimStart().length));
  return Math.max(deepest, indents.size);
}
