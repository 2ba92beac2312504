import { ELEMENTARY_CHARGE } from '../formulas/constants.js';
import { noiseGrid } from '../formulas/noise-grid.js';
import { outputNoise } from '../formulas/noise-integral.js';
import type { PassiveElement, PinNetwork } from '../formulas/pin-network.js';
import type { Parameter } from '../parts/figures.js';
import type { Stage } from '../stage/index.js';
import type { Amplifier, Outcome } from './amplifier.js';

const KELVIN = 273.15;
/** Lowest frequency where nobody said how long one looks, Hz (common practice). */
const LOWEST = 0.1;

export type NoiseAnswer = { readonly rms: number } | { readonly missing: readonly Parameter[] };

/** Noise at the output over the whole bandwidth, V rms: as the noise check adds it up, the converter behind the stage left out. */
export function noiseAt(stage: Stage, amplifier: Amplifier, { form, capacitor }: { readonly form: Outcome; readonly capacitor: number | null }): NoiseAnswer {
  const { network, asked, response } = stage;
  const { readings, gainBandwidthMost } = amplifier;
  if (network === null || gainBandwidthMost === null) return { missing: ['gainBandwidth'] };
  const read = (parameter: Parameter): number | null => (form === 'worst' ? readings.figureOrClass(parameter) : readings.figure(parameter))?.value ?? null;
  const sees = [network.plus, network.minus].some(hasResistance);
  const [voltageNoise, noiseCorner, currentNoise] = [readings.figure('voltageNoise')?.value ?? null, read('noiseCorner'), sees ? read('currentNoise') : 0];
  if (voltageNoise === null || noiseCorner === null || currentNoise === null) {
    return { missing: [...(voltageNoise === null ? (['voltageNoise'] as const) : []), ...(noiseCorner === null ? (['noiseCorner'] as const) : []), ...(currentNoise === null ? (['currentNoise'] as const) : [])] };
  }
  const { following } = asked;
  const isTransimpedance = response.kind === 'transimpedance';
  const grid = noiseGrid({
    ...apart(network.plus, withCapacitor(network.minus, capacitor)),
    minusCapacitance: isTransimpedance ? amplifier.inputCapacitance : 0,
    temperature: (form === 'worst' ? stage.temperature.max : stage.temperature.nominal) + KELVIN,
    lowest: stage.observation === null ? LOWEST : 1 / stage.observation,
    following: following === null ? null : { corner: following.corner.value, order: following.order },
  });
  const poles = Number.isFinite(amplifier.ownPole) ? [amplifier.ownPole] : [];
  const loop = { gainBandwidth: gainBandwidthMost, poles };
  const all = outputNoise(grid, { ...loop, voltageNoise, noiseCorner, currentNoise });
  const shot = isTransimpedance ? Math.sqrt(2 * ELEMENTARY_CHARGE * response.largestCurrent) : 0;
  const fromDiode = shot === 0 ? 0 : (outputNoise(grid, { ...loop, voltageNoise: 0, noiseCorner: 0, currentNoise: shot }).terms[2]?.rms ?? 0);
  return { rms: Math.hypot(all.rms, fromDiode) };
}

const hasResistance = ({ elements, pin }: PinNetwork): boolean => !['ground', 'input', 'output'].includes(pin) && elements.some(({ kind }) => kind === 'resistor');

function withCapacitor({ elements, pin }: PinNetwork, farad: number | null): PinNetwork {
  if (farad === null || farad === 0) return { elements, pin };
  return { pin, elements: [...elements, { name: 'feedback capacitor', kind: 'capacitor', value: farad, between: ['output', pin] }] };
}

/** A resistor that stands at both inputs (source and reference do) is told apart by its input. */
function apart(plus: PinNetwork, minus: PinNetwork): { readonly plus: PinNetwork; readonly minus: PinNetwork } {
  const named = ({ elements, pin }: PinNetwork, side: string): PinNetwork => ({ pin, elements: elements.map((one): PassiveElement => ({ ...one, name: `${one.name}, ${side} input` })) });
  return { plus: named(plus, '+'), minus: named(minus, '−') };
}
