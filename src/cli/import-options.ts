import { readDeclarations } from '../intake/declarations.js';
import { foldPhrase } from '../intake/header-parts.js';
import type { Layout } from '../intake/layout.js';
import { ENCODINGS, type Encoding } from '../intake/limits.js';
import type { ColumnAnswer, Delimiter, ListOptions } from '../intake/list.js';
import { readStatus } from '../intake/words.js';
import type { Problem } from '../quantities/problem.js';
import { suggest } from '../quantities/suggest.js';
import { EXIT } from './exit-code.js';
import type { MappingOptions } from './mapping-files.js';
import { commandProblem, RequestError } from './request-error.js';

/** Options of `import` that say how a list is to be read, as typed. */
export interface ReadingOptions extends MappingOptions {
  readonly encoding?: string;
  readonly sheet?: string;
  readonly delimiter?: string;
  readonly decimal?: 'comma' | 'point';
  readonly large?: boolean;
  readonly headerRows?: string;
  readonly untilBlank?: boolean;
  readonly map?: readonly string[];
  readonly word?: readonly string[];
  readonly missing?: readonly string[];
  readonly declare?: readonly string[];
  readonly classes?: string;
  readonly input?: boolean;
  readonly showMapping?: boolean;
}

type Answers = Pick<ListOptions, 'encoding' | 'sheet' | 'delimiter' | 'decimal' | 'large' | 'layout' | 'map' | 'words' | 'missing' | 'declare' | 'classWithin'>;

/** The answers the command line gives; every option that cannot be read is told at once. */
export function answersOf(options: ReadingOptions): Answers {
  const problems: Problem[] = [];
  const refuse = (message: string, path: string, fix: string): void => void problems.push(commandProblem('C104', message, { path, fix }));
  const declarations = options.declare === undefined ? null : readDeclarations(options.declare);
  if (declarations?.ok === false) refuse(declarations.reason, '--declare', declarations.fix);
  const answers: Answers = {
    ...given('encoding', encodingOf(options.encoding, refuse)),
    ...given('sheet', options.sheet),
    ...given('delimiter', delimiterOf(options.delimiter, refuse)),
    ...given('decimal', options.decimal),
    ...given('large', options.large),
    ...given('layout', layoutOf(options, refuse)),
    ...given('map', options.map?.flatMap((text) => columnAnswer(text, refuse))),
    ...given('words', wordsOf(options.word, refuse)),
    ...given('missing', options.missing),
    ...given('declare', declarations?.ok === true ? declarations.declarations : undefined),
    ...given('classWithin', distanceOf(options.classes, refuse)),
  };
  if (options.mapping === '') refuse('--mapping names no file', '--mapping', '--mapping hardware-list.json');
  if (problems.length > 0) throw new RequestError(problems, EXIT.request);
  return answers;
}

type Refuse = (...[message, path, fix]: [string, string, string]) => void;

function given<Key extends string, Value>(key: Key, value: Value | undefined): Partial<Record<Key, Value>> {
  return value === undefined ? {} : ({ [key]: value } as Partial<Record<Key, Value>>);
}

function encodingOf(text: string | undefined, refuse: Refuse): Encoding | undefined {
  if (text === undefined) return undefined;
  const folded = text.toLowerCase().replace(/^utf-?(\d+)-?/u, 'utf-$1').replace(/^(?:cp|win(?:dows)?-?)1252$/u, 'windows-1252');
  const found = ENCODINGS.find((one) => one === folded);
  if (found === undefined) refuse(`${text} is no encoding railfit reads: ${ENCODINGS.join(', ')}`, '--encoding', suggest(folded, ENCODINGS)[0] ?? 'windows-1252');
  return found;
}

const DELIMITERS: Readonly<Record<string, Delimiter>> = { ',': ',', ';': ';', '\t': '\t', '\\t': '\t', tab: '\t', '|': '|', comma: ',', semicolon: ';', bar: '|' };

function delimiterOf(text: string | undefined, refuse: Refuse): Delimiter | undefined {
  const found = text === undefined ? undefined : DELIMITERS[text.toLowerCase()];
  if (text !== undefined && found === undefined) refuse(`${text} is no separator railfit reads: , ; tab |`, '--delimiter', 'tab');
  return found;
}

function layoutOf({ headerRows, untilBlank = false }: ReadingOptions, refuse: Refuse): Layout | undefined {
  if (headerRows === undefined) return untilBlank ? { headerRows: [1], untilBlank } : undefined;
  const [, first, second] = /^([1-9]\d{0,3})(?:\s*-\s*([1-9]\d{0,3}))?$/u.exec(headerRows.trim()) ?? [];
  const top = Number(first);
  const pair = second === undefined ? null : Number(second);
  if (first === undefined || (pair !== null && pair !== top + 1)) refuse(`${headerRows}: one row, or two that follow each other`, '--header-rows', '4-5');
  return { headerRows: pair === null ? [top] : [top, pair], untilBlank };
}

/** `M=load (kΩ)`: the first `=` parts the column from the header it is read as. */
function columnAnswer(text: string, refuse: Refuse): ColumnAnswer[] {
  const at = text.indexOf('=');
  const [column, header] = [text.slice(0, at).trim(), text.slice(at + 1).trim()];
  if (at > 0 && column !== '' && header !== '') return [{ column, header }];
  refuse(`"${text}": the form is COLUMN=HEADER, the column by letter or header`, '--map', '--map "M=load (kΩ)"');
  return [];
}

function wordsOf(texts: readonly string[] | undefined, refuse: Refuse): ListOptions['words'] {
  if (texts === undefined) return undefined;
  return new Map(texts.flatMap((text) => {
    const [, word = '', status = ''] = /^(.*?)=\s*(.*?)\s*$/su.exec(text) ?? [];
    const found = readStatus(status);
    if (word.trim() !== '' && found.ok) return [[foldPhrase(word), found.word] as const];
    refuse(`"${text}": the form is WORD=STATUS`, '--word', '--word "Preferred=approved"');
    return [];
  }));
}

function distanceOf(text: string | undefined, refuse: Refuse): number | undefined {
  if (text === undefined) return undefined;
  const distance = /^\d+(?:\.\d+)?$/u.test(text.trim()) ? Number(text) : Number.NaN;
  if (!(distance > 0 && distance <= 1)) refuse(`${text}: a distance in decades is expected, up to 1`, '--classes', '--classes 0.3');
  return distance;
}
