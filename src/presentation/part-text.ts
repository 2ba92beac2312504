import { figureSlot, PARAMETERS, type Figure } from '../parts/figures.js';
import type { Origin, Part } from '../parts/part.js';
import { amount, figureAmount } from './amounts.js';
import { conditionText } from './condition-text.js';
import { padded, paragraph } from './layout.js';
import { originWords } from './origin-text.js';
import type { Withdrawn } from './parts-json.js';
import { safeLine } from './safe-text.js';
import { finished, glued } from './spelling.js';
import type { Style } from './style.js';
import { tableLines } from './table.js';
import { capital, counted, figureWords } from './words.js';

const COLUMNS = [
  { title: 'Figure', key: true },
  { title: 'kind', key: true },
  { title: 'value', align: 'right', key: true },
  { title: 'condition', moves: 2, name: 'at' },
  { title: 'from', moves: 1, name: 'from' },
] as const;

/** Everything known about one part: identity, then every figure with kind, condition and origin. */
export function renderPart(part: Part, origin: OriginOfSlot, style: Style): string {
  return rendered(part, { standing: part.tier === 'approved' ? 'on the approved list' : 'a generic set: a class of parts, not something to order', origin }, style);
}

/** The same of a part that is on the list no more, as it was last. */
export function renderWithdrawn(part: Part, { file, takenBack, origin }: Omit<Withdrawn, 'sha256'> & { readonly origin: OriginOfSlot }, style: Style): string {
  const why = takenBack ? `it came with ${safeLine(file)}, an import that was taken back` : `${safeLine(file)} no longer has it`;
  return rendered(part, { standing: `withdrawn, on the approved list no more: ${why}. As it was last`, origin }, style);
}

type OriginOfSlot = (slot: string) => Origin | null;

interface Standing {
  /** What the part is to the list. */
  readonly standing: string;
  readonly origin: OriginOfSlot;
}

function rendered(part: Part, { standing, origin }: Standing, style: Style): string {
  const rows = part.figures.map((figure) => rowOf(figure, origin(figureSlot(figure)), style));
  const lines = [
    ...paragraph(`${safeLine(part.id)}: ${standing}`, style, { indent: 2 }),
    ...identityOf(part).flatMap(([label, text]) => identityLine(label, text, style)),
    '',
    ...(rows.length === 0 ? ['No figure is known.'] : tableLines({ columns: COLUMNS, rows }, style)),
    '',
    ...paragraph(`${counted(part.figures.length, 'figure')}. What is not listed is not known.`, style),
  ];
  return finished(lines, style);
}

function rowOf(figure: Figure, origin: Origin | null, style: Style): string[] {
  const value = figureAmount(figure.parameter, { value: figure.value, unit: PARAMETERS[figure.parameter].unit }, { digits: DIGITS });
  const kind = figure.assumed === true ? `${figure.kind}, assumed` : figure.kind;
  return [figureWords(figure.parameter), kind, value, conditionText(figure.condition), originWords(origin, style)];
}

/** A figure of a list is shown as it stands there, not rounded. */
const DIGITS = 9;

function identityOf(part: Part): [string, string][] {
  const yesNo = (value: boolean | null): string => (value === null ? '' : value ? 'yes' : 'no');
  const price = part.price === null ? '' : `${amount(part.price.amount, part.price.currency, { digits: DIGITS })}${part.price.quantity === null ? '' : ` at ${part.price.quantity}`}`;
  const all: [string, string][] = [
    ['description', part.description ?? ''],
    ['class', part.class ?? ''],
    ['family', part.family ?? ''],
    ['status', part.status ?? ''],
    ['lifecycle', part.lifecycle ?? ''],
    ['package', part.package ?? ''],
    ['channels', part.channels === null ? '' : String(part.channels)],
    ['qualification', part.qualification ?? ''],
    ['price', price],
    ['input type', part.inputType ?? ''],
    ['phase reversal', yesNo(part.phaseReversal)],
    ['input clamp', yesNo(part.inputClamp)],
    ['crossover free', yesNo(part.crossoverFree)],
  ];
  return all.filter(([, text]) => text !== '').map(([label, text]) => [capital(label), glued(safeLine(text))]);
}

function identityLine(label: string, text: string, style: Style): string[] {
  return paragraph(text, style, { lead: padded(label, IDENTITY) });
}

/** As wide as the longest label and two blanks. */
const IDENTITY = 16;
