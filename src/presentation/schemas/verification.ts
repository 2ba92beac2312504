import * as z from 'zod';
import { envelope } from './envelope.js';
import { count } from './measures.js';

const difference = z.strictObject({
  stage: z.string().nullable().describe('File or name of the stage; null for the page as a whole'),
  what: z.enum(['stage-file', 'catalog', 'rules', 'stage', 'demand', 'chosen', 'outcome', 'verdict', 'detail', 'page']),
  subject: z.string(),
  was: z.string().describe('In the report'),
  is: z.string().describe('Judged again'),
});

/** `railfit verify --json` */
export const verification = envelope('verification', 'A report judged again from what it carries, with the catalog in force', {
  file: z.string(),
  time: z.string().describe('When the report was made'),
  tool: z.strictObject({ was: z.string(), is: z.string() }),
  stages: count('Stages of the report'),
  outcome: z.enum(['same', 'differs']),
  differences: z.array(difference),
});
