import fc from 'fast-check';
import type { FeedbackNetworks } from '../../src/formulas/feedback-loop.js';
import type { PassiveElement, PinNetwork } from '../../src/formulas/pin-network.js';

export function resistor(name: string, value: number, between: readonly [string, string]): PassiveElement {
  return { name, kind: 'resistor', value, between };
}

export function capacitor(name: string, value: number, between: readonly [string, string]): PassiveElement {
  return { name, kind: 'capacitor', value, between };
}

export const GROUNDED: PinNetwork = { elements: [], pin: 'ground' };
export const DRIVEN: PinNetwork = { elements: [], pin: 'input' };
export const FOLLOWING: PinNetwork = { elements: [], pin: 'output' };

/** Rf from the output, Rg to ground. */
export function divider(rf: number, rg: number): PinNetwork {
  return { elements: [resistor('Rf', rf, ['output', 'n']), resistor('Rg', rg, ['n', 'ground'])], pin: 'n' };
}

export function transimpedance(rf: number, cf: number, minusCapacitance: number): FeedbackNetworks {
  const elements = [resistor('Rf', rf, ['output', 'n']), capacitor('Cf', cf, ['output', 'n'])];
  return { plus: GROUNDED, minus: { elements, pin: 'n' }, minusCapacitance };
}

export function sallenKeyNetworks([r1, r2, c1, c2]: readonly [number, number, number, number], gain: number): FeedbackNetworks {
  const elements = [
    resistor('R1', r1, ['input', 'x']),
    resistor('R2', r2, ['x', 'p']),
    capacitor('C1', c1, ['x', 'output']),
    capacitor('C2', c2, ['p', 'ground']),
  ];
  return { plus: { elements, pin: 'p' }, minus: gain === 1 ? FOLLOWING : divider((gain - 1) * 1e4, 1e4) };
}

export function multipleFeedbackNetworks([r1, r2, r3]: readonly [number, number, number], [c1, c2]: readonly [number, number]): FeedbackNetworks {
  const elements = [
    resistor('R1', r1, ['input', 'x']),
    resistor('R2', r2, ['x', 'output']),
    resistor('R3', r3, ['x', 'n']),
    capacitor('C1', c1, ['x', 'ground']),
    capacitor('C2', c2, ['n', 'output']),
  ];
  return { plus: GROUNDED, minus: { elements, pin: 'n' } };
}

/** A value spread evenly over decades. */
export function decades(from: number, to: number): fc.Arbitrary<number> {
  return fc.double({ min: Math.log10(from), max: Math.log10(to), noNaN: true }).map((exponent) => 10 ** exponent);
}

/** Up to three inner nodes beside the pin, each held by a resistor, and capacitors anywhere. */
export const anyNetwork: fc.Arbitrary<PinNetwork> = fc.integer({ min: 0, max: 3 }).chain((inner) => {
  const free = [...Array.from({ length: inner }, (_, k) => `x${k}`), 'pin'];
  const held = ['output', 'input', 'ground'];
  const spine = free.map((node, k) => {
    return fc.record({ r: decades(1e2, 1e6), to: fc.constantFrom(...held, ...free.slice(0, k)) }).map(({ r, to }) => resistor(`R${k}`, r, [node, to]));
  });
  const extra = fc.record({ value: decades(1e2, 1e6), isResistor: fc.boolean(), a: fc.constantFrom(...free), b: fc.constantFrom(...held, ...free) });
  return fc.tuple(fc.tuple(...spine), fc.array(extra, { maxLength: 6 })).map(([resistors, extras]) => {
    const more = extras.map(({ value, isResistor, a, b }, k) => {
      return isResistor ? resistor(`X${k}`, value, [a, b]) : capacitor(`C${k}`, 1e-6 / value, [a, b]);
    });
    return { elements: [...resistors, ...more], pin: 'pin' };
  });
});

/** Stages with loops of all shapes; Q of the filters up to 20. */
export const anyStage: fc.Arbitrary<FeedbackNetworks> = fc
  .record({ r: decades(1e3, 1e6), f0: decades(1e2, 1e6), q: decades(0.5, 20), ratio: decades(1, 100), cin: decades(1e-12, 1e-10), kind: fc.integer({ min: 0, max: 3 }) })
  .map(({ r, f0, q, ratio, cin, kind }) => {
    const c = 1 / (2 * Math.PI * r * f0);
    const stages = [
      { plus: { elements: [resistor('Rs', r, ['input', 'p'])], pin: 'p' }, minus: divider(ratio * 1e3, 1e3), plusCapacitance: cin, minusCapacitance: cin },
      transimpedance(r, cin / ratio, cin),
      { ...sallenKeyNetworks([r, r, 2 * q * c, c / (2 * q)], 1), plusCapacitance: c / 1e3 },
      multipleFeedbackNetworks([r, r, r / 2], [3 * q * c, c / (1.5 * q)]),
    ];
    return stages[kind]!;
  });
