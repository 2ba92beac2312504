import { describe, expect, it } from 'vitest';
import { explain, shortlist } from '../../src/engine.js';
import type { PartSource } from '../../src/parts/part.js';
import { deriveDemands, demandsWhenAsked } from '../../src/demands/index.js';
import { judgePart, judging, probePart } from '../../src/screening/index.js';
import { demo, SHIPPED } from '../support/trials.js';

const STAGES = ['soil-moisture-probe', 'light-meter', 'leaf-filter', 'leaf-wetness', 'valve-command'];
const SOME = SHIPPED.filter((_, at) => at % 4 === 0);
const SOURCE: PartSource = { parts: SOME, sha256: '0'.repeat(64), origin: () => null };

describe.each(STAGES)('one part check by check, on %s', (name) => {
  const { stage } = demo(name)!;

  it('ends as judging it in one go does', () => {
    const whole = judging(deriveDemands(stage), SHIPPED, false);
    const asked = judging(demandsWhenAsked(stage), SHIPPED, false);
    for (const part of SOME) {
      const { outcome, verdicts } = judgePart(whole, part);
      const probe = probePart(asked, part);
      expect(probe.fits()).toBe(outcome === 'fits');
      expect(probe.notPassing()).toEqual(verdicts.filter((verdict) => verdict.outcome !== 'pass').map(({ check }) => check));
    }
  }, 60_000);

  it('gives explain the counts, the place and the other parts of the shortlist', () => {
    const report = shortlist(stage, SOURCE);
    for (const part of SOME.slice(0, 3)) {
      const one = explain(stage, SOURCE, { part });
      const line = report.fit.find((ranked) => [ranked, ...ranked.variants].some((other) => other.part.id === part.id));
      expect(one.counts).toEqual(report.counts);
      expect(one.rank).toBe(line?.rank ?? null);
      expect(one.fitting.map((other) => other.part.id)).toEqual(report.fit.filter((other) => other !== line).slice(0, 3).map((other) => other.part.id));
    }
  }, 60_000);
});
