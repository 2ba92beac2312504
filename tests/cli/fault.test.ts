import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { EXIT } from '../../src/cli/exit-code.js';
import { reportFault } from '../../src/cli/fault.js';
import type { Session } from '../../src/cli/session.js';

function faultOf(argv: readonly string[]): { exit: number; told: string[] } {
  const told: string[] = [];
  const stream = { isTTY: false, columns: undefined };
  const session: Session = { env: {}, stdout: stream, stderr: stream, tell: (line) => void told.push(line) };
  return { exit: reportFault(new RangeError('index 7 of 3'), argv, session), told };
}

describe('a fault of the program itself', () => {
  it('is exit 70 and one line, with the details in a file', () => {
    const { exit, told } = faultOf(['shortlist', 'stage.yaml']);
    expect(exit).toBe(EXIT.fault);
    expect(exit).toBe(70);
    expect(told).toHaveLength(1);
    expect(told[0]).toMatch(/^fault in railfit itself: index 7 of 3\. Details: .+\.txt\. .*\(exit 70\)$/u);
    const [, file = ''] = /Details: (.+\.txt)\./u.exec(told[0] ?? '') ?? [];
    expect(existsSync(file)).toBe(true);
    expect(readFileSync(file, 'utf8')).toMatch(/command: shortlist stage\.yaml\nRangeError: index 7 of 3\n\s+at /u);
  });

  it('shows the trace with --debug only', () => {
    expect(faultOf(['parts']).told.join('\n')).not.toContain('    at ');
    expect(faultOf(['parts', '--debug']).told.join('\n')).toContain('    at ');
  });
});
