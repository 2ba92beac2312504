import fc from 'fast-check';
import type { Loop } from '../../src/checks/phase-margin-loop.js';
import { decades, divider, FOLLOWING, GROUNDED } from '../formulas/networks.js';

/** Loops in which nothing leads. */
export const laggingLoops = fc.record({
  network: fc.oneof(fc.constant({ plus: GROUNDED, minus: FOLLOWING }), fc.tuple(decades(1e2, 1e6), decades(1e2, 1e6)).map(([rf, rg]) => ({ plus: GROUNDED, minus: divider(rf, rg) }))),
  inputCapacitance: fc.oneof(fc.constant(0), decades(1e-13, 1e-10)),
  ownPole: fc.oneof(fc.constant(Infinity), decades(1e4, 1e9)),
  load: fc.option(fc.record({ outputResistance: decades(1, 1e4), capacitance: decades(1e-12, 1e-6), resistance: fc.option(decades(1e2, 1e5)), isolation: fc.constant(0) })),
}).map((values): Loop => ({ ...values, open: null }));

/** Least and most gain bandwidth of a part, Hz. */
export const gainBandwidths = fc.tuple(decades(1e3, 1e8), fc.double({ min: 1.01, max: 5, noNaN: true })).map(([least, times]) => ({ least, most: least * times }));
