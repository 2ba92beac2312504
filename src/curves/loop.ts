import { knownOf } from '../checks/check.js';
import { LOOP_TERMS, loopFigures } from '../checks/phase-margin-figures.js';
import { loopFactor, marginAt, phaseParts, type Loop } from '../checks/phase-margin-loop.js';
import type { PhaseMarginDemand } from '../demands/index.js';
import { nearestSupply, usable } from '../parts/select.js';
import type { PartUnderTest } from '../parts/reading.js';
import { closedLoopOf } from './closed-loop.js';
import type { Crossing, LoopCurves, OpenLoop } from './curves.js';
import type { Standing } from './swing.js';

/** Points of a curve in a decade: a kink stays within a hundredth of a decade. */
const PER_DECADE = 16;
/** How far the curves go beyond what matters, as factors of frequency. */
const [BELOW, ABOVE] = [1000, 10];

/** Open-loop gain, noise gain and closed loop of a stage with one part. Null where there is no loop, or no gain bandwidth. */
export function loopCurves(of: Standing, test: PartUnderTest): LoopCurves | null {
  const loop = loopOf(of);
  const speeds = speedsOf(of, test);
  const [first] = speeds;
  if (loop === null || first === undefined) return null;
  const frequencies = grid(of, speeds);
  const noiseGain = inverse(loopFactor(loop, first.gainBandwidth));
  const open = speeds.map((speed): OpenLoop => ({ ...speed, gain: frequencies.map((frequency) => openGain(speed, loop, frequency)), crossing: crossingOf(loop, speed) }));
  const { frequency: band } = of.stage;
  return {
    frequencies,
    openLoop: open,
    noiseGain: frequencies.map(noiseGain),
    closedLoop: frequencies.map(closedLoopOf(of.stage, loop, first)),
    band,
    loopGain: band === null ? null : openGain(first, loop, band) / noiseGain(band),
    counts: { ownPole: Number.isFinite(loop.ownPole), load: loop.load !== null },
  };
}

/** A gain bandwidth (Hz) and a gain at DC. */
export type Speed = Omit<OpenLoop, 'gain' | 'crossing'>;

/** The loop as the check of the phase margin builds it, asked or not. */
function loopOf({ stage, demands, worst }: Standing): Loop | null {
  const { network, load } = stage;
  if (network === null || stage.response.kind === 'oscillator') return null;
  const hung = { capacitance: load?.capacitance ?? 0, resistance: load?.resistance ?? null, isolation: load?.isolation ?? 0 };
  const asked: Pick<PhaseMarginDemand, 'network' | 'open' | 'load'> = { network, open: demands['stable-gain']?.open ?? null, load: hung };
  const figures = loopFigures(asked, knownOf(LOOP_TERMS, { asked, readings: worst }), worst);
  const resistance = figures.outputResistance?.value ?? null;
  return {
    network,
    open: asked.open,
    inputCapacitance: figures.needsInput ? (figures.inputCapacitance?.value ?? 0) : 0,
    ownPole: figures.own.hertz,
    load: hung.capacitance === 0 || resistance === null ? null : { outputResistance: resistance, ...hung },
  };
}

function speedsOf({ worst }: Standing, test: PartUnderTest): Speed[] {
  const limit = worst.figure('gainBandwidth');
  if (limit === null || !Number.isFinite(limit.value)) return [];
  const counted: Speed = { gainBandwidth: limit.value, kind: 'limit', how: limit.how, direct: finite(worst.figure('openLoopGain')?.value) };
  const typical = printed(test, 'gainBandwidth');
  return typical === null ? [counted] : [counted, { gainBandwidth: typical, kind: 'typical', how: null, direct: printed(test, 'openLoopGain') ?? counted.direct }];
}

const finite = (value: number | undefined): number | null => (value !== undefined && Number.isFinite(value) ? value : null);

/** The typical figure at the supply nearest to the stage's; null: none printed. */
function printed(test: PartUnderTest, parameter: 'gainBandwidth' | 'openLoopGain'): number | null {
  const typicals = nearestSupply(usable(test, parameter).filter(({ kind }) => kind === 'typ'), test.operating.nominalSupply);
  return typicals.length === 0 ? null : Math.max(...typicals.map(({ value }) => value));
}

/** From far below the band or the crossover to beyond the fastest gain bandwidth, at whole decades. */
function grid({ stage }: Standing, speeds: readonly Speed[]): number[] {
  const fastest = Math.max(...speeds.map(({ gainBandwidth }) => gainBandwidth));
  const slowest = Math.min(...speeds.map(({ gainBandwidth }) => gainBandwidth / stage.noiseGain.nominal), stage.frequency ?? Infinity);
  const from = Math.floor(Math.log10(slowest / BELOW));
  const to = Math.ceil(Math.log10(fastest * (ABOVE / 5)));
  return Array.from({ length: (to - from) * PER_DECADE + 1 }, (_, at) => 10 ** (from + at / PER_DECADE));
}

/** |A| of one pole at DC gain, the gain bandwidth and the part's own second pole, V/V. */
function openGain({ gainBandwidth, direct }: Speed, { ownPole }: Loop, frequency: number): number {
  const single = direct === null ? gainBandwidth / frequency : direct / Math.hypot(1, (direct * frequency) / gainBandwidth);
  return single / Math.hypot(1, frequency / ownPole);
}

const inverse =
  (factor: (frequency: number) => number) =>
  (frequency: number): number =>
    1 / factor(frequency);

/** Half a step of the slope at the crossing, as a ratio of frequency. */
const NEAR = 1.02;

function crossingOf(loop: Loop, speed: Speed): Crossing | null {
  const crossover = phaseParts(loop, speed.gainBandwidth)?.crossover;
  if (crossover === undefined) return null;
  const noiseGain = inverse(loopFactor(loop, speed.gainBandwidth));
  const excess = (frequency: number): number => 20 * Math.log10(openGain({ ...speed, direct: null }, loop, frequency) / noiseGain(frequency));
  const rateOfClosure = (excess(crossover / NEAR) - excess(crossover * NEAR)) / (2 * Math.log10(NEAR));
  return { frequency: crossover, gain: noiseGain(crossover), rateOfClosure, phaseMargin: marginAt(loop, speed.gainBandwidth) };
}
