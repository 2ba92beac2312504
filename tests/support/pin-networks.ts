import type { FeedbackNetworks } from '../../src/formulas/feedback-loop.js';
import type { PassiveElement, PinNetwork } from '../../src/formulas/pin-network.js';
import { drawing } from './drawings.js';
import { amplifierLines, loadLines } from './live-amplifier.js';
import type { LiveStage } from './live-stage.js';

/** Nodes of a drawing that do not move with the signal. */
const STILL = ['0', 'stiff', 'vdd', 'other', 'bus'];

/**
 * The networks at both inputs as the product's formulas take them, read off the netlist of the drawing: resistors, capacitors and
 * wires; the output resistance and the load belong to them, the amplifier begins at the source before its output resistance.
 */
export function networksOf(stage: LiveStage): FeedbackNetworks {
  const drawn = drawing(stage.topology, stage.parts, stage.driven);
  const lines = [...drawn.lines, ...amplifierLines(drawn, stage.amplifier), ...loadLines(stage.load ?? {})];
  const joined = joiner(lines);
  const elements = lines.flatMap((line) => element(line, joined)).filter(({ between: [a, b] }) => a !== b);
  return { plus: around(joined(drawn.plus), elements), minus: around(joined(drawn.minus), elements) };
}

/** Wires make one node of two; the names the formulas reserve win. */
function joiner(lines: readonly string[]): (node: string) => string {
  const names = new Map<string, string>(STILL.map((node) => [node, 'ground']));
  names.set('in', 'input').set('behind', 'output');
  const find = (node: string): string => names.get(node) ?? node;
  const wires = lines.filter((line) => line.startsWith('vw')).map((line) => line.split(' ').slice(1, 3) as [string, string]);
  for (const _ of wires) {
    for (const [a, b] of wires) {
      const [x, y] = [find(a), find(b)];
      const kept = RESERVED.includes(x) || !RESERVED.includes(y) ? x : y;
      for (const node of new Set([a, b, ...names.keys()])) if ([x, y].includes(find(node))) names.set(node, kept);
    }
  }
  return find;
}

const RESERVED = ['output', 'input', 'ground'];

function element(line: string, joined: (node: string) => string): PassiveElement[] {
  const [name, a, b, value] = line.split(' ') as [string, string, string, string];
  const inside = ['y', 'q'].some((own) => a.startsWith(own));
  if (inside || !/^[rc]/.test(name)) return [];
  return [{ name, kind: name.startsWith('r') ? 'resistor' : 'capacitor', value: Number(value), between: [joined(a), joined(b)] }];
}

/** What hangs together with a pin without passing a reserved node. */
function around(pin: string, elements: readonly PassiveElement[]): PinNetwork {
  if (RESERVED.includes(pin)) return { elements: [], pin };
  const reached = new Set([pin]);
  for (const _ of elements) {
    for (const { between } of elements) {
      if (between.some((node) => reached.has(node))) for (const node of between) if (!RESERVED.includes(node)) reached.add(node);
    }
  }
  return { pin, elements: elements.filter(({ between }) => between.some((node) => reached.has(node))) };
}
