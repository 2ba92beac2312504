import { describe, expect, it } from 'vitest';
import { judging, screen } from '../../src/screening/index.js';
import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { FULL, max, min, partOf, replacing } from '../support/parts.js';
import { dc, demandsOf, stageSpec, value } from '../support/stages.js';

const DEMANDS = demandsOf(stageSpec('follower', dc(1, 3, 2e3), { limits: { supplyCurrent: value(80e-6) } }));
const part = (id: string, figures: readonly Figure[]): Part => partOf(figures, { id });
const screened = (...parts: Part[]): ReturnType<typeof screen> => screen(judging(DEMANDS, parts, false), parts);

const GOOD = part('GOOD', FULL);
const OPEN = part('OPEN', replacing('slewRate'));
const THIRSTY = part('THIRSTY', replacing('quiescentCurrent', max('quiescentCurrent', 90e-6)));
const SLOW_AND_THIRSTY = part('SLOW', [...replacing('quiescentCurrent', max('quiescentCurrent', 1e-3)).filter(({ parameter }) => parameter !== 'slewRate'), min('slewRate', 100)]);

describe('the whole list judged', () => {
  const all = screened(SLOW_AND_THIRSTY, OPEN, GOOD, THIRSTY);

  it('stands in three groups, each in the order of the list', () => {
    expect(all.fit.map((one) => one.part.id)).toEqual(['GOOD']);
    expect(all.undecided.map((one) => one.part.id)).toEqual(['OPEN']);
    expect(all.rejected.map((one) => one.part.id)).toEqual(['SLOW', 'THIRSTY']);
  });

  it('counts each failing check, most frequent first; a part can count several times', () => {
    expect(all.rejections).toEqual([{ check: 'supply-current', parts: 2 }, { check: 'slew-rate', parts: 1 }]);
  });

  it('has the nearest rejected parts first', () => {
    expect(all.nearest.map((one) => one.part.id)).toEqual(['THIRSTY', 'SLOW']);
  });

  it('is empty of an empty list', () => {
    expect(screened()).toEqual({ fit: [], undecided: [], rejected: [], rejections: [], nearest: [] });
  });
});
