import { amount, range } from './amounts.js';
import { safeLine } from './safe-text.js';
import { held } from './spelling.js';

const INPUT_WORDS: Readonly<Record<string, string>> = { positive: '+ input', negative: '- input' };

/** Unit of a named input: a current, the time since a reset, else a voltage. */
export function inputUnit(name: string): 'A' | 's' | 'V' {
  if (name === 'current') return 'A';
  return name === 'elapsed' ? 's' : 'V';
}

/** `input 25 mV..330 mV`, `current 0 A..3 A`, `command 0.5 V..4.5 V`; null for what is no input (which level an oscillator stands at). */
export function inputRange(name: string, { low, high }: { low: number; high: number }, isPeak: boolean): string | null {
  if (name === 'level') return null;
  if (name === 'elapsed') return `reset every ${amount(high, 's')}`;
  const words = held(INPUT_WORDS[name] ?? safeLine(name));
  return isPeak ? `${words} ${amount(high, inputUnit(name))} peak` : `${words} ${range(low, high, inputUnit(name))}`;
}
