import type { JudgedPart } from './judged-part.js';

/** What a survey knows of a part. */
export type Surveyed = Pick<JudgedPart, 'part' | 'outcome' | 'proof' | 'deciding' | 'current' | 'likely'>;

/** A part as a survey knows it: what is listed of it is at hand, and it is judged in words when more is looked at. */
export function surveyedPart(known: Surveyed, judge: () => JudgedPart): JudgedPart {
  return {
    get part() { return known.part; },
    get outcome() { return known.outcome; },
    get proof() { return known.proof; },
    get deciding() { return known.deciding; },
    get current() { return known.current; },
    get likely() { return known.likely; },
    get verdicts() { return judge().verdicts; },
    get confirm() { return judge().confirm; },
    get hazards() { return judge().hazards; },
    get dynamicRange() { return judge().dynamicRange; },
    get batteryHours() { return judge().batteryHours; },
  };
}
