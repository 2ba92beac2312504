import type { Topology } from '../../src/spec/spec.js';

/** Component values of a drawing by name, Ω and F; what is absent is not fitted (a series resistor: a wire). */
export type Parts = Readonly<Record<string, number | undefined>>;

/** What is connected to a drawing: volts or amperes, or the text of a source (`dc 0 ac 1`, `sin(1 0.5 1k)`). */
export interface Driven {
  readonly supply?: number;
  readonly reference?: number;
  readonly input: number | string;
  /** The other leg of a difference stage; the bus of a high-side shunt. */
  readonly other?: number | string;
}

/** The passive part of a stage: the nodes of the amplifier's inputs (its output is `out`) and the netlist lines around them. */
export interface Drawing {
  readonly plus: string;
  readonly minus: string;
  readonly lines: readonly string[];
}

/** The stage of a topology as any textbook draws it, written here by hand; nothing of the product is looked at. */
export function drawing(topology: Topology, parts: Parts, driven: Driven): Drawing {
  const { plus, minus, lines } = DRAWINGS[topology](parts, driven);
  return { plus, minus, lines: [`vdd vdd 0 ${driven.supply ?? 5}`, ...reference(parts, driven), ...lines] };
}

/** A resistor; a wire when it is not fitted or has no resistance. */
const r = (name: string, nodes: string, ohms: number | undefined): string[] => [
  ohms === undefined || ohms === 0 ? `vw${name} ${nodes} 0` : `r${name} ${nodes} ${ohms}`,
];

/** A capacitor; nothing when it is not fitted. */
const c = (name: string, nodes: string, farad: number | undefined): string[] =>
  farad === undefined || farad === 0 ? [] : [`c${name} ${nodes} ${farad}`];

/** Reference source, its resistance, and the bypass across both. */
function reference({ referenceResistance, bypass }: Parts, driven: Driven): string[] {
  return [`vref stiff 0 ${driven.reference ?? 0}`, ...r('ref', 'stiff ref', referenceResistance), ...c('byp', 'ref 0', bypass)];
}

const voltage = (driven: Driven): string => `vin in 0 ${driven.input}`;

type Draw = (parts: Parts, driven: Driven) => Drawing;

const nonInverting: Draw = (parts, driven) => ({
  plus: 'p',
  minus: 'n',
  lines: [voltage(driven), ...r('s', 'in p', parts['source']), ...nonInvertingLoop(parts)],
});

const nonInvertingLoop = (parts: Parts): string[] => [
  ...r('f', 'out n', parts['feedback']),
  ...c('f', 'out n', parts['feedbackCapacitor']),
  ...r('g', 'n ref', parts['input']),
];

const DRAWINGS: Readonly<Record<Topology, Draw>> = {
  follower: (parts, driven) => ({ plus: 'p', minus: 'out', lines: [voltage(driven), ...r('s', 'in p', parts['source'])] }),
  'non-inverting': nonInverting,
  inverting: (parts, driven) => ({
    plus: 'ref',
    minus: 'n',
    lines: [
      voltage(driven),
      ...r('s', 'in leg', parts['source']),
      ...r('i', 'leg n', parts['input']),
      ...r('f', 'out n', parts['feedback']),
      ...c('f', 'out n', parts['feedbackCapacitor']),
    ],
  }),
  // Leg a carries the signal; legs b and c rest at levels that do not move.
  summing: (parts, driven) => ({
    plus: 'ref',
    minus: 'n',
    lines: [
      voltage(driven),
      ...r('a', 'in n', parts['a']),
      ...r('b', 'n 0', parts['b']),
      ...r('c', 'n vdd', parts['c']),
      ...r('f', 'out n', parts['feedback']),
    ],
  }),
  difference: (parts, driven) => ({
    plus: 'p',
    minus: 'n',
    lines: [voltage(driven), `vother other 0 ${driven.other ?? 0}`, ...differenceLegs(parts, ['in', 'other'])],
  }),
  // The diode's cathode at the node: light pulls current out of it.
  transimpedance: (parts, driven) => ({
    plus: 'ref',
    minus: 'n',
    lines: [`iin n 0 ${driven.input}`, ...c('d', 'n 0', parts['diode']), ...r('f', 'out n', parts['feedback']), ...c('f', 'out n', parts['feedbackCapacitor'])],
  }),
  'low-side-sense': (parts, driven) => ({
    plus: 'p',
    minus: 'n',
    lines: [`iin 0 sh ${driven.input}`, ...r('sh', 'sh 0', parts['shunt']), ...r('s', 'sh p', parts['source']), ...nonInvertingLoop(parts)],
  }),
  'high-side-sense': (parts, driven) => ({
    plus: 'p',
    minus: 'n',
    lines: [
      `vbus bus 0 ${driven.other ?? 0}`,
      ...r('sh', 'bus low', parts['shunt']),
      `iin low 0 ${driven.input}`,
      ...differenceLegs(parts, ['bus', 'low']),
    ],
  }),
  'sallen-key-low-pass': (parts, driven) => {
    const unity = parts['feedback'] === undefined;
    return {
      plus: 'p',
      minus: unity ? 'out' : 'n',
      lines: [
        voltage(driven),
        ...r('s', 'in leg', parts['source']),
        ...r('1', 'leg x', parts['r1']),
        ...r('2', 'x p', parts['r2']),
        ...c('1', 'x out', parts['c1']),
        ...c('2', 'p 0', parts['c2']),
        ...(unity ? [] : nonInvertingLoop(parts)),
      ],
    };
  },
  'multiple-feedback-low-pass': (parts, driven) => ({
    plus: 'ref',
    minus: 'n',
    lines: [
      voltage(driven),
      ...r('s', 'in leg', parts['source']),
      ...r('1', 'leg x', parts['r1']),
      ...r('2', 'x out', parts['r2']),
      ...r('3', 'x n', parts['r3']),
      ...c('1', 'x 0', parts['c1']),
      ...c('2', 'n out', parts['c2']),
    ],
  }),
  integrator: (parts, driven) => ({
    plus: 'ref',
    minus: 'n',
    lines: [voltage(driven), ...r('s', 'in leg', parts['source']), ...r('i', 'leg n', parts['input']), ...c('f', 'n out', parts['c'])],
  }),
  'relaxation-oscillator': (parts) => ({
    plus: 'p',
    minus: 'n',
    lines: [
      ...r('a', 'vdd p', parts['toSupply']),
      ...r('b', 'p 0', parts['toGround']),
      ...r('o', 'out p', parts['toOutput']),
      ...r('t', 'out n', parts['resistance']),
      ...c('t', 'n 0', parts['capacitance']),
    ],
  }),
};

/** Two matched legs: source resistance in each; R2 = feedback, R1 = input, R3 = positiveInput, R4 = toReference. */
function differenceLegs(parts: Parts, [positive, negative]: readonly [string, string]): string[] {
  return [
    ...r('sp', `${positive} lp`, parts['source']),
    ...r('sn', `${negative} ln`, parts['source']),
    ...r('3', 'lp p', parts['positiveInput'] ?? parts['input']),
    ...r('4', 'p ref', parts['toReference'] ?? parts['feedback']),
    ...r('1', 'ln n', parts['input']),
    ...r('2', 'out n', parts['feedback']),
  ];
}
