import * as z from 'zod';
import { envelope } from './envelope.js';

/** `railfit help --json` */
export const help = envelope('help', 'A page of long help', {
  topic: z.string().nullable().describe('Topic, command or message code; null for the overview'),
  text: z.string(),
});
