import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { deriveDemands, oneCircuit } from '../../src/demands/index.js';
import { whyNothingFits } from '../../src/explanation/index.js';
import { shortlist } from '../../src/engine.js';
import type { Part, PartSource } from '../../src/parts/part.js';
import { viewsOf } from '../../src/parts/screen-view.js';
import { judgedMisses, type Miss, surveyedMisses } from '../../src/screening/index.js';
import { genericList } from '../support/generic-list.js';
import { demo } from '../support/trials.js';

const FOLDER = join(import.meta.dirname, '../../catalog/stages');
const STAGES = readdirSync(FOLDER).filter((name) => name.endsWith('.yaml')).map((name) => ({ name: name.replace('.yaml', '') }));
// Every other part without its offset or its current, so that some are open; by id, as a catalog has them.
const PARTS: readonly Part[] = [...genericList.parts]
  .sort((a, b) => (a.id < b.id ? -1 : 1))
  .map((part, at) => ({ ...part, figures: at % 2 === 0 ? part.figures : part.figures.filter(({ parameter }) => parameter !== (at % 4 === 1 ? 'quiescentCurrent' : 'offsetVoltage')) }));
const ROWS: PartSource = { parts: PARTS, sha256: '0'.repeat(64), origin: () => null };
const NUMBERS = ['outcome', 'required', 'offered', 'unit', 'margin', 'spare', 'known'] as const;

/** A source whose parts are only read through views; `read` is told of each. */
function viewed(read: (id: string) => void = () => undefined): PartSource {
  const views = viewsOf(PARTS).map((view) => ({ ...view, part: (at: number) => { read(view.id(at)); return view.part(at); } }));
  return { ...ROWS, screening: { views, generic: PARTS.filter(({ tier }) => tier === 'generic'), find: () => null } };
}

const told = (miss: Miss): object => ({
  id: miss.judged().part.id, fails: miss.fails, unmet: miss.unmet,
  verdicts: miss.unmet.map((check) => { const verdict = miss.verdict(check); return NUMBERS.map((name) => verdict?.[name]); }),
  other: miss.verdict('no such check'),
});

describe('what the parts that are out do not pass', () => {
  it.each(STAGES)('is told by a survey as by the parts judged in words, on $name', ({ name }) => {
    const { stage } = demo(name, [])!;
    const { rejected, undecided } = shortlist(stage, ROWS);
    const of = { demands: deriveDemands(stage), circuit: oneCircuit(stage).mark() };
    const surveyed = [...surveyedMisses(of, viewed(), false)].length;
    expect(surveyed).toBe(rejected.length + undecided.length);
    const found: object[] = [];
    for (const miss of surveyedMisses(of, viewed(), false)) found.push(told(miss));
    expect(found).toEqual(judgedMisses([...rejected, ...undecided]).map(told));
  }, 60_000);

  it('says why nothing fits the same way from either, and from a survey reads few parts', () => {
    const { stage, changing } = demo('soil-moisture-probe', ['limits.supplyCurrent=200 nA'])!;
    const { rejected, undecided, fit } = shortlist(stage, ROWS);
    expect(fit).toEqual([]);
    const read: string[] = [];
    const of = { demands: deriveDemands(stage), circuit: oneCircuit(stage).mark() };
    const [source, asking] = [viewed((id) => read.push(id)), { strict: false, order: 'merit' } as const];
    const fromSurvey = whyNothingFits({ stage, source, misses: surveyedMisses(of, source, false), ...asking }, changing);
    expect(fromSurvey).toEqual(whyNothingFits({ stage, source: ROWS, misses: judgedMisses([...rejected, ...undecided]), ...asking }, changing));
    expect(new Set(read).size).toBeLessThan(PARTS.length / 2);
    const { blamed, nearest } = fromSurvey.conflict!;
    const { check, among, verdict } = nearest!;
    const others = blamed.filter((one) => one.check !== check).map((one) => one.check);
    const left = rejected.filter(({ deciding }) => others.every((other) => !deciding.includes(other)));
    expect(among).toBe(left.length);
    const spares = left.flatMap(({ verdicts }) => verdicts.flatMap((one) => (one.check === check && typeof one.offered === 'number' && one.spare !== null ? [one.spare] : [])));
    expect(verdict.spare).toBe(Math.max(...spares));
  }, 60_000);
});
