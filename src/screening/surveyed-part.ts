import type { JudgedPart } from './judged-part.js';

/** A part that does not fit, as a survey knows it: what is listed of it is at hand, and it is judged in words when more is looked at. */
export function surveyedPart(known: Pick<JudgedPart, 'part' | 'outcome' | 'deciding' | 'current'>, judge: () => JudgedPart): JudgedPart {
  return {
    get part() { return known.part; },
    outcome: known.outcome,
    get deciding() { return known.deciding; },
    get current() { return known.current; },
    get proof() { return judge().proof; },
    get likely() { return judge().likely; },
    get verdicts() { return judge().verdicts; },
    get confirm() { return judge().confirm; },
    get hazards() { return judge().hazards; },
    get dynamicRange() { return judge().dynamicRange; },
    get batteryHours() { return judge().batteryHours; },
  };
}
