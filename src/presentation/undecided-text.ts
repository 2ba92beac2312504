import type { Report } from '../report.js';
import type { JudgedPart } from '../screening/index.js';
import type { Verdict } from '../verdicts/verdict.js';
import { aboutPart, more, partName } from './fit-table.js';
import { paragraph } from './layout.js';
import { likelyFirst } from './likely-first.js';
import { toned, type Style } from './style.js';
import { unknownText } from './verdict-words.js';
import { checkWords } from './words.js';

/** What cannot be decided, likely parts first: what is missing, and what it would have to be. */
export function undecidedLines({ undecided }: Report, style: Style): string[] {
  const shown = likelyFirst(undecided, style.top);
  return [
    ...unbuiltLines(undecided, style),
    ...shown.flatMap((one) => undecidedPart(one, style)),
    ...more(undecided.length - shown.length, 'cannot be decided', style),
  ];
}

/** A check this version lacks leaves every part open: said once, and any of them tells. */
function unbuiltLines([first]: readonly JudgedPart[], style: Style): string[] {
  const checks = new Set(first?.verdicts.filter(isUnbuilt).map(({ check }) => checkWords(check)));
  return checks.size === 0 ? [] : paragraph(`This version does not judge ${[...checks].join(', ')}: while the stage asks for it no part is proven to fit.`, style, { lead: ' ' });
}

const isUnbuilt = ({ reason }: Verdict): boolean => reason === 'not-built';

function undecidedPart(one: JudgedPart, style: Style): string[] {
  const open = one.verdicts.filter((verdict) => verdict.outcome === 'unknown');
  const built = open.filter((verdict) => !isUnbuilt(verdict));
  const reasons = reasonsOf(open.length === 1 ? built.map((verdict) => decidingAll(verdict, one.verdicts)) : built);
  const about = aboutPart(one.part);
  const likely = one.likely ? 'likely to fit (its class would); ' : '';
  const lead = ` ${toned('?', 'open', style)}  `;
  const why = reasons.length === 0 ? 'passes every check that is judged' : withFits(reasons, open.length);
  return paragraph(`${partName(one.part)}${about === '' ? '' : ` ${about}`} - ${likely}${why}`, style, { lead, indent: 6 });
}

/** The same reason of several checks once. */
function reasonsOf(verdicts: readonly Verdict[]): string[] {
  const alike = new Map<string, Verdict[]>();
  for (const verdict of verdicts) {
    const key = verdict.reason === null || verdict.reason === 'missing-figure' ? verdict.check : verdict.reason;
    alike.set(key, [...(alike.get(key) ?? []), verdict]);
  }
  return [...alike.values()].map(unknownText);
}

/** One open check decides the part; several only themselves. */
function withFits(reasons: readonly string[], open: number): string {
  return open === 1 ? reasons.join('').replace('passes if', 'fits if') : reasons.join('; ');
}

/** One open check decides at the value that the checks which passed over the same figure hold at too. */
function decidingAll(open: Verdict, verdicts: readonly Verdict[]): Verdict {
  const turn = open.decidesAt;
  if (turn === null) return open;
  const passedOver = verdicts.flatMap(({ uncharged }) => (uncharged?.figure === turn.figure && uncharged.kind === turn.kind ? [uncharged.value] : []));
  return { ...open, decidesAt: { ...turn, value: Math.min(turn.value, ...passedOver) } };
}
