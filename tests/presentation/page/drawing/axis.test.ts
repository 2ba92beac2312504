import { describe, expect, it } from 'vitest';
import { linearAxis, logAxis, roundedDecades } from '../../../../src/presentation/page/drawing/axis.js';

describe('axes', () => {
  it('put one prefix into the title of an even axis', () => {
    const axis = linearAxis({ words: 'error', unit: 'V', domain: [0, 0.035], pixels: [0, 350] });
    expect(axis.title).toBe('error (mV)');
    expect(axis.ticks.map(({ label }) => label)).toEqual(['0', '5', '10', '15', '20', '25', '30', '35']);
  });

  it('write a minus as a minus, and no minus before nothing', () => {
    expect(linearAxis({ words: 't', unit: '°C', domain: [-50, 50], pixels: [0, 100] }).ticks.map(({ label }) => label)).toEqual(['−40', '−20', '0', '20', '40']);
  });

  it('give every decade its prefix', () => {
    const axis = logAxis({ words: 'frequency', unit: 'Hz', domain: [10, 1e6], pixels: [0, 500] });
    expect(axis.ticks.map(({ label }) => label)).toEqual(['10\u00a0Hz', '100\u00a0Hz', '1\u00a0kHz', '10\u00a0kHz', '100\u00a0kHz', '1\u00a0MHz']);
  });

  it('leave out labels that would touch', () => {
    expect(logAxis({ words: 'frequency', unit: 'Hz', domain: [1, 1e9], pixels: [0, 120] }).ticks.length).toBeLessThan(4);
  });

  it('end at 1, 2 or 5', () => {
    expect(roundedDecades([0.07, 3.1])).toEqual([0.05, 5]);
    expect(roundedDecades([1, 10])).toEqual([1, 10]);
  });
});
