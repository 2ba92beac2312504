import type { Demands, NumberDemand, WordDemand } from '../../../src/demands/index.js';
import { flag, meets, type Outlook, real, standing, text } from './sql.js';

type Ratio = 'ratio' | 'none';

/** One reading against one number. */
function figure(asked: NumberDemand, name: string, ratio: Ratio): string {
  return compared(asked, { of: (outlook) => `${name}_${outlook}`, basis: `${name}_basis`, ratio });
}

interface Offered {
  readonly of: (outlook: Outlook) => string;
  readonly basis: string;
  readonly ratio: Ratio;
}

function compared({ check, required, sense }: NumberDemand, { of, basis, ratio }: Offered): string {
  const against = (outlook: Outlook): string => meets(real(required), of(outlook), sense);
  const margin = sense === 'at-least' ? `${of('w')} / ${real(required)}` : `${real(required)} / ${of('w')}`;
  return standing({ check, worst: against('w'), best: against('b'), basis, ...(ratio === 'ratio' ? { margin } : {}) });
}

/** A figure that is assumed where the list has none: the assumed value at worst, as good as can be at best. */
function assumed(name: string, value: string, best: number): (outlook: Outlook) => string {
  return (outlook) => `coalesce(${name}_${outlook}, case when ${name}_printed then null else ${outlook === 'w' ? value : real(best)} end)`;
}

const assumedBasis = (name: string): string => `coalesce(${name}_basis, 3)`;

/** The absolute maximum; the operating maximum serves where none is known. */
const absoluteMaximum = (outlook: Outlook): string =>
  `case when supplyVoltage_max_w is null then supplyAbsoluteMaximum_${outlook} else ${assumed('supplyAbsoluteMaximum', 'supplyVoltage_max_w', Number.POSITIVE_INFINITY)(outlook)} end`;

/** Words: one of those wanted, whatever their case. */
function words({ check, required }: WordDemand, column: string, where = '1'): string {
  const meet = `lower(trim(${column})) in (${required.map((word) => text(word.trim().toLowerCase())).join(', ')})`;
  return standing({ check, worst: meet, best: meet, basis: '0', where });
}

/** A generic set is no article: nobody asks for its status, lifecycle or package. */
const ARTICLES = "tier <> 'generic'";

/** Checks of one figure or one word against one number or some words. */
export function plainChecks(demands: Demands): string[] {
  const { 'supply-current': current, channels, price, status, lifecycle, qualification, package: wanted } = demands;
  return [
    figure(demands['supply-low'], 'supplyVoltage_min', 'none'),
    figure(demands['supply-high'], 'supplyVoltage_max', 'none'),
    compared(demands['supply-peak'], { of: absoluteMaximum, basis: assumedBasis('supplyAbsoluteMaximum'), ratio: 'none' }),
    figure(demands['input-low'], 'inputLowHeadroom', 'none'),
    figure(demands['input-high'], 'inputHighHeadroom', 'none'),
    ...speeds(demands),
    ...(current === null ? [] : [compared(current, { of: quiescent(current.per), basis: 'quiescentCurrent_basis', ratio: 'none' })]),
    compared(demands['temperature-low'], { of: assumed('temperature_min', '0.0', Number.NEGATIVE_INFINITY), basis: assumedBasis('temperature_min'), ratio: 'none' }),
    compared(demands['temperature-high'], { of: assumed('temperature_max', '70.0', Number.POSITIVE_INFINITY), basis: assumedBasis('temperature_max'), ratio: 'none' }),
    ...(channels === null ? [] : [compared(channels, { of: () => 'channels', basis: '0', ratio: 'none' })]),
    ...(wanted === null ? [] : [words(wanted, 'package', ARTICLES)]),
    ...(qualification === null ? [] : [words(qualification, 'qualification')]),
    ...(status === null ? [] : [words(status, 'status', ARTICLES)]),
    ...(lifecycle === null ? [] : [words(lifecycle, 'lifecycle', ARTICLES)]),
    ...(price === null ? [] : [compared(price, { of: () => `case when price_currency = ${text(price.currency)} then price_amount end`, basis: '0', ratio: 'none' })]),
    ...demands.unbuilt.map(({ check }) => standing({ check, worst: 'null', best: 'null', basis: '0' })),
  ];
}

function speeds(demands: Demands): string[] {
  const { 'slew-rate': slew, 'gain-bandwidth': bandwidth, 'stable-gain': stable } = demands;
  return [
    ...(slew === null ? [] : [figure(slew, 'slewRate', 'ratio')]),
    ...(bandwidth === null ? [] : [figure(bandwidth, 'gainBandwidth', 'ratio')]),
    ...(stable === null ? [] : [compared(stable, { of: assumed('minimumStableGain', '1.0', 1), basis: assumedBasis('minimumStableGain'), ratio: 'none' })]),
  ];
}

/** Of one amplifier, or of the package with its idle sections. */
function quiescent(per: 'amplifier' | 'package'): (outlook: Outlook) => string {
  return (outlook) => (per === 'amplifier' ? `quiescentCurrent_${outlook}` : `quiescentCurrent_${outlook} * channels`);
}

/**
 * Ambient plus thermal resistance times dissipation, against the lower of the stage's limit and the part's own. Without a limit of the stage it
 * speaks up only where all is known and the part may rise more than half of what it stands.
 */
export function junctionCheck(demands: Demands): string {
  const { required, ambient, supply, output, capacitive } = demands['junction-temperature'];
  const least = (outlook: Outlook): string => `min(${real(required ?? Number.POSITIVE_INFINITY)}, coalesce(junctionTemperature_${outlook}, 9e999))`;
  const watts = (outlook: Outlook): string => `${real(supply)} * quiescentCurrent_${outlook} * coalesce(channels, 1) + ${real(output + capacitive)}`;
  const hot = (outlook: Outlook): string => `${real(ambient)} + thermalResistance_${outlook} * (${watts(outlook)})`;
  // Not all of the power is known: more than the limit already is a fail, anything else is open.
  const warm = (outlook: Outlook): string => `${real(ambient)} + coalesce(thermalResistance_${outlook} * ${real(output + capacitive)}, 0.0)`;
  const isKnown = '(thermalResistance_w is not null and quiescentCurrent_w is not null)';
  const against = (outlook: Outlook): string =>
    `case when ${isKnown} then ${meets(least(outlook), hot(outlook), 'at-most')} when ${meets(least(outlook), warm(outlook), 'at-most')} then null else 0 end`;
  const rises = `${isKnown} and junctionTemperature_w is not null and thermalResistance_w * (${watts('w')}) > 0.5 * (junctionTemperature_w - ${real(ambient)})
    and thermalResistance_b * (${watts('b')}) > 0.5 * (junctionTemperature_b - ${real(ambient)})`;
  const basis = 'max(thermalResistance_basis, quiescentCurrent_basis, 3 * (channels is null))';
  return standing({ check: 'junction-temperature', worst: against('w'), best: against('b'), basis, where: `${flag(required !== null)} or (${rises})` });
}
