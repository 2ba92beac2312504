import * as z from 'zod';
import { ends, span } from './measures.js';

const resistors = z.strictObject({
  feedback: z.number().describe('Feedback resistor, Ω'),
  input: z.number().describe('Input resistor, or the one to ground or reference of a non-inverting stage, Ω'),
  positiveInput: z.number().optional().describe('Difference only: input resistor of the + leg, Ω'),
  toReference: z.number().optional().describe('Difference only: resistor from the + input to the reference, Ω'),
  tolerance: z.number().describe('Tolerance of each, as a fraction'),
});

const load = z.strictObject({
  resistance: z.number().nullable().describe('Ω; null without a resistive load'),
  to: z.enum(['ground', 'supply', 'reference']).describe('Where the load goes'),
  capacitance: z.number().describe('F'),
});

/** The stage as every answer about one carries it. */
export const stage = z
  .strictObject({
    name: z.string().nullable().describe('As written in the stage file; null without one'),
    topology: z.string(),
    coupling: z.enum(['dc', 'ac']),
    supply: span('Supply', 'V'),
    supplyPeak: z.number().describe('Highest transient of the supply, V'),
    gain: z.number().describe('Signal gain at nominal resistors, V/V; negative when the stage inverts'),
    noiseGain: z.number().describe('Noise gain that sets bandwidth and stability, nominal resistors, V/V'),
    noiseGainCorners: ends('The same over the tolerance of the resistors', 'V/V'),
    dcNoiseGain: span('Noise gain at DC: what multiplies an offset', 'V/V'),
    output: ends('Extremes of the ideal output over all corners', 'V'),
    outputNominal: ends('Extremes of the ideal output at nominal values', 'V'),
    commonMode: ends('Extremes of the voltage at the inputs over all corners', 'V'),
    resistors: resistors.nullable().describe('Null for a stage without resistors'),
    frequency: z.number().nullable().describe('Top of the signal band, Hz; null when not given'),
    load: load.nullable().describe('Null without a load'),
    temperature: span('Ambient temperature', '°C'),
    resistorRejection: z.number().nullable().describe('Difference only: common-mode rejection that the resistors alone leave, V/V; null where it does not apply or is unlimited'),
    assumptions: z.array(z.string()).describe('Every default that was taken, one sentence each'),
  })
  .meta({ id: 'stage', title: 'Stage', description: 'The circuit the stage file and the options imply' });
