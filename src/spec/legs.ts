import type { Draft } from './draft.js';
import { legNames, MOST_LEGS } from './leg-names.js';
import { readLevel } from './level.js';
import { present } from './present.js';
import { refuse } from './refuse.js';
import { readAmplitude } from './signal.js';
import type { LegSpec, Swing, Value } from './spec.js';
import { readValue } from './value.js';

/** The legs of a summing stage in the order written; volts against ground (AC-coupled: about zero), Ω, gain as a magnitude. */
export function readLegs(draft: Draft): readonly LegSpec[] | undefined {
  const names = legNames(draft);
  if (names.length === 0) return undefined;
  if (names.length > MOST_LEGS) refuse(draft, 'legs', { code: 'S110', message: `${String(names.length)} legs: a summing stage has at most ${String(MOST_LEGS)}`, fix: 'two stages, or legs that are wired together as one' });
  const legs = names.map((name) => readLeg(draft, name));
  const isFixed = legs.every((leg) => leg !== undefined && (leg.level.kind !== 'signal' || leg.level.swing.text === GROUND.text));
  if (isFixed) refuse(draft, 'legs', { code: 'S102', message: 'no leg carries a voltage: all of them rest on supply, reference or ground', fix: 'legs: {command: {input: 0.5..4.5 V, resistance: 100 kΩ}}' });
  return legs.filter((leg) => leg !== undefined);
}

const GROUND: Swing = { min: 0, max: 0, text: 'ground' };

function readLeg(draft: Draft, name: string): LegSpec | undefined {
  const path = `legs.${name}`;
  const level = levelOf(readLevel(draft, `${path}.input`)) ?? about(readAmplitude(draft, `${path}.amplitude`));
  const resistance = readValue(draft, `${path}.resistance`);
  const gain = readGain(draft, `${path}.gain`);
  return level === undefined ? undefined : present({ name, level, resistance, gain });
}

function levelOf(read: string | Swing | undefined): LegSpec['level'] | undefined {
  if (read === undefined) return undefined;
  if (read === 'supply' || read === 'reference') return { kind: read };
  return { kind: 'signal', swing: typeof read === 'string' ? GROUND : read };
}

function about(amplitude: Value | undefined): LegSpec['level'] | undefined {
  if (amplitude === undefined) return undefined;
  return { kind: 'signal', swing: { min: -amplitude.value, max: amplitude.value, text: amplitude.text } };
}

/** Every leg turns the sign, so −0.3 and 0.3 mean the same. */
function readGain(draft: Draft, path: string): Value | undefined {
  const read = readValue(draft, path);
  return read === undefined ? undefined : { value: Math.abs(read.value), text: read.text.replace(/^[−-]/, '').replace(/ \(inverting\)$/, '') };
}
