/** Whether some candidate is left under these constraints. */
type LeavesSome<C> = (constraints: readonly C[]) => boolean;

/**
 * Constraints that together leave no candidate, none of them superfluous; null when all together leave some. Of several such sets
 * the one made of constraints that come early: a constraint that comes late is in it only where the earlier ones do not do alone.
 * Source: U. Junker, QUICKXPLAIN: Preferred Explanations and Relaxations for Over-Constrained Problems, AAAI 2004 (from memory).
 * @example limits A and B each leave some parts and together none, C leaves all: the answer is A and B
 */
export function quickXplain<C>(constraints: readonly C[], leavesSome: LeavesSome<C>): C[] | null {
  if (leavesSome(constraints)) return null;
  return constraints.length === 0 ? [] : explained({ background: [], added: [] }, constraints, leavesSome);
}

interface Context<C> {
  /** Constraints that hold in any case. */
  readonly background: readonly C[];
  /** What was added to the background last. */
  readonly added: readonly C[];
}

/** The least of the constraints that leaves none on top of the background. */
function explained<C>({ background, added }: Context<C>, constraints: readonly C[], leavesSome: LeavesSome<C>): C[] {
  if (added.length > 0 && !leavesSome(background)) return [];
  if (constraints.length === 1) return [...constraints];
  const half = Math.ceil(constraints.length / 2);
  const [first, second] = [constraints.slice(0, half), constraints.slice(half)];
  const fromSecond = explained({ background: [...background, ...first], added: first }, second, leavesSome);
  const fromFirst = explained({ background: [...background, ...fromSecond], added: fromSecond }, first, leavesSome);
  return [...fromFirst, ...fromSecond];
}
