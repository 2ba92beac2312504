import { PARAMETERS, summaryOfLookup, type Lookup, type LookupList, type Parameter } from '../index.js';
import type { IdentityField } from '../intake/header-words.js';
import { writeSheet, type SheetField } from '../intake/write-sheet.js';

/** The look-ups as a sheet to fill in, in the order of their worth. */
export function lookupSheet({ datasheets }: LookupList): string {
  return writeSheet(
    datasheets.flatMap(({ parts }) =>
      parts.map(({ part, lookups }) => ({ id: part.id, wanted: lookups.map(summaryOfLookup).join('; '), fields: lookups.map(fieldOf) })),
    ),
  );
}

function fieldOf({ figure, kind, condition, wanted }: Lookup): SheetField {
  if (figure in PARAMETERS) return { parameter: figure as Parameter, kind: kind ?? 'typ', condition };
  if (figure === 'price') return { currency: String(wanted).split(':')[0] ?? 'EUR' };
  return { identity: figure as IdentityField };
}
