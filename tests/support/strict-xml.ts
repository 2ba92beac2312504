/** An element of a document, with its attributes and the text directly in it. */
export interface Element {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: readonly Element[];
  readonly text: string;
}

const NAME = String.raw`[A-Za-z_][\w.-]*`;
const TAG = new RegExp(String.raw`^<(/?)(${NAME})((?:\s+${NAME}="[^"<]*")*)\s*(/?)>$`, 'u');
/** Characters XML 1.0 holds, production 2. */
const CHARACTERS = /^[\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]*$/u;

/** Reads a document as strictly as XML 1.0 does, in the small part of it that a JUnit file needs; anything else is an error. */
export function readXml(document: string): Element {
  if (!CHARACTERS.test(document)) throw new Error('a character XML does not hold');
  const [head, ...rest] = document.split('\n');
  if (head !== '<?xml version="1.0" encoding="UTF-8"?>') throw new Error('no declaration');
  const open: { name: string; attributes: Record<string, string>; children: Element[]; text: string }[] = [{ name: '', attributes: {}, children: [], text: '' }];
  for (const [piece] of rest.join('\n').matchAll(/<[^>]*>|[^<]+/gu)) {
    const here = open.at(-1);
    if (here === undefined) throw new Error('more ends than starts');
    if (!piece.startsWith('<')) {
      here.text += plain(piece);
      continue;
    }
    const [, end, name = '', written = '', empty] = TAG.exec(piece) ?? [];
    if (name === '') throw new Error(`not a tag: ${piece}`);
    if (end === '/') {
      if (here.name !== name || open.length < 2) throw new Error(`${name} ends where ${here.name} is open`);
      open.pop();
      open.at(-1)?.children.push(here);
    } else if (empty === '/') here.children.push({ name, attributes: attributesOf(written), children: [], text: '' });
    else open.push({ name, attributes: attributesOf(written), children: [], text: '' });
  }
  const [root] = open;
  const [only, second] = root?.children ?? [];
  if (open.length !== 1 || only === undefined || second !== undefined || root?.text.trim() !== '') throw new Error('not one element');
  return only;
}

function attributesOf(written: string): Record<string, string> {
  const pairs = [...written.matchAll(new RegExp(String.raw`(${NAME})="([^"]*)"`, 'gu'))].map(([, name = '', value = '']) => [name, plain(value)] as const);
  if (new Set(pairs.map(([name]) => name)).size !== pairs.length) throw new Error(`written twice: ${written}`);
  return Object.fromEntries(pairs);
}

const ENTITIES: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };

function plain(text: string): string {
  if (/&(?!(?:amp|lt|gt|quot|apos);)/u.test(text) || text.includes('<')) throw new Error(`markup in text: ${text}`);
  return text.replace(/&(\w+);/gu, (_, name: string) => ENTITIES[name] ?? '');
}
