import { renderStageHelp, type Topology } from '../index.js';
import type { Block } from './help-topics.js';
import { TOPOLOGY_WORDS } from './topology-words.js';

type Help = ReturnType<typeof renderStageHelp>[number];

/** Each topology with what it needs. */
export const TOPOLOGY_PAIRS: readonly (readonly [string, string])[] = Object.entries(TOPOLOGY_WORDS).map(([topology, { does, needs }]) => [topology, `${does}. Needs ${needs}`] as const);

/** A map that so few topologies have is told as theirs. */
const FEW = 2;

/** The fields of every stage, then those of one or two topologies, each under its own line. */
export function fieldGroups(): readonly Block[] {
  const all = renderStageHelp();
  const maps = new Map(all.map((row) => [row.path, row.topologies]));
  const ownersOf = ({ path }: Help): readonly Topology[] => maps.get(path.split('.')[0] ?? '') ?? [];
  const common = all.filter((row) => ownersOf(row).length > FEW);
  const own = all.filter((row) => ownersOf(row).length <= FEW);
  const names = [...new Set(own.map((row) => ownersOf(row).join(' and ')))];
  return [
    { text: 'Fields that most stages have:' },
    pairsOf(common),
    ...names.flatMap((name): Block[] => [{ text: `Fields of ${name} only:` }, pairsOf(own.filter((row) => ownersOf(row).join(' and ') === name))]),
  ];
}

/** The fields that only this topology has, perhaps with one other; null when there are none. */
export function ownFields(topology: Topology): Block | null {
  const all = renderStageHelp();
  const maps = new Map(all.map((row) => [row.path, row.topologies]));
  const own = all.filter(({ path }) => {
    const owners = maps.get(path.split('.')[0] ?? '') ?? [];
    return owners.length <= FEW && owners.includes(topology);
  });
  return own.length === 0 ? null : pairsOf(own);
}

function pairsOf(rows: readonly Help[]): Block {
  return { pairs: rows.map(({ path, accepted, example, meaning }) => [path, `${meaning}: ${accepted}; for example ${example}`] as const) };
}
