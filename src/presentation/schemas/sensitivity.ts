import * as z from 'zod';
import { unit } from './measures.js';

const end = z.strictObject({ offered: z.number().nullable(), outcome: z.enum(['pass', 'fail', 'unknown']) });

/** Whether a verdict hangs on borrowed or typical figures. */
export const sensitivity = z
  .strictObject({
    check: z.string(),
    on: z.enum(['borrowed', 'typical']),
    figures: z.array(z.string()),
    required: z.number(),
    unit,
    best: end.describe('Borrowed: they contribute nothing. Typical: as printed, taken for limits'),
    worst: end.describe('Borrowed: the worst of the class, taken for its own. Typical: derated'),
    depends: z.boolean().describe('The verdict is another at one of the two ends'),
    text: z.string(),
  })
  .meta({ id: 'sensitivity', title: 'Sensitivity', description: 'A verdict judged again with its weak figures at both ends' });
