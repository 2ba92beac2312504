import type { LimitsSpec, StageSpec } from '../spec/spec.js';
import type { Stage } from './stage.js';

/** A stage and the spec it was built from. */
export interface Built {
  readonly spec: StageSpec;
  readonly stage: Stage;
}

/**
 * The stage of a spec that differs from a built one in values of its limits alone: the circuit depends on which limits are written, and
 * not on what they say. Null where more differs, or a limit that is judged while building; then it has to be built.
 */
export function withLimits({ spec, stage }: Built, next: StageSpec): Stage | null {
  const isSame = (name: keyof StageSpec): boolean => name === 'limits' || spec[name] === next[name];
  const names = [...Object.keys(spec), ...Object.keys(next)] as (keyof StageSpec)[];
  if (!names.every(isSame) || !isSameLimits(spec.limits, next.limits)) return null;
  return { ...stage, asked: { ...stage.asked, limits: next.limits } };
}

/** The same limits are written; a time to start up is held against the duty cycle of the stage. */
function isSameLimits(one: LimitsSpec, other: LimitsSpec): boolean {
  const [written, others] = [Object.keys(one), Object.keys(other)];
  return written.length === others.length && written.every((name) => name in other) && one.startUp?.value === other.startUp?.value;
}
