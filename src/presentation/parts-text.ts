import type { Figure, LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import { amount, priceText, range } from './amounts.js';
import { aboutPart, tierMark } from './fit-table.js';
import { paragraph } from './layout.js';
import type { PartLine } from './parts-json.js';
import { safeLine } from './safe-text.js';
import { finished, GLUE } from './spelling.js';
import type { Style } from './style.js';
import { tableLines } from './table.js';
import { checkWords, counted } from './words.js';

/** Parts of the catalog, after any search. */
export interface PartsList {
  /** How many the catalog has. */
  readonly total: number;
  readonly parts: readonly PartLine[];
}

const COLUMNS = [
  { title: 'Part', key: true },
  { title: '', key: true },
  { title: 'Class', moves: 1, name: '' },
  { title: 'Supply', name: 'supply' },
  { title: 'Gain\nbandwidth', align: 'right', name: 'gain bandwidth', moves: 3 },
  { title: 'Current', align: 'right', name: 'current', moves: 4 },
  { title: 'Price', align: 'right', name: 'price', moves: 5 },
  { title: 'Fails', moves: 2, name: 'fails' },
] as const;

/** The catalog as a list; typical figures are marked. */
export function renderParts({ total, parts }: PartsList, style: Style): string {
  if (parts.length === 0) return finished(paragraph(`Nothing matches; the catalog has ${counted(total, 'part')}.`, style), style);
  const of = (tier: Part['tier']): number => parts.filter(({ part }) => part.tier === tier).length;
  const share = parts.length === total ? counted(total, 'part') : `${parts.length} of ${counted(total, 'part')}`;
  const rows = parts.map(rowOf);
  const approximate = rows.some((row) => row.some((cell) => cell.endsWith(`${GLUE}typ`)));
  const legend = [...(of('approved') > 0 ? ['A on the approved list'] : []), ...(of('generic') > 0 ? ['G generic set: a class of parts, not something to order'] : []), ...(approximate ? ['typ: no limit is known'] : [])];
  const lines = [
    ...tableLines({ columns: COLUMNS, rows }, style),
    '',
    ...paragraph(legend.join('; '), style, { lead: ' ' }),
    ...paragraph(`${share}: ${of('approved')} approved, ${of('generic')} generic.`, style),
  ];
  return finished(lines, style);
}

function rowOf({ part, failing }: PartLine): string[] {
  return [
    safeLine(part.id),
    tierMark(part),
    aboutPart(part),
    supplyOf(part),
    figureOf(part, 'gainBandwidth', 'min'),
    figureOf(part, 'quiescentCurrent', 'max'),
    priceText(part.price),
    failing === undefined ? '' : failing.length === 0 ? 'nothing' : failing.map(checkWords).join(', '),
  ];
}

function supplyOf(part: Part): string {
  const end = (kind: LimitKind): Figure | undefined => part.figures.find((figure) => figure.parameter === 'supplyVoltage' && figure.kind === kind);
  const [low, high] = [end('min'), end('max')];
  if (low !== undefined && high !== undefined) return range(low.value, high.value, 'V');
  if (low !== undefined) return `from${GLUE}${amount(low.value, 'V')}`;
  return high === undefined ? 'unknown' : `up${GLUE}to${GLUE}${amount(high.value, 'V')}`;
}

/** The limit, worst over its conditions; else the typical figure, marked. */
function figureOf(part: Part, parameter: Parameter, limit: 'min' | 'max'): string {
  const of = (kind: LimitKind): number[] => part.figures.filter((figure) => figure.parameter === parameter && figure.kind === kind).map(({ value }) => value);
  const worst = limit === 'min' ? Math.min : Math.max;
  const { unit } = PARAMETERS[parameter];
  const [limits, typical] = [of(limit), of('typ')];
  if (limits.length > 0) return amount(worst(...limits), unit);
  return typical.length > 0 ? `${amount(worst(...typical), unit)}${GLUE}typ` : 'unknown';
}
