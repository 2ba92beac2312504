/** Nodes an amplifier stands between, and the tag its own elements and nodes end in. */
export interface Pins {
  readonly plus: string;
  readonly minus: string;
  readonly drive: string;
  readonly supply: string;
  readonly tag: string;
}

/** Macro-models of our own: each writes the netlist lines of one amplifier. */
export type Amplifier = (pins: Pins) => string[];

const SLEW_NODE_FARAD = 1e-9;

/** More than this, and the rounding of the solution shows at the output: up to 1e-7 V at 1e9. */
const ENDLESS = 1e8;
const GAIN_NODE_OHM = 1e3;

/** As good as ideal: the same gain at every frequency. */
export const ideal: Amplifier = ({ plus, minus, drive, tag }) => gainStage([plus, minus], [drive, '0'], { gain: ENDLESS, tag });

/** Gain as a current into a resistor: it rounds less than one controlled source of the whole gain. */
function gainStage(input: readonly [string, string], output: readonly [string, string], { gain, tag }: { gain: number; tag: string }): string[] {
  return [
    `g${tag} 0 y${tag} ${input.join(' ')} ${gain / GAIN_NODE_OHM}`,
    `ry${tag} y${tag} 0 ${GAIN_NODE_OHM}`,
    `e${tag} ${output.join(' ')} y${tag} 0 1`,
  ];
}

/** One pole: transconductance of 1 S into R and C, DC gain 1e9, unity-gain crossover at `gainBandwidth` Hz. */
export function onePole(gainBandwidth: number): Amplifier {
  return (pins) => [...pole(pins, gainBandwidth), `e${pins.tag} ${pins.drive} 0 y${pins.tag} 0 1`];
}

function pole({ plus, minus, tag }: Pins, gainBandwidth: number): string[] {
  const farad = 1 / (2 * Math.PI * gainBandwidth);
  return [`g${tag} 0 y${tag} ${plus} ${minus} 1`, `cy${tag} y${tag} 0 ${farad}`, `ry${tag} y${tag} 0 1e9`];
}

/** One pole whose current into the compensation capacitor is cut off hard at both ends: V/s. */
export function slewing(gainBandwidth: number, slewRate: number): Amplifier {
  const siemens = 2 * Math.PI * gainBandwidth * SLEW_NODE_FARAD;
  const most = slewRate * SLEW_NODE_FARAD;
  return ({ plus, minus, drive, tag }) => [
    `b${tag} 0 y${tag} i=min(max(${siemens}*(v(${plus})-v(${minus})),${-most}),${most})`,
    `cy${tag} y${tag} 0 ${SLEW_NODE_FARAD}`,
    `ry${tag} y${tag} 0 1e13`,
    `e${tag} ${drive} 0 y${tag} 0 1`,
  ];
}

/** What the output loses at a rail: a floor in volts and a resistance that carries the output current, ohm. */
export interface OutputLoss {
  readonly low: number;
  readonly high: number;
  readonly ohms: number;
}

/** One pole about half the supply, then a clamp between both rails, then a real resistor in series with the output. */
export function clamped(gainBandwidth: number, { low, high, ohms }: OutputLoss): Amplifier {
  return (pins) => [
    ...pole(pins, gainBandwidth),
    `b${pins.tag} k${pins.tag} 0 v=min(max(v(${pins.supply})/2+v(y${pins.tag}),${low}),v(${pins.supply})-${high})`,
    `ro${pins.tag} k${pins.tag} ${pins.drive} ${ohms}`,
  ];
}

/** Signed imperfections at DC. Volts, amperes (positive into the pins), V/V; an infinite rejection is no error. */
export interface Imperfections {
  readonly offset?: number;
  readonly intoPlus?: number;
  readonly intoMinus?: number;
  readonly commonModeRejection?: number;
  readonly supplyRejection?: number;
  readonly openLoopGain?: number;
}

/**
 * Offset (moving with common mode and supply) in series with the + input, currents into both pins, and finite gain about half
 * the supply. Controlled sources only, so that the operating point is one linear solution. `rated` is the supply of the offset, V.
 */
export function imperfect(errors: Imperfections, rated: number): Amplifier {
  const { offset = 0, intoPlus = 0, intoMinus = 0, openLoopGain = ENDLESS } = errors;
  const per = (rejection: number | undefined): number => (rejection === undefined ? 0 : 1 / rejection);
  return ({ plus, minus, drive, supply, tag }) => [
    `eh${tag} half${tag} 0 ${supply} 0 0.5`,
    `vr${tag} rated${tag} 0 ${rated}`,
    `vos${tag} a${tag} ${plus} ${offset}`,
    `ec${tag} b${tag} a${tag} ${plus} half${tag} ${per(errors.commonModeRejection)}`,
    `es${tag} c${tag} b${tag} ${supply} rated${tag} ${per(errors.supplyRejection)}`,
    ...gainStage([`c${tag}`, minus], [drive, `half${tag}`], { gain: openLoopGain, tag }),
    `ip${tag} ${plus} 0 dc ${intoPlus}`,
    `im${tag} ${minus} 0 dc ${intoMinus}`,
  ];
}
