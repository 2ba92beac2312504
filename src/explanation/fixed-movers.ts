import type { MovableInput } from '../spec/movable.js';
import type { Errand } from './boundary.js';
import type { Changing } from './changing.js';
import { endMover, limitMover, movable, valueMover, type Mover } from './movers.js';

/** Inputs that are usually kept fixed: which way each helps which checks. */
const HELPS: readonly { readonly path: string; readonly end: 'value' | 'min' | 'max'; readonly direction: 'up' | 'down'; readonly checks: readonly string[] }[] = [
  { path: 'signal.frequency', end: 'value', direction: 'down', checks: ['slew-rate', 'gain-bandwidth', 'distortion'] },
  { path: 'oscillator.frequency', end: 'value', direction: 'down', checks: ['slew-rate', 'frequency-error'] },
  { path: 'gain', end: 'value', direction: 'down', checks: ['gain-bandwidth', 'slew-rate', 'dc-error', 'noise', 'output-high'] },
  { path: 'supply', end: 'min', direction: 'up', checks: ['supply-low', 'input-high', 'output-high'] },
  { path: 'supply', end: 'value', direction: 'up', checks: ['supply-low', 'input-high', 'output-high'] },
  { path: 'supply', end: 'max', direction: 'down', checks: ['supply-high'] },
  { path: 'supplyPeak', end: 'value', direction: 'down', checks: ['supply-peak'] },
  { path: 'temperature', end: 'min', direction: 'up', checks: ['temperature-low'] },
  { path: 'temperature', end: 'max', direction: 'down', checks: ['temperature-high'] },
  { path: 'signal.input', end: 'min', direction: 'up', checks: ['input-low', 'output-low'] },
  { path: 'signal.input', end: 'max', direction: 'down', checks: ['input-high', 'output-high'] },
  { path: 'load.resistance', end: 'value', direction: 'up', checks: ['output-current', 'output-low', 'output-high'] },
  { path: 'load.capacitance', end: 'value', direction: 'down', checks: ['phase-margin'] },
  { path: 'source.resistance', end: 'value', direction: 'down', checks: ['dc-error', 'noise'] },
];

/** Movers of what may not move, where a check is in the way that they help; and limits that mayChange leaves out. */
export function fixedMovers(changing: Changing, { checks, bench }: Errand): Mover[] {
  const may = new Set(movable(changing).map(({ path }) => path));
  const fixed = changing.inputs.filter(({ path }) => !may.has(path));
  return [
    ...fixed.flatMap((input) => limitMover(input, bench.stage) ?? []),
    ...HELPS.flatMap(({ path, end, direction, checks: helped }) => {
      const input = fixed.find((one) => one.path === path);
      const touches = helped.filter((check) => checks.includes(check));
      const mover = input === undefined || touches.length === 0 ? null : moverOf(input, end, direction);
      return mover === null ? [] : [{ ...mover, touches }];
    }),
  ];
}

function moverOf(input: MovableInput, end: 'value' | 'min' | 'max', direction: 'up' | 'down'): Mover | null {
  if (input.form === 'value') return end === 'value' && input.value > 0 ? valueMover(input, direction) : null;
  return input.form === 'range' && end !== 'value' ? endMover(input, end) : null;
}
