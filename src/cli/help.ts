import { asciiText } from '../quantities/ascii.js';
import { suggest } from '../quantities/suggest.js';
import { EXIT } from './exit-code.js';
import { formulaAscii } from './formula-ascii.js';
import { codeBlocks, TOPICS, type Block } from './help-topics.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';
import { topologyBlocks } from './topology-page.js';
import { TOPOLOGY_WORDS } from './topology-words.js';

/** What help is asked about, and the short help it falls back on. */
export interface HelpQuestion {
  readonly topic: string | undefined;
  overview(): string;
  commandHelp(name: string): string | null;
}

const COMMANDS = ['shortlist', 'explain', 'predict', 'demands', 'sweep', 'draft', 'parts', 'part', 'import', 'check', 'stages', 'report', 'verify', 'help'];

/** `railfit help TOPIC`: long help, also for every message code. */
export function runHelp(session: Session, question: HelpQuestion, options: CommonOptions): Outcome {
  const style = styleFor(session, options);
  const text = textFor(question, style);
  if (options.json === true) return { text: `${JSON.stringify({ schema: 'railfit/help', schemaVersion: 1, topic: question.topic ?? null, text }, null, 2)}\n`, exit: EXIT.yes };
  return { text, exit: EXIT.yes };
}

function textFor(question: HelpQuestion, style: HelpStyle): string {
  const { topic } = question;
  if (topic === undefined) return `${question.overview()}\nTopics: ${Object.keys(TOPICS).join(', ')}, a topology, a command, or a message code such as Q002.\n`;
  const command = question.commandHelp(topic);
  const page = TOPICS[topic]?.() ?? null;
  if (command !== null) return (style.ascii ? asciiText(command) : command) + (page === null ? '' : `\n${page.map((block) => render(block, style)).join('\n\n')}\n`);
  const blocks = page ?? topologyBlocks(topic) ?? codeBlocks(topic);
  if (blocks !== null) return `${blocks.map((block) => render(block, style)).join('\n\n')}\n`;
  const near = suggest(topic, [...Object.keys(TOPICS), ...Object.keys(TOPOLOGY_WORDS), ...COMMANDS]);
  const fix = near.length === 0 ? `one of ${Object.keys(TOPICS).join(', ')}, a topology, a command, or a message code` : `did you mean ${near.join(', ')}?`;
  throw new RequestError([commandProblem('C109', `no help on ${topic}`, { fix })], EXIT.request);
}

type HelpStyle = Pick<ReturnType<typeof styleFor>, 'width' | 'ascii'>;

function render(block: Block, { width, ascii }: HelpStyle): string {
  const spelled = (text: string): string => (ascii ? formulaAscii(asciiText(text)) : text.replaceAll('−', '-'));
  if ('text' in block) return wrap(spelled(block.text), width).join('\n');
  if ('code' in block) return block.code.map((line) => `    ${spelled(line)}`).join('\n');
  const widest = Math.min(28, Math.max(...block.pairs.map(([name]) => name.length)));
  return block.pairs.flatMap(([name, text]) => pairLines([name, spelled(text)], widest, width)).join('\n');
}

/** Name and text side by side; a long name, or a narrow terminal, puts the text below. */
function pairLines([name, text]: readonly [string, string], widest: number, width: number): string[] {
  if (width < 60 || name.length > widest) return [`  ${name}`, ...wrap(text, width - 6).map((line) => `      ${line}`)];
  const lines = wrap(text, width - widest - 4);
  return lines.map((line, at) => `  ${(at === 0 ? name : '').padEnd(widest)}  ${line}`);
}

function wrap(text: string, width: number): string[] {
  const lines: string[] = [];
  for (const word of text.split(' ')) {
    const last = lines.at(-1);
    if (last === undefined || last.length + 1 + word.length > width) lines.push(word);
    else lines[lines.length - 1] = `${last} ${word}`;
  }
  return lines;
}
