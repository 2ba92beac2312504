import type { Stage } from '../stage/index.js';
import type { Amplifier } from './amplifier.js';

/** Hz, about where the loop closes: only to know where to look. */
export const loopFrequency = ({ noiseGain }: Stage, { gainBandwidth }: Amplifier): number => (gainBandwidth ?? 1) / noiseGain.nominal;

/** A load capacitance whose pole is not known. */
export const isLoadUnknown = ({ load }: Stage, { unknown }: Amplifier): boolean => load !== null && load.capacitance > 0 && unknown.has('outputResistance');
