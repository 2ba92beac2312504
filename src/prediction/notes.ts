import { formatQuantity } from '../quantities/format.js';
import { PARAMETERS, type Parameter } from '../parts/figures.js';
import type { Run } from './run.js';

/** Figures without which the model goes on, and how. */
const LEFT_OUT: readonly (readonly [Parameter, string])[] = [
  ['phaseMargin', 'no second pole of its own counted'],
  ['outputResistance', 'the load makes no pole'],
  ['inputCapacitance', 'not counted'],
  ['openLoopGain', 'counted as endless'],
  ['offsetVoltage', 'levels without it'],
];

/** What was left out or chosen, one sentence each. */
export function notesOf({ stage, amplifier, around, slew, levels }: Run): string[] {
  const left = LEFT_OUT.filter(([parameter]) => amplifier.unknown.has(parameter) && matters(stage, parameter)).map(([parameter, how]) => `${PARAMETERS[parameter].words} not known: ${how}`);
  const chosen = around.chosenCapacitor === null ? [] : [`feedback capacitor ${formatQuantity(around.chosenCapacitor, 'F', { digits: 3 })}: the maximally flat one for this gain bandwidth`];
  const charging = amplifier.slewRate !== null && slew.up < amplifier.slewRate ? [`the output current charges the load capacitance at ${formatQuantity(slew.up, 'V/s', { digits: 3 })}, less than the slew rate`] : [];
  const ends = (['low', 'high'] as const).flatMap((side) => {
    const { level } = levels[side];
    return level === null ? [] : [`${side === 'low' ? 'lowest' : 'highest'} output ${formatQuantity(level, 'V', { digits: 4 })} at the current that flows there`];
  });
  return [...left, ...chosen, ...charging, ...ends];
}

function matters({ network, load }: Run['stage'], parameter: Parameter): boolean {
  if (parameter === 'outputResistance') return load !== null && load.capacitance > 0;
  if (parameter !== 'inputCapacitance' || network === null) return true;
  return [network.plus, network.minus].some(({ pin }) => pin.startsWith('pin'));
}
