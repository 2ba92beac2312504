import { PARAMETERS, type LimitKind, type Parameter } from './figures.js';

/** The limit kind an assumed figure stands for: the one that bounds it on the bad side. Ranges take their maximum. */
export function limitKindOf(parameter: Parameter): LimitKind {
  const kinds: readonly LimitKind[] = PARAMETERS[parameter].kinds;
  if (kinds.includes('max')) return 'max';
  return kinds.includes('min') ? 'min' : 'typ';
}
