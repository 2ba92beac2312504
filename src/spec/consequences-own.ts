import type { Draft } from './draft.js';
import { drop, giveWay, optionAt } from './give-way.js';
import { legNames } from './leg-names.js';
import { isFromFile, leafText } from './tree.js';

/** What an option on a topology's own fields makes pointless in the file: another way to say the same, or what followed from it. */
export function dropOwn(draft: Draft): void {
  for (const name of legNames(draft)) replaceInLeg(draft, `legs.${name}`);
  replaceFilter(draft);
  letPartsRule(draft);
  retime(draft);
  dropEdges(draft);
}

function replaceInLeg(draft: Draft, leg: string): void {
  const pairs = [['gain', 'resistance'], ['resistance', 'gain'], ['input', 'amplitude'], ['amplitude', 'input']] as const;
  for (const [path, rival] of pairs) {
    const by = optionAt(draft, `${leg}.${path}`);
    if (by !== undefined && draft.fields.has(`${leg}.${path}`)) giveWay(draft, by, [`${leg}.${rival}`]);
  }
}

const RESPONSE = ['filter.corner', 'filter.q'];
const PARTS = ['filter.r1', 'filter.r2', 'filter.r3', 'filter.c1', 'filter.c2'];

/** A wanted response and components as fitted exclude each other: what an option says stays. */
function replaceFilter(draft: Draft): void {
  for (const [paths, rivals] of [[RESPONSE, PARTS], [PARTS, RESPONSE]] as const) {
    const by = firstBy(draft, paths);
    if (by !== undefined) giveWay(draft, by, rivals);
  }
}

/** r1 and r2 of a multiple-feedback filter settle its gain: the gain of the file gives way. */
function letPartsRule(draft: Draft): void {
  const by = firstBy(draft, ['filter.r1', 'filter.r2']);
  if (by === undefined || leafText(draft.fields, 'topology')?.trim() !== 'multiple-feedback-low-pass' || !isFromFile(draft.fields, 'gain')) return;
  draft.notes.push(`${by}: gain ${leafText(draft.fields, 'gain') ?? ''} of the file dropped, it follows from r2 over r1`);
  drop(draft, 'gain');
}

const MOVES_PERIOD = ['oscillator.frequency', 'oscillator.capacitance', 'oscillator.toSupply', 'oscillator.toGround', 'oscillator.toOutput'];

/** Frequency, timing resistor and capacitor: of three in the file the one that no option names is chosen again, the resistor first. */
function retime(draft: Draft): void {
  const { fields } = draft;
  if (!fields.has('oscillator.resistance') || !fields.has('oscillator.capacitance')) return;
  const byResistor = optionAt(draft, 'oscillator.resistance');
  const by = byResistor ?? firstBy(draft, MOVES_PERIOD);
  const given = byResistor === undefined ? 'oscillator.resistance' : 'oscillator.capacitance';
  if (by === undefined || !isFromFile(fields, given)) return;
  draft.notes.push(`${by}: ${given} ${leafText(fields, given) ?? ''} of the file dropped, chosen again for the frequency`);
  drop(draft, given);
}

/** A sine has no edge, a step no duty. */
function dropEdges(draft: Draft): void {
  const by = optionAt(draft, 'signal.shape');
  const shape = leafText(draft.fields, 'signal.shape')?.trim();
  if (by === undefined || shape === 'pulse') return;
  giveWay(draft, by, shape === 'step' ? ['signal.duty'] : ['signal.edge', 'signal.duty']);
}

function firstBy(draft: Draft, paths: readonly string[]): string | undefined {
  return paths.map((path) => optionAt(draft, path)).find((by) => by !== undefined);
}
