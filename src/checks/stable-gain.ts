import { openNoiseGain, type StableGainDemand } from '../demands/index.js';
import { weakest } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatPercent, formatQuantity } from '../quantities/format.js';
import type { NumberFinding, UndecidedFinding } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { compareFigure, type Compared } from './compare-figure.js';

const UNITY = { value: 1, best: 1, why: 'no minimum stable gain known: taken as unity-gain stable' };
const FIGURE: Compared = { figure: 'minimumStableGain', kind: 'max', unit: 'V/V' };

/** Noise gain of the stage at high frequency against the least one the part is stable at. */
export const stableGain: Check<StableGainDemand> = {
  id: 'stable-gain',
  title: 'minimum stable gain',
  unit: 'V/V',
  reads: ['minimumStableGain', 'gainBandwidth', 'inputCapacitance'],
  hasMargin: true,
  asks: (demands) => demands['stable-gain'],
  judge: (asked, readings) => {
    const stable = readings.figureOrAssumed('minimumStableGain', UNITY);
    // Stable at unity is stable at any noise gain.
    if (asked.open === null || stable === null || stable.value <= 1) return compareFigure(asked, FIGURE, stable);
    return withOwnCapacitor(asked, stable, readings);
  },
};

/** Transimpedance: the part's own gain bandwidth makes the capacitor, and that, at its upper tolerance end, the noise gain; the least makes the least. */
function withOwnCapacitor(asked: StableGainDemand, stable: Reading, readings: Readings): NumberFinding | UndecidedFinding {
  const speed = readings.spread('gainBandwidth');
  const { unit, sense } = asked;
  if (speed === null || asked.open === null) {
    return { kind: 'undecided', required: null, unit, sense, cause: 'missing-figure', missing: [{ figure: 'gainBandwidth', kind: 'min' }] };
  }
  const own = readings.figure('inputCapacitance');
  const open = { ...asked.open, inputCapacitance: asked.open.inputCapacitance + (own?.value ?? 0) };
  const required = speed.ends === null ? Math.max(asked.required, stable.value) : openNoiseGain(open, speed.ends.least, asked.capacitorTolerance);
  const finding = compareFigure({ ...asked, required }, FIGURE, stable);
  if (finding.kind !== 'numbers') return finding;
  const basis = weakest([finding.basis, speed.basis, ...(own === null ? [] : [own.basis])]);
  const how = speed.ends === null ? null : `1 + Cin/Cf with the maximally flat capacitor of ${formatQuantity(speed.ends.least, 'Hz')}${asked.capacitorTolerance === 0 ? '' : `, + ${formatPercent(asked.capacitorTolerance)}`}`;
  return { ...finding, basis, how: [finding.how, how].filter((step) => step != null).join(', ') };
}
