import type { Drawing } from './drawings.js';

/** An amplifier of one's own making, as far as a figure list can say it: Hz, Ω, F, V/√Hz, A/√Hz, V/s. */
export interface LiveAmplifier {
  readonly gainBandwidth: number;
  readonly poles?: readonly number[];
  readonly outputResistance?: number;
  /** From each input to ground. */
  readonly inputCapacitance?: number;
  /** Limit of the slope: hard, or reached through the tanh of a bipolar pair. */
  readonly slewRate?: number;
  readonly pair?: 'hard' | 'bipolar';
  readonly noise?: NoiseFigures;
}

/** White levels, the 1/f corner of the voltage noise, and the white level of one generator() as measured at this temperature. */
export interface NoiseFigures {
  readonly voltage: number;
  readonly corner: number;
  readonly current: number;
  readonly generator: number;
}

/** Ω and F at the output; behind the isolation resistor, where there is one. To an AC ground. */
export interface LiveLoad {
  readonly resistance?: number;
  readonly capacitance?: number;
  readonly isolation?: number;
}

const INTEGRATING_FARAD = 1e-9;

/**
 * Netlist lines of the amplifier between a drawing's pins and `out`. The loop can be opened at the source `vloop`: it stands
 * between the controlled source (no impedance) and the output resistance, so that a voltage there tells the whole loop gain,
 * −v(before)/v(behind), with nothing loaded wrongly (Middlebrook, Int. J. Electronics 38(4), 1975, from memory).
 */
export function amplifierLines({ plus, minus }: Drawing, amplifier: LiveAmplifier, injected = ''): string[] {
  const { outputResistance, inputCapacitance, poles = [], noise } = amplifier;
  const stages = poles.flatMap((pole, k) => [`ep${k} q${k} 0 y${k} 0 1`, `rp${k} q${k} y${k + 1} 1`, `cp${k} y${k + 1} 0 ${1 / (2 * Math.PI * pole)}`]);
  return [
    ...(noise === undefined ? [] : noiseLines([plus, minus], noise)),
    ...integrator(amplifier, noise === undefined ? plus : 'pe', minus),
    ...stages,
    `eout before 0 y${poles.length} 0 1`,
    `vloop before behind dc 0 ${injected}`,
    outputResistance === undefined || outputResistance === 0 ? 'vwo behind out 0' : `ro behind out ${outputResistance} noisy=0`,
    ...(inputCapacitance === undefined ? [] : [`cip ${plus} 0 ${inputCapacitance}`, `cin ${minus} 0 ${inputCapacitance}`]),
  ];
}

/** dv/dt = 2π·GBW·(v+ − v−), limited to the slew rate where there is one; DC gain 1e9 and more. */
function integrator({ gainBandwidth, slewRate, pair }: LiveAmplifier, plus: string, minus: string): string[] {
  const siemens = 2 * Math.PI * gainBandwidth * INTEGRATING_FARAD;
  const state = [`cy y0 0 ${INTEGRATING_FARAD}`, `ry y0 0 ${1e9 / siemens} noisy=0`];
  if (slewRate === undefined) return [`gy 0 y0 ${plus} ${minus} ${siemens}`, ...state];
  const most = slewRate * INTEGRATING_FARAD;
  if (pair === 'bipolar') return [`by 0 y0 i=${most}*tanh(${siemens / most}*(v(${plus})-v(${minus})))`, ...state];
  return [`by 0 y0 i=min(max(${siemens}*(v(${plus})-v(${minus})),${-most}),${most})`, ...state];
}

/** Elementary charge as in the simulator's own source, C. */
const CHARGE = 1.602176634e-19;

/**
 * A diode as a noise generator: its shot noise 2q·I is white, its flicker noise KF·I/f meets it at KF/(2q). Read as the current
 * of `vx…`. Its white level is measured in a run of its own, at the temperature of the circuit.
 */
export function generator(name: string, corner = 0): string[] {
  return [
    `vb${name} b${name} 0 0.55`,
    `d${name} b${name} x${name} dm${name}`,
    `vx${name} x${name} 0 0`,
    `.model dm${name} d is=1e-14 n=1 kf=${corner * 2 * CHARGE} af=1`,
  ];
}

/** Voltage noise in series with the + input (node `pe`), one current noise into each input, all three independent. */
function noiseLines([plus, minus]: readonly [string, string], { voltage, corner, current, generator: level }: NoiseFigures): string[] {
  return [
    ...generator('v', corner),
    `hv pe ${plus} vxv ${voltage / level}`,
    ...(current === 0
      ? []
      : [...generator('ip'), `fip 0 ${plus} vxip ${current / level}`, ...generator('im'), `fim 0 ${minus} vxim ${current / level}`]),
  ];
}

/** Load lines at `out`; its far end is `far`. */
export function loadLines({ resistance, capacitance, isolation }: LiveLoad): string[] {
  return [
    isolation === undefined || isolation === 0 ? 'vwl out far 0' : `riso out far ${isolation}`,
    ...(resistance === undefined ? [] : [`rload far 0 ${resistance} noisy=0`]),
    ...(capacitance === undefined ? [] : [`cload far 0 ${capacitance}`]),
  ];
}
