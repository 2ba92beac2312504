import { describe, expect, it } from 'vitest';
import type { WishesSpec } from '../../src/spec/spec.js';
import { dc, demandsOf, stageSpec } from '../support/stages.js';

const of = (wishes: WishesSpec): ReturnType<typeof demandsOf> => demandsOf(stageSpec('follower', dc(1, 2), { wishes }));

describe('wishes', () => {
  it('ask nothing unless written', () => {
    const demands = of({ package: [] });
    expect([demands.channels, demands.package, demands.qualification, demands.status, demands.lifecycle, demands.price]).toEqual([null, null, null, null, null, null]);
  });

  it('ask for channels and price as numbers, for words as one of', () => {
    const demands = of({ channels: 2, package: ['A', 'B'], status: ['approved'], lifecycle: ['active', 'nrnd'], price: { amount: 1, currency: 'EUR', text: '1 EUR' } });
    expect(demands.channels).toMatchObject({ required: 2, sense: 'at-least' });
    expect(demands.package).toMatchObject({ required: ['A', 'B'], sense: 'one-of', unit: null });
    expect(demands.lifecycle).toMatchObject({ required: ['active', 'nrnd'] });
    expect(demands.status).toMatchObject({ required: ['approved'] });
    expect(demands.price).toMatchObject({ required: 1, unit: 'EUR', currency: 'EUR', sense: 'at-most' });
  });

  it('ask for a grade at least as good; any other word as it is', () => {
    expect(of({ qualification: 'AEC-Q100 grade 1' }).qualification?.required).toEqual(['AEC-Q100 grade 0', 'AEC-Q100 grade 1']);
    expect(of({ qualification: 'aec-q100 GRADE 0 ' }).qualification?.required).toEqual(['AEC-Q100 grade 0']);
    expect(of({ qualification: 'house rule 7' }).qualification?.required).toEqual(['house rule 7']);
  });
});
