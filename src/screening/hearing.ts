import { markOf } from '../demands/index.js';
import type { Readings } from '../parts/readings.js';

/** One question a check asked of the readings, and a mark of the answer. */
export interface Heard {
  readonly again: (readings: Readings) => unknown;
  readonly mark: string;
}

/** Readings that write down what is asked of them, and what they answer. A finding depends on nothing else of the part. */
export function hearing(readings: Readings, heard: Heard[]): Readings {
  const hear = <Answer>(again: (of: Readings) => Answer): Answer => {
    const answer = again(readings);
    heard.push({ again, mark: markOf(answer, '') });
    return answer;
  };
  return {
    identity: readings.identity,
    brief: readings.brief,
    figure: (parameter, end) => hear((of) => of.figure(parameter, end)),
    figureOrClass: (parameter) => hear((of) => of.figureOrClass(parameter)),
    figureOrAssumed: (parameter, assumed, end) => hear((of) => of.figureOrAssumed(parameter, assumed, end)),
    spread: (parameter) => hear((of) => of.spread(parameter)),
    offset: () => hear((of) => of.offset()),
    headroom: (side) => (question) => hear((of) => of.headroom(side)(question)),
    currentFromHeadroom: (side, supply) => hear((of) => of.currentFromHeadroom(side, supply)),
    bounded: (worst, best) => hear((of) => of.bounded(worst, best)),
    hasClass: (parameter) => hear((of) => of.hasClass(parameter)),
  };
}

/** Whether these readings answer all of it as it was answered before. */
export const hearsTheSame = (heard: readonly Heard[], readings: Readings): boolean => heard.every(({ again, mark }) => markOf(again(readings), '') === mark);
