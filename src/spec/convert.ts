import { isAlias, isMap, isScalar, isSeq } from 'yaml';
import type { Pair, YAMLMap } from 'yaml';
import type { Problem } from '../quantities/problem.js';
import { problemAt } from './problems.js';
import type { Position } from './spec.js';
import type { Entry, Node } from './tree.js';

interface Conversion {
  readonly at: (offset: number) => Position;
  readonly file: string | undefined;
}

interface Converting extends Conversion {
  readonly problems: Problem[];
}

/** The parsed document as our own tree; anchors, aliases, tags and keys that are not words are refused on the way. */
export function convert(contents: unknown, conversion: Conversion): { root: Node | null; problems: readonly Problem[] } {
  const converting = { ...conversion, problems: [] };
  if (contents === null || contents === undefined) return { root: null, problems: [] };
  return { root: nodeOf(contents, converting, 0), problems: converting.problems };
}

function nodeOf(value: unknown, converting: Converting, fallback: number): Node {
  const start = startOf(value) ?? fallback;
  const at = converting.at(start);
  refuseMarks(value, at, converting);
  if (isMap(value)) return { kind: 'branch', entries: entriesOf(value, converting, start), at };
  if (isSeq(value)) return { kind: 'list', items: value.items.map((item) => nodeOf(item, converting, start)), at };
  return { kind: 'leaf', text: textOf(value), at };
}

function entriesOf(map: YAMLMap, converting: Converting, fallback: number): Entry[] {
  return map.items.flatMap((pair: Pair) => {
    const start = startOf(pair.key) ?? fallback;
    const keyAt = converting.at(start);
    refuseMarks(pair.key, keyAt, converting);
    if (!isScalar(pair.key)) {
      refuse(converting, keyAt, { code: 'S103', message: 'a key of the stage file is one word, not a list or a map', fix: 'signal' });
      return [];
    }
    return [{ key: textOf(pair.key), keyAt, node: nodeOf(pair.value, converting, start) }];
  });
}

/** Plain text as it stands in the file: `8`, `4k7`, `5 V ± 5 %`; an unquoted null or ~ is an empty value. */
function textOf(value: unknown): string {
  if (isAlias(value)) return `*${value.source}`;
  if (!isScalar(value)) return '';
  const text = typeof value.value === 'string' ? value.value : '';
  const isNull = value.type === 'PLAIN' && (text === 'null' || text === '~');
  return isNull ? '' : text.trimEnd();
}

function startOf(value: unknown): number | undefined {
  const range = (value as { range?: readonly number[] | null } | null | undefined)?.range;
  return range?.[0];
}

function refuseMarks(value: unknown, at: Position, converting: Converting): void {
  if (isAlias(value)) refuse(converting, at, { code: 'S111', message: `*${value.source} stands for a value written elsewhere; a stage file says every value where it is used`, fix: 'write the value itself' });
  const { anchor, tag } = (value ?? {}) as { anchor?: string; tag?: string };
  if (anchor !== undefined && !isAlias(value)) refuse(converting, at, { code: 'S111', message: `the anchor &${anchor} has no use in a stage file`, fix: `leave out &${anchor}` });
  if (tag !== undefined) refuse(converting, at, { code: 'S111', message: `the tag ${tag.replace('tag:yaml.org,2002:', '!!')} has no use in a stage file: values are read as typed`, fix: 'leave it out' });
}

function refuse(converting: Converting, at: Position, complaint: { code: string; message: string; fix: string }): void {
  converting.problems.push(problemAt({ path: '', at, file: converting.file }, complaint));
}
