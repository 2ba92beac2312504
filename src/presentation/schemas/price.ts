import * as z from 'zod';

export const price = z
  .strictObject({
    amount: z.number(),
    currency: z.string().describe('ISO 4217'),
    quantity: z.number().nullable().describe('Pieces it holds for; null when not stated'),
  })
  .nullable()
  .describe('Price of one; null when not known');
