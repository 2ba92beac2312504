import * as z from 'zod';
import { demand } from './demand.js';
import { envelope } from './envelope.js';
import { stage } from './stage.js';

/** `railfit demands --json` */
export const demands = envelope('demands', 'What the stage asks of any amplifier; no part was looked at', { stage, demands: z.array(demand) });
