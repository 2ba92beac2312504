import * as z from 'zod';
import { envelope } from './envelope.js';
import { tier } from './judged-part.js';
import { count } from './measures.js';

const line = z.strictObject({
  part: z.string().describe('Id of the part'),
  tier,
  description: z.string().nullable(),
  class: z.string().nullable(),
  failing: z.array(z.string()).optional().describe('Checks it fails, when a stage was named'),
});

/** `railfit parts --json` */
export const parts = envelope('parts', 'The catalog, or what matched of it', {
  counts: z.strictObject({
    catalog: count('Parts in the catalog'),
    parts: count('Parts that matched'),
    approved: count('Of these on the approved list'),
    generic: count('Of these generic sets'),
  }),
  parts: z.array(line),
});
