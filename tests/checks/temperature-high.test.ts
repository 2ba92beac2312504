import { describe, expect, it } from 'vitest';
import { max, min } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('temperature-high');
const upTo = (celsius: number): ReturnType<typeof stageSpec> => stageSpec('follower', dc(1, 2), { temperature: between(0, celsius) });

describe('highest temperature', () => {
  it.each([[85.1, 'pass'], [85, 'pass'], [84.9, 'fail']])('85 °C against a range up to %f °C: %s', (celsius, outcome) => {
    expect(judge(upTo(85), [max('temperature', celsius)])).toMatchObject({ outcome, required: 85, offered: celsius, margin: null });
  });

  it('is 70 °C where no range is specified: assumed, it can pass, not fail', () => {
    expect(judge(upTo(70), [min('temperature', -40)])).toMatchObject({ outcome: 'pass', offered: 70, basis: 'assumed' });
    expect(judge(upTo(70.1), [])).toMatchObject({ outcome: 'unknown', offered: 70, reason: 'assumed', decidesAt: { kind: 'max', value: 70.1 } });
  });
});
