import { TYPICAL_FACTOR } from '../../parts/derating.js';
import { formatQuantity } from '../../quantities/format.js';
import { PARAMETER_WORDS } from '../words.js';

/** The one table of factors, said in one sentence: wherever a typical figure counts, its factor is printed. */
export const DERATING_WORDS = `A figure that is only typical counts after a factor (common practice, from memory): ${factors()}; head-rooms plus half their magnitude. A figure rated at 25 °C and used more than 15 K away counts as an estimate.`;

function factors(): string {
  const byFactor = new Map<string, string[]>();
  for (const [parameter, words] of Object.entries(PARAMETER_WORDS)) {
    const factor = TYPICAL_FACTOR[parameter as keyof typeof PARAMETER_WORDS];
    if (factor === undefined) continue;
    const text = factor < 0.5 ? `÷\u00a0${formatQuantity(1 / factor, '1')}` : `×\u00a0${formatQuantity(factor, '1')}`;
    byFactor.set(text, [...(byFactor.get(text) ?? []), words]);
  }
  return [...byFactor].map(([factor, names]) => `${names.join(', ')} ${factor}`).join('; ');
}
