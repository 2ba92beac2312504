import { describe, expect, it } from 'vitest';
import { shortlist, withWaysOut } from '../../src/engine.js';
import type { PartSource } from '../../src/parts/part.js';
import { changeOptions } from '../../src/presentation/change-words.js';
import type { Report } from '../../src/report.js';
import { demo, judgedOn, SHIPPED } from '../support/trials.js';

const SOURCE: PartSource = { parts: SHIPPED, sha256: '0'.repeat(64), origin: () => null };

function empty(name: string, set: readonly string[]): { report: Report; again: (options: readonly string[]) => number } {
  const made = demo(name, set)!;
  const report = withWaysOut(shortlist(made.stage, SOURCE), SOURCE, made.changing);
  const again = (options: readonly string[]): number => {
    const stage = made.again(options)!;
    return SHIPPED.filter((part) => judgedOn(stage, part).outcome === 'fits').length;
  };
  return { report, again };
}

describe('where nothing fits', () => {
  it('blames checks that together rule out every part, none of them superfluous', () => {
    const { report } = empty('vent-motor-control', ['limits.supplyCurrent=20 µA']);
    const blamed = report.nothingFits!.conflict!.blamed.map(({ check }) => check);
    const left = (checks: readonly string[]): number => report.rejected.filter(({ verdicts }) => checks.every((check) => verdicts.find((one) => one.check === check)?.outcome !== 'fail')).length;
    expect(left(blamed)).toBe(0);
    for (const check of blamed) expect(left(blamed.filter((other) => other !== check))).toBeGreaterThan(0);
  }, 60_000);

  it('counts what each change lets in, the same as judging the whole catalog again', () => {
    const { report, again } = empty('soil-moisture-probe', ['limits.supplyCurrent=200 nA']);
    const { changes } = report.nothingFits!;
    expect(changes.length).toBeGreaterThan(1);
    for (const change of changes) expect(again(changeOptions(change).filter((word) => word !== '--set'))).toBe(change.lets);
  }, 60_000);

  it('gives up swing first where the output is wanted at a rail', () => {
    const { report, again } = empty('pump-current', ['limits.swingLoss=0 V']);
    const [first] = report.nothingFits!.changes;
    expect(first!.moves.map(({ path }) => path)).toEqual(['limits.swingLoss']);
    expect(again([`limits.swingLoss=${first!.moves[0]!.text}`])).toBe(first!.lets);
    expect(report.nothingFits!.conflict!.blamed).toEqual([expect.objectContaining({ check: 'output-low', leaves: 0 })]);
  }, 60_000);

  it('leaves a report alone in which something fits', () => {
    expect(empty('soil-moisture-probe', []).report.nothingFits).toBeNull();
  }, 60_000);
});
