import { imperfect, type Imperfections } from '../support/amplifiers.js';
import { at, netlist, type Bench as Fitted, type Circuit } from '../support/netlists.js';
import { spice } from '../support/spice.js';
import { allBenches, cornersOf, quietCircuit, type Corner } from './corners.js';
import { both, type Bench, type Measured } from './measured.js';
import type { DcFigures } from './part-drawn.js';
import type { DrawnStage, Point } from './stage-drawn.js';

const SIMPLIFICATION =
  'every term stands at its own worst corner, multiplied by the upper corner of the noise gain, and the bias current is charged with the tolerance of both sides';

/** Is the output farther from that of a faultless amplifier than the limit: operating points, all errors with their worst signs. */
export const dcError: Bench = {
  simplification: SIMPLIFICATION,
  measure: (draw, ground) =>
    both(async (reading): Promise<Measured> => {
      const bench = new ErrorBench(draw.stage, draw.part.physical(draw.scale, reading)!.dc!);
      const volts = await (ground === 'real' ? bench.together() : bench.apart());
      return { excess: volts / draw.stage.dcError - 1, unit: 'fraction', resolution: 1e-5 };
    }),
};

interface Place {
  readonly corner: Corner;
  readonly point: Point;
}

/** What each error does to the output at one place, V, signed. */
interface Effects extends Place {
  readonly each: readonly number[];
}

const AT_ONCE = 120;

class ErrorBench {
  private readonly stage: DrawnStage;
  private readonly errors: readonly Imperfections[];
  private readonly rated: number;
  private readonly offset: number;

  constructor(stage: DrawnStage, dc: DcFigures) {
    this.stage = stage;
    this.errors = errorsOf(dc);
    this.rated = dc.ratedSupply ?? stage.supply.nominal;
    this.offset = dc.offset;
  }

  /** All errors at once, at the place and with the signs that add most. */
  async together(): Promise<number> {
    const nominal = await this.effects(this.places([this.stage.bench]));
    const worst = mostOf(nominal, total).slice(0, 2);
    const all = await this.effects(allBenches(this.stage).flatMap((bench) => worst.map(({ corner, point }) => ({ corner: { ...corner, bench }, point }))));
    const found = mostOf(all, total).slice(0, 2);
    // One simulator in the process, so one run after the other.
    let largest = 0;
    for (const place of found) largest = Math.max(largest, await this.largestSum(place));
    return largest;
  }

  /** The written rule: the sum of each error's largest, noise gain at its upper corner. */
  async apart(): Promise<number> {
    const nominal = await this.effects(this.places([this.stage.bench]));
    const all = [...nominal, ...(await this.effects(this.places(allBenches(this.stage))))];
    const gain = (one: Effects): number => Math.abs(one.each[0]!) / this.offset;
    const upper = Math.max(...all.map(gain));
    const skewed = await this.effects(this.places(skewedBenches(this.stage)));
    return this.errors.reduce((sum, error, k) => {
      const from = error.intoPlus === undefined && error.intoMinus === undefined ? all : isBias(error) ? skewed : nominal;
      return sum + upper * Math.max(...from.map((one) => Math.abs(one.each[k]!) / gain(one)));
    }, 0);
  }

  private places(benches: readonly Fitted[]): Place[] {
    return cornersOf(this.stage, benches).flatMap((corner) => (this.stage.isAc ? this.stage.points.slice(0, 1) : this.stage.points).map((point) => ({ corner, point })));
  }

  private async effects(places: readonly Place[]): Promise<Effects[]> {
    const done: Effects[] = [];
    const variants = [{}, ...this.errors];
    const many = Math.max(1, Math.floor(AT_ONCE / variants.length));
    for (let from = 0; from < places.length; from += many) {
      const some = places.slice(from, from + many);
      const outputs = await this.outputs(some.flatMap((place) => variants.map((variant) => ({ place, variant }))));
      some.forEach((place, k) => {
        const [exact = 0, ...off] = outputs.slice(k * variants.length, (k + 1) * variants.length);
        done.push({ ...place, each: off.map((volts) => volts - exact) });
      });
    }
    return done;
  }

  private async largestSum(place: Effects): Promise<number> {
    // The sign of the open-loop gain, the last, is what keeps the loop stable: all others follow it.
    const sign = Math.sign(place.each.at(-1)!) || 1;
    const whole = this.errors.map((error, k) => (k === this.errors.length - 1 ? error : turned(error, sign * (Math.sign(place.each[k]!) || 1))));
    const [exact = 0, off = 0] = await this.outputs([{ place, variant: {} }, { place, variant: combined(whole) }]);
    return Math.abs(off - exact);
  }

  private async outputs(of: readonly { readonly place: Place; readonly variant: Imperfections }[]): Promise<number[]> {
    const circuits = of.map(({ place, variant }, k): Circuit => quietCircuit({ stage: this.stage, corner: place.corner, name: `k${k}`, amplifier: imperfect(variant, this.rated) }, place.point));
    const run = await spice(netlist(circuits, '.op', ...circuits.map(({ name }) => at('out', name))));
    return circuits.map(({ name }) => run.value(at('out', name)));
  }
}

/** Each error by itself: offset first, open-loop gain last. Pins that may differ by the whole bias current are two errors. */
function errorsOf(dc: DcFigures): Imperfections[] {
  const { bias, offsetCurrent } = dc;
  const currents: Imperfections[] = offsetCurrent === null ? [{ intoPlus: bias }, { intoMinus: bias }] : [{ intoPlus: bias, intoMinus: bias }, { intoPlus: offsetCurrent / 2, intoMinus: -offsetCurrent / 2 }];
  return [{ offset: dc.offset }, ...currents, { commonModeRejection: dc.commonModeRejection }, { supplyRejection: dc.supplyRejection }, { openLoopGain: dc.openLoopGain }];
}

const isBias = (error: Imperfections): boolean => error.intoPlus !== undefined && error.intoPlus === error.intoMinus;
const total = (one: Effects): number => one.each.reduce((sum, volts) => sum + Math.abs(volts), 0);
const mostOf = (all: readonly Effects[], of: (one: Effects) => number): Effects[] => [...all].sort((a, b) => of(b) - of(a));

function turned(error: Imperfections, sign: number): Imperfections {
  return Object.fromEntries(Object.entries(error).map(([name, value]) => [name, sign * (value as number)]));
}

/** All errors in one amplifier; the currents of both add at each pin. */
function combined(errors: readonly Imperfections[]): Imperfections {
  const sum = (name: 'intoPlus' | 'intoMinus'): number => errors.reduce((so, error) => so + (error[name] ?? 0), 0);
  return { ...Object.assign({}, ...errors), intoPlus: sum('intoPlus'), intoMinus: sum('intoMinus') } as Imperfections;
}

/** Both sides off by the tolerance against each other, every ratio nominal: what the rule charges the bias current with. */
function skewedBenches(stage: DrawnStage): Fitted[] {
  const t = stage.bench.topology === 'follower' ? 0.01 : stage.tolerance;
  return [-1, 1].map((sign) => scaledSides(stage, 1 + sign * t, 1 - sign * t));
}

function scaledSides({ bench, isAc }: DrawnStage, plus: number, minus: number): Fitted {
  const times = (factor: number, ...names: ('feedback' | 'input' | 'positiveInput' | 'toReference' | 'source' | 'referenceResistance')[]) =>
    Object.fromEntries(names.flatMap((name) => (bench[name] === undefined ? [] : [[name, bench[name] * factor]])));
  if (isAc) return { ...bench, ...times(plus, 'referenceResistance'), ...times(minus, 'feedback', 'input', 'source') };
  if (bench.topology === 'inverting') return { ...bench, ...times(plus, 'referenceResistance'), ...times(minus, 'feedback', 'input', 'source') };
  if (bench.topology === 'difference') {
    // The source stands in both legs; there the sides are moved by their own resistors alone.
    return { ...bench, ...times(plus, 'positiveInput', 'toReference', 'referenceResistance'), ...times(minus, 'feedback', 'input') };
  }
  return { ...bench, ...times(plus, 'source'), ...times(minus, 'feedback', 'input', 'referenceResistance') };
}
