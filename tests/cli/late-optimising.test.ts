import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { lateOptimising } from '../../src/cli/late-optimising.js';

describe('the flag for code that runs once', () => {
  it('is set for the engine it was measured with, and the engine takes it without a word', () => {
    const flag = lateOptimising('11.3.244.8-node.38') ?? 'none';
    expect(flag).toBe('--interrupt-budget=540672');
    const { status, stdout, stderr } = spawnSync(process.execPath, ['-e', `require('node:v8').setFlagsFromString(${JSON.stringify(flag)}); console.log(6 * 7)`], { encoding: 'utf8' });
    expect({ status, stdout, stderr }).toEqual({ status: 0, stdout: '42\n', stderr: '' });
  });

  it.each(['11.30.1', '12.4.254.21-node.33', '13.6.233'])('is left alone on engine %s', (engine) => {
    expect(lateOptimising(engine)).toBeNull();
  });
});
