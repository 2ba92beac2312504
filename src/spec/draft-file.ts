import { draftKeysOf, type DraftField } from './draft-fields.js';
import { sceneOf } from './draft-scenes.js';
import type { FieldRow } from './field.js';
import { scalarText } from './scalar-text.js';
import type { SignalSpec, Topology } from './spec.js';

/** A stage file that is still to be filled in, or that answers have filled in. */
export interface DraftRequest {
  readonly topology: Topology;
  readonly coupling: SignalSpec['coupling'];
  /** Texts as typed, by dotted path; absent: an example of the topology. */
  readonly values?: ReadonlyMap<string, string>;
}

/**
 * A commented stage file with every field of the topology: what is needed or answered stands there, the rest has a `#` directly
 * before it. Reads back as it is, and with any one of those taken away when nothing was answered. RangeError for what is not coupled so.
 */
export function draftFile(request: DraftRequest): string {
  const scene = sceneOf(request.topology, request.coupling);
  if (scene === null) throw new RangeError(`no draft of an AC-coupled ${request.topology} stage: it is refused`);
  const head = [...(request.values === undefined ? prose(scene.told, '') : []), ...prose(HOW, ''), ''];
  const live = request.values ?? new Map(Object.entries(scene.live));
  const fields = draftKeysOf({ ...request, live, examples: scene.examples });
  return `${[...head, ...fields.flatMap((one) => [...fieldLines(one, ''), ''])].join('\n').trimEnd()}\n`;
}

const HOW =
  'Values are written as engineers write them, with their unit. A field with # directly before it is left out and takes its default; take the # away to use it. Whatever default is taken is printed as an assumption.';

function fieldLines(one: DraftField, indent: string): string[] {
  if (one.kind === 'told') return one.rows.flatMap((row, at) => toldLines(row, { indent, lead: at === 0 ? one.lead : 'Together with it' }));
  const told = prose(`${capital(one.row.meaning)}. Accepted: ${one.row.accepted}.`, indent);
  const key = keyOf(one.row);
  if (one.kind === 'block') return [...prose(`${capital(one.row.meaning)}.`, indent), `${indent}${key}:`, ...one.fields.flatMap((field) => fieldLines(field, `${indent}  `))];
  return [...told, ...one.parts.flatMap((part) => partLines(part, indent)), `${indent}${one.isLive ? '' : '#'}${key}: ${scalarText(one.text)}`];
}

/** A key of a map that is written in one line. */
function partLines(row: FieldRow, indent: string): string[] {
  return prose(`${keyOf(row)}: ${row.meaning}. Accepted: ${row.accepted}.`, indent, 2);
}

function toldLines(row: FieldRow, { indent, lead }: { indent: string; lead: string }): string[] {
  return prose(`${lead}, ${keyOf(row)}: ${row.example} (${row.meaning}). Accepted: ${row.accepted}.`, indent);
}

const keyOf = ({ path }: FieldRow): string => path.slice(path.lastIndexOf('.') + 1);
/** A word before a colon is one that is typed. */
const capital = (text: string): string => (/^\w+:/.test(text) ? text : text.slice(0, 1).toUpperCase() + text.slice(1));

const WIDTH = 100;

/** Comment lines: `#` and a blank, so that they are never taken for a field. A figure and its unit stay in one line; a minus is one that is typed. */
function prose(text: string, indent: string, inset = 0): string[] {
  const lead = `${indent}# ${' '.repeat(inset)}`;
  const lines: string[] = [];
  for (const word of text.replaceAll('−', '-').split(/(?<!\d) | (?=\d)/)) {
    const last = lines.at(-1);
    if (last === undefined || last.length + 1 + word.length > WIDTH) lines.push(`${lead}${last === undefined || inset === 0 ? '' : '  '}${word}`);
    else lines[lines.length - 1] = `${last} ${word}`;
  }
  return lines;
}
