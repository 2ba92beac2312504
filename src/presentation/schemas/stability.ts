import * as z from 'zod';

const priceTurn = z.strictObject({
  of: z.union([z.literal(0), z.literal(1)]).describe('0: the part that is ahead stays there up to this price; 1: the one behind leads below it'),
  now: z.number().nullable().describe('EUR; null when not known'),
  at: z.number().describe('EUR'),
  allowed: z.number().nullable().describe('EUR the stage allows, where that is less: beyond it the part does not fit'),
});

const weightTurn = z.strictObject({ share: z.enum(['margins', 'price', 'current']), at: z.number().describe('Weight of this share, the others 1') });

/** How far something would have to move for the order of two parts to turn. */
export const stability = z
  .strictObject({
    decidedBy: z.string().describe('Step of the order that decides as things stand'),
    prices: z.array(priceTurn).describe('Empty: no price turns it'),
    weights: z.array(weightTurn).describe('Empty: no weight of a share turns it'),
  })
  .meta({ id: 'stability', title: 'Stability', description: 'How far a price or the weight of a share would have to move for the order of two parts to turn' });
