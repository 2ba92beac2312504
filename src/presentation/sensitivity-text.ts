import type { Sensitivity, SensitivityEnd } from '../explanation/index.js';
import { checkAmount } from './amounts.js';
import { paragraph } from './layout.js';
import { glued } from './spelling.js';
import type { Style } from './style.js';
import { figureWords } from './words.js';

/** Whether verdicts hang on figures that are borrowed or only typical, with the numbers at both ends; checks that pass alike in short. */
export function sensitivityLines(found: readonly Sensitivity[], style: Style): string[] {
  const plain = style.all ? [] : found.filter((one) => one.outcome === 'pass' && !one.depends);
  const told = found.filter((one) => !plain.includes(one));
  if (found.length === 0) return [];
  const titles = [...new Set(plain.map(({ title }) => title))];
  return [
    ...paragraph('Does it hang on borrowed or typical figures?', style),
    ...told.flatMap((one) => paragraph(glued(sensitivityText(one)), style, { lead: '  ', indent: 4 })),
    ...(titles.length === 0 ? [] : paragraph(`Not ${titles.join(', ')}: ${titles.length === 1 ? 'it passes' : 'they pass'} with these figures at their best and at their worst.`, style, { lead: '  ', indent: 4 })),
  ];
}

/** One verdict in one or two sentences. */
export function sensitivityText(one: Sensitivity): string {
  const { title, on, figures, best, worst } = one;
  const names = listed(figures.map((figure) => figureWords(figure)));
  const [from, to] = on === 'borrowed' ? [`with nothing for what is borrowed (${names})`, 'with the worst of the class'] : [`with ${names} as printed`, 'derated'];
  const still = best.outcome === worst.outcome ? 'still ' : '';
  const said = (end: SensitivityEnd): string => (end.offered === null ? words(end) : `${checkAmount(one, end.offered)} (${words(end)})`);
  return `${title}: ${from} ${said(best)}, ${to} ${still}${said(worst)}; the limit is ${checkAmount(one, one.required)}. ${ending(one)}`;
}

function ending({ depends, on, outcome, best }: Sensitivity): string {
  if (depends) return `The verdict hangs on ${on === 'borrowed' ? 'what is borrowed' : 'these figures'}.`;
  if (on === 'borrowed' && outcome === 'unknown' && best.outcome === 'pass') return 'It passes either way, and yet is no proof: borrowed figures may make up a tenth of a limit, not more.';
  return 'The verdict does not depend on them.';
}

function listed(names: readonly string[]): string {
  return names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;
}

const words = ({ outcome }: SensitivityEnd): string => ({ pass: 'passes', fail: 'fails', unknown: 'cannot be decided' })[outcome];
