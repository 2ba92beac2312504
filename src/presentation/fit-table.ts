import type { Part } from '../parts/part.js';
import type { RankedPart } from '../ranking/index.js';
import type { Report } from '../report.js';
import { amount, priceText } from './amounts.js';
import { tightestBar } from './bars/shortlisted.js';
import { lifeText } from './budget-text.js';
import { paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { GLUE, glued } from './spelling.js';
import type { Style } from './style.js';
import { tableLines, type Column } from './table.js';
import { spareText } from './verdict-words.js';
import { checkWords } from './words.js';

/** What fits, in its order. */
export function fitLines(report: Report, style: Style): string[] {
  const shown = report.fit.slice(0, style.top);
  if (shown.length === 0) return [];
  const hasBattery = shown.some(({ batteryHours }) => batteryHours !== null);
  const rows = shown.map((one) => rowOf(one, hasBattery, style));
  return [...tableLines({ columns: columnsOf(report, hasBattery), rows }, style), ...more(report.fit.length - shown.length, 'fit', style)];
}

/** How many were cut off; nothing is cut silently. */
export function more(left: number, verb: string, style: Style): string[] {
  return left <= 0 ? [] : paragraph(`… and ${left} more that ${verb} (--top ${left + style.top} shows all)`, style, { lead: ' ' });
}

function columnsOf({ fit }: Report, hasBattery: boolean): Column[] {
  const quantities = new Set(fit.map(({ part }) => part.price?.quantity ?? null).filter((quantity) => quantity !== null));
  const [quantity] = quantities;
  return [
    { title: '#', align: 'right', key: true },
    { title: 'Part', key: true },
    { title: '', key: true },
    { title: 'Class', moves: 1, name: '' },
    { title: 'Tightest check', name: 'tightest' },
    { title: 'worst case', name: '' },
    { title: 'of limit\n0..100 %', ifRoom: true },
    { title: 'DC error\nat output', align: 'right', name: 'DC error at the output', moves: 3 },
    { title: 'Current\nmax', align: 'right', name: 'current', moves: 4 },
    { title: quantities.size === 1 ? `Price\nat ${quantity}` : 'Price', align: 'right', name: quantities.size === 1 ? `price at ${quantity}:` : 'price' },
    ...(hasBattery ? [{ title: 'Battery', align: 'right', name: 'battery', moves: 5 } as const] : []),
    { title: 'Proof', name: 'proof', moves: 2 },
  ];
}

function rowOf(one: RankedPart, hasBattery: boolean, style: Style): string[] {
  const tightest = one.verdicts.find((verdict) => verdict.check === one.tightest);
  const error = one.verdicts.find((verdict) => verdict.check === 'dc-error')?.offered;
  return [
    String(one.rank),
    safeLine(one.part.id),
    tierMark(one.part),
    [aboutPart(one.part), ...variantWords(one)].filter((words) => words !== '').join('; '),
    tightest === undefined ? '' : checkWords(tightest.check),
    tightest === undefined ? '' : spareText(tightest),
    tightest === undefined ? '' : tightestBar(tightest, style),
    typeof error === 'number' ? amount(error, 'V', { round: 'up' }) : '',
    one.current === null ? '' : amount(one.current, 'A', { round: 'up' }),
    priceText(one.part.price),
    ...(hasBattery ? [one.batteryHours === null ? '' : lifeText(one.batteryHours.hours)] : []),
    one.proof === 'limits' ? 'limits' : `typical${GLUE}(${one.confirm.length})`,
  ];
}

/** Variants of one die stand in one line and are told as such. */
export function variantWords({ variants }: RankedPart): string[] {
  if (variants.length === 0) return [];
  const told = variants.map(({ part }) => [safeLine(part.id), part.package === null ? '' : safeLine(part.package), part.channels === null ? '' : sections(part.channels)].filter((word) => word !== '').join(' '));
  return [`same die: ${told.join(', ')}`];
}

const sections = (channels: number): string => ({ 1: 'single', 2: 'dual', 4: 'quad' })[channels] ?? `${channels} channels`;

export const tierMark = ({ tier }: Pick<Part, 'tier'>): string => (tier === 'approved' ? 'A' : 'G');

/** A part inside a sentence, its mark in parentheses: after a number a bare A would read as amperes. */
export const partName = (part: Part): string => `${safeLine(part.id)} (${tierMark(part)})`;

/** What kind of part it is, in the list's own words. */
export const aboutPart = (part: Part): string => glued(safeLine(part.description ?? part.class ?? ''));

/** What the marks mean; only those that occur. */
export function legendLine(report: Report, style: Style): string[] {
  const shown = [...report.fit.slice(0, style.top), ...report.undecided.slice(0, style.top)];
  const tiers = new Set(shown.map(({ part }) => part.tier));
  const typical = report.fit.slice(0, style.top).some(({ proof }) => proof === 'typical');
  const meanings = [
    ...(tiers.has('approved') ? ['A on the approved list'] : []),
    ...(tiers.has('generic') ? ['G generic set: a class of parts, not something to order'] : []),
    ...(typical ? ['typical (n): rests on n figures that are not limits'] : []),
    ...(report.undecided.length > 0 ? ['? cannot be decided'] : []),
  ];
  return meanings.length === 0 ? [] : paragraph(meanings.join('; '), style, { lead: ' ' });
}
