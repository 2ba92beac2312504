import type { Draft } from './draft.js';
import type { Topology } from './spec.js';
import { isUnder, leafText } from './tree.js';
import { refuse, refuseAbsent } from './refuse.js';

/** Refuses what is missing: topology, supply and what the stage is fed. A field that was written and refused is not missing. */
export function refuseMissing(draft: Draft, topology: Topology | undefined): void {
  const isRefused = topology === undefined && isWritten(draft, 'topology');
  for (const path of ['topology', 'supply']) if (!isWritten(draft, path)) refuseAbsent(draft, path);
  if (isRefused) return;
  if (topology === 'difference') refuseMissingLegs(draft);
  else refuseMissingInput(draft);
}

const PAIRS = [['signal.positive', 'signal.negative'], ['signal.differential', 'signal.commonMode']] as const;
const DRIVES = ['signal.input', 'signal.amplitude', ...PAIRS.flat()];

function refuseMissingInput(draft: Draft): void {
  if (DRIVES.some((path) => isWritten(draft, path))) return;
  refuseAbsent(draft, leafText(draft.fields, 'signal.coupling') === 'ac' || isWritten(draft, 'signal.center') ? 'signal.amplitude' : 'signal.input');
}

function refuseMissingLegs(draft: Draft): void {
  if (!DRIVES.some((path) => isWritten(draft, path))) return missingBoth(draft);
  const used = PAIRS.filter((pair) => pair.some((path) => isWritten(draft, path)));
  if (used.length > 1) return refuseMixture(draft);
  for (const path of used.flat()) if (!isWritten(draft, path)) refuseAbsent(draft, path);
}

function refuseMixture(draft: Draft): void {
  const second = PAIRS[1].filter((path) => isWritten(draft, path));
  for (const path of second) {
    refuse(draft, path, { code: 'S108', message: 'the two inputs are written in two ways; accepted: positive and negative, or differential and commonMode', fix: 'keep one pair' });
  }
}

function missingBoth(draft: Draft): void {
  const fix = draft.hasFile ? 'signal: {positive: 1.2..1.4 V, negative: 1.2..1.3 V}' : '--set "signal={positive: 1.2..1.4 V, negative: 1.2..1.3 V}"';
  refuse(draft, 'signal', { code: 'S102', message: 'signal.positive and signal.negative are missing; accepted: these two, or signal.differential and signal.commonMode', fix });
}

/** Also true when the field, or the map around it, was refused for its structure. */
function isWritten(draft: Draft, path: string): boolean {
  return draft.positions.has(path) || draft.problems.some(({ place }) => place?.path !== undefined && isUnder(path, place.path));
}
