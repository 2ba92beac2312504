import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { BUILT } from './built.js';
import { screenOf } from './screen.js';

/** Wait for a text, then type; `\r` is Enter, `\u0003` Ctrl-C, `\u0015` erases the line, `\u001b[B` is the arrow down. */
export type Step = readonly [until: string, keys: string];

/** How a command on a pseudo-terminal went. */
export interface Seen {
  readonly exit: number;
  /** The whole screen when each step typed, and at the end. */
  readonly screens: readonly string[];
  /** Terminal settings (echo, line mode, signals) are what they were before. */
  readonly restored: boolean;
  /** The cursor is shown at the end. */
  readonly cursor: boolean;
}

export interface Place {
  readonly folder: string;
  readonly catalog: string;
  /** 100 unless said. */
  readonly columns?: number;
  /** On top of the usual environment, which has NO_COLOR; an empty text takes a variable out. */
  readonly env?: Readonly<Record<string, string>>;
}

const DRIVER = join(import.meta.dirname, 'terminal.py');
const COLUMNS = 100;

/** Runs the built command on a pseudo-terminal, of 100 columns unless said, and types the steps. Throws when a text does not come. */
export function onTerminal(words: readonly string[], steps: readonly Step[], place: Place): Seen {
  const { output, exit, restored } = driven(words, steps, place);
  const screens = output.map((_, at) => screenOf(output.slice(0, at + 1).join(''), columnsOf(place)));
  const sent = output.join('');
  return { exit, screens, restored, cursor: sent.lastIndexOf('\u001b[?25h') >= sent.lastIndexOf('\u001b[?25l') };
}

/** All that a command which asks nothing sends to such a terminal, with its controls, and the screen it leaves. */
export function sentToTerminal(words: readonly string[], place: Place): { readonly sent: string; readonly screen: string } {
  const sent = driven(words, [], place).output.join('');
  return { sent, screen: screenOf(sent, columnsOf(place)) };
}

const columnsOf = ({ columns = COLUMNS }: Place): number => columns;

interface Driven {
  /** What came before each step, and after the last. */
  readonly output: readonly string[];
  readonly exit: number;
  readonly restored: boolean;
}

function driven(words: readonly string[], steps: readonly Step[], place: Place): Driven {
  const columns = columnsOf(place);
  const env = { PATH: process.env['PATH'] ?? '', HOME: place.folder, TMPDIR: place.folder, LANG: 'C.UTF-8', TERM: 'xterm', NO_COLOR: '1', RAILFIT_CATALOG: place.catalog, ...place.env };
  const asked = { argv: [process.execPath, BUILT, ...words], cwd: place.folder, env, columns, rows: 500, steps: steps.map(([until, keys]) => ({ until, keys })) };
  const ran = spawnSync('python3', [DRIVER], { input: JSON.stringify(asked), encoding: 'utf8' });
  if (ran.error !== undefined || ran.status !== 0) throw new Error(`python3 drives the pseudo-terminal, and it did not: ${ran.error?.message ?? ran.stderr}`);
  const { failed, ...rest } = JSON.parse(ran.stdout) as Driven & { readonly failed: string | null };
  if (failed !== null) throw new Error(`"${failed}" did not come up; the screen:\n${screenOf(rest.output.join(''), columns)}`);
  return rest;
}
