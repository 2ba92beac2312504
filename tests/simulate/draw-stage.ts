import { deriveDemands, type Demands } from '../../src/demands/index.js';
import { readStage } from '../../src/spec/read.js';
import { buildStage } from '../../src/stage/index.js';
import { stageFile } from '../support/bench.js';
import type { Bench, BenchTopology, Load } from '../support/netlists.js';
import { written, type Dice } from './random.js';
import type { DrawnStage, Point } from './stage-drawn.js';

const TOPOLOGIES: readonly BenchTopology[] = ['follower', 'non-inverting', 'inverting', 'difference'];

/** A stage the product accepts; stages that contradict themselves are drawn again. */
export function drawStage(dice: Dice): DrawnStage {
  for (let attempt = 0; attempt < 500; attempt += 1) {
    const stage = attemptStage(dice);
    if (stage !== null) return stage;
  }
  throw new Error('no stage without a contradiction in 500 draws');
}

function attemptStage(dice: Dice): DrawnStage | null {
  const topology = dice.pick(TOPOLOGIES);
  const isAc = topology !== 'difference' && dice.chance(0.25);
  const supply = drawSupply(dice);
  const reference = drawReference(dice, supply.nominal, isAc);
  const tolerance = topology === 'follower' ? 0 : dice.pick([0, 0.001, 0.01, 0.01, 0.02, 0.05]);
  const bench = drawBench(dice, topology, { isAc, grounded: reference.kind === 'ground' });
  const sourceTolerance = topology === 'inverting' && bench.source !== undefined && !isAc && dice.chance(0.3) ? 0.05 : 0;
  const signal = drawSignal(dice, { bench, isAc, supply: supply.nominal, reference: reference.volts });
  if (signal === null) return null;
  const load = drawLoad(dice);
  const asked = drawAsked(dice, supply.nominal);
  const circuit = { bench, isAc, tolerance, sourceTolerance, supply, points: signal.points, centre: signal.centre, load: load?.load ?? null, ...asked.drawn };
  const more = [...asked.lines, ...(load === null ? [] : [load.text])];
  const file = fileOf(circuit, { supply: supply.text, reference, signal: signal.text, more });
  const demands = demandsOf(file);
  return demands === null ? null : { file, demands, ...circuit, reference: { kind: reference.kind, value: reference.volts, tolerance: reference.tolerance } };
}

type Circuit = Omit<DrawnStage, 'file' | 'demands' | 'reference'>;

interface Texts {
  readonly supply: string;
  readonly reference: DrawnReference;
  readonly signal: string;
  readonly more: readonly string[];
}

function fileOf({ bench, isAc, tolerance, sourceTolerance, frequency }: Circuit, { supply, reference, signal, more }: Texts): string {
  return stageFile(bench, {
    supply,
    ...(reference.text === null ? {} : { reference: reference.text }),
    ...(reference.kind === 'mid-supply' && reference.tolerance > 0 ? { referenceTolerance: 100 * reference.tolerance } : {}),
    tolerance: 100 * tolerance,
    ...(sourceTolerance > 0 ? { sourceTolerance: 100 * sourceTolerance } : {}),
    signal: `${signal}${isAc ? ', coupling: ac' : ''}, frequency: ${frequency} Hz`,
    more,
  });
}

/** What the product makes of the file; null when the stage contradicts itself. */
function demandsOf(file: string): Demands | null {
  const spec = readStage(file, { file: 'stage.yaml', overrides: [] });
  if (!spec.ok) throw new Error(`a drawn stage file is refused: ${spec.problems.map(({ message }) => message).join('; ')}\n${file}`);
  const built = buildStage(spec.spec);
  return built.ok ? deriveDemands(built.stage) : null;
}

type DrawnLimits = Pick<DrawnStage, 'frequency' | 'temperature' | 'gainError' | 'isVector' | 'swingLoss' | 'headroomMargin' | 'dcError'>;

/** Frequency, temperatures and limits, and their lines in the stage file. */
function drawAsked(dice: Dice, supply: number): { readonly drawn: DrawnLimits; readonly lines: readonly string[] } {
  const frequency = written(dice.ratio(100, 100e3));
  const [min, max] = dice.pick([[25, 25], [0, 50], [-20, 60], [-40, 85], [10, 40], [25, 125]] as const);
  const isVector = dice.chance(0.2);
  const gainError = dice.pick([0.001, 0.005, 0.01, 0.03]);
  const swingLoss = dice.chance(0.2) ? written(dice.ratio(0.002, 0.05)) : 0;
  const headroomMargin = dice.chance(0.15) ? written(dice.ratio(0.002, 0.02)) : 0;
  const dcError = written(dice.ratio(0.001, 0.02) * supply);
  const limits = [
    `gainError: ${100 * gainError} %`, ...(isVector ? ['gainErrorKind: vector'] : []),
    ...(swingLoss > 0 ? [`swingLoss: ${swingLoss} V`] : []), `dcError: ${dcError} V`,
  ];
  return {
    drawn: { frequency, temperature: { min, max }, gainError, isVector, swingLoss, headroomMargin, dcError },
    lines: [
      `temperature: ${min}..${max} °C`,
      `limits: {${limits.join(', ')}}`,
      ...(headroomMargin > 0 ? [`margins: {outputHeadroom: ${headroomMargin} V}`] : []),
    ],
  };
}

function drawSupply(dice: Dice): DrawnStage['supply'] & { readonly text: string } {
  const nominal = dice.pick([1.8, 2.5, 3.3, 5, 5, 9, 12]);
  const spread = dice.pick([0, 0.02, 0.05, 0.1, 0.17]);
  const [min, max] = [written(nominal * (1 - spread), 4), written(nominal * (1 + spread), 4)];
  const text = spread === 0 ? `${nominal} V` : `${min}..${max} V`;
  return { min, max, nominal: (min + max) / 2, text };
}

interface DrawnReference {
  readonly kind: 'ground' | 'mid-supply' | 'voltage';
  readonly volts: number;
  readonly tolerance: number;
  readonly text: string | null;
}

function drawReference(dice: Dice, nominal: number, isAc: boolean): DrawnReference {
  const kind = dice.pick(isAc ? (['mid-supply', 'voltage'] as const) : (['ground', 'mid-supply', 'voltage'] as const));
  const tolerance = dice.pick([0, 0, 0.01, 0.03]);
  if (kind === 'ground') return { kind, volts: 0, tolerance: 0, text: null };
  if (kind === 'mid-supply') return { kind, volts: nominal / 2, tolerance, text: 'mid-supply' };
  const volts = written(nominal * dice.even(0.25, 0.65));
  return { kind, volts, tolerance, text: tolerance === 0 ? `${volts} V` : `${volts} V ± ${100 * tolerance} %` };
}

const DECADE = [1e3, 1.5e3, 2.2e3, 3.3e3, 4.7e3, 6.8e3];

function drawBench(dice: Dice, topology: BenchTopology, of: { isAc: boolean; grounded: boolean }): Bench {
  const ohms = (): number => dice.pick(DECADE) * dice.pick([1, 10]);
  const series = (share: number): number | undefined => (dice.chance(share) ? written(dice.ratio(100, 5e3), 2) : undefined);
  const source = of.isAc && topology !== 'inverting' ? undefined : series(0.4);
  const referenceResistance = of.grounded ? undefined : of.isAc ? written(dice.ratio(1e3, 100e3), 2) : topology === 'follower' ? undefined : series(0.3);
  const around = { ...(source === undefined ? {} : { source }), ...(referenceResistance === undefined ? {} : { referenceResistance }) };
  if (topology === 'follower') return { topology, ...around };
  const input = ohms();
  const feedback = written(input * dice.ratio(topology === 'non-inverting' ? 0.2 : 0.4, 30), 2);
  if (topology !== 'difference') return { topology, feedback, input, ...around };
  const even = dice.chance(0.6);
  const positiveInput = even ? input : ohms();
  const toReference = even ? feedback : written((positiveInput * feedback) / input, 2);
  return { topology, feedback, input, positiveInput, toReference, ...around };
}

interface DrawnSignal {
  readonly text: string;
  readonly points: readonly Point[];
  readonly centre: Point;
}

interface Room {
  readonly bench: Bench;
  readonly isAc: boolean;
  readonly supply: number;
  readonly reference: number;
}

/** A swing that uses a good part of the supply at the output; null where the reference leaves none. */
function drawSignal(dice: Dice, room: Room): DrawnSignal | null {
  const { bench, supply, reference } = room;
  const leg = (bench.input ?? 0) + (bench.topology === 'non-inverting' && !room.isAc ? (bench.referenceResistance ?? 0) : bench.topology === 'inverting' ? (bench.source ?? 0) : 0);
  const rho = bench.feedback === undefined ? 0 : bench.feedback / leg;
  const low = supply * dice.even(0.01, 0.2);
  const high = supply * (1 - dice.even(0.01, 0.2));
  if (room.isAc) return alternating(Math.min(reference - low, high - reference) * dice.even(0.6, 1), bench.topology === 'inverting' ? rho : 1 + rho);
  if (bench.topology === 'follower') return single(low, high);
  if (bench.topology === 'non-inverting') return single(reference + (low - reference) / (1 + rho), reference + (high - reference) / (1 + rho));
  if (bench.topology === 'inverting') return single(reference + (reference - high) / rho, reference + (reference - low) / rho);
  return twoLegs(dice, { low, high, reference, rho, supply });
}

function alternating(peak: number, gain: number): DrawnSignal | null {
  const amplitude = written(peak / gain, 4);
  if (!(amplitude > 1e-6)) return null;
  return { text: `amplitude: ${amplitude} Vpk`, points: [{ input: -amplitude }, { input: amplitude }], centre: { input: 0 } };
}

function single(from: number, to: number): DrawnSignal | null {
  const [min, max] = [written(from, 4), written(to, 4)];
  if (!(max - min > 1e-5)) return null;
  return { text: `input: ${min}..${max} V`, points: [{ input: min }, { input: max }], centre: { input: (min + max) / 2 } };
}

function twoLegs(dice: Dice, to: { low: number; high: number; reference: number; rho: number; supply: number }): DrawnSignal | null {
  const gain = to.rho;
  const common = dice.even(0.2, 0.6) * to.supply;
  const [least, most] = [(to.low - to.reference) / gain, (to.high - to.reference) / gain];
  return dice.chance(0.5) ? legs([least, most], common) : coupled([least, most], [common, common * dice.even(1, 1.3)]);
}

function legs([least, most]: readonly [number, number], common: number): DrawnSignal | null {
  const span = (most - least) / 4;
  const middle = (least + most) / 2;
  const ends = [common + middle / 2 - span, common + middle / 2 + span, common - middle / 2 - span, common - middle / 2 + span].map((volts) => written(volts, 4));
  const [p0 = 0, p1 = 0, n0 = 0, n1 = 0] = ends;
  if (!(p1 > p0 && n1 > n0)) return null;
  return {
    text: `positive: ${p0}..${p1} V, negative: ${n0}..${n1} V`,
    points: [p0, p1].flatMap((positive) => [n0, n1].map((negative) => ({ positive, negative }))),
    centre: { positive: (p0 + p1) / 2, negative: (n0 + n1) / 2 },
  };
}

function coupled(differential: readonly [number, number], common: readonly [number, number]): DrawnSignal | null {
  const [d0, d1, c0, c1] = [...differential, ...common].map((volts) => written(volts, 4)) as [number, number, number, number];
  if (!(d1 > d0 && c1 >= c0)) return null;
  const at = (d: number, c: number): Point => ({ positive: c + d / 2, negative: c - d / 2 });
  return {
    text: `differential: ${d0}..${d1} V, commonMode: ${c0}..${c1} V`,
    points: [d0, d1].flatMap((d) => [c0, c1].map((c) => at(d, c))),
    centre: at((d0 + d1) / 2, (c0 + c1) / 2),
  };
}

function drawLoad(dice: Dice): { readonly load: Load; readonly text: string } | null {
  if (dice.chance(0.3)) return null;
  const ohms = written(dice.ratio(500, 50e3), 2);
  const to = dice.pick(['ground', 'supply', 'reference'] as const);
  const nanofarad = dice.chance(0.4) ? written(dice.ratio(0.1, 20), 2) : null;
  const capacitance = nanofarad === null ? '' : `, capacitance: ${nanofarad} nF`;
  return { load: { ohms, to, ...(nanofarad === null ? {} : { farad: nanofarad * 1e-9 }) }, text: `load: {resistance: ${ohms} Ω, to: ${to}${capacitance}}` };
}
