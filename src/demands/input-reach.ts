import type { PinNetwork } from '../formulas/pin-network.js';
import type { Stage, Vertex } from '../stage/index.js';
import type { InputReach } from './hazard-demand.js';
import { pinsAreStill } from './input-range.js';

/** How far an input of the stage may leave the rails, and what stands between it and the amplifier. */
export function inputReach(stage: Stage): InputReach {
  const { overdrive, sequencing } = stage.asked;
  const unpowered = sequencing === null ? null : sequencing === 'supply-first' ? 0 : Math.max(...stage.vertices.map(drivenTo));
  return { beyond: overdrive?.value ?? null, unpowered, series: seriesResistance(stage), still: pinsAreStill(stage) };
}

/** Names of inputs that are no voltages. */
const NO_VOLTS: ReadonlySet<string> = new Set(['current', 'elapsed', 'level']);

/** Largest voltage at the inputs of the stage, V; of a shunt to ground what stands at the pins. */
function drivenTo({ inputs, commonMode }: Vertex): number {
  const volts = Object.entries(inputs).filter(([name]) => !NO_VOLTS.has(name)).map(([, value]) => Math.abs(value));
  return volts.length === 0 ? Math.abs(commonMode) : Math.max(...volts);
}

/** Least resistance from the signal to an input of the amplifier, Ω; 0 where a pin is the signal itself, or none is reached. */
function seriesResistance({ network }: Stage): number {
  if (network === null) return 0;
  const paths = [network.plus, network.minus].map((pin) => pathFrom(pin, pin.pin, new Set())).filter(Number.isFinite);
  return paths.length === 0 ? 0 : Math.min(...paths);
}

/** Nodes a signal does not pass through: each holds its own voltage. */
const HELD: ReadonlySet<string> = new Set(['output', 'ground']);

function pathFrom(network: PinNetwork, node: string, seen: ReadonlySet<string>): number {
  if (node === 'input') return 0;
  if (HELD.has(node) || seen.has(node)) return Infinity;
  const onward = network.elements.flatMap(({ kind, value, between: [a, b] }) => {
    const far = a === node ? b : b === node ? a : null;
    return far === null ? [] : [(kind === 'resistor' ? value : 0) + pathFrom(network, far, new Set([...seen, node]))];
  });
  return Math.min(Infinity, ...onward);
}
