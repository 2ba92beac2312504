import { cell } from './cells.js';
import type { Complex } from './complex.js';
import { HELD_NODES, reduceMesh, roomFor, starMesh, type Mesh, type PassiveElement, type ReducedMesh } from './star-mesh.js';

export type { PassiveElement } from './star-mesh.js';

/**
 * The passive network at one input of the amplifier. Reserved nodes: `output` (driven by the amplifier), `input` (driven by the
 * signal), `ground` (every AC ground). `pin` is the node of the amplifier's input; it may be reserved (follower: `output`).
 */
export interface PinNetwork {
  readonly elements: readonly PassiveElement[];
  readonly pin: string;
}

/** Voltage transfers to the pin (V/V), the other reserved nodes grounded, and the impedance there (Ω; 0 at a reserved node). */
export interface PinTransfer {
  readonly fromOutput: Complex;
  readonly fromInput: Complex;
  readonly impedance: Complex;
}

/** With every resistor's share of the noise at the pin: density² = 4kT·transfer, transfer in Ω = R·|transfer of its own noise voltage|². */
export interface PinResponse extends PinTransfer {
  readonly thermal: readonly { readonly name: string; readonly transfer: number }[];
}

/**
 * Everything the amplifier's input sees of its network at one frequency, exact. The thermal shares add up to Re(impedance).
 * @param network elements in Ω and F, above 0
 * @param frequency Hz, at least 0; at 0 capacitors are open
 * @param pinCapacitance F from the pin to ground, at least 0
 * @returns V/V, V/V, Ω, and Ω for every resistor
 * @example 9 kΩ from output to pin, 1 kΩ from pin to ground: fromOutput 0.1, impedance 900 Ω, thermal 90 Ω and 810 Ω
 * Source: nodal analysis; Nyquist, Thermal agitation of electric charge in conductors, Phys. Rev. 32, 1928.
 * @throws RangeError when a node has no path to a reserved node; at 0 Hz when it has none through resistors.
 */
export function pinResponse(network: PinNetwork, frequency: number, pinCapacitance = 0): PinResponse {
  return pinResponses(network, pinCapacitance)(frequency);
}

/**
 * The same for many frequencies of one network: sorted once, then asked again and again.
 * @param network elements in Ω and F, above 0
 * @param pinCapacitance F from the pin to ground, at least 0
 * @returns the response as a function of the frequency in Hz
 * @example pinResponses(divider)(1e3) is pinResponse(divider, 1e3)
 * Source: as pinResponse().
 */
export function pinResponses(network: PinNetwork, pinCapacitance = 0): (frequency: number) => PinResponse {
  const resistors = network.elements.filter(({ kind }) => kind === 'resistor');
  if (HELD_NODES.includes(network.pin)) {
    const silent = { ...heldPin(network.pin), thermal: resistors.map(({ name }) => ({ name, transfer: 0 })) };
    return () => silent;
  }
  const mesh = starMesh(network.elements, network.pin, pinCapacitance);
  const places = resistors.map(({ name, value, between: [a, b] }) => ({ name, value, a: mesh.nodes.indexOf(a), b: mesh.nodes.indexOf(b) }));
  const room = roomFor(mesh);
  return (frequency) => {
    const reduced = reduceMesh(mesh, frequency, room);
    const transfer = transferOf(mesh, reduced);
    const volts = voltagesPerAmpere(mesh, reduced, transfer.impedance);
    const thermal = places.map(({ name, value, a, b }) => {
      // Reciprocity: a noise current from a to b makes at the pin what 1 A into the pin makes between a and b.
      const x = cell(volts.re, a) - cell(volts.re, b);
      const y = cell(volts.im, a) - cell(volts.im, b);
      return { name, transfer: (x * x + y * y) / value };
    });
    return { ...transfer, thermal };
  };
}

/**
 * Only transfers and impedance, for many frequencies: half the work where no noise is asked.
 * @param network elements in Ω and F, above 0
 * @param pinCapacitance F from the pin to ground, at least 0
 * @returns V/V, V/V and Ω as a function of the frequency in Hz
 * @example pinTransfers({elements: [], pin: 'output'})(1e3).fromOutput is 1
 * Source: as pinResponse().
 */
export function pinTransfers(network: PinNetwork, pinCapacitance = 0): (frequency: number) => PinTransfer {
  if (HELD_NODES.includes(network.pin)) {
    const held = heldPin(network.pin);
    return () => held;
  }
  const mesh = starMesh(network.elements, network.pin, pinCapacitance);
  if (mesh.inner === 0) return (frequency) => dividedAt(mesh, frequency);
  const room = roomFor(mesh);
  return (frequency) => transferOf(mesh, reduceMesh(mesh, frequency, room));
}

/**
 * The transfer from the output alone: all that a loop asks of its network.
 * @param network elements in Ω and F, above 0
 * @param pinCapacitance F from the pin to ground, at least 0
 * @returns V/V as a function of the frequency in Hz
 * @example outputShare({elements: [], pin: 'output'})(1e3) is 1
 * Source: as pinResponse().
 */
export function outputShare(network: PinNetwork, pinCapacitance = 0): (frequency: number) => Complex {
  if (HELD_NODES.includes(network.pin)) {
    const { fromOutput } = heldPin(network.pin);
    return () => fromOutput;
  }
  const mesh = starMesh(network.elements, network.pin, pinCapacitance);
  if (mesh.inner === 0) return (frequency) => sharedAt(mesh, frequency);
  const room = roomFor(mesh);
  return (frequency) => transferOf(mesh, reduceMesh(mesh, frequency, room)).fromOutput;
}

function heldPin(pin: string): PinTransfer {
  const zero = { re: 0, im: 0 };
  const one = { re: 1, im: 0 };
  return { fromOutput: pin === 'output' ? one : zero, fromInput: pin === 'input' ? one : zero, impedance: zero };
}

/** As dividedAt(), of the output alone. */
function sharedAt(mesh: Mesh, frequency: number): Complex {
  const { conductance, capacitance } = mesh;
  const a = cell(conductance, 1);
  const p = cell(capacitance, 1) * 2 * Math.PI * frequency;
  const x = a + cell(conductance, 2) + cell(conductance, 3);
  const y = p + cell(capacitance, 2) * 2 * Math.PI * frequency + cell(capacitance, 3) * 2 * Math.PI * frequency;
  const square = x * x + y * y;
  if (!(square > 0 && square < Infinity)) return dividedAt(mesh, frequency).fromOutput;
  return { re: (a * x + p * y) / square, im: (p * x - a * y) / square };
}

/** Without an inner node the branches of the pin are the star already: the sums of transferOf() with nothing to take out before. */
function dividedAt(mesh: Mesh, frequency: number): PinTransfer {
  const { conductance, capacitance } = mesh;
  const susceptance = (at: number): number => cell(capacitance, at) * 2 * Math.PI * frequency;
  const [a, b, c] = [cell(conductance, 1), cell(conductance, 2), cell(conductance, 3)];
  const [p, q, r] = [susceptance(1), susceptance(2), susceptance(3)];
  const x = a + b + c;
  const y = p + q + r;
  const square = x * x + y * y;
  // Nothing hangs on the pin, or no frequency at all: the reduction says which.
  if (!(square > 0 && square < Infinity)) return transferOf(mesh, reduceMesh(mesh, frequency));
  return {
    fromOutput: { re: (a * x + p * y) / square, im: (p * x - a * y) / square },
    fromInput: { re: (b * x + q * y) / square, im: (q * x - b * y) / square },
    impedance: { re: (1 * x + 0 * y) / square, im: (0 * x - 1 * y) / square },
  };
}

/** The kept node as a star of three branches to output, input and ground. */
function transferOf({ nodes, inner }: Mesh, { re, im }: ReducedMesh): PinTransfer {
  const first = inner * nodes.length + inner + 1;
  const x = cell(re, first) + cell(re, first + 1) + cell(re, first + 2);
  const y = cell(im, first) + cell(im, first + 1) + cell(im, first + 2);
  const square = x * x + y * y;
  const share = (a: number, b: number): Complex => ({ re: (a * x + b * y) / square, im: (b * x - a * y) / square });
  return {
    fromOutput: share(cell(re, first), cell(im, first)),
    fromInput: share(cell(re, first + 1), cell(im, first + 1)),
    impedance: share(1, 0),
  };
}

/** Voltages of all nodes with 1 A driven into the pin and the reserved nodes grounded, V/A. */
function voltagesPerAmpere({ nodes, inner }: Mesh, weights: ReducedMesh, impedance: Complex): ReducedMesh {
  const size = nodes.length;
  const re = new Float64Array(size);
  const im = new Float64Array(size);
  re[inner] = impedance.re;
  im[inner] = impedance.im;
  for (let k = inner - 1; k >= 0; k -= 1) {
    let x = 0;
    let y = 0;
    for (let j = k + 1; j <= inner; j += 1) {
      const a = cell(weights.re, k * size + j);
      const b = cell(weights.im, k * size + j);
      x += a * cell(re, j) - b * cell(im, j);
      y += a * cell(im, j) + b * cell(re, j);
    }
    re[k] = x;
    im[k] = y;
  }
  return { re, im };
}
