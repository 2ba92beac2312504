import * as z from 'zod';

/** Where a figure came from, in one string. */
export const origin = z
  .string()
  .nullable()
  .meta({ id: 'origin', description: 'Where a figure came from: a cell (RFC 7111, approved.csv#cell=2,13), a generic set, a class, an assumption; null when not kept' });
