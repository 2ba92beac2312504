import { describe, expect, it } from 'vitest';
import { max, min } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { between, dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('temperature-low');
const from = (celsius: number): ReturnType<typeof stageSpec> => stageSpec('follower', dc(1, 2), { temperature: between(celsius, 60) });

describe('lowest temperature', () => {
  it.each([[-21, 'pass'], [-20, 'pass'], [-19.9, 'fail']])('-20 °C against a range from %f °C: %s', (celsius, outcome) => {
    expect(judge(from(-20), [min('temperature', celsius)])).toMatchObject({ outcome, required: -20, offered: celsius, margin: null, spare: celsius === -20 ? 0 : expect.closeTo(-20 - celsius, 12) as number });
  });

  it('is 0 °C where no range is specified: assumed, it can pass, not fail', () => {
    expect(judge(from(0), [max('temperature', 125)])).toMatchObject({ outcome: 'pass', offered: 0, basis: 'assumed' });
    expect(judge(from(-0.1), [])).toMatchObject({ outcome: 'unknown', offered: 0, reason: 'assumed', decidesAt: { figure: 'temperature', kind: 'min', value: -0.1 } });
  });
});
