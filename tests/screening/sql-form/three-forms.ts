import { openCatalog } from '../../../src/catalog/index.js';
import { CHECK_IDS, circuitMark, deriveDemands } from '../../../src/demands/index.js';
import { shortlist } from '../../../src/engine.js';
import { whyAhead } from '../../../src/explanation/index.js';
import { BASES } from '../../../src/parts/basis.js';
import type { PartSource } from '../../../src/parts/part.js';
import { shortlistJson } from '../../../src/presentation/json.js';
import { marginForOrder, rank, screenAndRank } from '../../../src/ranking/index.js';
import type { Asking, Report } from '../../../src/report.js';
import { judgePart, judgingOf, type JudgedPart } from '../../../src/screening/index.js';
import { nearestOf } from '../../../src/screening/nearest.js';
import type { Stage } from '../../../src/stage/index.js';
import { answerBySql, type SqlAnswer, type SqlPart } from './answer.js';

/** An answer in one shape, whichever form gave it. */
export interface Told {
  /** Of every part its outcome and its verdicts, a pass with what it rests on and its margin. */
  readonly parts: Readonly<Record<string, string>>;
  /** Of every check the parts it fails, lets pass and leaves open. */
  readonly tally: SqlAnswer['tally'];
  /** Ids of what fits in their order, each line its variants. */
  readonly lines: readonly (readonly string[])[];
  readonly json: string;
}

/** The same question answered from the rows of a catalog, from its dictionary, and by SQL from its part table. */
export async function threeForms(file: string, stage: Stage, asking: Asking): Promise<{ readonly rows: Told; readonly dictionary: Told; readonly sql: Told; readonly answer: SqlAnswer }> {
  const catalog = await openCatalog(file);
  const rows = toldByCode(stage, catalog.source(), asking);
  const answer = answerBySql(file, deriveDemands(stage), asking);
  const sql = toldBySql({ stage, source: catalog.source(), asking }, answer);
  const dictionary = toldByCode(stage, catalog.screenSource(), asking);
  catalog.close();
  return { rows, dictionary, sql, answer };
}

const print = (report: Report): string => shortlistJson(report, { top: 1e6, all: true });
const name = ({ tier, id }: Pick<SqlPart, 'tier' | 'id'>): string => `${tier} ${id}`;

function toldByCode(stage: Stage, source: PartSource, asking: Asking): Told {
  const { screened, fit } = screenAndRank({ demands: deriveDemands(stage), circuit: circuitMark(stage) }, source, asking);
  const all = [...screened.fit, ...screened.undecided, ...screened.rejected];
  const tally: Record<string, [number, number, number]> = {};
  for (const { check, outcome } of all.flatMap(({ verdicts }) => verdicts)) (tally[check] ??= [0, 0, 0])[OUTCOMES.indexOf(outcome)]! += 1;
  return {
    parts: Object.fromEntries(all.map((one) => [name(one.part), [one.outcome, ...one.verdicts.map((verdict) => words(verdict, verdict.basis, marginForOrder(verdict))).sort()].join('\n')])),
    tally,
    lines: fit.map((line) => [line, ...line.variants].map(({ part }) => part.id)),
    json: print(shortlist(stage, source, asking)),
  };
}

const OUTCOMES = ['fail', 'pass', 'unknown'] as const;
/** Of a pass what it rests on, and its margin to as many digits as two ways of adding up agree in. */
const words = ({ check, outcome }: { readonly check: string; readonly outcome: string }, basis: string | null, margin: number | null): string =>
  outcome === 'pass' ? `${check} pass, ${basis ?? ''} ${margin === null ? '' : digits(margin)}` : `${check} ${outcome}`;

/** Eight digits of twelve: short numbers often end in a 5 there, which must be cut the same way however it was added up. */
const digits = (value: number): string => Number(value.toPrecision(12)).toPrecision(8);

interface Question {
  readonly stage: Stage;
  readonly source: PartSource;
  readonly asking: Asking;
}

function toldBySql(question: Question, answer: SqlAnswer): Told {
  const { parts, tally } = answer;
  const verdictsOf = ({ verdicts }: SqlPart): string[] => Object.entries(verdicts).map(([check, [outcome, basis, margin]]) => words({ check, outcome }, BASES[basis] ?? 'none', margin)).sort();
  return { parts: Object.fromEntries(parts.map((one) => [name(one), [one.outcome, ...verdictsOf(one)].join('\n')])), tally, lines: linesOf(parts).map((line) => line.map(({ id }) => id)), json: print(reportOf(question, answer)) };
}

function linesOf(parts: readonly SqlPart[]): SqlPart[][] {
  const lines = new Map<number, SqlPart[]>();
  const fitting = parts.filter(({ place }) => place !== null).sort((a, b) => (a.place ?? 0) - (b.place ?? 0));
  for (const one of fitting) lines.set(one.line ?? 0, [...(lines.get(one.line ?? 0) ?? []), one]);
  return [...lines.values()];
}

/** What SQL found in the words of the ordinary printing: who fits and in which order, who does not, how often each check fails. Each part is told as it is told alone; the nearest are those of the parts SQL rejects. */
function reportOf({ stage, source, asking }: Question, { parts, tally }: SqlAnswer): Report {
  const run = judgingOf(deriveDemands(stage), source, asking.strict);
  const byName = new Map(source.parts.map((part) => [name(part), part]));
  const judged = (one: SqlPart): JudgedPart => judgePart(run, byName.get(name(one))!);
  const having = (outcome: SqlPart['outcome']): JudgedPart[] => parts.filter((one) => one.outcome === outcome).map(judged);
  const [fits, undecided, rejected] = [having('fits'), having('undecided'), having('does-not-fit')];
  const dressed = new Map(rank(fits, asking.order).map((line) => [line.part.id, line]));
  const fit = linesOf(parts).map(([first, ...variants], at) => ({ ...dressed.get(first!.id)!, ...judged(first!), rank: at + 1, variants: variants.map(judged) }));
  const order = (check: string): number => (CHECK_IDS as readonly string[]).indexOf(check);
  const rejections = Object.entries(tally).flatMap(([check, [fails]]) => (fails === 0 ? [] : [{ check, parts: fails }]));
  return {
    ...shortlist(stage, { ...source, parts: [] }, asking),
    counts: { parts: parts.length, fit: fits.length, undecided: undecided.length, rejected: rejected.length },
    fit, undecided, rejected,
    rejections: rejections.sort((a, b) => b.parts - a.parts || order(a.check) - order(b.check)),
    nearest: nearestOf(rejected, stage.supply.nominal),
    ahead: whyAhead(fit, asking.order),
    data: shortlist(stage, source, asking).data,
  };
}
