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

/** As good as ideal: gain 1e9 at every frequency. */
export const ideal: Amplifier = ({ plus, minus, drive, tag }) => [`e${tag} ${drive} 0 ${plus} ${minus} 1e9`];

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
 * Offset (moving with common mode and supply), currents into both pins and finite gain about half the supply. `rated` is the
 * supply the offset is rated at.
 */
export function imperfect(errors: Imperfections, rated: number): Amplifier {
  const { offset = 0, intoPlus = 0, intoMinus = 0, openLoopGain = 1e9 } = errors;
  const per = (rejection: number | undefined): number => (rejection === undefined ? 0 : 1 / rejection);
  return ({ plus, minus, drive, supply, tag }) => {
    const moved = `${offset}+${per(errors.commonModeRejection)}*(v(${plus})-v(${supply})/2)+${per(errors.supplyRejection)}*(v(${supply})-${rated})`;
    return [
      `b${tag} ${drive} 0 v=v(${supply})/2+${openLoopGain}*(v(${plus})-v(${minus})+${moved})`,
      `ip${tag} ${plus} 0 dc ${intoPlus}`,
      `im${tag} ${minus} 0 dc ${intoMinus}`,
    ];
  };
}
