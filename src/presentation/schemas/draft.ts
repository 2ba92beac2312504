import * as z from 'zod';
import { envelope } from './envelope.js';

/** `railfit draft --json` */
export const draft = envelope('draft', 'A commented stage file to fill in', {
  topology: z.string(),
  coupling: z.enum(['dc', 'ac']),
  file: z.string().nullable().describe('The file it was written to; null when to none'),
  text: z.string().describe('The stage file, YAML'),
});
