import type { Figure, Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { figuresOf } from './band-figures.js';

export const RAILS = ['outputLowHeadroom', 'outputHighHeadroom'] as const satisfies readonly Parameter[];
export type Rail = (typeof RAILS)[number];

/** One swing row: head-room, V, at a current towards the rail, A, on the supply it is rated at, V. */
export interface SwingRow {
  readonly supply: number;
  readonly current: number;
  readonly headroom: number;
}

/** Rows of one rail and supply, lightest first. */
export interface SwingCurve {
  readonly rail: Rail;
  readonly supply: number;
  readonly rows: readonly SwingRow[];
}

/** The limit of every load, else its typical figure; rows whose load helps towards the rail are left out. */
export function swingCurves(part: Part): SwingCurve[] {
  return RAILS.flatMap((rail) => {
    const rows = figuresOf(part, rail).flatMap((figure) => (isShadowed(part, figure) ? [] : (rowOf(figure) ?? [])));
    const supplies = [...new Set(rows.map(({ supply }) => supply))].sort((a, b) => a - b);
    return supplies.map((supply) => ({ rail, supply, rows: rows.filter((row) => row.supply === supply).sort((a, b) => a.current - b.current || a.headroom - b.headroom) }));
  });
}

/** A typical row beside a limit of the same load. */
function isShadowed(part: Part, figure: Figure): boolean {
  if (figure.kind !== 'typ') return false;
  return figuresOf(part, figure.parameter, 'max').some(({ condition }) => JSON.stringify(condition) === JSON.stringify(figure.condition));
}

/** Null for a load that helps the output towards its own rail: nothing flows against it there. */
function rowOf({ parameter, condition, value: headroom }: Figure): SwingRow | null {
  const { load, supply } = condition;
  if (load === undefined || supply === undefined) throw new Error('a generic swing row states load and supply');
  if (load.kind === 'current') return { supply, headroom, current: load.amperes };
  const ownRail = parameter === 'outputLowHeadroom' ? 'ground' : 'supply';
  if (load.to === ownRail) return null;
  const across = (load.to === 'mid-supply' ? supply / 2 : supply) - headroom;
  return { supply, headroom, current: across / load.ohms };
}

/** Head-room at a current within the rows, straight between two of them; null outside. */
export function headroomAt(rows: readonly SwingRow[], current: number): number | null {
  const at = rows.findIndex((row) => row.current >= current);
  const [lower, upper] = [rows[at - 1], rows[at]];
  if (upper === undefined || lower === undefined) return upper?.current === current ? upper.headroom : null;
  return lower.headroom + ((current - lower.current) / (upper.current - lower.current)) * (upper.headroom - lower.headroom);
}

/** Resistance of the output device between the two heaviest rows, Ω; null with fewer than two. */
export function heavyResistance(rows: readonly SwingRow[]): number | null {
  const [lighter, heaviest] = [rows.at(-2), rows.at(-1)];
  if (lighter === undefined || heaviest === undefined || heaviest.current <= lighter.current) return null;
  return (heaviest.headroom - lighter.headroom) / (heaviest.current - lighter.current);
}
