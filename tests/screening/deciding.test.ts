// A part of a survey tells its outcome, and which checks it fails or leaves open, before it is judged in words: both must say the same.
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { shortlist } from '../../src/engine.js';
import type { Part } from '../../src/parts/part.js';
import type { RankedPart } from '../../src/ranking/index.js';
import type { JudgedPart } from '../../src/screening/index.js';
import type { ScreenView } from '../../src/parts/screen-view.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { plausibleParts } from '../bench/plausible-part.js';
import { dice } from '../simulate/random.js';
import { genericList } from '../support/generic-list.js';
import { specOf } from '../support/stage-file.js';
import { rowSource, viewSource } from '../support/two-paths.js';

const FOLDER = join(import.meta.dirname, '../../catalog/stages');
const ASKING = { strict: false, order: 'merit', assumed: [] } as const;
const drawn = plausibleParts(dice(31, 0));
const list: Part[] = [...Array.from({ length: 30 }, () => drawn.next().value as Part), ...genericList.parts.filter((_, at) => at % 4 === 0)];

function stageOf(name: string): Stage {
  const built = buildStage(specOf(readFileSync(join(FOLDER, name), 'utf8')));
  if (!built.ok) throw new Error(built.problems.map(({ message }) => message).join('\n'));
  return built.stage;
}

/** The same view in segments of seven. */
function cutUp(view: ScreenView): ScreenView {
  return {
    ...view,
    segment: 7,
    codes(trait, segment, into) {
      const all = new Int32Array(view.size);
      view.codes(trait, 0, all);
      into.set(all.subarray(7 * segment, Math.min(view.size, 7 * (segment + 1))));
    },
  };
}

describe('a part that does not fit, as a survey knows it', () => {
  it.each(readdirSync(FOLDER).map((name) => ({ name })))('fails the checks that it fails part by part, on $name', ({ name }) => {
    const rows = shortlist(stageOf(name), rowSource(list), ASKING).rejected;
    const source = viewSource(list);
    const screening = source.screening!;
    const sources = [source, { ...source, screening: { ...screening, views: screening.views.map(cutUp) } }];
    expect(rows.length).toBeGreaterThan(0);
    for (const views of sources) {
      const { rejected } = shortlist(stageOf(name), views, ASKING);
      expect(rejected.map(({ part, outcome, deciding, current }) => ({ id: part.id, outcome, deciding, current }))).toEqual(rows.map(({ part, outcome, deciding, current }) => ({ id: part.id, outcome, deciding, current })));
    }
  });

  it.each(readdirSync(FOLDER).map((name) => ({ name })))('has the checks open, or the place, that it has part by part, on $name', ({ name }) => {
    // Every other part without its offset or its current, so that some are open.
    const some = list.map((part, at): Part => ({ ...part, figures: at % 2 === 0 ? part.figures : part.figures.filter(({ parameter }) => parameter !== (at % 4 === 1 ? 'quiescentCurrent' : 'offsetVoltage')) }));
    const [rows, views] = [shortlist(stageOf(name), rowSource(some), ASKING), shortlist(stageOf(name), viewSource(some), ASKING)];
    const short = ({ part, outcome, proof, deciding, current }: JudgedPart): object => ({ id: part.id, outcome, proof, deciding, current });
    expect(views.undecided.map(short)).toEqual(rows.undecided.map(short));
    const placed = (one: RankedPart): object => ({ ...short(one), rank: one.rank, merit: one.merit, tightest: one.tightest, dominatedBy: one.dominatedBy, variants: one.variants.map(short) });
    expect(views.fit.map(placed)).toEqual(rows.fit.map(placed));
    expect(views.fit.map((one) => ({ ...one }))).toEqual(rows.fit);
  });

  it('is judged in words only where words are asked for', () => {
    const read: string[] = [];
    const plain = viewSource(list);
    const watched = (view: ScreenView): ScreenView => ({ ...view, part: (at) => { const part = view.part(at); read.push(part.id); return part; } });
    const source = { ...plain, screening: { ...plain.screening!, views: plain.screening!.views.map(watched) } };
    const { fit } = shortlist(stageOf('soil-moisture-probe.yaml'), source, ASKING);
    const before = read.length;
    const last = fit.at(-1)!;
    expect({ outcome: last.outcome, rank: last.rank, deciding: last.deciding, current: typeof last.current }).toEqual({ outcome: 'fits', rank: fit.length, deciding: [], current: 'number' });
    expect(read.length).toBe(before);
    expect(last.verdicts.length).toBeGreaterThan(5);
    expect(read.length).toBe(before + 1);
  });

  it('tells the rest of itself as the part judged whole', () => {
    const rows = shortlist(stageOf('soil-moisture-probe.yaml'), rowSource(list), ASKING).rejected;
    const { rejected } = shortlist(stageOf('soil-moisture-probe.yaml'), viewSource(list), ASKING);
    const whole = rejected.map((one) => ({ ...one }));
    expect(whole).toEqual(rows);
    for (const { verdicts, deciding } of whole) expect(deciding).toEqual(verdicts.filter(({ outcome }) => outcome === 'fail').map(({ check }) => check));
  });
});

describe('the checks an outcome rests on', () => {
  it('fail where it does not fit, are open where it is undecided, and are none where it fits', () => {
    const report = shortlist(stageOf('vent-motor-control.yaml'), rowSource(list), ASKING);
    const found = [...report.fit, ...report.undecided, ...report.rejected];
    expect(new Set(found.map(({ outcome }) => outcome))).toEqual(new Set(['fits', 'undecided', 'does-not-fit']));
    const wanted = { fits: 'fail', undecided: 'unknown', 'does-not-fit': 'fail' } as const;
    for (const { outcome, verdicts, deciding } of found) {
      expect(deciding).toEqual(verdicts.filter((verdict) => verdict.outcome === wanted[outcome]).map(({ check }) => check));
      expect(deciding.length === 0).toBe(outcome === 'fits');
    }
  });
});
