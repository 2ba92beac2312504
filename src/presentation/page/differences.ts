import { checkWords } from '../words.js';
import type { RecordedPart, RecordedReport, RecordedStage } from './recorded.js';

/** Something a report says and a rerun does not say any more. */
export interface Difference {
  /** The stage it is about, as its file or name; null for the page as a whole. */
  readonly stage: string | null;
  readonly what: 'stage-file' | 'catalog' | 'rules' | 'stage' | 'demand' | 'chosen' | 'outcome' | 'verdict' | 'detail' | 'page';
  readonly subject: string;
  readonly was: string;
  readonly is: string;
}

/** What differs between two reports of the same request, the weightiest first. */
export function differencesOf(was: RecordedReport, is: RecordedReport): Difference[] {
  return was.stages.flatMap((one, at) => {
    const other = is.stages[at];
    return other === undefined ? [] : stageDifferences(one, other);
  });
}

type Found = Omit<Difference, 'stage'>;

function stageDifferences(was: RecordedStage, is: RecordedStage): Difference[] {
  const found = [...dataDifferences(was, is), ...chosenDifference(was, is), ...outcomeDifferences(was, is), ...verdictDifferences(was, is), ...demandDifferences(was, is), ...fieldDifferences(was, is)];
  const rest = found.length === 0 ? detailDifference(was, is) : [];
  const name = was.file ?? textOf(was.shortlist.stage['name']);
  return [...found, ...rest].map((one) => ({ stage: name, ...one }));
}

function dataDifferences({ shortlist: { data: was } }: RecordedStage, { shortlist: { data: is } }: RecordedStage): Found[] {
  const shown = ({ catalog }: typeof was): string => `${catalog.parts} parts, sha256 ${catalog.sha256.slice(0, 8)}`;
  return [
    ...(was.catalog.sha256 === is.catalog.sha256 ? [] : [{ what: 'catalog', subject: 'catalog', was: shown(was), is: shown(is) } as const]),
    ...(was.rules === is.rules ? [] : [{ what: 'rules', subject: 'rules', was: was.rules, is: is.rules } as const]),
  ];
}

function chosenDifference({ chosen: was }: RecordedStage, { chosen: is }: RecordedStage): Found[] {
  const told = (one: RecordedStage['chosen']): string => {
    if (one === null) return 'none';
    const place = one.withdrawn !== undefined ? `, ${one.withdrawn}` : one.rank === null ? '' : `, place ${one.rank}`;
    return `${one.part} ${OUTCOMES[one.outcome] ?? one.outcome}${one.proof === null ? '' : ` (${one.proof})`}${place}`;
  };
  return told(was) === told(is) ? [] : [{ what: 'chosen', subject: was?.by === 'first' || was === null ? 'first in order' : 'chosen part', was: told(was), is: told(is) }];
}

const OUTCOMES: Readonly<Record<string, string>> = { fits: 'fits', undecided: 'cannot be decided', 'does-not-fit': 'does not fit' };

function outcomeDifferences(was: RecordedStage, is: RecordedStage): Found[] {
  const told = (stage: RecordedStage): Map<string, string> => new Map(stage.outcomes.map(({ part, outcome, checks }) => [part, `${OUTCOMES[outcome] ?? outcome}${checks.length === 0 ? '' : ` (${checks.map(checkWords).join(', ')})`}`]));
  const [before, after] = [told(was), told(is)];
  return [...new Set([...before.keys(), ...after.keys()])].flatMap((part): Found[] => {
    const [old, now] = [before.get(part) ?? 'not in the catalog', after.get(part) ?? 'not in the catalog'];
    return old === now ? [] : [{ what: 'outcome', subject: part, was: old, is: now }];
  });
}

/** Numbers of the parts that both reports tell in full. */
function verdictDifferences(was: RecordedStage, is: RecordedStage): Found[] {
  const after = told(is);
  return [...told(was)].flatMap(([part, one]) => {
    const other = after.get(part);
    return other === undefined ? [] : one.verdicts.flatMap((verdict): Found[] => {
      const now = other.verdicts.find(({ check }) => check === verdict.check);
      if (now === undefined || sameNumbers(verdict, now)) return [];
      return [{ what: 'verdict', subject: `${part}, ${checkWords(verdict.check)}`, was: verdict.text, is: now.text === verdict.text ? `${now.text} (in further digits)` : now.text }];
    });
  });
}

const sameNumbers = (a: RecordedPart['verdicts'][number], b: RecordedPart['verdicts'][number]): boolean =>
  a.outcome === b.outcome && JSON.stringify([a.offered, a.required]) === JSON.stringify([b.offered, b.required]);

function told({ chosen, shortlist: { fit, undecided, nearest } }: RecordedStage): Map<string, RecordedPart> {
  return new Map([...fit, ...undecided, ...nearest, ...(chosen === null ? [] : [chosen])].map((one) => [one.part, one]));
}

function demandDifferences({ shortlist: was }: RecordedStage, { shortlist: is }: RecordedStage): Found[] {
  const asked = (list: typeof was.demands): Map<string, string> => new Map(list.map(({ check, required }) => [check, JSON.stringify(required)]));
  return mapDifferences(asked(was.demands), asked(is.demands), 'demand', checkWords);
}

function fieldDifferences({ shortlist: was }: RecordedStage, { shortlist: is }: RecordedStage): Found[] {
  const fields = (stage: Readonly<Record<string, unknown>>): Map<string, string> => new Map(Object.entries(stage).map(([key, value]) => [key, JSON.stringify(value)]));
  return mapDifferences(fields(was.stage), fields(is.stage), 'stage', (key) => key);
}

// Two sides, what it is and how it is said.
// eslint-disable-next-line max-params
function mapDifferences(before: ReadonlyMap<string, string>, after: ReadonlyMap<string, string>, what: 'demand' | 'stage', said: (key: string) => string): Found[] {
  return [...new Set([...before.keys(), ...after.keys()])].flatMap((key): Found[] => {
    const [was, is] = [before.get(key) ?? 'nothing', after.get(key) ?? 'nothing'];
    return was === is ? [] : [{ what, subject: said(key), was, is }];
  });
}

/** Whatever is left: the first place where the documents part. */
function detailDifference(was: RecordedStage, is: RecordedStage): Found[] {
  const found = firstDifference(was, is, '');
  return found === null ? [] : [{ what: 'detail', subject: found.path, was: textOf(found.was), is: textOf(found.is) }];
}

interface Parting {
  readonly path: string;
  readonly was: unknown;
  readonly is: unknown;
}

function firstDifference(was: unknown, is: unknown, path: string): Parting | null {
  if (was === is) return null;
  if (typeof was !== 'object' || typeof is !== 'object' || was === null || is === null) return { path, was, is };
  for (const key of new Set([...Object.keys(was), ...Object.keys(is)])) {
    const found = firstDifference((was as Record<string, unknown>)[key], (is as Record<string, unknown>)[key], path === '' ? key : `${path}.${key}`);
    if (found !== null) return found;
  }
  return null;
}

const textOf = (value: unknown): string => (typeof value === 'string' ? value : value === undefined ? 'nothing' : JSON.stringify(value));
