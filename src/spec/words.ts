import type { Draft } from './draft.js';
import { nearest, shown } from './nearest.js';
import type { Complaint } from './problems.js';
import { problemIn } from './problems.js';
import { field } from './schema.js';
import type { Leaf } from './tree.js';
import { isEmpty } from './tree.js';
import { unknownPath } from './unknown-key.js';
import { leafAt, refuse } from './refuse.js';

/** A field that takes one of a few words. */
// eslint-disable-next-line @typescript-eslint/no-unnecessary-type-parameters -- the table of fields holds the words as text
export function readChoice<Word extends string>(draft: Draft, path: string): Word | undefined {
  const leaf = leafAt(draft, path);
  if (leaf === undefined) return undefined;
  const word = leaf.text.trim();
  const { words = [] } = field(path);
  return words.includes(word) ? (word as Word) : refuse(draft, path, unknownWord(word, path));
}

/** A field that takes a list of a few words, or one of them; `a, b` is a list too. */
// eslint-disable-next-line @typescript-eslint/no-unnecessary-type-parameters -- the table of fields holds the words as text
export function readChoices<Word extends string>(draft: Draft, path: string): readonly Word[] | undefined {
  const { words = [] } = field(path);
  return readItems(draft, path, (word) => (words.includes(word) ? null : unknownWord(word, path))) as readonly Word[] | undefined;
}

/** A field that takes a list of free words. */
export function readTexts(draft: Draft, path: string): readonly string[] | undefined {
  return readItems(draft, path, () => null);
}

/** A field that takes a list of field names. */
export function readPaths(draft: Draft, path: string): readonly string[] | undefined {
  return readItems(draft, path, pathComplaint);
}

/** A field that takes any text in one piece. */
export function readText(draft: Draft, path: string): string | undefined {
  const leaf = leafAt(draft, path);
  if (leaf === undefined) return undefined;
  return isEmpty(leaf) ? refuse(draft, path, empty(path)) : leaf.text.trim();
}

function readItems(draft: Draft, path: string, complain: (word: string) => Complaint | null): readonly string[] | undefined {
  const node = draft.fields.get(path);
  if (node === undefined || node.kind === 'branch') return undefined;
  if (isEmpty(node) || (path.startsWith('wishes.') && node.kind === 'list' && node.items.length === 0)) return refuse(draft, path, empty(path));
  const items = node.kind === 'leaf' ? node.text.split(',').map((text): Leaf => ({ ...node, text: text.trim() })) : (node.items as readonly Leaf[]);
  const problems = items.flatMap((item) => {
    const complaint = item.text.trim() === '' ? empty(path) : complain(item.text.trim());
    return complaint === null ? [] : [problemIn(item, { path, at: item.at, file: draft.file }, complaint)];
  });
  draft.problems.push(...problems);
  return problems.length > 0 ? undefined : items.map((item) => item.text.trim());
}

/** What may never be what "would let it in" touches: it names or steers, it asks nothing. */
const STEERING: readonly string[] = ['name', 'mayChange', 'avoid', 'part'];

function pathComplaint(word: string): Complaint | null {
  if (!STEERING.includes(word)) return unknownPath(word);
  return { code: 'S104', message: `${word} asks nothing of a part, so changing it lets none in; accepted: a field that is judged`, fix: 'limits.dcError' };
}

/** S104 for a word that is none of those a field takes, S103 for none at all. */
export function unknownWord(word: string, path: string): Complaint {
  const { words = [], accepted, example } = field(path);
  if (word === '') return empty(path);
  const meant = nearest(word, words);
  const hint = meant === undefined ? ';' : `, did you mean ${meant}?`;
  return { code: 'S104', message: `${shown(word)} is not one of the words taken here${hint} accepted: ${accepted}`, fix: meant ?? firstOf(example) };
}

function empty(path: string): Complaint {
  return { code: 'S103', message: `${path} has no value; accepted: ${field(path).accepted}`, fix: field(path).example };
}

/** `[approved, conditional]` → `approved`. */
function firstOf(example: string): string {
  return example.replace(/[[\]]/g, '').split(',')[0] ?? example;
}
