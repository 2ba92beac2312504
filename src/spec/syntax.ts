export interface SyntaxFault {
  /** The parser's own code for what it met. */
  readonly code: string;
  /** UTF-16 offset where it met it. */
  readonly offset: number;
  readonly text: string;
}

export interface SyntaxExplanation {
  readonly offset: number;
  readonly message: string;
  readonly fix?: string;
}

/** Says a YAML fault in the words of a stage file, with what to type instead. */
export function explainSyntax(fault: SyntaxFault): SyntaxExplanation {
  const quoted = startsLikeBlockText(fault);
  if (quoted !== null) return quoted;
  const [message, fix] = WORDS[fault.code] ?? ['this is not YAML: expected "key: value", one a line', 'supply: 5 V'];
  return { offset: fault.offset, message, fix };
}

const WORDS: Readonly<Record<string, readonly [string, string]>> = {
  TAB_AS_INDENT: ['a tab stands where YAML wants spaces', 'two spaces for each level'],
  MULTIPLE_DOCS: ['a second document starts here; a stage file holds one stage', 'one file for each stage'],
  BLOCK_AS_IMPLICIT_KEY: ['a second "key: value" on one line', 'a line of its own for each key, or a map: {key: value, key: value}'],
  MULTILINE_IMPLICIT_KEY: ['a key runs over two lines', 'each key and its colon on one line'],
  BAD_SCALAR_START: ['a value cannot start with this character unless it is in quotes', 'put the value in quotes'],
  BAD_DQ_ESCAPE: ['the backslash in a text in double quotes starts nothing YAML knows', 'leave out the backslash, or write \\\\'],
  BAD_INDENT: ['a map or list is not closed, or its lines are not indented alike', 'close it with } or ], or indent its lines alike'],
  MISSING_CHAR: ['something is missing here: a colon with a space after it, a comma, a closing quote or bracket', 'key: value'],
  BAD_ALIAS: ['* and & start names of YAML that a stage file does not use', 'put the value in quotes'],
  BAD_DIRECTIVE: ['% at the start of a line is a directive of YAML', 'leave the line out'],
  UNEXPECTED_TOKEN: ['this does not belong here', 'key: value, one a line; a list is [a, b], a map {key: value}'],
  KEY_OVER_1024_CHARS: ['a key is longer than 1024 characters: a colon or a line end is missing', 'key: value'],
  BLOCK_IN_FLOW: ['lines of "key: value" or "- item" stand inside { } or [ ]', '{key: value, key: value}'],
};

/** `dcError: >5 mV` is a block text to YAML: the fault is the sign, not what the parser stumbled on. */
function startsLikeBlockText({ offset, text }: SyntaxFault): SyntaxExplanation | null {
  const start = text.lastIndexOf('\n', offset - 1) + 1;
  const end = text.indexOf('\n', start);
  const line = text.slice(start, end < 0 ? text.length : end);
  const match = /^([^#'"]*?:\s+)([>|].*?)\s*$/.exec(line);
  if (match?.[1] === undefined || match[2] === undefined) return null;
  const sign = match[2].charAt(0);
  return { offset: start + match[1].length, message: `a value that starts with ${sign} is the start of a block of text to YAML`, fix: `"${match[2]}"` };
}
