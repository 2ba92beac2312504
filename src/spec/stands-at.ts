import type { StageSpec } from './spec.js';

/** Both ends of a field as the stage has it, SI. */
export interface Band {
  readonly min: number;
  readonly max: number;
  /** Null where only the ends are known. */
  readonly nominal: number | null;
  readonly text: string;
}

/** What the stage has at a dotted path; null where it has no number there. */
export function standsAt(spec: StageSpec, path: string): Band | null {
  const [first = '', ...rest] = path.split('.');
  const found = first === 'legs' ? legAt(spec, rest) : [first, ...rest].reduce<unknown>(memberOf, spec);
  return bandOf(found);
}

/** False where both ends are one. */
export const isBand = ({ min, max }: Band): boolean => min < max;

function legAt(spec: StageSpec, [name, ...rest]: readonly string[]): unknown {
  const leg = spec.legs?.find((one) => one.name === name);
  if (leg === undefined || rest.join('.') !== 'input') return rest.reduce<unknown>(memberOf, leg);
  return leg.level.kind === 'signal' ? leg.level.swing : null;
}

const memberOf = (of: unknown, key: string): unknown => (typeof of === 'object' && of !== null ? (of as Readonly<Record<string, unknown>>)[key] : undefined);

function bandOf(found: unknown): Band | null {
  const number = (key: string): number | null => {
    const value = memberOf(found, key);
    return typeof value === 'number' ? value : null;
  };
  const text = memberOf(found, 'text');
  const only = number('value');
  // A frequency band has a bottom and a top.
  const [min, max] = [number('min') ?? number('bottom') ?? number('top') ?? only, number('max') ?? number('top') ?? only];
  return min === null || max === null ? null : { min, max, nominal: number('nominal') ?? only, text: typeof text === 'string' ? text : '' };
}
