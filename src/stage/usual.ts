/** What is asked where the stage file does not say; each is told among the assumptions. Common practice. */
export const USUAL = {
  /** Of the gain, relative. */
  gainError: 0.01,
  /** Least of a loop with a capacitance on the output, °. */
  phaseMargin: 45,
  /** From here on noise is counted, Hz. */
  lowestNoise: 0.1,
} as const;
