import { beforeAll, describe, expect, it } from 'vitest';
import { draw } from './draw.js';
import { SIMULATED_CHECKS } from './draw-part.js';
import { disagreements, report, told } from './report.js';
import { confirm, type Confirmation } from './simulate.js';

// Source: ngspice 45 (eecircuit-engine), netlists of our own, around drawn stages and parts near the edge of each check.
// The long form is `npm run simulate -- --seed 1 -n 2000`; its result stands in tests/outside/RESULTS.md.

const SEED = 7;
const VERDICTS = 63;

describe('differential test: drawn verdicts confirmed in the simulator on both readings', () => {
  const found: Confirmation[] = [];

  beforeAll(async () => {
    for (let number = 0; number < VERDICTS; number += 1) found.push(await confirm(draw(SEED, number)));
  }, 120_000);

  it('no verdict disagrees', () => {
    expect(found).toHaveLength(VERDICTS);
    const all = found.map(told);
    expect(disagreements(all), report(all)).toEqual([]);
  });

  it('most readings agree at every real corner, and none is agreed for want of a simulation', () => {
    const readings = found.flatMap((one) => one.readings);
    const share = (standing: string): number => readings.filter((one) => one.standing === standing).length / readings.length;
    expect(share('agreed')).toBeGreaterThan(0.85);
    expect(share('unseen')).toBe(0);
    expect(share('not-simulated')).toBeLessThan(0.05);
  });

  it('every check is drawn, and pass, fail and unknown all occur', () => {
    expect(new Set(found.map((one) => one.draw.check))).toEqual(new Set(SIMULATED_CHECKS));
    expect(new Set(found.map((one) => one.draw.verdict.outcome))).toEqual(new Set(['pass', 'fail', 'unknown']));
  });

  it('the same seed draws the same verdict', () => {
    const [first, again] = [draw(SEED, 5), draw(SEED, 5)];
    expect(again.stage.file).toBe(first.stage.file);
    expect(again.scale).toBe(first.scale);
    expect(again.verdict).toEqual(first.verdict);
  });

  it('a verdict turned round is noticed, whatever the check', async () => {
    for (const { draw: one } of found.slice(0, SIMULATED_CHECKS.length)) {
      const turned = { ...one, verdict: { ...one.verdict, outcome: one.verdict.outcome === 'fail' ? ('pass' as const) : ('fail' as const) } };
      const confirmation = await confirm(turned);
      expect(confirmation.readings.some(({ standing }) => standing === 'disagreed'), one.check).toBe(true);
    }
  });
});
