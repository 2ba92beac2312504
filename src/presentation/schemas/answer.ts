import * as z from 'zod';
import { count, sha256 } from './measures.js';

/** How the answer was asked for. */
export const asking = z
  .strictObject({
    strict: z.boolean().describe('Only limits counted'),
    order: z.enum(['merit', 'price', 'current', 'margin']),
    assumed: z.array(z.string()).describe('PART.figure=VALUE as given'),
  })
  .meta({ id: 'asking', description: 'How the answer was asked for' });

/** What the answer rests on. */
export const data = z
  .strictObject({
    catalog: z.strictObject({
      parts: count('Parts in the catalog'),
      approved: count('Parts of the approved list'),
      generic: count('Generic sets'),
      sha256: sha256.describe('SHA-256 over all that can change an answer, hexadecimal'),
    }),
    rules: z.string().describe('Version of the judging rules'),
  })
  .meta({ id: 'data', description: 'What the answer rests on' });
