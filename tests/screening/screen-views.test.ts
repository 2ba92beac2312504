import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { circuitMark, deriveDemands } from '../../src/demands/index.js';
import { ORDERS, outlineAndRank, outlinesIn, type RankedPart, screenAndRank } from '../../src/ranking/index.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { plausibleParts } from '../bench/plausible-part.js';
import { dice } from '../simulate/random.js';
import { drawStage } from '../simulate/draw-stage.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { genericList } from '../support/generic-list.js';
import { option, specOf } from '../support/stage-file.js';
import { ALL_TOPOLOGIES, stageFile } from '../support/topology-stages.js';
import { shortlist } from '../../src/engine.js';
import { bothPaths, printedAs, rowSource, viewSource } from '../support/two-paths.js';
import type { Part } from '../../src/parts/part.js';

const FOLDER = join(import.meta.dirname, '../../catalog/stages');

function stageOf(text: string, overrides: readonly [string, string][] = []): Stage {
  const built = buildStage(specOf(text, overrides.map(([path, value]) => option(path, value))));
  if (!built.ok) throw new Error(built.problems.map(({ message }) => message).join('\n'));
  return built.stage;
}

function taken(seed: number, count: number): Part[] {
  const parts = plausibleParts(dice(seed, 0));
  return Array.from({ length: count }, () => parts.next().value as Part);
}

const ASKING = { strict: false, order: 'merit', assumed: [] } as const;

describe('a catalog judged through views', () => {
  const list = [...taken(7, 15), ...genericList.parts.filter((_, at) => at % 5 === 0)];

  it.each(readdirSync(FOLDER).map((name) => ({ name })))('answers $name with the same bytes as part by part', ({ name }) => {
    const [rows, views] = bothPaths(stageOf(readFileSync(join(FOLDER, name), 'utf8')), list, ASKING);
    expect(views).toEqual(rows);
  });

  it.each(ALL_TOPOLOGIES)('answers a bare $topology stage with the same bytes', ({ topology }) => {
    const [rows, views] = bothPaths(stageOf(stageFile(topology)), list, ASKING);
    expect(views).toEqual(rows);
  });

  it.each(ORDERS.map((order) => ({ order })))('orders by $order the same way, strict and not', ({ order }) => {
    const stage = stageOf(readFileSync(join(FOLDER, 'reference-buffer.yaml'), 'utf8'));
    for (const strict of [false, true]) {
      const [rows, views] = bothPaths(stage, list, { ...ASKING, order, strict });
      expect(views).toEqual(rows);
    }
  });

  it('holds for any parts and any stage', () => {
    fc.assert(
      fc.property(arbitraryParts, fc.nat(1e6), fc.boolean(), (odd, seed, strict) => {
        const parts = [...odd.map((part) => ({ ...part, tier: 'approved' as const, id: `odd ${part.id}` })), ...taken(seed, 8), ...genericList.parts.slice(0, 12)];
        const stage = stageOf(drawStage(dice(seed, 1)).file);
        const [rows, views] = bothPaths(stage, parts, { ...ASKING, strict });
        expect(views).toEqual(rows);
      }),
      { numRuns: 12, seed: 11 },
    );
  });
});

describe('outcomes alone', () => {
  const list = [...taken(21, 25), ...genericList.parts.filter((_, at) => at % 4 === 0)];

  it.each(readdirSync(FOLDER).map((name) => ({ name })))('has the counts and the order of everything judged on $name, through views and part by part', ({ name }) => {
    const stage = stageOf(readFileSync(join(FOLDER, name), 'utf8'));
    const marked = { demands: deriveDemands(stage), circuit: circuitMark(stage) };
    const ids = (fit: readonly RankedPart[]): string[] => fit.flatMap((line) => [line, ...line.variants].map(({ part }) => part.id));
    const whole = screenAndRank(marked, rowSource(list), ASKING);
    const { fit, undecided, rejected } = whole.screened;
    for (const source of [rowSource(list), viewSource(list)]) {
      const short = outlineAndRank(marked, source, ASKING);
      expect(short.counts).toEqual({ parts: list.length, fit: fit.length, undecided: undecided.length, rejected: rejected.length });
      expect(ids(short.fit)).toEqual(ids(whole.fit));
    }
  });
});

describe('one view asked again', () => {
  it('answers a changed limit as if it were asked for the first time', () => {
    const list = [...taken(9, 25), ...genericList.parts.slice(0, 8)];
    const source = viewSource(list);
    const text = readFileSync(join(FOLDER, 'reference-buffer.yaml'), 'utf8');
    const changes: [string, string][][] = [[], [['limits.dcError', '2 mV']], [['limits.dcError', '40 mV']], [['temperature', '0..125 °C']], [['limits.supplyCurrent', '1 mA']], []];
    for (const overrides of changes) {
      for (const strict of [false, true]) {
        const stage = stageOf(text, overrides);
        const again = printedAs(shortlist(stage, source, { ...ASKING, strict }));
        expect(again).toEqual(printedAs(shortlist(stage, rowSource(list), { ...ASKING, strict })));
      }
    }
  });

  it('has the outcomes of everything judged, however limits came and went before', () => {
    const list = [...taken(13, 40), ...genericList.parts.filter((_, at) => at % 6 === 0)];
    const text = readFileSync(join(FOLDER, 'soil-moisture-probe.yaml'), 'utf8');
    const limit = fc.oneof(
      fc.constantFrom('1 mV', '5 mV', '20 mV', '80 mV').map((value): [string, string] => ['limits.dcError', value]),
      fc.constantFrom('2 µA', '90 µA', '2 mA').map((value): [string, string] => ['limits.supplyCurrent', value]),
      fc.constantFrom('-20..60 °C', '0..85 °C').map((value): [string, string] => ['temperature', value]),
    );
    fc.assert(
      fc.property(fc.array(fc.tuple(limit, limit, fc.boolean()), { minLength: 2, maxLength: 6 }), (asked) => {
        const [source, rows] = [viewSource(list), rowSource(list)];
        const outlines = outlinesIn(source, ASKING);
        let before: ReturnType<typeof outlines> | null = null;
        for (const [one, other, isWhole] of asked) {
          const stage = stageOf(text, one[0] === other[0] ? [one] : [one, other]);
          const marked = { demands: deriveDemands(stage), circuit: circuitMark(stage) };
          if (isWhole) screenAndRank(marked, source, ASKING);
          const outline = outlines(marked);
          const { counts, first, ids } = outline;
          const fresh = outlinesIn(viewSource(list), ASKING)(marked);
          const judged = screenAndRank(marked, rows, ASKING);
          const fit = judged.fit.flatMap((line) => [line, ...line.variants].map(({ part }) => part.id));
          expect({ counts, first, ids }).toEqual({ counts: { parts: list.length, fit: fit.length, undecided: judged.screened.undecided.length, rejected: judged.screened.rejected.length }, first: fit[0] ?? null, ids: fit });
          expect(ids).toEqual(fresh.ids);
          if (before !== null) {
            const earlier = before.ids;
            expect(outline.beyond(before)).toEqual(ids.filter((id) => !earlier.includes(id)));
            expect(before.beyond(outline)).toEqual(earlier.filter((id) => !ids.includes(id)));
          }
          before = outline;
        }
      }),
      { numRuns: 12, seed: 3 },
    );
  });
});
