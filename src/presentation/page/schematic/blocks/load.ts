import type { Stage } from '../../../../stage/index.js';
import { at, junction, wire, type Piece, type Symbols } from '../piece.js';
import { PIN, terminal } from '../symbols/amplifier.js';
import { ground, supplyBar } from '../symbols/ends.js';
import { capacitor, resistor } from '../symbols/passive.js';
import { farads, ohms, outputWords } from '../values.js';
import { referenceTerminal } from './reference.js';

/** Where feedback is taken from the output. */
export const OUT = at(476, PIN.output.y);

/** From the output pin past the feedback to the isolation resistor, the load and the terminal of the stage. */
export function loadSide(stage: Stage, symbols: Symbols): Piece[] {
  const { load } = stage;
  const { y } = OUT;
  const isolation = load?.isolation ?? 0;
  const after = isolation === 0 ? OUT.x + 24 : OUT.x + 92;
  const resistance = load?.resistance ?? null;
  const capacitance = load?.capacitance ?? 0;
  const first = after + 16;
  const second = resistance === null ? first : first + 80;
  const end = at((capacitance === 0 ? first : second) + 56, y);
  const places = [{ x: OUT.x + 10, y: y - 12, anchor: 'start' as const }, ...[0, 16, 32, 48].flatMap((up) => [{ x: end.x + 6, y: y - 14 - up, anchor: 'end' as const }, { x: end.x + 12, y: y + 4.5 + up, anchor: 'start' as const }])];
  return [
    wire(PIN.output, OUT),
    isolation === 0 ? wire(OUT, at(after, y)) : resistor(at(OUT.x + 10, y), at(after, y), { label: ohms('Riso', isolation), symbols }),
    ...(isolation === 0 ? [] : [wire(OUT, at(OUT.x + 10, y))]),
    wire(at(after, y), end),
    terminal(end, `out ${outputWords(stage)}`, places),
    ...(resistance === null ? [] : resistiveLoad(stage, { x: first, resistance, symbols })),
    ...(capacitance === 0 ? [] : [junction(at(second, y)), capacitor(at(second, y), at(second, y + 70), farads('CL', capacitance)), ground(at(second, y + 70))]),
  ];
}

function resistiveLoad(stage: Stage, { x, resistance, symbols }: { readonly x: number; readonly resistance: number; readonly symbols: Symbols }): Piece[] {
  const { y } = OUT;
  const label = ohms('RL', resistance);
  if (stage.load?.to === 'supply') return [junction(at(x, y)), resistor(at(x, y), at(x, y - 70), { label, symbols }), supplyBar(at(x, y - 70), 'V+')];
  const below = at(x, y + 70);
  const end = stage.load?.to === 'reference' ? referenceTerminal(stage, below, 1) : [ground(below)];
  return [junction(at(x, y)), resistor(at(x, y), below, { label, symbols }), ...end];
}
