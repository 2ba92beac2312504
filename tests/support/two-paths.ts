import { shortlist } from '../../src/engine.js';
import type { Part, PartSource, Tier } from '../../src/parts/part.js';
import { viewOf } from '../../src/parts/screen-view.js';
import { shortlistCsv } from '../../src/presentation/shortlist-csv.js';
import { shortlistJson } from '../../src/presentation/json.js';
import { renderShortlist } from '../../src/presentation/shortlist-text.js';
import type { Asking, Report } from '../../src/report.js';
import type { Stage } from '../../src/stage/index.js';

/** The parts as the catalog orders them. */
export function ordered(parts: readonly Part[]): Part[] {
  const byId = [...parts].sort((a, b) => (a.id < b.id ? -1 : Number(a.id > b.id)));
  return [...byId.filter(({ tier }) => tier === 'approved'), ...byId.filter(({ tier }) => tier === 'generic')];
}

/** Judged part by part. */
export function rowSource(parts: readonly Part[]): PartSource {
  return { parts: ordered(parts), sha256: 'none', origin: () => null };
}

/** Judged through views made in memory. */
export function viewSource(parts: readonly Part[]): PartSource {
  const source = rowSource(parts);
  const tier = (wanted: Tier): Part[] => source.parts.filter((part) => part.tier === wanted);
  return { ...source, screening: { views: [viewOf('approved', tier('approved')), viewOf('generic', tier('generic'))], generic: tier('generic'), find: (id) => source.parts.find((part) => part.id === id) ?? null } };
}

/** Everything a shortlist is printed as. */
export function printedAs(report: Report): Readonly<Record<string, string>> {
  const style = { colour: false, ascii: false, width: 100, top: 20, all: true, sources: false, gluedUnits: false };
  return {
    json: shortlistJson(report, { top: 20, all: false }),
    everything: shortlistJson(report, { top: 1e6, all: true }),
    csv: shortlistCsv(report),
    text: renderShortlist(report, style, { command: 'railfit', stageFile: 'stage.yaml', catalog: [] }),
  };
}

export function bothPaths(stage: Stage, parts: readonly Part[], asking: Asking): [Readonly<Record<string, string>>, Readonly<Record<string, string>>] {
  return [printedAs(shortlist(stage, rowSource(parts), asking)), printedAs(shortlist(stage, viewSource(parts), asking))];
}
