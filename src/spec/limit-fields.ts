import type { FieldRow } from './field.js';

const ERROR_SHARE = { above: 0, below: 1, why: 'an error limit lies above 0 % and below 100 %' };

/** What the stage must keep: absent limits are not judged. */
export const LIMIT_FIELDS: readonly FieldRow[] = [
  { path: 'limits', shape: 'map', accepted: 'a map: {gainError: 1 %, dcError: 20 mV}', example: '{gainError: 1 %, dcError: 20 mV}', meaning: 'what the stage must keep; what is absent is not judged' },
  { path: 'limits.swingLoss', shape: 'quantity', kind: 'voltage', limit: 'max', bounds: { from: 0, why: 'swing that may be missing is never negative (margins.outputHeadroom asks for extra)' }, accepted: 'a voltage: 0 mV', example: '20 mV', meaning: 'how much of the wanted swing may be missing at each rail; default 0' },
  { path: 'limits.gainError', shape: 'quantity', kind: 'fraction', limit: 'max', bounds: ERROR_SHARE, accepted: 'a percentage: 1 %', example: '1 %', meaning: 'loss of gain at the top frequency; default 1 %' },
  { path: 'limits.gainErrorKind', shape: 'choice', words: ['magnitude', 'vector', 'corner'], accepted: 'magnitude or vector; corner for filters', example: 'magnitude', meaning: 'how the gain error is counted: in size, with its phase, or as a shift of the −3 dB frequency; default magnitude' },
  { path: 'limits.dcError', shape: 'quantity', kind: 'offset_limit', limit: 'max', bounds: { above: 0, why: 'no amplifier keeps an error of 0 V' }, accepted: 'a voltage: 20 mV', example: '20 mV', meaning: 'worst error at the output, at rest' },
  { path: 'limits.outputNoise', shape: 'quantity', kind: 'voltage', limit: 'max', bounds: { above: 0, why: 'no amplifier is without noise' }, accepted: 'an rms voltage: 300 µVrms', example: '300 µVrms', meaning: 'noise at the output over its bandwidth' },
  { path: 'limits.snr', shape: 'quantity', kind: 'ratio', limit: 'min', bounds: { above: 1, why: 'a signal-to-noise ratio that is asked lies above 0 dB' }, accepted: 'decibels: 70 dB', example: '70 dB', meaning: 'signal over noise at the output, instead of outputNoise' },
  { path: 'limits.distortion', shape: 'quantity', kind: 'ratio', limit: 'max', bounds: { above: 0, below: 1, why: 'distortion is a part of the signal: below 0 dB, above nothing' }, accepted: 'decibels or a percentage: -70 dB, 0.03 %', example: '-70 dB', meaning: 'harmonics over the signal at the output' },
  { path: 'limits.supplyCurrent', shape: 'quantity', kind: 'current', limit: 'max', bounds: { above: 0, why: 'no amplifier runs on no current' }, accepted: 'a current: 80 µA', example: '80 µA', meaning: 'quiescent current' },
  { path: 'limits.supplyCurrentPer', shape: 'choice', words: ['amplifier', 'package'], accepted: 'amplifier or package', example: 'amplifier', meaning: 'package counts the idle sections of duals and quads; default amplifier' },
  { path: 'limits.settling', shape: 'map', accepted: 'a map: {within: 20 µs, to: 0.1 %}', example: '{within: 20 µs, to: 0.1 %}', meaning: 'how soon the output must rest after a step' },
  { path: 'limits.settling.within', shape: 'quantity', kind: 'time', limit: 'max', bounds: { above: 0, why: 'settling takes some time' }, accepted: 'a time: 20 µs', example: '20 µs', meaning: 'time after the step' },
  { path: 'limits.settling.to', shape: 'quantity', kind: 'fraction', limit: 'max', bounds: ERROR_SHARE, accepted: 'a percentage: 0.1 %', example: '0.1 %', meaning: 'of the step, how near' },
  { path: 'limits.phaseMargin', shape: 'quantity', kind: 'angle', limit: 'min', bounds: { above: 0, below: 180, why: 'a phase margin lies above 0° and below 180°' }, accepted: 'an angle: 45°', example: '45°', meaning: 'at the true crossover, with load and input capacitance' },
  { path: 'limits.junctionTemperature', shape: 'quantity', kind: 'temperature', limit: 'max', bounds: { above: -273.15, why: 'nothing is colder than −273.15 °C' }, accepted: 'a temperature: 125 °C', example: '125 °C', meaning: 'highest chip temperature at the worst dissipation' },
  { path: 'limits.frequencyError', shape: 'quantity', kind: 'fraction', limit: 'max', bounds: ERROR_SHARE, accepted: 'a percentage: 3 %', example: '3 %', meaning: 'oscillator only: how far the amplifier may move the frequency from the ideal' },
];
