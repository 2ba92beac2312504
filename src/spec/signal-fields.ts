import type { FieldRow } from './field.js';

const VOLTS = 'a voltage or a range: 25 mV..330 mV';

/** What the stage is fed and must give. */
export const SIGNAL_FIELDS: readonly FieldRow[] = [
  { path: 'signal', shape: 'map', accepted: 'a map: {input: 25 mV..330 mV, frequency: 2 kHz}', example: '{input: 25 mV..330 mV, frequency: 2 kHz}', meaning: 'what the stage is fed and must give' },
  { path: 'signal.input', shape: 'quantity', kind: 'voltage', accepted: VOLTS, example: '25 mV..330 mV', meaning: 'DC-coupled: extremes at the stage input against ground', option: '--input' },
  { path: 'signal.output', shape: 'quantity', kind: 'voltage', accepted: 'a range: 0.2..2.64 V', example: '0.2..2.64 V', meaning: 'without gain: gain and reference are solved from it; else a cross-check' },
  { path: 'signal.amplitude', shape: 'quantity', kind: 'amplitude', bounds: { above: 0, why: 'an amplitude of 0 is no signal (a steady voltage is written as input)' }, accepted: 'an amplitude with its kind: 100 mVpk, 200 mVpp, 70 mVrms', example: '100 mVpk', meaning: 'AC-coupled, or DC-coupled together with center' },
  { path: 'signal.center', shape: 'quantity', kind: 'voltage', accepted: 'one voltage: 1.5 V', example: '1.5 V', meaning: 'DC-coupled: what the amplitude swings about, against ground' },
  { path: 'signal.coupling', shape: 'choice', words: ['dc', 'ac'], accepted: 'dc or ac', example: 'dc', meaning: 'ac: amplitude only, centred on the reference; default dc' },
  { path: 'signal.shape', shape: 'choice', words: ['sine', 'band-limited', 'step', 'pulse'], accepted: 'sine, band-limited, step or pulse', example: 'sine', meaning: 'form of the signal; default band-limited' },
  { path: 'signal.frequency', shape: 'quantity', kind: 'frequency', limit: 'max', bounds: { above: 0, why: 'the top of the band is above 0 Hz (leave the field out for a steady signal)' }, accepted: 'the top of the band or a range: 2 kHz, 20 Hz..2 kHz', example: '2 kHz', meaning: 'the band, of a pulse its repetition; without it slew rate and gain bandwidth are not asked', option: '--frequency' },
  { path: 'signal.edge', shape: 'quantity', kind: 'time', limit: 'max', bounds: { above: 0, why: 'an edge takes some time' }, accepted: 'a time: 100 µs', example: '100 µs', meaning: 'step and pulse: 10 % to 90 % time wanted at the output; without it slew rate is not asked' },
  { path: 'signal.duty', shape: 'quantity', kind: 'share', bounds: { above: 0, below: 1, why: 'a duty lies above 0 and below 1' }, accepted: 'a share of the period: 0.3, 30 %', example: '0.3', meaning: 'pulse: how much of the period it is high; AC-coupled without it, either side has room for the whole pulse' },
  { path: 'signal.observation', shape: 'quantity', kind: 'time', bounds: { above: 0, why: 'looking takes some time' }, accepted: 'a time: 10 s', example: '10 s', meaning: 'how long one looks: its inverse is the lowest frequency of the noise' },
  { path: 'signal.positive', shape: 'quantity', kind: 'voltage', accepted: VOLTS, example: '1.2..1.4 V', meaning: 'difference only: far end of the leg to the + input' },
  { path: 'signal.negative', shape: 'quantity', kind: 'voltage', accepted: VOLTS, example: '1.2..1.3 V', meaning: 'difference only: far end of the leg to the − input' },
  { path: 'signal.differential', shape: 'quantity', kind: 'voltage', accepted: VOLTS, example: '-50..50 mV', meaning: 'difference only: positive minus negative, together with commonMode' },
  { path: 'signal.commonMode', shape: 'quantity', kind: 'voltage', accepted: VOLTS, example: '1.2..1.3 V', meaning: 'difference only: mean of positive and negative' },
];
