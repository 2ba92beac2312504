import { PARAMETERS, type Figure } from '../parts/figures.js';
import type { Part } from '../parts/part.js';

/**
 * The part as its typical figures have it: limits only where nothing typical is printed, or where a parameter has no typical. Assumed
 * figures count as written, and a head-room without a load as at 10 kΩ to mid-supply, as the checks take it.
 */
export function typicalPart(part: Part): Part {
  const typical = new Set(part.figures.filter(({ kind }) => kind === 'typ').map(placeOf));
  return { ...part, figures: part.figures.filter((figure) => figure.kind === 'typ' || !typical.has(placeOf(figure)) || !hasTypical(figure)).map(asPrinted) };
}

/** A head-room is one point of a curve: another load or supply is another point, that of a limit too. */
function placeOf({ parameter, condition }: Figure): string {
  return isHeadroom(parameter) ? JSON.stringify([parameter, condition.load ?? null, condition.supply ?? null]) : parameter;
}

const isHeadroom = (parameter: Figure['parameter']): boolean => parameter === 'outputLowHeadroom' || parameter === 'outputHighHeadroom';

const hasTypical = ({ parameter }: Figure): boolean => (PARAMETERS[parameter].kinds as readonly string[]).includes('typ');

function asPrinted({ assumed: _assumed, ...figure }: Figure): Figure {
  if (!isHeadroom(figure.parameter) || figure.condition.load !== undefined) return figure;
  return { ...figure, condition: { ...figure.condition, load: { kind: 'resistance', ohms: 10e3, to: 'mid-supply' } } };
}
