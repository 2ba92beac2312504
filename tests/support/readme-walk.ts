import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ROOT } from './built.js';

/** One command of the README's walk, as a reader pastes it. */
export interface WalkStep {
  readonly words: readonly string[];
  /** What stands behind `# exit`; 0 when nothing does. */
  readonly exit: number;
  /** Lines the README shows of its answer. */
  readonly shown: readonly string[];
}

/** The commands and answers of the README's section on the demo, in order. Error: no such section, or an answer before any command. */
export function readmeWalk(): WalkStep[] {
  const steps: { words: string[]; exit: number; shown: string[] }[] = [];
  for (const [, kind, body = ''] of section('A walk through the demo').matchAll(/^```(sh|text)\n([\s\S]*?)^```$/gmu)) {
    const lines = body.split('\n').filter((line) => line !== '');
    if (kind === 'sh') steps.push(...lines.map(stepOf));
    else if (steps.length === 0) throw new Error('README.md shows an answer before the first command of the walk');
    else steps.at(-1)?.shown.push(...lines);
  }
  return steps;
}

function section(title: string): string {
  const found = readFileSync(join(ROOT, 'README.md'), 'utf8').split(/^## /mu).find((text) => text.startsWith(`${title}\n`));
  if (found === undefined) throw new Error(`README.md has no section "${title}"`);
  return found;
}

function stepOf(line: string): { words: string[]; exit: number; shown: string[] } {
  const [, command = '', exit = '0'] = /^railfit (.*?)(?:\s+# exit (\d+).*)?$/u.exec(line) ?? [];
  if (command === '') throw new Error(`README.md, walk through the demo: not a railfit command: ${line}`);
  return { words: shellWords(command), exit: Number(exit), shown: [] };
}

/** Words as a shell splits them; only double quotes are known, and they hold no escapes. */
function shellWords(command: string): string[] {
  return [...command.matchAll(/(?:"[^"]*"|[^\s"])+/gu)].map(([word]) => word.replaceAll('"', ''));
}
