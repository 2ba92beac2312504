import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lagsOf } from '../../src/checks/phase-margin-lags.js';
import { atEitherEnd, isMarginLeft, marginAt, sideOfMargin, worstMargin, type Loop } from '../../src/checks/phase-margin-loop.js';
import { opened } from '../../src/checks/phase-margin-opened.js';
import { divider, GROUNDED } from '../formulas/networks.js';
import { gainBandwidths, laggingLoops } from '../support/arbitrary-loop.js';

const DIVIDER = { plus: GROUNDED, minus: divider(70e3, 10e3) };
const BARE: Loop = { network: DIVIDER, open: null, inputCapacitance: 0, ownPole: Infinity, load: null };
const LOAD = { outputResistance: 200, capacitance: 1e-9, resistance: null, isolation: 0 };

describe('an opened loop', () => {
  it('is the same one for a loop of the same values, and another for any other', () => {
    const loop = { ...BARE, inputCapacitance: 5e-12, ownPole: 3e6, load: LOAD };
    const first = opened(loop);
    expect(opened({ ...loop, load: { ...LOAD } })).toBe(first);
    expect(opened({ ...loop, stray: 0 })).toBe(first);
    const others: Loop[] = [
      { ...loop, inputCapacitance: 6e-12 }, { ...loop, stray: 1e-12 }, { ...loop, ownPole: 2e6 }, { ...loop, load: null }, { ...loop, network: { ...DIVIDER } },
      { ...loop, load: { ...LOAD, outputResistance: 201 } }, { ...loop, load: { ...LOAD, capacitance: 2e-9 } }, { ...loop, load: { ...LOAD, resistance: 1e3 } }, { ...loop, load: { ...LOAD, isolation: 10 } },
    ];
    for (const other of others) expect(opened(other)).not.toBe(first);
  });

  it('answers as if it were alone, whatever other loops of its network were asked in between', () => {
    const loops = Array.from({ length: 300 }, (_, at): Loop => ({ ...BARE, inputCapacitance: at * 1e-13, load: { ...LOAD, outputResistance: 100 + at } }));
    const fresh = loops.map((loop) => marginAt({ ...loop, network: { ...DIVIDER } }, 2e6));
    expect(loops.map((loop) => marginAt(loop, 2e6))).toEqual(fresh);
    expect(loops.toReversed().map((loop) => marginAt(loop, 2e6)).toReversed()).toEqual(fresh);
  });
});

describe('a loop that only lags', () => {

  it('has the very margin that the search over all gain bandwidths finds, to the last bit', () => {
    fc.assert(
      fc.property(laggingLoops, gainBandwidths, (loop, { least, most }) => {
        expect(opened(loop).onlyLags).toBe(true);
        const places = [most, least, Math.sqrt(least * most), least * (most / least) ** 0.25, least * (most / least) ** 0.75];
        const margins = places.map((gainBandwidth) => marginAt({ ...loop, network: { ...loop.network } }, gainBandwidth));
        const worst = worstMargin(loop, { least, most });
        expect(worst).toEqual({ margin: Math.min(...margins), gainBandwidth: places[margins.indexOf(Math.min(...margins))] });
        expect(atEitherEnd(loop, { least, most })).toBe(Math.min(margins[0]!, margins[1]!));
      }),
    );
  });

  it('is on the side of a limit that its crossover puts it on', () => {
    let early = 0;
    fc.assert(
      fc.property(laggingLoops, gainBandwidths, fc.double({ min: 1, max: 89, noNaN: true }), (loop, ends, required) => {
        const worst = worstMargin(loop, ends).margin;
        const side = sideOfMargin(loop, ends, required);
        expect(side >= required).toBe(worst >= required);
        expect(isMarginLeft(loop, ends, required)).toBe(atEitherEnd(loop, ends) >= required);
        if (side !== worst) early += 1;
      }),
      { numRuns: 500 },
    );
    expect(early).toBeGreaterThan(100);
    const at = { loop: { ...BARE, ownPole: 3e6, load: LOAD }, ends: { least: 1e6, most: 2e6 } };
    const exact = worstMargin(at.loop, at.ends).margin;
    // At the limit itself, and nearer to it than can be told beforehand, the crossover decides.
    for (const required of [exact, exact + 1e-7, exact - 1e-7]) expect(sideOfMargin(at.loop, at.ends, required)).toBe(exact);
  });

  it('is none where something leads: an isolation resistor, a capacitor of the network, feedback to the + input, a capacitor left to the part', () => {
    const capacitor = { name: 'feedback capacitor', kind: 'capacitor', value: 1e-12, between: ['output', 'n'] } as const;
    const leading: Loop[] = [
      { ...BARE, load: { ...LOAD, isolation: 10 } },
      { ...BARE, network: { ...DIVIDER, minus: { ...DIVIDER.minus, elements: [...DIVIDER.minus.elements, capacitor] } } },
      { ...BARE, network: { ...DIVIDER, plus: divider(1e6, 1e3) } },
      { ...BARE, open: { feedback: 70e3, inputCapacitance: 50e-12 } },
      { ...BARE, network: { ...DIVIDER, minus: { elements: DIVIDER.minus.elements, pin: 'elsewhere' } } },
    ];
    for (const loop of leading) expect([opened(loop).onlyLags, lagsOf(loop)]).toEqual([false, null]);
  });
});
