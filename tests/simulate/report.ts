import { SIMULATED_CHECKS } from './draw-part.js';
import { READINGS } from './reading.js';
import type { Confirmation, Confirmed, Standing } from './simulate.js';
import type { SimulatedCheck } from './draw-part.js';
import type { Outcome } from '../../src/verdicts/verdict.js';

const STANDINGS: readonly Standing[] = ['agreed', 'by-rule', 'unseen', 'not-simulated', 'disagreed'];

/** A confirmation as it is told: data only, so that it can come from another process. */
export interface Told {
  readonly number: number;
  readonly check: SimulatedCheck;
  readonly outcome: Outcome;
  readonly readings: readonly Confirmed[];
  readonly simplification: string | null;
  /** Stage, figures and what was measured. */
  readonly full: string;
}

export function told(confirmation: Confirmation): Told {
  const { draw, readings, simplification } = confirmation;
  return { number: draw.number, check: draw.check, outcome: draw.verdict.outcome, readings, simplification, full: inFull(confirmation) };
}

/** Counts by check and reading, verdicts by outcome, and every disagreement in full (`isFull`: every verdict). Markdown. */
export function report(all: readonly Told[], isFull = false): string {
  return [
    outcomes(all), '', standings(all), '',
    ...simplified(all),
    `Disagreements: ${disagreements(all).length} of ${all.length} verdicts.`, '',
    ...(isFull ? all : disagreements(all)).map(({ full }) => full),
  ].join('\n');
}

export function disagreements(all: readonly Told[]): Told[] {
  return all.filter(({ readings }) => readings.some(({ standing }) => standing === 'disagreed'));
}

function table(head: readonly string[], rows: readonly (readonly (string | number)[])[]): string {
  return [head, head.map(() => '---'), ...rows].map((cells) => `| ${cells.join(' | ')} |`).join('\n');
}

function outcomes(all: readonly Told[]): string {
  const rows = SIMULATED_CHECKS.map((check) => {
    const of = all.filter((one) => one.check === check);
    return [check, of.length, ...(['pass', 'unknown', 'fail'] as const).map((outcome) => of.filter((one) => one.outcome === outcome).length)];
  });
  return table(['check', 'verdicts', 'pass', 'unknown', 'fail'], rows);
}

function standings(all: readonly Told[]): string {
  const rows = SIMULATED_CHECKS.flatMap((check) =>
    READINGS.map((reading) => {
      const of = all.filter((one) => one.check === check).flatMap(({ readings }) => readings.filter((one) => one.reading === reading));
      return [check, reading, ...STANDINGS.map((standing) => of.filter((one) => one.standing === standing).length)];
    }),
  );
  return table(['check', 'reading', ...STANDINGS], rows);
}

/** Where only the written simplification agrees: how many, and how far the real corners are off at most. */
function simplified(all: readonly Told[]): string[] {
  return SIMULATED_CHECKS.flatMap((check) => {
    const of = all.filter((one) => one.check === check).flatMap(({ number, readings, simplification }) => readings.map((one) => ({ ...one, simplification, number })));
    return (['clean', 'violated'] as const).flatMap((expected) => {
      const found = of.filter((one) => one.standing === 'by-rule' && one.expected === expected);
      if (found.length === 0) return [];
      const most = found.reduce((best, next) => (Math.abs(next.real?.excess ?? 0) > Math.abs(best.real?.excess ?? 0) ? next : best));
      const judged = expected === 'clean' ? 'met, yet violated at a real corner' : 'broken, yet clean at every real corner';
      return [`- ${check}: ${found.length} readings judged ${judged}, by at most ${size(most)} (#${most.number}). Rule: ${most.simplification}.`];
    });
  });
}

function size({ real }: Confirmed): string {
  const excess = Math.abs(real?.excess ?? 0);
  return real?.unit === 'fraction' ? `${Number((100 * excess).toPrecision(3))} %` : `${Number((1000 * excess).toPrecision(3))} mV`;
}

function inFull({ draw, readings }: Confirmation): string {
  const { verdict, aim, part } = draw;
  const lines = readings.map(({ reading, standing, expected, real, rule }) => {
    const measured = (one: Confirmed['real']): string => (one === null ? 'not measured' : `${one.excess.toPrecision(4)} ${one.unit}`);
    return `  ${reading}: ${standing}, expected ${expected}, real ${measured(real)}, by rule ${measured(rule)}`;
  });
  return [
    `#${draw.number} ${draw.check} ${verdict.outcome}: required ${verdict.required as number}, offered ${verdict.offered}, best ${verdict.offeredBest}, known ${verdict.known}`,
    `  ${part.way}; ${aim.side} the ${aim.reading} edge by ${aim.gap.toPrecision(3)}; worst at ${JSON.stringify(verdict.worstAt)}`,
    ...lines,
    ...part.figures(draw.scale).map((figure) => `  ${figure.parameter} ${figure.kind} ${figure.value.toPrecision(6)} ${JSON.stringify(figure.condition)}`),
    ...draw.stage.file.trimEnd().split('\n').map((line) => `    ${line}`),
    '',
  ].join('\n');
}
