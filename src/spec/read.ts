import { readTopology, refuseStrangers } from './belongs.js';
import { drawConsequences } from './consequences.js';
import { parseTree } from './document.js';
import type { Draft } from './draft.js';
import { emptyDraft } from './draft.js';
import { readGain } from './gain.js';
import { hazardContradictions } from './hazard-contradictions.js';
import { readHazards } from './hazards.js';
import { readLimits } from './limits.js';
import { limitMoved, type Reading } from './moved-limit.js';
import { applyOverrides } from './overrides.js';
import { inOrder, problemAt } from './problems.js';
import { readReference } from './reference.js';
import { refuseMissing } from './required.js';
import { present } from './present.js';
import { readFed } from './fed.js';
import type { Hazard, Override, SpecResult, StageSpec } from './spec.js';
import { flatten } from './structure.js';
import { isEmpty } from './tree.js';
import { supplyContradictions } from './supply-contradictions.js';
import { readLoad, readResistors, readSource } from './surroundings.js';
import { readMargins, readWishes } from './team.js';
import { readBattery, readConverter, readFollowing } from './readout.js';
import { readCapacitors, readDrives, readFilter, readOscillator } from './shaping.js';
import { readInterval, readValue } from './value.js';
import { readChoices, readPaths, readText } from './words.js';

export interface ReadOptions {
  /** How the file is named in messages. */
  readonly file?: string;
  /** In the order given; they win over the file. */
  readonly overrides?: readonly Override[];
}

/**
 * The stage as the user wrote it: YAML or JSON, options over it, every field checked on its own, SI units.
 * `text` null: options say it all. Every problem is reported at once, in file order, then by option, then what is missing;
 * never throws on any text.
 */
export function readStage(text: string | null, options: ReadOptions = {}): SpecResult {
  return stageReader(text, options.file)(options.overrides ?? []);
}

/** As `readStage`, for one file under many options: the text is taken apart once, and where only a limit moves, only the limits are read again. */
export function stageReader(text: string | null, file?: string): (overrides: readonly Override[]) => SpecResult {
  const opened = emptyDraft(text === null ? undefined : file, text !== null);
  const state = text === null ? 'open' : readFile(opened, text);
  let last: Reading | null = null;
  return (overrides) => {
    const moved = last === null ? null : limitMoved(last, overrides);
    if (moved !== null) return { ok: true, spec: moved };
    const draft = copyOf(opened);
    if (state === 'empty' && overrides.length === 0) refuseEmpty(draft);
    if (state === 'unreadable' || (state === 'empty' && overrides.length === 0)) return { ok: false, problems: draft.problems };
    applyOverrides(draft, overrides);
    drawConsequences(draft);
    const spec = readFields(draft);
    if (spec !== null && draft.problems.length === 0) {
      last = { overrides, draft, spec };
      return { ok: true, spec };
    }
    return { ok: false, problems: inOrder(draft.problems, overrides.map(({ option }) => option)) };
  };
}

function copyOf(draft: Draft): Draft {
  const { fields, positions, problems, notes } = draft;
  return { ...draft, fields: new Map(fields), positions: new Map(positions), problems: [...problems], notes: [...notes] };
}

/** `unreadable`: nothing more can be said about the file. */
function readFile(draft: Draft, text: string): 'open' | 'empty' | 'unreadable' {
  const parsed = parseTree({ text, file: draft.file });
  draft.problems.push(...parsed.problems);
  if (!parsed.ok) return 'unreadable';
  if (parsed.root === null || isEmpty(parsed.root)) return 'empty';
  const flat = flatten(parsed.root, { path: '', keyAt: { line: 1, column: 1 }, file: draft.file });
  draft.problems.push(...flat.problems);
  for (const [path, node] of flat.fields) draft.fields.set(path, node);
  for (const [path, position] of flat.positions) draft.positions.set(path, position);
  return parsed.root.kind === 'branch' ? 'open' : 'unreadable';
}

function refuseEmpty(draft: Draft): void {
  const message = 'the stage file is empty; a stage needs at least topology, supply and signal.input';
  const fix = 'topology: non-inverting\nsupply: 5 V ± 5 %\ngain: 8\nsignal: {input: 25 mV..330 mV}';
  draft.problems.push(problemAt({ path: '', at: { line: 1, column: 1 }, file: draft.file }, { code: 'S102', message, fix }));
}

function readFields(draft: Draft): StageSpec | null {
  const topology = readTopology(draft);
  refuseStrangers(draft, topology);
  refuseMissing(draft, topology);
  const supply = readInterval(draft, 'supply');
  const written = readOthers(draft, topology);
  const positions = Object.fromEntries(draft.positions);
  const found = { ...written, ...present({ supply }), positions, file: draft.file };
  if (draft.problems.length > 0) draft.problems.push(...supplyContradictions(found), ...hazardContradictions(found));
  if (topology === undefined || supply === undefined) return null;
  return { ...written, topology, supply, notes: draft.notes, positions };
}

function readOthers(draft: Draft, topology: StageSpec['topology'] | undefined): Omit<StageSpec, 'topology' | 'supply' | 'notes' | 'positions'> {
  return present({
    name: readText(draft, 'name'),
    supplyPeak: readValue(draft, 'supplyPeak'),
    gain: readGain(draft, topology),
    keepFeedback: draft.keepFeedback ? true : undefined,
    resistors: readResistors(draft),
    reference: readReference(draft),
    ...readFed(draft),
    capacitors: readCapacitors(draft),
    filter: readFilter(draft),
    oscillator: readOscillator(draft),
    drives: readDrives(draft),
    source: readSource(draft),
    load: readLoad(draft),
    following: readFollowing(draft),
    converter: readConverter(draft),
    battery: readBattery(draft),
    ...readHazards(draft),
    temperature: readInterval(draft, 'temperature'),
    limits: readLimits(draft),
    wishes: readWishes(draft),
    margins: readMargins(draft),
    mayChange: readPaths(draft, 'mayChange'),
    part: readText(draft, 'part'),
    avoid: readChoices<Hazard>(draft, 'avoid') ?? [],
  });
}
