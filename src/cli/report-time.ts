import type { Problem } from '../quantities/problem.js';
import { commandProblem } from './request-error.js';
import type { Session } from './session.js';

/** ISO 8601 date and time with zone. */
const MOMENT = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(?::\d{2}(?:\.\d{1,3})?)?(?:Z|[+-]\d{2}:\d{2})$/u;
const LATEST_SECOND = 253_402_300_799;

/** When a report is made: `--time`, else SOURCE_DATE_EPOCH (reproducible-builds.org), else the clock. */
export function timeOf({ time }: { readonly time?: string }, env: Session['env']): { readonly time: string; readonly problem: Problem | null } {
  const epoch = env['SOURCE_DATE_EPOCH'] ?? '';
  if (time !== undefined) return { time, problem: MOMENT.test(time) && !Number.isNaN(Date.parse(time)) ? null : refused(`--time ${time}`, '--time 2026-03-14T09:30:00Z', '--time') };
  if (epoch === '') return { time: stamp(new Date()), problem: null };
  const seconds = Number(epoch);
  if (!/^\d+$/u.test(epoch) || seconds > LATEST_SECOND) return { time: '', problem: refused(`SOURCE_DATE_EPOCH ${epoch}`, 'seconds since 1970, such as 1773480600', 'SOURCE_DATE_EPOCH') };
  return { time: stamp(new Date(seconds * 1000)), problem: null };
}

const stamp = (moment: Date): string => `${moment.toISOString().slice(0, 19)}Z`;

const refused = (what: string, fix: string, path: string): Problem => commandProblem('C104', `${what}: a time is a date, a time of day and a zone`, { fix, path });
