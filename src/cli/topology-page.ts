import { buildStage, CHECKS, demandsOf, draftFile, readStage, type Topology } from '../index.js';
import type { Block } from './help-topics.js';
import { ownFields } from './stage-help.js';
import { TOPOLOGY_WORDS } from './topology-words.js';

/** Page of one topology: what it does and needs, its own fields, what its drafted stage asks, and how to start; null for another word. */
export function topologyBlocks(word: string): readonly Block[] | null {
  const topology = word.toLowerCase();
  if (!isTopology(topology)) return null;
  const { does, needs } = TOPOLOGY_WORDS[topology];
  const own = ownFields(topology);
  return [
    { text: `${topology}: ${does}.` },
    { text: `Needs topology, supply and ${needs}. railfit help stage lists the fields that most stages have.` },
    ...(own === null ? [] : [{ text: 'Its own fields:' }, own]),
    ...askedBlocks(topology),
    { text: 'To start from a file with every field, and to see what it asks before any part is looked at:' },
    { code: [`railfit draft ${topology} -o stage.yaml`, 'railfit demands stage.yaml', 'railfit shortlist stage.yaml'] },
  ];
}

const isTopology = (word: string): word is Topology => Object.hasOwn(TOPOLOGY_WORDS, word);

/** From the draft itself, so that the page cannot say otherwise. */
function askedBlocks(topology: Topology): Block[] {
  const read = readStage(draftFile({ topology, coupling: 'dc' }), { overrides: [] });
  const built = read.ok ? buildStage(read.spec) : null;
  if (built?.ok !== true) throw new RangeError(`the draft of ${topology} is no stage`);
  const asked = new Set<string>(demandsOf(built.stage).demands.map(({ check }) => check));
  const pairs = CHECKS.filter(({ id }) => asked.has(id)).map(({ id, title }) => [id, title] as const);
  return [{ text: 'What the drafted stage asks of an amplifier:' }, { pairs }];
}
