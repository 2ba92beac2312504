import { deriveDemands } from '../../src/demands/index.js';
import { sqlForm, TALLY } from '../screening/sql-form/statement.js';
import { stageOf } from './library.js';

/** The capacitance of the probe's cable asks for a phase margin, which SQL does not answer. */
const WITHOUT_CABLE = [{ path: 'load', text: '{resistance: 10 kΩ, to: ground}', option: '--set' }];

/**
 * The probe as SQL: both readings of every figure, head-room curves, classes, the sum of the DC error, tally and order by merit, everything but the phase
 * margin. Written to be a second opinion (`tests/screening/sql-form.test.ts`), not to be fast.
 */
export function wholeJob(stageFile: string): string {
  const demands = deriveDemands(stageOf(stageFile, WITHOUT_CABLE));
  return `${sqlForm(demands, { strict: false, order: 'merit' })}${TALLY};\nselect known.id from known join fitting using (key) order by line, place limit 20;\n`;
}
