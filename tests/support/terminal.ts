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
}

const DRIVER = join(import.meta.dirname, 'terminal.py');
const COLUMNS = 100;

/** Runs the built command on a pseudo-terminal of 100 columns and types the steps. Throws when a text does not come. */
export function onTerminal(words: readonly string[], steps: readonly Step[], place: Place): Seen {
  const env = { PATH: process.env['PATH'] ?? '', HOME: place.folder, TMPDIR: place.folder, LANG: 'C.UTF-8', TERM: 'xterm', NO_COLOR: '1', RAILFIT_CATALOG: place.catalog };
  const asked = { argv: [process.execPath, BUILT, ...words], cwd: place.folder, env, columns: COLUMNS, rows: 500, steps: steps.map(([until, keys]) => ({ until, keys })) };
  const ran = spawnSync('python3', [DRIVER], { input: JSON.stringify(asked), encoding: 'utf8' });
  if (ran.error !== undefined || ran.status !== 0) throw new Error(`python3 drives the pseudo-terminal, and it did not: ${ran.error?.message ?? ran.stderr}`);
  const { output, exit, restored, failed } = JSON.parse(ran.stdout) as { output: string[]; exit: number; restored: boolean; failed: string | null };
  const screens = output.map((_, at) => screenOf(output.slice(0, at + 1).join(''), COLUMNS));
  if (failed !== null) throw new Error(`"${failed}" did not come up; the screen:\n${screens.at(-1) ?? ''}`);
  const sent = output.join('');
  return { exit, screens, restored, cursor: sent.lastIndexOf('\u001b[?25h') >= sent.lastIndexOf('\u001b[?25l') };
}
