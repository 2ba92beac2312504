import * as z from 'zod';
import { envelope } from './envelope.js';
import { problem } from './problem.js';

/** Printed in place of any document when the request, the data or the surroundings are at fault. */
export const problems = envelope('problems', 'Why there is no answer; the exit code says of which kind', { problems: z.array(problem) });
