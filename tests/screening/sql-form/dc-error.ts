import type { DcErrorDemand } from '../../../src/demands/index.js';
import { flag, meets, type Outlook, real, standing, text } from './sql.js';

/** A multiplier below this is rounding: its figure is not needed. */
const NOTHING = 1e-12;

interface Term {
  readonly name: string;
  readonly worst: string;
  readonly best: string;
  readonly basis: string;
  readonly where?: string;
}

/** One addend of one part; null where its figure is missing. */
const term = ({ name, worst, best, basis, where = '1' }: Term): string =>
  `select key, ${text(name)} as name, ${worst} as worst, ${best} as best, ${basis} as basis from known where ${where}`;

/** A figure times (or a move over) something, borrowed from the class where the part has none. */
function borrowable(name: string, column: string, value: (outlook: string) => string): Omit<Term, 'where'> {
  return { name, worst: value(`${column}_cw`), best: value(`${column}_cb`), basis: `${column}_cbasis` };
}

/**
 * `error_term`: NG·[offset + drift·ΔT + Ib·(|Rp − Rn| + t·(Rp + Rn)) + (Ios/2)·(Rp + Rn) + ΔVcm/CMRR + ΔVS/PSRR + ΔVo/A0]. A term with nothing to
 * multiply is none; an offset over temperature has the drift in it.
 */
export function errorTables(asked: DcErrorDemand): string {
  const { noiseGain, kelvin, commonModeMove, outputMove, supply } = asked;
  const times = (factor: number) => (figure: string): string => `${real(noiseGain * factor)} * ${figure}`;
  const over = (move: number) => (figure: string): string => `${real(noiseGain * move)} / ${figure}`;
  const move = `max(abs(${real(supply.min)} - coalesce(offset_supply, ${real(supply.nominal)})), abs(${real(supply.max)} - coalesce(offset_supply, ${real(supply.nominal)})))`;
  const counts = (factor: number): string => flag(noiseGain * factor > NOTHING);
  const terms: Term[] = [
    { name: 'offset', worst: times(1)('offsetVoltage_w'), best: times(1)('offsetVoltage_b'), basis: 'offsetVoltage_basis' },
    { ...borrowable('drift', 'offsetDrift', times(kelvin)), where: `${counts(kelvin)} and not coalesce(offset_over, 0)` },
    { ...borrowable('common mode', 'commonModeRejection', over(commonModeMove)), where: counts(commonModeMove) },
    { ...borrowable('supply', 'supplyRejection', (figure) => `${real(noiseGain)} * ${move} / ${figure}`), where: `${real(noiseGain)} * ${move} > ${real(NOTHING)}` },
    { ...borrowable('output', 'openLoopGain', over(outputMove)), where: counts(outputMove) },
    ...currentTerms(asked),
  ];
  return `create temp table error_term as ${terms.map(term).join('\nunion all ')}`;
}

/**
 * Bias and offset current through the resistances in series with the pins. Offset current not known: the pins may differ by the whole bias current,
 * unless that of the class says less; at best they do not differ.
 */
function currentTerms({ noiseGain, positive, negative, tolerance }: DcErrorDemand): Term[] {
  const sum = positive + negative;
  if (sum === 0) return [];
  const matched = noiseGain * (Math.abs(positive - negative) + tolerance * sum);
  const [half, whole] = [(noiseGain * sum) / 2, noiseGain * sum];
  const hasMatched = flag(matched > NOTHING);
  const [noOffset, noBias] = ['offsetCurrent_w is null', 'biasCurrent_w is null'];
  const lends = `offsetCurrent_lent is not null and ${real(matched)} * biasCurrent_w + ${real(half)} * offsetCurrent_lent < ${real(whole)} * biasCurrent_w`;
  const isWhole = `${noOffset} and not ${noBias} and not coalesce(${lends}, 0)`;
  return [
    {
      name: 'bias current',
      worst: `case when ${isWhole} then ${real(whole)} else ${real(matched)} end * biasCurrent_w`,
      best: `${real(matched)} * biasCurrent_b`,
      basis: 'biasCurrent_basis',
      where: `${hasMatched} or (${isWhole})`,
    },
    {
      name: 'offset current',
      worst: `${real(half)} * offsetCurrent_cw`,
      best: `${real(half)} * offsetCurrent_cb`,
      basis: 'offsetCurrent_cbasis',
      // Without bias current that one is missing already, unless the pins are matched.
      where: `not ${noOffset} or (${noBias} and not ${hasMatched}) or (not ${noBias} and ${noOffset} and coalesce(${lends}, 0))`,
    },
  ];
}

/** Known terms beyond the limit on the best reading are a fail; a missing one leaves it open, and so do borrowed ones of more than a tenth of the limit. */
export function errorCheck({ required }: DcErrorDemand): string {
  const against = (outlook: Outlook): string => {
    const column = outlook === 'w' ? 'worst' : 'best';
    const known = `coalesce(sum(${column}), 0.0)`;
    const borrowed = `coalesce(sum(case when basis = 4 then ${column} end), 0.0)`;
    return `case when not ${meets(real(required), known, 'at-most')} then 0 when count(${column}) < count(*) or ${borrowed} > 0.1 * ${real(Math.abs(required))} * (1.0 + 1e-9) then null else 1 end`;
  };
  return `${standing({ check: 'dc-error', worst: against('w'), best: against('b'), basis: 'max(basis)', margin: `${real(required)} / sum(worst)`, from: 'error_term' })} group by key`;
}
