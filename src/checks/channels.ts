import type { NumberDemand } from '../demands/index.js';
import type { Check } from './check.js';

/** Amplifiers wanted in one package; more than asked is met with sections idle. */
export const channels: Check<NumberDemand> = {
  id: 'channels',
  title: 'channels',
  unit: '1',
  reads: ['channels'],
  hasMargin: true,
  asks: (demands) => demands.channels,
  judge: (asked, { identity }) => {
    const { required, unit, sense } = asked;
    if (identity.channels === null) {
      return { kind: 'undecided', required, unit, sense, cause: 'missing-figure', missing: [{ figure: 'channels', kind: null }] };
    }
    return { kind: 'numbers', required, unit, sense, offered: identity.channels, basis: 'guaranteed' };
  },
};
