import * as z from 'zod';
import { envelope } from './envelope.js';

const saved = z.strictObject({
  file: z.string().describe('The stage file, as it can be typed'),
  part: z.string().nullable().describe('The part chosen for it; null while none is'),
  name: z.string().nullable().describe('Of the stage; null when it has none, or no longer reads'),
  problem: z.string().nullable().describe('Why the file is no stage now; null when it is one'),
});

/** `railfit stages --json` */
export const stages = envelope('stages', "The team's stage files, kept by path", {
  done: z.enum(['list', 'add', 'remove']),
  files: z.array(z.string()).describe('The files it was done to'),
  stages: z.array(saved).describe('What is saved now, by path'),
});
