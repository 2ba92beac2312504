import { buildStage, movableInputs, stageReader, withLimits, type Built, type Changing, type Override, type Rerun, type Stage, type StageSpec } from '../index.js';

/** A stage as a command was given it: the text of the file, null without one, and the options over it. */
export interface GivenStage {
  readonly text: string | null;
  readonly overrides: readonly Override[];
}

/**
 * The stage under further options, as another command with these `--set` at its end would read and build it. The file is taken apart
 * once; what was tried before is known.
 */
export function rerunOf({ text, overrides }: GivenStage): Rerun {
  const read = stageReader(text);
  const known = new Map<string, ReturnType<Rerun>>();
  let last: Built | null = null;
  return (more) => {
    const key = more.map(({ path, text: value }) => `${path}=${value}`).join('\n');
    const tried = known.get(key);
    if (tried !== undefined) return tried;
    const spec = read([...overrides, ...more]);
    const stage: Stage | null = spec.ok ? stageOf(spec.spec, last) : null;
    if (spec.ok && stage !== null) last = { spec: spec.spec, stage };
    known.set(key, stage);
    return stage;
  };
}

/** Built, or taken from the stage tried before where only the value of a limit differs. */
function stageOf(spec: StageSpec, last: Built | null): Stage | null {
  const kept = last === null ? null : withLimits(last, spec);
  if (kept !== null) return kept;
  const built = buildStage(spec);
  return built.ok ? built.stage : null;
}

/** What a search for changes may use. */
export function changingOf(spec: StageSpec, given: GivenStage): Changing {
  return { rerun: rerunOf(given), inputs: movableInputs(spec), mayChange: spec.mayChange ?? null };
}
