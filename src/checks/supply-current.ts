import type { SupplyCurrentDemand } from '../demands/index.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { UndecidedFinding } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { compareFigure } from './compare-figure.js';

/** Quiescent current against its limit, per amplifier, or for the package with its idle sections. */
export const supplyCurrent: Check<SupplyCurrentDemand> = {
  id: 'supply-current',
  title: 'supply current',
  unit: 'A',
  reads: ['quiescentCurrent', 'channels'],
  hasMargin: true,
  asks: (demands) => demands['supply-current'],
  judge: (asked, readings) => {
    const one = readings.figure('quiescentCurrent');
    const compared = { figure: 'quiescentCurrent', kind: 'max', unit: 'A' } as const;
    if (asked.per === 'amplifier') return compareFigure(asked, compared, one);
    const channels = readings.identity.channels;
    if (one !== null && channels === null) return channelsMissing(asked);
    return compareFigure(asked, compared, one === null ? null : perPackage(one, readings));
  },
};

function perPackage(one: Reading, readings: Readings): Reading {
  const channels = readings.identity.channels ?? 1;
  const how = readings.brief ? null : [one.how, `× ${channels} sections`].filter((step) => step !== null).join(', ');
  return { ...one, value: one.value * channels, how };
}

function channelsMissing(asked: SupplyCurrentDemand): UndecidedFinding {
  const { required, unit, sense } = asked;
  return { kind: 'undecided', required, unit, sense, cause: 'missing-figure', missing: [{ figure: 'channels', kind: null }] };
}
