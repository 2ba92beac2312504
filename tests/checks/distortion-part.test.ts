import { expect, it } from 'vitest';
import { NONE, together } from '../../src/checks/distortion-part.js';

it('several causes as one keep their terms, what is missing and what is said', () => {
  const term = { name: 'clipping', value: 0.1, slot: null, basis: 'guaranteed', figure: null, how: null } as const;
  const missing = { figure: 'slewRate', kind: 'min' } as const;
  expect(together([NONE, { ...NONE, terms: [term] }, { ...NONE, missing: [missing], cautions: ['a word'] }])).toEqual({ terms: [term], missing: [missing], cautions: ['a word'] });
});
