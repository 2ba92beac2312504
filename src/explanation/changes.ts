import type { Probe } from '../screening/index.js';
import { adviceFor } from './advice.js';
import { benchOf, type BenchSetup } from './bench.js';
import type { Errand } from './boundary.js';
import type { Change, Changes, Changing } from './changing.js';
import { designsFor } from './designs.js';
import { fixedMovers } from './fixed-movers.js';
import { minimalSets } from './minimal-sets.js';
import { movable, moversOf, untried } from './movers.js';
import { reaching, type Reacher } from './reacher.js';
import { realised } from './realised.js';

/** Changes of more inputs at once are a new stage. */
const MOST_MOVES = 3;
/** So many are told. */
const MOST_OPTIONS = 4;
const MOST_BEYOND = 2;
/** Three digits. */
const SHOWN = 1e-3;

/** What would let one part in: smallest sets of moves, each judged again in full before it is told. None where it fits. */
export function changesFor(setup: Omit<BenchSetup, 'rerun'>, changing: Changing): Changes {
  const bench = benchOf({ ...setup, rerun: changing.rerun });
  const notPassing = bench.tried([])?.notPassing() ?? [];
  const errand: Errand = { bench, checks: notPassing, before: [] };
  const limits = moversOf(changing, setup.stage).map((mover) => reaching(mover, errand));
  const reachers = [...limits, ...designsFor(errand, changing)];
  const options = smallest(reachers, errand, (probe) => probe.fits()).slice(0, MOST_OPTIONS);
  const stuck = notPassing.filter((check) => !reachers.some(({ reach }) => reach.has(check)));
  return {
    options,
    notPassing,
    stuck,
    beyond: options.length > 0 || notPassing.length === 0 ? [] : beyond(reachers, { ...errand, stuck }, changing),
    advice: adviceFor(errand, { changing, smallest: (checks, isIn) => smallest(reachers, { ...errand, checks }, isIn) }),
    movable: movable(changing).map(({ path }) => path),
    untried: untried(changing),
  };
}

/** By factor, then by number of moves. */
function smallest(reachers: readonly Reacher[], errand: Errand, isIn: (probe: Probe) => boolean): Change[] {
  if (errand.checks.length === 0) return [];
  const options = minimalSets(reachers, errand.checks, MOST_MOVES).flatMap((set) => realised(set, errand, isIn) ?? []);
  const ordered = options.sort((a, b) => a.factor - b.factor || a.moves.length - b.moves.length);
  const told = ordered.map(({ moves }) => moves.map(({ path, text }) => `${path}=${text}`).join('\n'));
  return ordered.filter((_, at) => told.indexOf(told[at] ?? '') === at);
}

/** What is kept fixed and would help, where nothing else does. */
function beyond(reachers: readonly Reacher[], errand: Errand & { readonly stuck: readonly string[] }, changing: Changing): Change[] {
  const { stuck } = errand;
  const movers = fixedMovers(changing, errand).filter(({ touches }) => stuck.length === 0 || touches?.some((check) => stuck.includes(check)) === true);
  // One check that nothing helps, and no search is worth its time.
  if (!stuck.every((check) => movers.some(({ touches }) => touches?.includes(check)))) return [];
  const roughly = { ...errand, width: SHOWN };
  const further = movers.map((mover) => reaching(mover, roughly));
  return smallest([...reachers, ...further], roughly, (probe) => probe.fits()).slice(0, MOST_BEYOND);
}
