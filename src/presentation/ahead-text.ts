import type { Difference, WhyAhead } from '../explanation/index.js';
import type { Report } from '../report.js';
import { amount } from './amounts.js';
import { paragraph } from './layout.js';
import { held } from './spelling.js';
import { priceStability } from './stability-text.js';
import type { Style } from './style.js';
import { checkWords } from './words.js';
import { formatQuantity } from '../quantities/format.js';

/** Why 1 is ahead of 2: what decided, then what speaks for each. */
export function aheadLines({ ahead, fit }: Report, style: Style): string[] {
  const [first, second] = fit;
  if (ahead === null || first === undefined || second === undefined) return [];
  const forFirst = inFavour(ahead, 0);
  const forSecond = inFavour(ahead, 1);
  const sentence = [
    `Why 1 is ahead of 2: ${decision(ahead, [first.proof, second.proof])}.`,
    ...(forFirst.length === 0 ? [] : [`In favour of 1: ${forFirst.join(', ')}.`]),
    ...(forSecond.length === 0 ? [] : [`In favour of 2: ${forSecond.join(', ')}.`]),
  ];
  return [...paragraph(sentence.join(' '), style, { lead: '', indent: 2 }), ...paragraph(priceStability(ahead.stability, ['1', '2']), style, { lead: '  ' })];
}

function decision({ decidedBy, merits, prices, currents }: WhyAhead, proofs: readonly [unknown, unknown]): string {
  const against = (values: readonly [number | null, number | null], unit: string): string =>
    values.map((value) => (value === null ? 'not known' : amount(value, unit))).join(' against ');
  const words: Readonly<Record<string, string>> = {
    tier: '1 is on the approved list, 2 is a generic set',
    proof: proofs[0] === 'limits' ? '1 rests on limits only, 2 partly on figures that are not limits' : 'better proof',
    merit: `merit ${meritText(merits)}`,
    price: `price ${against(prices, 'EUR')}`,
    current: `supply current ${against(currents, 'A')}`,
    margin: 'its least margin is larger',
    estimates: 'it rests on fewer figures to confirm',
    id: 'equal in everything that counts; then by part number',
  };
  return words[decidedBy] ?? decidedBy;
}

/** As many digits as tell the two apart. */
export function meritText([first, second]: readonly [number, number]): string {
  for (let digits = 2; digits < 9; digits++) {
    const texts = [first, second].map((merit) => formatQuantity(merit, '1', { digits }));
    if (texts[0] !== texts[1]) return texts.join(' against ');
  }
  return formatQuantity(first, '1');
}

function inFavour(ahead: WhyAhead, side: 0 | 1): string[] {
  const [mine, other] = side === 0 ? [0, 1] : ([1, 0] as const);
  const saving = (values: readonly [number | null, number | null]): number => (values[other] ?? Number.NaN) - (values[mine] ?? Number.NaN);
  const cheaper = saving(ahead.prices);
  const less = saving(ahead.currents);
  return [
    ...(cheaper > 0 ? [`${amount(cheaper, 'EUR')} cheaper`] : []),
    ...(less > 0 ? [`${amount(less, 'A')} less supply current`] : []),
    ...(side === 0 ? ahead.better : ahead.worse).map((difference) => differenceText(difference, side)),
  ];
}

/** One check in which two parts differ, from the side of one of them; `printed` has the numbers as they already stand beside it, in the order of the parts. */
export function differenceText({ check, first, second, unit }: Difference, side: 0 | 1, printed: readonly (string | null)[] = []): string {
  const values = [first, second].map((value, at) => printed[at] ?? amount(value, unit, { round: AT_LEAST.has(check) ? 'down' : 'up' }));
  return `${HEADROOM[check] ?? checkWords(check)} ${(side === 0 ? values : values.reverse()).join(' against ')}`;
}

const HEADROOM: Readonly<Record<string, string>> = { 'output-low': held('head-room') + ' to V-', 'output-high': held('head-room') + ' to V+' };

/** Larger is better: rounded down, as beside a limit. */
const AT_LEAST: ReadonlySet<string> = new Set(['slew-rate', 'gain-bandwidth', 'output-current']);
