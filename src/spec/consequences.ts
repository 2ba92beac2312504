import { parseQuantity } from '../quantities/parse.js';
import type { Draft } from './draft.js';
import { dropOwn } from './consequences-own.js';
import { drop, giveWay, optionAt } from './give-way.js';
import { isFromFile, isUnder, leafText } from './tree.js';

/** What an option makes pointless in the file is dropped and told: a what-if stays one option and is no contradiction. */
export function drawConsequences(draft: Draft): void {
  keepFeedback(draft);
  letResistorsRule(draft);
  dropLowPeak(draft);
  replaceSignal(draft);
  dropOwn(draft);
  dropTolerance(draft);
  dropCrossCheck(draft);
}

const FOLLOWING = ['resistors.input', 'resistors.positiveInput'];

/** A new gain, or a new feedback resistor beside a gain: feedback stays, the input resistor is derived again. */
function keepFeedback(draft: Draft): void {
  const { fields } = draft;
  const by = optionAt(draft, 'gain') ?? (fields.has('gain') ? optionAt(draft, 'resistors.feedback') : undefined);
  const feedback = leafText(fields, 'resistors.feedback');
  if (by === undefined || feedback === undefined || optionAt(draft, 'resistors.input') !== undefined) return;
  for (const path of FOLLOWING) if (isFromFile(fields, path)) drop(draft, path);
  draft.keepFeedback = true;
  const toReference = leafText(fields, 'resistors.toReference');
  const kept = toReference === undefined ? `feedback ${feedback}` : `feedback ${feedback} and toReference ${toReference}`;
  const again = ['difference', 'high-side-sense'].includes(leafText(fields, 'topology')?.trim() ?? '') ? 'input resistors' : 'input resistor';
  draft.notes.push(`${by}: ${kept} kept, ${again} derived again`);
}

/** An input resistor from an option beside a feedback resistor settles the gain: the gain of the file gives way. */
function letResistorsRule(draft: Draft): void {
  const by = optionAt(draft, 'resistors.input');
  if (by === undefined || !draft.fields.has('resistors.feedback') || !isFromFile(draft.fields, 'gain')) return;
  draft.notes.push(`${by}: gain ${leafText(draft.fields, 'gain') ?? ''} of the file dropped, it follows from the resistors`);
  drop(draft, 'gain');
}

function dropLowPeak(draft: Draft): void {
  const by = optionAt(draft, 'supply');
  const peak = leafText(draft.fields, 'supplyPeak');
  if (by === undefined || peak === undefined || !isFromFile(draft.fields, 'supplyPeak')) return;
  const [top, highest] = [topOf(leafText(draft.fields, 'supply') ?? ''), topOf(peak)];
  if (top === undefined || highest === undefined || highest >= top) return;
  drop(draft, 'supplyPeak');
  draft.notes.push(`${by}: supplyPeak ${peak} of the file dropped, it lies below the new top of the supply`);
}

/** Highest volts a supply text allows; undefined when it cannot be read. */
function topOf(text: string): number | undefined {
  const read = parseQuantity(text, 'supply');
  return read.ok ? (read.quantity.max ?? read.quantity.nominal) : undefined;
}

/** Which fields of the file say the same thing in another way, and give way to an option. */
const RIVALS: Readonly<Record<string, readonly string[]>> = {
  'signal.input': ['signal.amplitude', 'signal.center'],
  'signal.amplitude': ['signal.input'],
  'signal.positive': ['signal.differential', 'signal.commonMode'],
  'signal.negative': ['signal.differential', 'signal.commonMode'],
  'signal.differential': ['signal.positive', 'signal.negative'],
  'signal.commonMode': ['signal.positive', 'signal.negative'],
};

function replaceSignal(draft: Draft): void {
  const isAc = leafText(draft.fields, 'signal.coupling') === 'ac';
  for (const [path, rivals] of Object.entries(RIVALS)) {
    const by = optionAt(draft, path);
    if (by === undefined || (isAc && path === 'signal.input')) continue;
    giveWay(draft, by, rivals);
  }
  const coupling = optionAt(draft, 'signal.coupling');
  if (isAc && coupling !== undefined && draft.fields.has('signal.amplitude')) giveWay(draft, coupling, ['signal.center']);
}

/** A reference value that brings its own ends, or ground, which has none. */
function dropTolerance(draft: Draft): void {
  const by = optionAt(draft, 'reference.value');
  const text = leafText(draft.fields, 'reference.value') ?? '';
  const read = parseQuantity(text, 'voltage');
  const bringsEnds = read.ok && (read.quantity.min !== undefined || read.quantity.max !== undefined);
  if (by !== undefined && (bringsEnds || text === 'ground')) giveWay(draft, by, ['reference.tolerance']);
}

/** Whatever moves the output at nominal values. */
const MOVES_OUTPUT = [
  'gain', 'topology', 'resistors.feedback', 'resistors.input', 'resistors.positiveInput', 'resistors.toReference', 'reference', 'source',
  'signal.input', 'signal.amplitude', 'signal.center', 'signal.coupling', 'signal.positive', 'signal.negative', 'signal.differential', 'signal.commonMode',
  'legs', 'photodiode', 'shunt', 'filter',
];

/** An output of the file that only cross-checks a gain would contradict the option: a contradiction the user did not make. */
function dropCrossCheck(draft: Draft): void {
  const { fields } = draft;
  const output = leafText(fields, 'signal.output');
  if (output === undefined || !isFromFile(fields, 'signal.output') || !isGainKnown(draft)) return;
  const followsSupply = leafText(fields, 'reference.value')?.startsWith('mid') === true;
  const by = firstOption(draft, followsSupply ? [...MOVES_OUTPUT, 'supply'] : MOVES_OUTPUT);
  if (by === undefined) return;
  drop(draft, 'signal.output');
  draft.notes.push(`${by}: signal.output ${output} of the file dropped, the output follows from the gain`);
}

/** True when the gain is not what the output is there to say. */
function isGainKnown({ fields }: Draft): boolean {
  const has = (...paths: readonly string[]): boolean => paths.every((path) => fields.has(path));
  const topology = leafText(fields, 'topology')?.trim();
  if (topology === 'summing') return true;
  if (topology === 'transimpedance') return has('resistors.feedback');
  return has('gain') || has('resistors.feedback', 'resistors.input') || (topology === 'multiple-feedback-low-pass' && has('filter.r1', 'filter.r2'));
}

function firstOption(draft: Draft, paths: readonly string[]): string | undefined {
  const written = [...draft.fields.keys()].filter((path) => paths.some((moved) => isUnder(path, moved)));
  return written.map((path) => optionAt(draft, path)).find((option) => option !== undefined);
}
