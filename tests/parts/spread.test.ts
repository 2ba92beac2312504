import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadReading } from '../../src/parts/spread.js';
import { assumed, min, typ, under } from '../support/parts.js';

const OPTIMISTIC = { outlook: 'optimistic' } as const;
const COLD = { coldest: -20, hottest: 60, nominalSupply: 5 };

describe('the spread of a gain bandwidth', () => {
  it('reaches from the derated typical to the typical', () => {
    const spread = spreadReading(under([typ('gainBandwidth', 1e6)]), 'gainBandwidth');
    expect(spread).toMatchObject({ ends: { least: 0.6e6, most: 1e6 }, basis: 'derated', slot: 'gainBandwidth.typ', how: 'typical × 0.6, up to the typical as printed' });
  });

  it('reaches from the minimum to the typical where both are known', () => {
    const spread = spreadReading(under([typ('gainBandwidth', 1e6), min('gainBandwidth', 0.7e6)]), 'gainBandwidth');
    expect(spread).toMatchObject({ ends: { least: 0.7e6, most: 1e6 }, basis: 'derated', slot: 'gainBandwidth.min', how: 'up to the typical' });
  });

  it('reaches from the minimum to what its typical would be where it stands alone, with --strict too', () => {
    const spread = spreadReading(under([min('gainBandwidth', 0.6e6)]), 'gainBandwidth');
    expect(spread).toMatchObject({ value: 0.6e6, basis: 'estimated', how: 'up to the limit × 1.67' });
    expect(spread!.ends!.most).toBeCloseTo(1e6, 6);
    const strict = spreadReading(under([min('gainBandwidth', 0.6e6), typ('gainBandwidth', 5e6)], { strict: true }), 'gainBandwidth');
    expect(strict!.ends!.most).toBeCloseTo(1e6, 6);
    expect(spreadReading(under([typ('gainBandwidth', 5e6)], { strict: true }), 'gainBandwidth')).toBeNull();
  });

  it('loses at its lower end alone what 25 °C figures lose away from there', () => {
    const spread = spreadReading(under([typ('gainBandwidth', 1e6, { temperature: 25 })], { operating: COLD }), 'gainBandwidth');
    expect(spread).toMatchObject({ ends: { least: 0.48e6, most: 1e6 }, basis: 'estimated' });
  });

  it('is the printed value alone on the best reading', () => {
    expect(spreadReading(under([typ('gainBandwidth', 1e6)], OPTIMISTIC), 'gainBandwidth')).toMatchObject({ ends: { least: 1e6, most: 1e6 } });
    expect(spreadReading(under([typ('gainBandwidth', 1e6), min('gainBandwidth', 0.7e6)], OPTIMISTIC), 'gainBandwidth')).toMatchObject({ ends: { least: 0.7e6, most: 0.7e6 } });
  });

  it('is free on the best reading of an assumed value, which can pass a check and not fail it', () => {
    const figures = [assumed(typ('gainBandwidth', 1e6))];
    expect(spreadReading(under(figures, OPTIMISTIC), 'gainBandwidth')).toMatchObject({ ends: null, basis: 'assumed' });
    expect(spreadReading(under(figures), 'gainBandwidth')).toMatchObject({ ends: { least: 0.6e6, most: 1e6 }, basis: 'assumed' });
  });

  it('always holds the printed value, so that the best reading is never the worse one', () => {
    const hertz = fc.double({ min: 1, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(hertz, hertz, fc.constantFrom([true, true], [true, false], [false, true]), (least, typical, [hasMin, hasTyp]) => {
        const figures = [...(hasMin ? [min('gainBandwidth', least)] : []), ...(hasTyp ? [typ('gainBandwidth', typical)] : [])];
        const worst = spreadReading(under(figures, { operating: COLD }), 'gainBandwidth')!.ends!;
        const best = spreadReading(under(figures, { operating: COLD, ...OPTIMISTIC }), 'gainBandwidth')!.ends!;
        expect(worst.least <= best.least && best.most <= worst.most).toBe(true);
      }),
    );
  });
});
