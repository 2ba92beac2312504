import { flag, real, rows, text } from './sql.js';

/** How a figure is read: by the rules of the contract, written down here once more. */
export interface Rule {
  /** As the part table calls it. */
  readonly column: string;
  readonly kinds: readonly ('min' | 'typ' | 'max')[];
  /** A figure of its own for either end. */
  readonly ends?: true;
  /** What a typical figure is multiplied by; half its magnitude is added to a head-room. */
  readonly factor?: number | 'half';
  /** What a figure stated at 25 °C is multiplied by away from there. */
  readonly away?: number;
  /** Kinds of which more is better. */
  readonly more?: readonly ('min' | 'typ' | 'max')[];
  /** As good as can be of a figure that is only assumed, where less is better. */
  readonly best?: number;
}

const MIN_TYP = ['min', 'typ'] as const;
const TYP_MAX = ['typ', 'max'] as const;
const MOST = ['min', 'typ'] as const;
const ENDURED = ['max'] as const;

export const RULES: Readonly<Record<string, Rule>> = {
  supplyVoltage: { column: 'supply_voltage', kinds: ['min', 'max'], ends: true, more: ENDURED },
  supplyAbsoluteMaximum: { column: 'supply_absolute_maximum', kinds: ['max'], more: ENDURED },
  inputLowHeadroom: { column: 'input_low_headroom', kinds: TYP_MAX, factor: 'half', best: Number.NEGATIVE_INFINITY },
  inputHighHeadroom: { column: 'input_high_headroom', kinds: TYP_MAX, factor: 'half', best: Number.NEGATIVE_INFINITY },
  outputLowHeadroom: { column: 'output_low_headroom', kinds: TYP_MAX, factor: 'half' },
  outputHighHeadroom: { column: 'output_high_headroom', kinds: TYP_MAX, factor: 'half' },
  slewRate: { column: 'slew_rate', kinds: MIN_TYP, factor: 0.6, away: 0.8, more: MOST },
  gainBandwidth: { column: 'gain_bandwidth', kinds: MIN_TYP, factor: 0.6, away: 0.8, more: MOST },
  minimumStableGain: { column: 'minimum_stable_gain', kinds: ['max'] },
  openLoopGain: { column: 'open_loop_gain', kinds: MIN_TYP, factor: 1 / 3.16, more: MOST },
  offsetVoltage: { column: 'offset_voltage', kinds: TYP_MAX, factor: 3 },
  offsetDrift: { column: 'offset_drift', kinds: TYP_MAX, factor: 3 },
  biasCurrent: { column: 'bias_current', kinds: TYP_MAX, factor: 4 },
  offsetCurrent: { column: 'offset_current', kinds: TYP_MAX, factor: 4 },
  commonModeRejection: { column: 'common_mode_rejection', kinds: MIN_TYP, factor: 1 / 3.16, more: MOST },
  supplyRejection: { column: 'supply_rejection', kinds: MIN_TYP, factor: 1 / 3.16, more: MOST },
  quiescentCurrent: { column: 'quiescent_current', kinds: TYP_MAX, factor: 1.4, away: 1.3 },
  outputCurrent: { column: 'output_current', kinds: ['min'], more: MOST },
  temperature: { column: 'temperature', kinds: ['min', 'max'], ends: true, more: ENDURED, best: Number.NEGATIVE_INFINITY },
  thermalResistance: { column: 'thermal_resistance', kinds: TYP_MAX },
  junctionTemperature: { column: 'junction_temperature', kinds: ['max'], more: ENDURED },
  inputCrossover: { column: 'input_crossover', kinds: ['min', 'max'], ends: true },
  inputOverdrive: { column: 'input_overdrive', kinds: ['max'], more: ENDURED },
  overdriveCurrent: { column: 'overdrive_current', kinds: ['max'], more: ENDURED },
  differentialInput: { column: 'differential_input', kinds: ['max'], more: ENDURED },
  overloadRecovery: { column: 'overload_recovery', kinds: TYP_MAX, factor: 1 / 0.6 },
  startUpTime: { column: 'start_up_time', kinds: TYP_MAX, factor: 1 / 0.6 },
};

/** Names of the readings: a parameter, or one end of it. */
export const NAMES: readonly string[] = Object.entries(RULES).flatMap(([parameter, { ends, kinds }]) => (ends ? kinds.map((kind) => `${parameter}_${kind}`) : [parameter]));

const EMPTY = 'null as supply, null as amperes, null as ohms, null as toward, null as temperature, 0 as is_over, 0 as assumed';
const at = (path: string): string => `json_extract(point.value, '$[${path}')`;
/** A point is kept as JSON: kind, value, condition, and true where nobody printed it. */
const CONDITION = [
  `cast(${at('2].supply')} as real)`, `cast(${at('2].load.amperes')} as real)`, `cast(${at('2].load.ohms')} as real)`, at('2].load.to'),
  `case when ${at('2].temperature')} = 'over' then null else cast(${at('2].temperature')} as real) end`, `coalesce(${at('2].temperature')} = 'over', 0)`, `coalesce(${at('3]')}, 0)`,
].join(', ');

/** Every figure of every part in force, one a row: those without condition from their columns, the others from the points. */
export function figureTable(): string {
  const selects = Object.entries(RULES).flatMap(([parameter, { column, kinds, ends }]) => {
    const name = (kind: string): string => (ends ? `${text(`${parameter}_`)} || ${kind}` : text(parameter));
    const plain = kinds.map((kind) => `select key, ${name(text(kind))} as name, ${text(kind)} as kind, ${column}_${kind} as value, ${EMPTY} from force where ${column}_${kind} is not null`);
    return [...plain, `select force.key, ${name(at('0]'))}, ${at('0]')}, cast(${at('1]')} as real), ${CONDITION} from force, json_each(${column}_points) as point`];
  });
  return [
    'create temp table force as select * from part where withdrawn_at is null',
    `create temp table figure as ${selects.join('\nunion all ')}`,
  ].join(';\n');
}

/** How the figures of each name are read; `more` and `best` by kind. */
export function ruleTable(): string {
  const lines = Object.entries(RULES).flatMap(([parameter, rule]) =>
    rule.kinds.map((kind) => {
      const more = (rule.more ?? []).includes(kind);
      const best = more ? Number.POSITIVE_INFINITY : (rule.best ?? 0);
      const factor = rule.factor === 'half' ? 1 : (rule.factor ?? 1);
      return [text(rule.ends ? `${parameter}_${kind}` : parameter), text(kind), real(factor), flag(rule.factor === 'half'), rule.away === undefined ? 'null' : real(rule.away), flag(more), real(best)];
    }),
  );
  return rows('rule', ['name', 'kind', 'factor', 'half', 'away', 'more', 'best'], lines);
}
