import { expect, it } from 'vitest';
import { compareFigure } from '../../src/checks/compare-figure.js';

const ASKED = { check: 'slew-rate', required: 5, unit: 'V/s', sense: 'at-least', because: '', source: '', corner: { supply: 3 } } as const;
const COMPARED = { figure: 'slewRate', kind: 'min', unit: 'V/s' } as const;

it('a figure stands beside its demand and tells where it would turn', () => {
  const reading = { value: 4, printed: 8, kind: 'typ', basis: 'derated', slot: 'slewRate.typ', how: 'typical' } as const;
  expect(compareFigure(ASKED, COMPARED, reading)).toEqual({
    kind: 'numbers', required: 5, unit: 'V/s', sense: 'at-least', offered: 4, basis: 'derated', slot: 'slewRate.typ', how: 'typical',
    turnsAt: { ...COMPARED, value: 5 }, corner: { supply: 3 },
  });
});

it('a missing figure is undecided', () => {
  expect(compareFigure(ASKED, COMPARED, null)).toMatchObject({ kind: 'undecided', missing: [{ figure: 'slewRate', kind: 'min' }], turnsAt: { value: 5 } });
});
