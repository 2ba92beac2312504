import type { Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import type { CellFault } from './cell-fault.js';

/** A wrong unit without a fix gets the first that can be read: per volt (`80 µV/V`), the prefix kept (100 mA → `100 mV`), the header's unit. */
export function withUnit(fault: CellFault, cell: string, { parameter, unit }: { readonly parameter: Parameter; readonly unit: string | null }): CellFault {
  if (fault.code !== 'Q004' || fault.fix !== undefined) return fault;
  const { field, headerUnit, unit: si } = PARAMETERS[parameter];
  const [, number, prefix = ''] = /^([<>≤≥]?\s*[+-]?[\d.]+)\s*([fpnµumkMG](?=\p{L}|Ω))?/u.exec(cell.trim()) ?? [];
  if (number === undefined) return fault;
  const kept = prefix !== '' && SIMPLE.has(si) ? [`${number} ${prefix}${si}`] : [];
  const offers = [...(field === 'ratio' ? [`${cell.trim()}/V`] : []), ...kept, `${number} ${unit ?? headerUnit}`];
  const fix = offers.find((offer) => parseQuantity(offer, field, {}).ok);
  return fix === undefined ? fault : { ...fault, fix };
}

/** Units that take every prefix. */
const SIMPLE: ReadonlySet<string> = new Set(['V', 'A', 'Hz', 'Ω', 'F']);
