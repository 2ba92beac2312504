import { describe, expect, it } from 'vitest';
import { largerIsBetter, smallerIsBetter, twoSided, weightedGeometricMean } from '../../src/formulas/desirability.js';
import { undominated } from '../../src/formulas/dominance.js';
import { ENTRIES, published, rederived, type Given } from '../support/check-values.js';
import { closeness } from '../support/topsis.js';

type Part = readonly [name: string, margin: number, price: number, power: number];
interface Scales {
  readonly price: readonly [target: number, worst: number];
  readonly power: readonly [target: number, worst: number];
}

describe('desirability', () => {
  published('RNK-01', (of) => largerIsBetter({ value: of('y'), worst: of('L'), target: of('T'), exponent: of('s') }));
  published('RNK-03', (of) => {
    return twoSided({ value: of('y'), low: of('L'), target: of('T'), high: of('U'), rise: of('s'), fall: of('t') });
  });
  published('RNK-04', (of) => weightedGeometricMean(of.list('d').map((score) => ({ score, weight: 1 }))));
  rederived('RNK-04', {
    by: 'the cube root of the product',
    within: 1e-9,
    value: (of) => Math.cbrt(of.list('d').reduce((product, d) => product * d, 1)),
  });
  published('RNK-06', (of) => overall(['', of('margin'), of('price'), of('power')], scales(of)));
  published('RNK-09', (of) => best(parts(of), scales(of)));
  it('keeps the order of the others whatever part is taken away (Derringer & Suich 1980)', () => {
    const entry = ENTRIES.find(({ id }) => id === 'RNK-09')!;
    const all = entry.inputs['parts'] as readonly Part[];
    const fixed: Scales = { price: [0.5, 20], power: [0.1, 5] };
    const order = ranked(all, fixed);
    for (const gone of order) expect(ranked(all.filter(([name]) => name !== gone), fixed)).toEqual(order.filter((name) => name !== gone));
  });
  published('RNK-10', (of) => undominated(parts(of).map(([, margin, price, power]) => [margin, -price, -power])).length);
  it('lets clamped margins remove the over-specified part, which raw margins never do', () => {
    const all = ENTRIES.find(({ id }) => id === 'RNK-10')!.inputs['parts'] as readonly Part[];
    const left = undominated(all.map(([, margin, price, power]) => [Math.min(margin, 1.5), -price, -power]));
    expect(left.map((index) => all[index]![0])).toEqual(['just_enough', 'comfortable', 'marginal']);
  });
});

describe('TOPSIS, the rejected alternative', () => {
  const scores = (of: Given): readonly number[] => {
    return closeness(of.raw('matrix') as readonly (readonly number[])[], of.raw('benefit') as readonly boolean[]);
  };
  const winner = (of: Given): string => {
    const all = scores(of);
    return (of.raw('names') as readonly string[])[all.indexOf(Math.max(...all))]!;
  };
  published('RNK-05', (of) => scores(of)[2]!);
  published('RNK-07', winner);
  published('RNK-08', winner);
});

function parts(of: Given): readonly Part[] {
  return of.raw('parts') as readonly Part[];
}

function scales(of: Given): Scales {
  return { price: [of('price_T'), of('price_U')], power: [of('power_T'), of('power_U')] };
}

function overall([, margin, price, power]: Part, fixed: Scales): number {
  const cheap = (value: number, [target, worst]: readonly [number, number]): number =>
    smallerIsBetter({ value: Math.log(value), worst: Math.log(worst), target: Math.log(target) });
  const scores = [largerIsBetter({ value: margin, worst: 1, target: 1.5 }), cheap(price, fixed.price), cheap(power, fixed.power)];
  return weightedGeometricMean(scores.map((score) => ({ score, weight: 1 })));
}

function ranked(all: readonly Part[], fixed: Scales): readonly string[] {
  return [...all].sort((one, other) => overall(other, fixed) - overall(one, fixed)).map(([name]) => name);
}

function best(all: readonly Part[], fixed: Scales): string {
  return ranked(all, fixed)[0]!;
}
