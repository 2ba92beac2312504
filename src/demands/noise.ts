import { ELEMENTARY_CHARGE } from '../formulas/constants.js';
import { noiseGrid, type NoiseGrid } from '../formulas/noise-grid.js';
import type { PinNetwork } from '../formulas/pin-network.js';
import { formatDecibels, formatQuantity } from '../quantities/format.js';
import { USUAL, type Stage } from '../stage/index.js';
import { withFeedbackCapacitor } from './feedback-capacitor.js';
import type { NoiseDemand, PartCapacitances } from './noise-demand.js';
import { openTransimpedance } from './stable-gain.js';

const SOURCE = 'M4: all sources over the true bandwidth, added as squares (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 7; Motchenbacher & Connelly, Low-Noise Electronic System Design, 1993; both from memory)';
const KELVIN = 273.15;

/** Noise the stage allows at its output, with everything of it but the amplifier. Null without a limit, and for the oscillator. */
export function noise(stage: Stage): NoiseDemand | null {
  const { outputNoise, snr } = stage.asked.limits;
  const limit = outputNoise ?? snr;
  const { network, response } = stage;
  if (limit === undefined || network === null || response.kind === 'oscillator') return null;
  const isTransimpedance = response.kind === 'transimpedance';
  return {
    check: 'noise',
    required: limit.value,
    ...(outputNoise === undefined ? { unit: 'V/V', sense: 'at-least' } : { unit: 'V', sense: 'at-most' }),
    because: becauseOf(stage),
    source: SOURCE,
    grid: remembered((part) => gridOf(stage, named(network), part)),
    countsInput: isTransimpedance,
    open: openTransimpedance(stage),
    rms: outputNoise?.value ?? null,
    ratio: snr?.value ?? null,
    temperature: stage.temperature.max,
    shot: isTransimpedance ? Math.sqrt(2 * ELEMENTARY_CHARGE * response.largestCurrent) : 0,
    quantisation: quantisation(stage),
    output: wantedOutput(stage),
    sees: { plus: hasResistance(network.plus), minus: hasResistance(network.minus) },
  };
}

interface Networks {
  readonly plus: PinNetwork;
  readonly minus: PinNetwork;
}

function gridOf(stage: Stage, network: Networks, part: PartCapacitances): NoiseGrid {
  const { plus, minus } = part.feedback === null ? network : withFeedbackCapacitor(network, part.feedback);
  const { following } = stage.asked;
  return noiseGrid({
    plus,
    minus,
    minusCapacitance: part.input,
    temperature: stage.temperature.max + KELVIN,
    lowest: lowestOf(stage),
    following: following === null ? null : { corner: following.corner.value, order: following.order },
  });
}

/** So many circuits are kept of parts that bring a capacitor of their own: some 30 kB each. */
const KEPT = 128;

/** One grid serves every part that adds the same capacitances; where each brings a capacitor of its own, the latest are kept. */
function remembered(make: (part: PartCapacitances) => NoiseGrid): NoiseDemand['grid'] {
  const known = new Map<string, NoiseGrid>();
  return (part) => {
    const key = `${part.input} ${part.feedback}`;
    const grid = known.get(key) ?? make(part);
    known.set(key, grid);
    const [oldest] = known.keys();
    if (known.size > KEPT && oldest !== undefined) known.delete(oldest);
    return grid;
  };
}

/** A resistor that stands at both inputs (source and reference do) is told apart by its input. */
function named({ plus, minus }: Networks): Networks {
  const names = [...plus.elements, ...minus.elements].map(({ name }) => name);
  const apart = ({ elements, pin }: PinNetwork, where: string): PinNetwork => ({
    elements: elements.map((one) => (names.indexOf(one.name) === names.lastIndexOf(one.name) ? one : { ...one, name: `${one.name}, ${where} input` })),
    pin,
  });
  return { plus: apart(plus, '+'), minus: apart(minus, '−') };
}

const hasResistance = ({ elements, pin }: PinNetwork): boolean => pin !== 'ground' && pin !== 'input' && pin !== 'output' && elements.some(({ kind }) => kind === 'resistor');

const lowestOf = ({ observation }: Stage): number => (observation === null ? USUAL.lowestNoise : 1 / observation);

/** LSB/√12 of the converter behind the stage, V (Bennett, Spectra of quantized signals, Bell Syst. Tech. J. 27, 1948). */
function quantisation({ asked: { converter } }: Stage): number {
  if (converter === null) return 0;
  return (converter.range.max - converter.range.min) / 2 ** converter.bits / Math.sqrt(12);
}

function wantedOutput({ outputNominal, asked: { converter } }: Stage): { min: number; max: number } {
  if (converter === null) return outputNominal;
  return { min: Math.max(outputNominal.min, converter.range.min), max: Math.min(outputNominal.max, converter.range.max) };
}

function becauseOf(stage: Stage): string {
  const { limits, following, converter } = stage.asked;
  const asked = [
    ...(limits.outputNoise === undefined ? [] : [`${formatQuantity(limits.outputNoise.value, 'V')} rms allowed at the output`]),
    ...(limits.snr === undefined ? [] : [`${formatDecibels(limits.snr.value)} of signal to noise asked`]),
  ];
  const band = following === null ? 'over all the bandwidth of the amplifier' : `up to the filter of order ${following.order} at ${formatQuantity(following.corner.value, 'Hz')}`;
  const converted = converter === null ? '' : `, with a converter of ${converter.bits} bits`;
  return `${asked.join(' and ')}, from ${formatQuantity(lowestOf(stage), 'Hz')} ${band}${converted}`;
}
