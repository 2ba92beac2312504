import { describe, expect, it } from 'vitest';
import { outlinesOf, shortlist } from '../../src/engine.js';
import { SAMPLE_PARTS, sampleSource, sampleStage } from '../support/sample-report.js';

type Changes = Readonly<Record<string, string>>;
const shown = (changes: Changes, answer = shortlist(sampleStage(changes), sampleSource())): unknown => ({
  counts: answer.counts,
  fit: answer.fit.flatMap((line) => [line, ...line.variants].map(({ part }) => part.id)),
});

/** Everything that is slow or rests on functions of the stage is asked too. */
const WHOLE: Changes = { 'load.capacitance': '220 pF', 'limits.outputNoise': '2 mVrms', 'limits.distortion': '-50 dB', 'limits.settling': '{within: 200 µs, to: 1 %}' };
const SWEPT: readonly (readonly [string, readonly string[]])[] = [
  ['supply', ['2.7 V', '2.8 V', '3 V', '3.3 V', '5 V', '5.5 V', '6 V', '3 V']],
  ['temperature', ['25 °C', '-20..40 °C', '-40..85 °C', '-40..125 °C']],
  ['gain', ['2', '4', '7', '8']],
  ['signal.frequency', ['100 Hz', '2 kHz', '5 kHz', '20 kHz', '50 kHz']],
  ['load.resistance', ['500 Ω', '1 kΩ', '10 kΩ', '1 MΩ']],
  ['limits.dcError', ['1 mV', '10 mV', '20 mV', '50 mV', '10 mV']],
  ['limits.supplyCurrent', ['20 µA', '50 µA', '70 µA', '90 µA']],
  ['limits.outputNoise', ['20 µVrms', '100 µVrms', '300 µVrms', '2 mVrms']],
  ['limits.distortion', ['-90 dB', '-70 dB', '-50 dB', '-30 dB']],
  ['limits.phaseMargin', ['30°', '60°', '80°', '30°']],
  ['limits.gainError', ['0.01 %', '0.1 %', '1 %', '5 %']],
  ['limits.settling.within', ['5 µs', '50 µs', '200 µs']],
  ['limits.swingLoss', ['0 mV', '100 mV']],
  ['wishes.price', ['0.3 EUR', '1 EUR']],
];

describe('outlines of many stages in a row', () => {
  it.each(SWEPT)('over %s are the shortlists one by one', (path, values) => {
    const outline = outlinesOf(sampleSource());
    for (const value of values) {
      const changes = { ...WHOLE, [path]: value };
      const { counts, fit, first } = outline(sampleStage(changes));
      expect({ counts, fit }, value).toEqual(shown(changes));
      expect(first).toBe(fit[0] ?? null);
    }
  });

  it('hold across fields that change together', () => {
    const outline = outlinesOf(sampleSource());
    for (const changes of [{}, WHOLE, { supply: '5 V' }, { ...WHOLE, supply: '5 V' }, { ...WHOLE, 'limits.dcError': '12 mV' }, {}]) {
      const { counts, fit } = outline(sampleStage(changes));
      expect({ counts, fit }).toEqual(shown(changes));
    }
  });

  it('go by the asking', () => {
    const asking = { strict: true, order: 'price', assumed: [] } as const;
    const { counts, fit } = outlinesOf(sampleSource(), asking)(sampleStage());
    expect({ counts, fit }).toEqual(shown({}, shortlist(sampleStage(), sampleSource(), asking)));
    expect(counts.parts).toBe(SAMPLE_PARTS.length);
  });
});
