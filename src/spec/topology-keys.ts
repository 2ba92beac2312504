/** Fields of topologies that are not built yet: known by name, so that they are never called misspelt. */
export const OTHER_TOPOLOGIES_KEYS: Readonly<Record<string, string>> = {
  photodiode: 'transimpedance',
  filter: 'sallen-key-low-pass and multiple-feedback-low-pass',
  shunt: 'low-side-sense and high-side-sense',
  oscillator: 'relaxation-oscillator',
};
