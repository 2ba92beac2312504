import type { Demands } from '../demands/index.js';
import type { Readings } from '../parts/readings.js';

/** Hours a battery lasts, and the average currents it gives, A: pessimistic. */
export interface BatteryLife {
  readonly hours: number;
  /** The whole package, idle sections too. */
  readonly amplifier: number;
  /** Load and feedback network. */
  readonly network: number;
  readonly others: number;
}

/** Life of the stage's battery with this part; null without a battery, or with the quiescent current not known. */
export function batteryHours({ battery }: Demands, readings: Readings): BatteryLife | null {
  const quiescent = readings.figure('quiescentCurrent');
  if (battery === null || quiescent === null) return null;
  const amplifier = quiescent.value * (readings.identity.channels ?? 1);
  const { network, others } = battery;
  return { hours: battery.hoursAt(amplifier + network + others), amplifier, network, others };
}
