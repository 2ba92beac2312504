/** How a saved stage is answered by one list. */
export interface StageStanding {
  /** First choice; null when nothing fits. */
  readonly first: string | null;
  readonly fit: number;
  readonly undecided: number;
  readonly rejected: number;
  /** The part chosen for the stage; null when none is. `absent`: not in the catalog. */
  readonly chosen: { readonly outcome: 'fits' | 'undecided' | 'does-not-fit' | 'absent'; readonly proof: 'limits' | 'typical' | null; readonly rank: number | null } | null;
}

/** A saved stage before and after an import; or why it was not judged. */
export interface StageChange {
  readonly file: string;
  /** The part chosen for it; null when none is. */
  readonly part: string | null;
  readonly outcome: 'same' | 'other' | 'not-judged';
  readonly before: StageStanding | null;
  readonly after: StageStanding | null;
  /** Not judged only. */
  readonly reason?: string;
}

/** Which saved stages are answered differently, then those that could not be judged. */
export function stageChangeLines(stages: readonly StageChange[]): string[] {
  if (stages.length === 0) return [];
  const other = stages.filter(({ outcome }) => outcome === 'other');
  const broken = stages.filter(({ outcome }) => outcome === 'not-judged');
  const judged = stages.length - broken.length;
  const said = other.length === 0 ? `${counted(judged)} ${judged === 1 ? 'is' : 'are'} answered as before.` : `${other.length} of ${counted(judged)} ${other.length === 1 ? 'is' : 'are'} answered differently.`;
  return [...(judged === 0 ? [] : [said]), ...other.map(changeLine), ...broken.map(({ file, reason }) => `  ${file}: not judged: ${reason ?? ''}`)];
}

const counted = (stages: number): string => `${stages} saved stage${stages === 1 ? '' : 's'}`;

function changeLine({ file, part, before, after }: StageChange): string {
  if (before === null || after === null) return `  ${file}`;
  const pieces = [
    moved('first choice', before.first ?? 'none', after.first ?? 'none'),
    moved('fit', String(before.fit), String(after.fit)),
    moved('cannot be decided', String(before.undecided), String(after.undecided)),
    ...(part === null ? [] : [moved(`chosen ${part}`, chosenWords(before), chosenWords(after))]),
  ].filter((piece) => piece !== '');
  return `  ${file}: ${pieces.length === 0 ? 'what fits changes' : pieces.join('; ')}`;
}

/** What stays the same is left out, but for the chosen part and the first choice: those are what a reader looks for. */
function moved(what: string, was: string, now: string): string {
  if (was !== now) return `${what} ${was} → ${now}`;
  return what === 'fit' || what === 'cannot be decided' ? '' : `${what} ${was} as before`;
}

function chosenWords({ chosen }: StageStanding): string {
  if (chosen === null) return 'none';
  const { outcome, proof, rank } = chosen;
  if (outcome === 'fits') return `fits (rank ${rank ?? '?'}, ${proof === 'limits' ? 'on limits' : 'figures to confirm'})`;
  return { undecided: 'cannot be decided', 'does-not-fit': 'does not fit', absent: 'not on the list' }[outcome];
}
