import { describe, expect, it } from 'vitest';
import { decide } from '../../src/verdicts/decide.js';
import type { NumberFinding, Remedy } from '../../src/verdicts/finding.js';
import { remarksOf, remediesOf } from '../../src/verdicts/remarks.js';

const CHECK = { id: 'phase-margin', title: 'phase margin', hasMargin: true };
const REMEDY: Remedy = { path: 'load.isolation', text: '47 Ω', offered: 50, cost: '' };
const finding = (offered: number, more: Partial<NumberFinding> = {}): NumberFinding => ({ kind: 'numbers', required: 45, offered, unit: '°', sense: 'at-least', basis: 'derated', ...more });

describe('what stands beside the numbers', () => {
  it('is left out where it does not apply', () => {
    expect(remarksOf(finding(1), [])).toEqual({});
    expect(remarksOf(finding(1, { notes: [] }), [])).toEqual({});
    expect(remarksOf({ kind: 'undecided', required: 1, unit: null, sense: null, cause: 'not-built', missing: [] }, [])).toEqual({});
    expect(remarksOf(finding(1, { adds: 'squares', termUnit: 'V', notes: ['a'] }), [REMEDY])).toEqual({ adds: 'squares', termUnit: 'V', notes: ['a'], remedies: [REMEDY] });
  });

  it('are remedies of every vertex', () => {
    expect(remediesOf({ kind: 'vertices', findings: [finding(1, { remedies: [REMEDY] }), finding(2)] })).toEqual([REMEDY]);
    expect(remediesOf({ kind: 'words', required: [], offered: '' })).toEqual([]);
  });
});

describe('a verdict', () => {
  const other: Remedy = { ...REMEDY, text: '10 Ω' };

  it('offers what helps on the worst reading, also where it shows the best, and nothing when it passes', () => {
    expect(decide(CHECK, finding(10, { remedies: [REMEDY] }), finding(20, { remedies: [other] }))).toMatchObject({ outcome: 'fail', offered: 20, remedies: [REMEDY] });
    expect(decide(CHECK, finding(10, { remedies: [REMEDY] }), finding(50))).toMatchObject({ outcome: 'unknown', remedies: [REMEDY] });
    expect(decide(CHECK, finding(50, { remedies: [REMEDY] }), finding(50)).remedies).toBeUndefined();
  });
});
