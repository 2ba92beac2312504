import { requireNotNegative, requirePositive, requireWithin } from './domain.js';

/** An output at rest: its voltage, V, and the current out of it, A (negative: into it). */
export interface RestingOutput {
  readonly volts: number;
  readonly amperes: number;
}

/**
 * Most an output dissipates resting anywhere between two points, its current changing evenly between them: (VS − v)·I when it
 * sources, v·|I| when it sinks.
 * @param supply V, above 0
 * @param from one end of the swing
 * @param to the other
 * @returns W
 * @example worstRestingDissipation(5, {volts: 0, amperes: 0}, {volts: 5, amperes: 5e-3}) is 6.25 mW: 1 kΩ to ground
 * Source: own algebra: pieces of a parabola; Gray, Hurst, Lewis & Meyer, Analysis and Design of Analog Integrated Circuits (5th ed. 2009),
 * class B (from memory).
 */
export function worstRestingDissipation(supply: number, from: RestingOutput, to: RestingOutput): number {
  requirePositive('worstRestingDissipation', { supply });
  const [dv, di] = [to.volts - from.volts, to.amperes - from.amperes];
  const at = (share: number): number => restingDissipation(supply, { volts: from.volts + share * dv, amperes: from.amperes + share * di });
  // Tops of (VS − v)·I and of v·I, where each is a parabola with one.
  const tops = [((supply - from.volts) * di - from.amperes * dv) / (2 * dv * di), -(from.volts * di + from.amperes * dv) / (2 * dv * di)];
  const inside = tops.filter((share) => Number.isFinite(share) && share > 0 && share < 1);
  return Math.max(...[0, 1, ...inside].map(at));
}

/**
 * Dissipation of an output at rest.
 * @param supply V, above 0
 * @param output V and A
 * @returns W; 0 at least
 * @example restingDissipation(5, {volts: 1, amperes: -2e-3}) is 2 mW
 * Source: definition.
 */
export function restingDissipation(supply: number, { volts, amperes }: RestingOutput): number {
  requirePositive('restingDissipation', { supply });
  return Math.max(0, amperes >= 0 ? (supply - volts) * amperes : -volts * amperes);
}

/**
 * Average of the sourced half of a current that swings as a sine about its centre: what the positive supply gives.
 * @param centre A out of the output, either sign
 * @param swing A peak, at least 0
 * @returns A
 * @example averageSourced(0, 1e-3) is 318.3 µA
 * Source: own algebra; Sedra & Smith, Microelectronic Circuits, class B (from memory).
 */
export function averageSourced(centre: number, swing: number): number {
  requireNotNegative('averageSourced', { swing });
  if (Math.abs(centre) >= swing) return Math.max(0, centre);
  const share = centre / swing;
  return (centre * (Math.PI / 2 + Math.asin(share)) + swing * Math.sqrt(1 - share * share)) / Math.PI;
}

/** supply V; level V and current A of the output at rest; conductance S of what it drives; all finite, conductance at least 0. */
export interface DrivenLoad {
  readonly supply: number;
  readonly level: number;
  readonly current: number;
  readonly conductance: number;
}

/**
 * Average dissipation of an output that swings as a sine into a resistive load: VS·(average sourced current) − average of v·i.
 * @param load supply, resting point and conductance
 * @param peak V, at least 0
 * @returns W
 * @example averageSineDissipation({supply: 5, level: 2.5, current: 2.5e-3, conductance: 1e-3}, 1) is 5.75 mW
 * Source: own algebra.
 */
export function averageSineDissipation({ supply, level, current, conductance }: DrivenLoad, peak: number): number {
  requireNotNegative('averageSineDissipation', { peak, conductance });
  return supply * averageSourced(current, conductance * peak) - level * current - (conductance * peak * peak) / 2;
}

/**
 * Largest average dissipation over all amplitudes up to one; with the load to mid-supply VS²/(2π²·RL) at Vp = VS/π.
 * @param load supply, resting point and conductance
 * @param peak V, at least 0: the largest amplitude
 * @returns W
 * @example worstSineDissipation({supply: 5, level: 2.5, current: 0, conductance: 1e-3}, 2.5) is 1.267 mW
 * Source: Sedra & Smith, Microelectronic Circuits, class B (from memory); any resting current: own algebra.
 */
export function worstSineDissipation(load: DrivenLoad, peak: number): number {
  requireWithin('worstSineDissipation', { peak }, { from: 0 });
  const { supply, current, conductance } = load;
  const amplitudes = [0, peak];
  if (conductance > 0) {
    // Stationary where Vp² = (VS/π)²·(1 − (I/(g·Vp))²): a quadratic in Vp².
    const [b, c] = [(supply / Math.PI) ** 2, ((supply * current) / (Math.PI * conductance)) ** 2];
    const top = Math.sqrt((b + Math.sqrt(Math.max(0, b * b - 4 * c))) / 2);
    if (top < peak) amplitudes.push(top);
  }
  return Math.max(...amplitudes.map((amplitude) => averageSineDissipation(load, amplitude)));
}
