import type { GainBandwidthDemand } from '../demands/index.js';
import { turningPoint } from '../formulas/bisection.js';
import { weakest } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import { formatQuantity } from '../quantities/format.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

const COMPARED = { figure: 'gainBandwidth', kind: 'min', unit: 'Hz' } as const;

/** Gain bandwidth that gain error, edge and settling need against the part's, with its own input capacitance where that counts. */
export const gainBandwidth: Check<GainBandwidthDemand> = {
  id: 'gain-bandwidth',
  title: 'gain bandwidth',
  unit: 'Hz',
  reads: ['gainBandwidth', 'inputCapacitance'],
  hasMargin: true,
  asks: (demands) => demands['gain-bandwidth'],
  judge: (asked, readings) => {
    const offered = readings.figure('gainBandwidth');
    if (asked.requiredWith === null) return compareFigure(asked, COMPARED, offered);
    const own = readings.figure('inputCapacitance');
    const required = asked.requiredWith(own?.value ?? 0);
    const finding = compareFigure({ ...asked, required }, COMPARED, offered);
    if (finding.kind !== 'numbers') return finding;
    const how = [finding.how, own === null ? 'its own input capacitance not counted' : `with ${formatQuantity(own.value, 'F')} of its own at the input`];
    const caution = own === null && offered !== null ? turningCapacitance(asked.requiredWith, offered) : null;
    return {
      ...finding,
      basis: weakest([finding.basis, own?.basis ?? 'assumed']),
      how: how.filter((step) => step !== null && step !== undefined).join(', '),
      cautions: caution === null ? [] : [caution],
    };
  },
};

/** Beyond this no amplifier's input goes, F. */
const MOST = 1e-6;

/** Where the part's own input capacitance is not known: from which on the gain bandwidth would be too small. */
function turningCapacitance(requiredWith: (own: number) => number, { value }: Reading): string | null {
  const isTooMuch = (own: number): boolean => requiredWith(own) > value;
  if (isTooMuch(0) || !isTooMuch(MOST)) return null;
  let high = 1e-12;
  while (!isTooMuch(high)) high *= 4;
  const turn = turningPoint(isTooMuch, { low: 0, high });
  return `input capacitance not known and not counted: from ${formatQuantity(turn, 'F', { round: 'down' })} on the gain bandwidth is too small`;
}
