/** Phase margin of A = fc/(jf) with one more pole, degrees, by its closed form at the true crossover (own algebra). */
export function phaseMarginOfTwoPoles(asymptote: number, pole: number): number {
  const crossover = Math.sqrt((pole ** 2 / 2) * (Math.sqrt(1 + (4 * asymptote ** 2) / pole ** 2) - 1));
  return 90 - (Math.atan(crossover / pole) * 180) / Math.PI;
}

/** The asymptotic crossover whose true one is this, with one more pole, Hz. */
export function asymptoteOf(crossover: number, pole: number): number {
  return crossover * Math.hypot(1, crossover / pole);
}
