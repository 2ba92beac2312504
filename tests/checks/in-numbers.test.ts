import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CHECKS, STANDS, type AnyCheck, type AnyNumbers } from '../../src/checks/index.js';
import { deriveDemands, type Demands } from '../../src/demands/index.js';
import { BASES } from '../../src/parts/basis.js';
import { classesOf } from '../../src/parts/classes.js';
import type { Part } from '../../src/parts/part.js';
import { readingsOf, type Readings } from '../../src/parts/readings.js';
import { buildStage } from '../../src/stage/index.js';
import { decide, decideBriefly } from '../../src/verdicts/decide.js';
import { standingOf } from '../../src/verdicts/standing.js';
import type { Finding } from '../../src/verdicts/finding.js';
import { drawStage } from '../simulate/draw-stage.js';
import { dice } from '../simulate/random.js';
import { drawCatalog } from '../screening/sql-form/draw.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { genericList } from '../support/generic-list.js';
import { specOf } from '../support/stage-file.js';

const FOLDER = join(import.meta.dirname, '../../catalog/stages');
const SHIPPED = readdirSync(FOLDER).filter((name) => name.endsWith('.yaml')).map((name) => readFileSync(join(FOLDER, name), 'utf8'));
const COMPOSED = CHECKS.filter(({ composition }) => composition !== null);
const BRIEF = { brief: true } as const;

function demandsOf(text: string): Demands | null {
  const built = buildStage(specOf(text));
  return built.ok ? deriveDemands(built.stage) : null;
}

/** The terms of one part, as the check works them out. */
function termsOf({ composition }: AnyCheck, demands: Demands, readings: Readings): unknown[] {
  return (composition?.names ?? []).map((name) => composition?.term(name, demands, readings));
}

function rowOf({ terms }: AnyNumbers, found: readonly unknown[]): Float64Array {
  const row = new Float64Array(terms.reduce((sum, { width }) => sum + width, 0));
  let at = 0;
  terms.forEach(({ width, write }, number) => {
    write(found[number], { row, at });
    at += width;
  });
  return row;
}

function fromTerms({ composition }: AnyCheck, demands: Demands, found: readonly unknown[]): Finding | null {
  if (composition === null) return null;
  const known = Object.fromEntries(composition.names.map((name, number) => [name, () => found[number]]));
  return composition.finding(demands, composition.whole(demands, known, BRIEF), BRIEF);
}

/** A brief finding of numbers, or a bound, or of several vertices, as one number. */
function standsAs(finding: Finding): number {
  const standing = standingOf(finding);
  if (standing !== 'pass') return standing === 'open' ? STANDS.open : STANDS.fails;
  const { basis } = decideBriefly({ id: '', title: '', hasMargin: false }, finding, finding);
  return STANDS.passes + BASES.findIndex((one) => one === basis);
}

describe('a check in numbers', () => {
  it('finds what it finds from its terms and what it tells in words, for any part and any stage; and how that stands against the limit', () => {
    const seen = new Map<string, Set<string>>();
    const see = (check: string, what: string): void => void seen.set(check, (seen.get(check) ?? new Set()).add(what));
    const compare = (demands: Demands, part: Part, strict: boolean): void => {
      const classWorst = part.class === null ? null : (classesOf(genericList.parts, demands.operating).get(part.class) ?? null);
      const rules = { part, operating: demands.operating, strict, classWorst };
      for (const check of COMPOSED.filter((one) => one.isAsked(demands))) {
        const numbers = check.composition?.inNumbers(demands) ?? null;
        if (numbers === null) throw new Error(`${check.id} has no numbers`);
        const both = (['pessimistic', 'optimistic'] as const).map((outlook) => {
          const found = termsOf(check, demands, readingsOf({ ...rules, outlook, ...BRIEF }));
          const row = rowOf(numbers, found);
          const [finding, stands, terms] = [numbers.finding(row), numbers.stands(row), fromTerms(check, demands, found)];
          if (finding !== null) expect(stands).not.toBe(STANDS.untold);
          if (stands !== STANDS.untold) {
            if (finding === null) see(check.id, `${['fails', 'is open', 'passes'][Math.min(stands, STANDS.passes)] ?? ''} without a number`);
            expect(stands).toBe(terms === null ? null : standsAs(terms));
          }
          if (finding === null || terms === null) return null;
          expect(decideBriefly(check, finding, finding)).toEqual(decideBriefly(check, terms, terms));
          return { finding, words: check.judge(demands, readingsOf({ ...rules, outlook })) };
        });
        const [worst, best] = both;
        if (worst?.words == null || best?.words == null) {
          see(check.id, 'told from terms');
          continue;
        }
        const brief = decideBriefly(check, worst.finding, best.finding);
        see(check.id, brief.outcome);
        // What the basis is of is told of a pass only.
        const { basis, standsOn, ...rest } = brief;
        expect(decide(check, worst.words, best.words)).toMatchObject(brief.outcome === 'pass' ? { basis, standsOn, ...rest } : rest);
      }
    };
    fc.assert(
      fc.property(fc.nat(1e6), fc.boolean(), arbitraryParts, (seed, strict, any) => {
        const drawn = demandsOf(drawStage(dice(seed, 5)).file);
        const shipped = demandsOf(SHIPPED[seed % SHIPPED.length] ?? '');
        const parts = [...drawCatalog(seed, 8).approved, ...any];
        for (const demands of [drawn, shipped]) if (demands !== null) for (const part of parts) compare(demands, part, strict);
      }),
      { numRuns: 60, seed: 3 },
    );
    expect(Object.fromEntries([...seen].map(([check, what]) => [check, [...what].sort()]))).toEqual({
      'output-low': ['fail', 'fails without a number', 'is open without a number', 'pass', 'told from terms', 'unknown'],
      'output-high': ['fail', 'fails without a number', 'is open without a number', 'pass', 'told from terms', 'unknown'],
      'phase-margin': ['fail', 'fails without a number', 'is open without a number', 'pass', 'passes without a number', 'told from terms', 'unknown'],
      'dc-error': ['fail', 'pass', 'unknown'],
    });
  }, 120_000);
});
