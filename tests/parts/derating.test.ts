import { describe, expect, it } from 'vitest';
import { COLD_HOT_FACTOR, derateHeadroom, DOUBLING_KELVIN, FET_BIAS_LIMIT, HEADROOM_PER_KELVIN, SUPPLY_REACH, TEMPERATURE_REACH, TYPICAL_FACTOR } from '../../src/parts/derating.js';

describe('the derating table', () => {
  it('is the one of the contract', () => {
    expect(TYPICAL_FACTOR).toEqual({
      slewRate: 0.6, gainBandwidth: 0.6, offsetVoltage: 3, offsetDrift: 3, biasCurrent: 4, offsetCurrent: 4, quiescentCurrent: 1.4,
      voltageNoise: 1.25, currentNoise: 1.25, commonModeRejection: 1 / 3.16, supplyRejection: 1 / 3.16, openLoopGain: 1 / 3.16,
      // What goes with the speed of the part.
      supplyRejectionCorner: 0.6, overloadRecovery: 1 / 0.6, startUpTime: 1 / 0.6,
    });
  });

  it('adds half their magnitude to head-rooms, also beyond the rail', () => {
    expect(derateHeadroom(0.2)).toBeCloseTo(0.3, 15);
    expect(derateHeadroom(-0.2)).toBeCloseTo(-0.1, 15);
    expect(derateHeadroom(0)).toBe(0);
  });

  it('has its reaches and its factors away from 25 °C', () => {
    expect(COLD_HOT_FACTOR).toEqual({ slewRate: 0.8, gainBandwidth: 0.8, quiescentCurrent: 1.3 });
    expect([TEMPERATURE_REACH, HEADROOM_PER_KELVIN, DOUBLING_KELVIN, FET_BIAS_LIMIT, SUPPLY_REACH]).toEqual([15, 0.005, 10, 1e-9, 2]);
  });
});
