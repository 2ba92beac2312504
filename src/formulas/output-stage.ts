import { requireFinite, requirePositive, requireWithin } from './domain.js';

/** gain k in A/V², overdrive Vov = VS − Vth in V, both above 0. */
export interface MosOutput {
  readonly gain: number;
  readonly overdrive: number;
}

/**
 * Head-room of a MOS output device in its triode region: Vov − √(Vov² − 2I/k).
 * @param device gain and overdrive
 * @param current A, 0 .. k·Vov²/2; beyond it the device saturates and there is no swing to the rail
 * @returns V
 * @example mosHeadroom({gain: 2.3256e-3, overdrive: 4.3}, 10e-3) is 1.155 V, where 100 Ω would say 1.0 V
 * Source: Sedra & Smith, Microelectronic Circuits; Gray, Hurst, Lewis & Meyer (5th ed. 2009), triode law (from memory).
 */
export function mosHeadroom(device: MosOutput, current: number): number {
  requireWithin('mosHeadroom', { current }, { from: 0, to: mosSaturationCurrent(device) });
  const { gain, overdrive } = device;
  const share = (2 * current) / gain;
  return share / (overdrive + Math.sqrt(Math.max(0, overdrive ** 2 - share)));
}

/**
 * Current at which that device saturates: k·Vov²/2, half of Vov/Ron.
 * @param device gain and overdrive
 * @returns A
 * @example mosSaturationCurrent({gain: 2.3256e-3, overdrive: 4.3}) is 21.5 mA
 * Source: as mosHeadroom().
 */
export function mosSaturationCurrent({ gain, overdrive }: MosOutput): number {
  requirePositive('mosSaturationCurrent', { gain, overdrive });
  return (gain * overdrive ** 2) / 2;
}

/**
 * Head-room on each rail behind an output swing on symmetric or other rails: (V+ − V− − Vpp)/2.
 * @param positive V+, V
 * @param negative V−, V, below V+
 * @param swing V peak to peak, 0 .. V+ − V−
 * @returns V
 * @example headroomOfSwing(15, -15, 24) is 3 V
 * Source: common practice for output swings stated on split supplies.
 */
export function headroomOfSwing(positive: number, negative: number, swing: number): number {
  requireFinite('headroomOfSwing', { positive, negative });
  requireWithin('headroomOfSwing', { swing }, { from: 0, to: positive - negative });
  return (positive - negative - swing) / 2;
}

/**
 * Highest output of a conventional stage of stacked emitter followers: V+ less 2·VBE + VCEsat, 1.2 V at best, 1.5 V at worst.
 * @param rail V+, V, above 1.5
 * @returns V
 * @example emitterFollowerCeiling(5) is 3.5..3.8 V
 * Source: common practice.
 */
export function emitterFollowerCeiling(rail: number): { readonly worst: number; readonly best: number } {
  requireWithin('emitterFollowerCeiling', { rail }, { above: 1.5 });
  return { worst: rail - 1.5, best: rail - 1.2 };
}
