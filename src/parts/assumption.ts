import { PARAMETERS, type Figure, type LimitKind, type Parameter } from './figures.js';
import type { Part } from './part.js';

/** The limit kind an assumed figure stands for: the one that bounds it on the bad side. Ranges take their maximum. */
export function limitKindOf(parameter: Parameter): LimitKind {
  const kinds: readonly LimitKind[] = PARAMETERS[parameter].kinds;
  if (kinds.includes('max')) return 'max';
  return kinds.includes('min') ? 'min' : 'typ';
}

/** True for a parameter with two ends (supply voltage, temperature, crossover region): an assumption is about one of them. */
export function hasTwoEnds(parameter: Parameter): boolean {
  const kinds: readonly LimitKind[] = PARAMETERS[parameter].kinds;
  return kinds.includes('min') && kinds.includes('max');
}

/** A figure assumed for one run, SI, under no condition. `kind` only where the parameter has two ends. */
export function assumedFigure(parameter: Parameter, value: number, kind: LimitKind = limitKindOf(parameter)): Figure {
  return { parameter, kind, value, condition: {}, assumed: true };
}

/** An assumed figure takes the place of what the list has for that parameter; of a range, of that end alone. */
export function withAssumed(part: Part, figure: Figure): Part {
  const isReplaced = (one: Figure): boolean => one.parameter === figure.parameter && (!hasTwoEnds(figure.parameter) || one.kind === figure.kind);
  return { ...part, figures: [...part.figures.filter((one) => !isReplaced(one)), figure] };
}
