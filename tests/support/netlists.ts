import type { Amplifier } from './amplifiers.js';

/** The stages of resistors alone; drawings.ts has all twelve. */
export type BenchTopology = 'follower' | 'non-inverting' | 'inverting' | 'difference';

/** A stage as it lies on the bench: real resistors, ohm. Written from the drawing of each topology, not from the product. */
export interface Bench {
  readonly topology: BenchTopology;
  /** Non-inverting and inverting: Rf, Rg or Rin. Difference: R2, R1, and R3, R4 at the + input. */
  readonly feedback?: number;
  readonly input?: number;
  readonly positiveInput?: number;
  readonly toReference?: number;
  /** In series with every input. */
  readonly source?: number;
  readonly referenceResistance?: number;
}

/** What is connected: volts, or the text of a source (`dc 0 ac 1`, `sin(1 0.5 1k)`). */
export interface Drive {
  readonly supply: number;
  readonly reference: number;
  /** `input`, or `positive` and `negative`. */
  readonly inputs: Readonly<Record<string, number | string>>;
}

export interface Load {
  readonly ohms?: number;
  readonly farad?: number;
  readonly to: 'ground' | 'supply' | 'reference';
}

/** One stage with its amplifier. Its nodes end in the name, so that many fit into one netlist. */
export interface Circuit {
  readonly name: string;
  readonly bench: Bench;
  readonly amplifier: Amplifier;
  readonly drive: Drive;
  readonly load?: Load;
}

/** A netlist of any number of circuits with one analysis. */
export function netlist(circuits: readonly Circuit[], analysis: string, ...saved: readonly string[]): string {
  const save = saved.length === 0 ? [] : [`.save ${saved.join(' ')}`];
  return ['* stages on the bench', ...circuits.flatMap(lines), analysis, ...save, '.end', ''].join('\n');
}

/** Vectors of a circuit: voltage at a node (`out`, `plus`, `minus`), and the current out of the amplifier. */
export const at = (node: string, name: string): string => `v(${node}_${name})`;
export const outputCurrent = (name: string): string => `i(vo_${name})`;

function lines({ name, bench, amplifier, drive, load }: Circuit): string[] {
  const node = (stem: string): string => `${stem}_${name}`;
  const pins = { plus: node('plus'), minus: node('minus'), drive: node('drive'), supply: node('vdd'), tag: node('') };
  const inputs = Object.entries(drive.inputs).map(([stem, value]) => `vi${stem}_${name} ${node(stem)} 0 ${value}`);
  return [
    `vdd_${name} ${node('vdd')} 0 ${drive.supply}`,
    `vref_${name} ${node('ref')} 0 ${drive.reference}`,
    ...inputs,
    ...amplifier(pins),
    `vo_${name} ${node('drive')} ${node('out')} 0`,
    ...DRAWINGS[bench.topology](bench, (label, ends, ohms) => chain(`${label}_${name}`, [node(ends[0]), node(ends[1])], ohms)),
    ...(load === undefined ? [] : loadLines(load, node)),
  ];
}

type Join = (label: string, ends: readonly [string, string], ohms: readonly (number | undefined)[]) => string[];

const DRAWINGS: Readonly<Record<BenchTopology, (bench: Bench, join: Join) => string[]>> = {
  follower: (bench, join) => [...join('s', ['input', 'plus'], [bench.source]), ...join('f', ['out', 'minus'], [])],
  'non-inverting': (bench, join) => [
    ...join('s', ['input', 'plus'], [bench.source]),
    ...join('f', ['out', 'minus'], [bench.feedback]),
    ...join('g', ['minus', 'ref'], [bench.input, bench.referenceResistance]),
  ],
  inverting: (bench, join) => [
    ...join('s', ['input', 'minus'], [bench.source, bench.input]),
    ...join('f', ['out', 'minus'], [bench.feedback]),
    ...join('g', ['plus', 'ref'], [bench.referenceResistance]),
  ],
  difference: (bench, join) => [
    ...join('p', ['positive', 'plus'], [bench.source, bench.positiveInput]),
    ...join('q', ['plus', 'ref'], [bench.toReference, bench.referenceResistance]),
    ...join('n', ['negative', 'minus'], [bench.source, bench.input]),
    ...join('f', ['out', 'minus'], [bench.feedback]),
  ],
};

/** Resistors in a row between two nodes; a wire when there are none. */
function chain(label: string, [from, to]: readonly [string, string], ohms: readonly (number | undefined)[]): string[] {
  const fitted = ohms.filter((value) => value !== undefined && value > 0);
  if (fitted.length === 0) return [`vw${label} ${from} ${to} 0`];
  const between = (k: number): string => (k === 0 ? from : k === fitted.length ? to : `${label}x${k}`);
  return fitted.map((value, k) => `r${k}${label} ${between(k)} ${between(k + 1)} ${value}`);
}

function loadLines(load: Load, node: (stem: string) => string): string[] {
  const end = { ground: '0', supply: node('vdd'), reference: node('ref') }[load.to];
  return [
    ...(load.ohms === undefined ? [] : [`rl${node('')} ${node('out')} ${end} ${load.ohms}`]),
    ...(load.farad === undefined ? [] : [`cl${node('')} ${node('out')} ${end} ${load.farad}`]),
  ];
}
