import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { undecidedLines } from '../../src/presentation/undecided-text.js';
import { shortlist } from '../../src/engine.js';
import { max } from '../support/parts.js';
import { SAMPLE_PARTS, sampleSource, sampleStage, styleOf } from '../support/sample-report.js';

const ASKING = { strict: false, order: 'merit', assumed: [] } as const;
/** Errors are of little account, room below the output is not: the offset is passed over by output low and open for the DC error. */
const STAGE = sampleStage({ 'limits.dcError': '300 mV' });

function reportWith(offset: readonly Figure[]): ReturnType<typeof shortlist> {
  const [known] = SAMPLE_PARTS;
  if (known === undefined) throw new Error('no sample part');
  const part: Part = { ...known, figures: [...known.figures.filter(({ parameter }) => parameter !== 'offsetVoltage'), ...offset] };
  return shortlist(STAGE, sampleSource([part]), ASKING);
}

describe('what cannot be decided', () => {
  it('fits at the value that every check holds at that reads the figure, open or passed over', () => {
    const text = undecidedLines(reportWith([]), styleOf(100)).join(' ');
    const [, millivolts = ''] = /offset voltage unknown: fits if ([\d.]+).mV.or.less/u.exec(text) ?? [];
    const turn = Number(millivolts) / 1e3;
    expect(turn).toBeGreaterThan(0);
    expect(reportWith([max('offsetVoltage', turn)]).counts).toMatchObject({ fit: 1 });
    expect(reportWith([max('offsetVoltage', turn * 1.01)]).counts).toMatchObject({ fit: 0 });
  });
});
