import { parseQuantity } from '../quantities/parse.js';
import type { Branch, Entry, Leaf, Node } from './tree.js';

/** Maps that also have a form in one line become the map they stand for; everything else stays as it is. */
export function expandShortForm(path: string, node: Node): Node {
  if (node.kind !== 'leaf') return node;
  if (path === 'source') return single(node, 'resistance');
  if (path === 'reference') return single(node, 'value');
  if (path === 'load') return { kind: 'branch', entries: pieces(node).flatMap(loadEntries), at: node.at };
  return node;
}

function single(leaf: Leaf, key: string): Branch {
  return { kind: 'branch', entries: [entry(key, leaf)], at: leaf.at };
}

function entry(key: string, leaf: Leaf): Entry {
  return { key, keyAt: leaf.at, node: leaf };
}

/** `10 kΩ to ground, 100 pF`: parts between commas; a comma between two digits is a decimal comma. */
function pieces(leaf: Leaf): Leaf[] {
  const found = [...leaf.text.matchAll(/(?:[^,;]|(?<=\d),(?=\d))+/g)].map((match) => piece(leaf, match.index, match[0]));
  return found.length === 0 ? [leaf] : found;
}

function piece(leaf: Leaf, start: number, text: string): Leaf {
  const lead = text.length - text.trimStart().length;
  const whole = leaf.whole ?? { text: leaf.text, offset: 0 };
  return { kind: 'leaf', text: text.trim(), at: leaf.at, whole: { text: whole.text, offset: whole.offset + start + lead } };
}

function loadEntries(part: Leaf): Entry[] {
  const match = /^(.*?)\s+to\s+(\S.*)$/i.exec(part.text);
  if (match?.[1] === undefined || match[2] === undefined) return [entry(isCapacitance(part.text) ? 'capacitance' : 'resistance', part)];
  const to = piece(part, part.text.length - match[2].length, match[2]);
  return [entry('resistance', piece(part, 0, match[1])), entry('to', to)];
}

function isCapacitance(text: string): boolean {
  if (parseQuantity(text, 'resistance').ok) return false;
  return parseQuantity(text, 'capacitance').ok || /F\s*$|\d\s*[pnuµμ]\S*\s*$/.test(text);
}
