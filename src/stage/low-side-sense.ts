import { excitation } from './excitation.js';
import { fitResistors } from './fitted.js';
import type { RatioCorner } from './circuit.js';
import { AMPLIFIER, type Maker } from './making.js';
import { nonInverting } from './non-inverting.js';
import { shuntEnds } from './shunt.js';
import { inputOf } from './circuit.js';

/**
 * Current through a shunt to ground, amplified by a non-inverting stage: the inputs stand at I·Rsh, about ground
 * (own algebra; common practice).
 */
export const makeLowSideSense: Maker = (spec, settled, around) => {
  const { shunt } = spec;
  if (shunt === undefined) throw new RangeError('a low-side sense stage without a shunt reached the circuit');
  const fitted = fitResistors(spec, settled.gain);
  if (!fitted.ok) return fitted;
  const base = nonInverting(fitted.resistors, around);
  const through = (corner: RatioCorner, resistance: number): RatioCorner => ({
    noiseGain: corner.noiseGain,
    output: (point, reference, supply) => corner.output({ input: inputOf(point, 'current') * resistance }, reference, supply),
    commonMode: (point, reference, supply) => corner.commonMode({ input: inputOf(point, 'current') * resistance }, reference, supply),
  });
  const atEnds = (corners: readonly RatioCorner[]): RatioCorner[] => corners.flatMap((corner) => shuntEnds(shunt).map((resistance) => through(corner, resistance)));
  const circuit = {
    ...base,
    nominal: through(base.nominal, shunt.resistance.value),
    corners: atEnds(base.corners),
    ...(base.signalCorners === undefined ? {} : { signalCorners: atEnds(base.signalCorners) }),
    seriesPositive: around.sourceResistance + shunt.resistance.value,
  };
  const drive = excitation({ coupling: 'dc', shape: spec.signal.shape, input: shunt.current }, 'current');
  return { ok: true, made: { circuit, excitation: drive, response: AMPLIFIER, fitNotes: fitted.notes, cautions: [] } };
};
