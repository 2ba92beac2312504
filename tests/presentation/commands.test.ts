import { spawnSync } from 'node:child_process';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { commandLines, commandOf, nextLines, plainCommand } from '../../src/presentation/commands.js';
import { finished } from '../../src/presentation/spelling.js';

const STYLE = { width: 60, ascii: false, colour: false, top: 20, all: false, sources: false, gluedUnits: true };

/** What a shell makes of a text: the words it would hand to `railfit`. */
function wordsOf(text: string): string[] {
  const ran = spawnSync('sh', ['-c', `railfit() { printf '%s\\0' "$@"; }\n${text}\n`], { encoding: 'utf8' });
  expect(ran.stderr).toBe('');
  return ran.stdout.split('\0').slice(0, -1);
}

/** Signs that a shell, an option parser or a printer of sentences would take for theirs. */
const hostile = fc.stringMatching(/^[-−A-Z0-9 '"$`\\!*?#&|;<>(){}[\]~=.,%µΩ]{1,14}$/u).filter((id) => id.trim() === id && id !== '' && id !== '-');

describe('a command that is offered', () => {
  it('is read back word for word by a shell, whatever the part is called, on one line or several', () => {
    fc.assert(
      fc.property(hostile, hostile, (id, file) => {
        const words = commandOf({ command: 'railfit', stageFile: file, changes: ['--supply', '3 V'], catalog: ['--catalog', file] }, ['explain', id], ['--assume', `${id}.offsetDrift=8uV/K`]);
        const options = ['--supply', '3 V', '--assume', `${id}.offsetDrift=8uV/K`, '--catalog', file];
        const behind = id.startsWith('-') || file.startsWith('-');
        const meant = ['explain', ...(behind ? [...options, '--', id, file] : [id, file, ...options])];
        expect(wordsOf(words.join(' '))).toEqual(meant);
        expect(wordsOf(finished(commandLines(words, STYLE, '    '), STYLE))).toEqual(meant);
        const next = finished(nextLines([{ words, why: '' }], { ...STYLE, width: 200 }), STYLE);
        expect(wordsOf(next.replace(/^Next/u, ''))).toEqual(meant);
      }),
      { numRuns: 150 },
    );
  }, 60_000);

  it('puts operands behind -- only where one looks like an option', () => {
    expect(plainCommand('part', 'A-1')).toBe('railfit part A-1');
    expect(plainCommand('part', '-X')).toBe('railfit part -- -X');
    expect(plainCommand('explain', 'A-1', '-')).toBe('railfit explain A-1 -');
  });
});
