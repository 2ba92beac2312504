import { inputOf, type RatioCorner } from './circuit.js';
import { difference } from './difference.js';
import { pairs } from './excitation.js';
import { fitResistors } from './fitted.js';
import { AMPLIFIER, type Maker } from './making.js';
import { shuntEnds } from './shunt.js';
import type { InputPoint } from './stage.js';

/**
 * Shunt in the supply line of a load, read by a difference stage: the + leg at the bus, the - leg behind the shunt. The pins see
 * (G·Vbus + Vref)/(1+G); what the resistors leave of the common mode is listed (own algebra; Pallas-Areny & Webster, 1991).
 */
export const makeHighSideSense: Maker = (spec, settled, around) => {
  const { shunt } = spec;
  if (shunt?.bus === undefined) throw new RangeError('a high-side sense stage without a shunt and a bus reached the circuit');
  const fitted = fitResistors(spec, settled.gain);
  if (!fitted.ok) return fitted;
  const base = difference(fitted.resistors, around);
  const legs = (point: InputPoint, resistance: number): InputPoint => {
    const bus = inputOf(point, 'bus');
    return { positive: bus, negative: bus - inputOf(point, 'current') * resistance };
  };
  const across = (corner: RatioCorner, resistance: number): RatioCorner => ({
    noiseGain: corner.noiseGain,
    output: (point, reference, supply) => corner.output(legs(point, resistance), reference, supply),
    commonMode: (point, reference, supply) => corner.commonMode(legs(point, resistance), reference, supply),
  });
  const atEnds = (corners: readonly RatioCorner[]): RatioCorner[] => corners.flatMap((corner) => shuntEnds(shunt).map((resistance) => across(corner, resistance)));
  const circuit = {
    ...base,
    nominal: across(base.nominal, shunt.resistance.value),
    corners: atEnds(base.corners),
    ...(base.signalCorners === undefined ? {} : { signalCorners: atEnds(base.signalCorners) }),
  };
  const drive = pairs({ current: shunt.current, bus: shunt.bus });
  return { ok: true, made: { circuit, excitation: drive, response: AMPLIFIER, fitNotes: fitted.notes, cautions: [] } };
};
