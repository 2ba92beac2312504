import { demandsWhenAsked } from '../demands/index.js';
import type { Part } from '../parts/part.js';
import { judging, probePart, type Probe } from '../screening/index.js';
import type { Override } from '../spec/spec.js';
import type { Stage } from '../stage/index.js';
import type { Rerun } from './changing.js';

/** One part, to be judged on the stage under one set of options after another. */
export interface Bench {
  readonly stage: Stage;
  /** Null where the stage would be refused. */
  tried(overrides: readonly Override[]): Probe | null;
}

/** What stays the same over all trials. */
export interface BenchSetup {
  readonly stage: Stage;
  readonly rerun: Rerun;
  readonly part: Part;
  /** The catalog: what can be borrowed comes from the part's own class. */
  readonly parts: readonly Part[];
  readonly strict: boolean;
}

export function benchOf({ stage, rerun, part, parts, strict }: BenchSetup): Bench {
  const sets = part.class === null ? [] : parts.filter((one) => one.tier === 'generic' && one.class === part.class);
  // A stage that was tried keeps what was judged on it.
  const known = new WeakMap<Stage, Probe>();
  const probe = (of: Stage): Probe => {
    const made = known.get(of) ?? probePart(judging(demandsWhenAsked(of), sets, strict), part);
    known.set(of, made);
    return made;
  };
  const asIs = probe(stage);
  return {
    stage,
    tried: (overrides) => {
      if (overrides.length === 0) return asIs;
      const moved = rerun(overrides);
      return moved === null ? null : probe(moved);
    },
  };
}
