/** Signs of formulas and their spelling where only ASCII may be printed. */
const SPELLINGS: readonly (readonly [string, string])[] = [
  ['²', '^2'], ['³', '^3'], ['⁻', '^-'], ['¼', '1/4'], ['·', '*'], ['×', 'x'], ['√', 'sqrt'], ['∫', 'integral '], ['…', '...'],
  ['Δ', 'd'], ['Σ', 'sum '], ['β', 'beta'], ['ε', 'eps'], ['θ', 'theta'], ['π', 'pi'], ['ρ', 'rho'], ['τ', 'tau'], ['ω', 'w'],
];

/** A text with its formulas in ASCII; units keep their own spellings. */
export function formulaAscii(text: string): string {
  return SPELLINGS.reduce((spelled, [sign, word]) => spelled.replaceAll(sign, word), text);
}
