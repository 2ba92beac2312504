import { expect, it } from 'vitest';
import { compareWord } from '../../src/checks/compare-word.js';

const ASKED = { check: 'package', required: ['A', 'B'], unit: null, sense: 'one-of', because: '', source: '' } as const;

it('a word stands beside those asked for; none is undecided, never a word of its own', () => {
  expect(compareWord(ASKED, 'package', 'C')).toEqual({ kind: 'words', required: ['A', 'B'], offered: 'C' });
  expect(compareWord(ASKED, 'package', null)).toMatchObject({ kind: 'undecided', cause: 'missing-figure', missing: [{ figure: 'package', kind: null }] });
});
