import * as z from 'zod';

/** A change that lets a part in. */
export const change = z
  .strictObject({
    set: z.record(z.string(), z.string()).describe('Fields of the stage and what they would become, as they are written: --set FIELD=TEXT'),
    design: z.string().optional().describe('What it means for the circuit'),
    factor: z.number().describe('How far the field moves, new to old or old to new, 1 or more; the largest of several. 20 °C count as twice, a swing given up as its share, words as 1'),
    fits: z.boolean().describe('Judged again in full'),
    lets: z.int().min(0).optional().describe('How many parts it lets in'),
    first: z.string().optional().describe('The first of them by the order asked for'),
  })
  .meta({ id: 'change', title: 'Change', description: 'A smallest set of changes with which every check passes' });

/** A way that no field of the stage stands for. */
export const advice = z
  .discriminatedUnion('kind', [
    z.strictObject({
      kind: z.literal('calibrate'),
      left: z.number().describe('DC error without the offset, V'),
      allowed: z.number().describe('V'),
      set: z.record(z.string(), z.string()).describe('What else must change'),
    }),
    z.strictObject({
      kind: z.literal('split'),
      gain: z.number().describe('Of each of two stages, V/V'),
      gainError: z.number().describe('Of each, as a fraction'),
      dcErrors: z.tuple([z.number(), z.number()]).nullable().describe('At the output of each, V; null where none is asked'),
    }),
  ])
  .meta({ id: 'advice', title: 'Advice', description: 'A way the stage file cannot say, computed beside it' });
