import type { Condition, LoadCondition, LoadEnd } from '../parts/figures.js';
import type { FieldKind } from '../quantities/kinds.js';
import { parseQuantity } from '../quantities/parse.js';
import { exactDecimal, exactQuantity } from './exact.js';

export type ConditionResult =
  | { readonly ok: true; readonly condition: Condition }
  | { readonly ok: false; readonly reason: string };

/** Reads what stands after the `@` of a header: `2 kΩ to ground, 5 V`, `over temperature`, `gain 10`. */
export function readCondition(text: string): ConditionResult {
  let condition: Condition = {};
  for (const term of text.split(',').map((piece) => piece.trim())) {
    const found = readTerm(term);
    if (typeof found === 'string') return { ok: false, reason: found };
    const repeated = Object.keys(found).find((key) => key in condition);
    if (repeated !== undefined) return { ok: false, reason: `two conditions for the ${repeated}` };
    condition = { ...condition, ...found };
  }
  return { ok: true, condition: inOrder(condition) };
}

/** The condition in the words `readCondition` reads: load, supply, temperature, gain. Empty when nothing is stated. */
export function conditionWords({ load, supply, temperature, gain }: Condition): string {
  const words: string[] = [];
  if (load?.kind === 'current') words.push(exactQuantity(load.amperes, 'A'));
  if (load?.kind === 'resistance') words.push(`${exactQuantity(load.ohms, 'Ω')} to ${load.to}`);
  if (supply !== undefined) words.push(`${exactDecimal(supply, 0)} V`);
  if (temperature === 'over') words.push('over temperature');
  else if (temperature !== undefined) words.push(`${exactDecimal(temperature, 0)} °C`);
  if (gain !== undefined) words.push(`gain ${exactDecimal(gain, 0)}`);
  return words.join(', ');
}

const LOAD_TO = /^(.*\S)\s+to\s+(ground|supply|mid[\s-]?supply)$/i;
const GAIN = /^gain\s*(?:of\s+)?(.+)$/i;
const UNREADABLE =
  'not a load, supply, temperature or gain: `1 mA`, `2 kΩ to ground`, `5 V`, `25 °C`, `over temperature` and `gain 10` are';

function readTerm(term: string): Condition | string {
  if (term === '') return 'an empty condition';
  if (/^over\s*temperature$/i.test(term)) return { temperature: 'over' };
  const gain = GAIN.exec(term)?.[1] ?? (/v\s*\/\s*v$/i.test(term) ? term : null);
  if (gain !== null) return asGain(term, gain);
  const toEnd = LOAD_TO.exec(term);
  if (toEnd !== null) return asLoad(term, toEnd);
  return oneOf(term, READERS.flatMap((read) => read(term) ?? []));
}

function asGain(term: string, text: string): Condition | string {
  const gain = positive(text, 'gain');
  return gain === null ? `"${term}" is not a gain, as \`gain 10\` is` : { gain };
}

function asLoad(term: string, [, text = '', end = '']: RegExpExecArray): Condition | string {
  const ohms = positive(text, 'resistance');
  return ohms === null ? `"${term}" is not a load, as \`2 kΩ to ground\` is` : { load: resistance(ohms, loadEnd(end)) };
}

const READERS: readonly ((term: string) => Condition | null)[] = [
  (term) => from(positive(term, 'current'), (amperes) => ({ load: { kind: 'current', amperes } })),
  // "2 kΩ" alone goes to mid-supply: the datasheet habit for a load that is not explained.
  (term) => from(positive(term, 'resistance'), (ohms) => ({ load: resistance(ohms, 'mid-supply') })),
  (term) => from(positive(term, 'supply'), (supply) => ({ supply })),
  (term) => from(single(term, 'temperature'), (temperature) => ({ temperature })),
];

function oneOf(term: string, found: readonly Condition[]): Condition | string {
  const [only, second] = found;
  if (only === undefined) return `"${term}" is ${UNREADABLE}`;
  // `300 K` is a resistance to one reader and a temperature to the other.
  if (second !== undefined) return `"${term}" can be read as ${found.map(conditionWords).join(' or as ')}`;
  return only;
}

function from(value: number | null, make: (value: number) => Condition): Condition | null {
  return value === null ? null : make(value);
}

function positive(text: string, kind: FieldKind): number | null {
  const value = single(text, kind);
  return value !== null && value > 0 ? value : null;
}

function single(text: string, kind: FieldKind): number | null {
  const result = parseQuantity(text, kind);
  if (!result.ok) return null;
  const { min, nominal, max } = result.quantity;
  return min === undefined && max === undefined ? (nominal ?? null) : null;
}

function resistance(ohms: number, to: LoadEnd): LoadCondition {
  return { kind: 'resistance', ohms, to };
}

function loadEnd(text: string): LoadEnd {
  const word = text.toLowerCase();
  return word === 'ground' || word === 'supply' ? word : 'mid-supply';
}

/** One order of keys, so that equal conditions are equal as JSON. */
function inOrder({ supply, load, temperature, gain }: Condition): Condition {
  return {
    ...(supply === undefined ? {} : { supply }),
    ...(load === undefined ? {} : { load }),
    ...(temperature === undefined ? {} : { temperature }),
    ...(gain === undefined ? {} : { gain }),
  };
}
