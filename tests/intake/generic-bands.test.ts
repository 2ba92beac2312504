import { describe, expect, it } from 'vitest';
import { figureSlot, PARAMETERS, type Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { RELATIONS, violations } from '../support/bands.js';
import { DIES, genericList } from '../support/generic-list.js';
import { INCOHERENT } from '../support/incoherent-sets.js';

// The generic sets are invented; what can be checked is that an amplifier could have such figures. The relations stand in
// tests/support/*-bands.ts, each with its source.

describe('the relations', () => {
  it('have names of their own and a source each', () => {
    expect(new Set(RELATIONS.map(({ name }) => name)).size).toBe(RELATIONS.length);
    for (const { name, source } of RELATIONS) expect(source.length, name).toBeGreaterThan(20);
  });

  it.each(INCOHERENT)('refuse $claim, for "$relation" and nothing else', ({ relation, part }) => {
    const found = violations(part);
    expect(found.map((one) => one.relation)).toEqual([relation]);
    const [one] = found;
    expect(one?.source).toBe(RELATIONS.find(({ name }) => name === relation)?.source);
    expect(one === undefined || (one.value >= one.band[0] && one.value <= one.band[1])).toBe(false);
  });

  it('refuse each something that no other refuses: none could be left out', () => {
    expect(new Set(INCOHERENT.map(({ relation }) => relation))).toEqual(new Set(RELATIONS.map(({ name }) => name)));
  });

  it('say nothing of figures that are not known', () => {
    for (const part of DIES) expect(violations({ ...part, figures: [] }), part.id).toEqual([]);
  });

  it('speak about every figure that is a number of the amplifier itself', () => {
    // Without the figure, some relation has fewer values for some set. Thermal resistance belongs to the package.
    const values = (part: Part): number => RELATIONS.reduce((sum, relation) => sum + relation.values(part).length, 0);
    const silent = (Object.keys(PARAMETERS) as Parameter[]).filter((parameter) =>
      DIES.every((part) => values({ ...part, figures: part.figures.filter((figure) => figure.parameter !== parameter) }) === values(part)),
    );
    expect(silent).toEqual(['minimumStableGain', 'thermalResistance']);
  });
});

describe('every generic set', () => {
  it.each(genericList.parts.map((part) => [part.id, part] as const))('%s lies in all bands', (_, part) => {
    expect(violations(part)).toEqual([]);
  });
});

/** What sets of one process or one convention share without being related: it is left out of the comparison. */
const CONVENTIONS: ReadonlySet<Parameter> = new Set([
  'supplyVoltage', 'supplyAbsoluteMaximum', 'inputLowHeadroom', 'inputHighHeadroom', 'minimumStableGain', 'temperature', 'junctionTemperature', 'thermalResistance',
]);
/** Logarithms this close are one ratio: 2 %. */
const SAME = 0.02;

function logarithms(part: Part): Map<string, number> {
  return new Map(part.figures.filter(({ parameter, value }) => !CONVENTIONS.has(parameter) && value > 0).map((figure) => [figureSlot(figure), Math.log(figure.value)]));
}

/** How many of the shared figures have one and the same ratio, at most. */
function alike(one: ReadonlyMap<string, number>, other: ReadonlyMap<string, number>): { shared: number; same: number } {
  const ratios = [...one].flatMap(([slot, value]) => (other.has(slot) ? [value - (other.get(slot) ?? 0)] : [])).sort((a, b) => a - b);
  let [same, from] = [0, 0];
  ratios.forEach((ratio, to) => {
    while (ratio - (ratios[from] ?? ratio) > SAME) from += 1;
    same = Math.max(same, to - from + 1);
  });
  return { shared: ratios.length, same };
}

describe('no two sets are one set multiplied by something', () => {
  const compared = DIES.map((part) => ({ id: part.id, figures: logarithms(part) }));

  it('not even in all figures but two, nor in half of them', () => {
    const related = compared.flatMap((one, at) =>
      compared.slice(at + 1).flatMap((other) => {
        const { shared, same } = alike(one.figures, other.figures);
        expect(shared, `${one.id} and ${other.id} share too few figures to compare`).toBeGreaterThan(6);
        return same >= shared - 2 || same > shared / 2 ? [`${one.id} and ${other.id}: ${same} of ${shared}`] : [];
      }),
    );
    expect(related).toEqual([]);
  });

  it('and the test sees one that is', () => {
    const [part] = DIES;
    if (part === undefined) throw new Error('no sets');
    const twice = { ...part, figures: part.figures.map((figure, at) => ({ ...figure, value: figure.value * (at % 11 === 5 ? 3 : 2) })) };
    const { shared, same } = alike(logarithms(part), logarithms(twice));
    expect(same).toBeGreaterThan(shared / 2);
  });
});
