import { describe, expect, it } from 'vitest';
import { progressBar } from '../../src/cli/progress.js';

const TERMINAL = { stderr: { isTTY: true, columns: 80 }, env: {} };

/** Works for so many milliseconds in steps, and hands back what was drawn. */
function drawn(milliseconds: number, session: Parameters<typeof progressBar>[0] = TERMINAL): string[] {
  const all: string[] = [];
  const bar = progressBar(session, (text) => void all.push(text));
  const step = bar.step('comparing');
  const start = performance.now();
  for (let done = 0; performance.now() - start < milliseconds; done += 64) step(done % 1024, 1024);
  bar.end();
  return all;
}

describe('the bar', () => {
  it('is not drawn for work under half a second, nor away from a terminal', () => {
    expect(drawn(300)).toEqual([]);
    expect(drawn(800, { stderr: { isTTY: false, columns: undefined }, env: {} })).toEqual([]);
    expect(drawn(800, { ...TERMINAL, env: { TERM: 'dumb' } })).toEqual([]);
  });

  it('is drawn after half a second, at most ten times a second, and taken away at the end', () => {
    const all = drawn(1100);
    const last = all.pop();
    expect(last).toBe('\r\u001b[K');
    expect(all.length).toBeGreaterThan(0);
    expect(all.length).toBeLessThanOrEqual(7);
    for (const text of all) expect(text).toMatch(/^\r\u001b\[Kcomparing \[#*\.*\] \d+ %$/u);
  });
});
