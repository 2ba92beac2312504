import * as z from 'zod';
import { ends, span } from './measures.js';

const resistors = z.strictObject({
  feedback: z.number().describe('Feedback resistor, Ω'),
  input: z.number().nullable().describe('Input resistor, or the one to ground or reference of a non-inverting stage, Ω; null where the signal is a current'),
  positiveInput: z.number().optional().describe('Difference only: input resistor of the + leg, Ω'),
  toReference: z.number().optional().describe('Difference only: resistor from the + input to the reference, Ω'),
  tolerance: z.number().describe('Tolerance of each, as a fraction'),
});

const load = z.strictObject({
  resistance: z.number().nullable().describe('Ω; null without a resistive load'),
  to: z.enum(['ground', 'supply', 'reference']).describe('Where the load goes'),
  capacitance: z.number().describe('F'),
  isolation: z.number().describe('Ω in series with the load, outside the feedback loop; 0 without'),
});

const filterParts = z.strictObject({
  r1: z.number().describe('Ω'),
  r2: z.number().describe('Ω'),
  r3: z.number().optional().describe('Multiple feedback only, Ω'),
  c1: z.number().describe('F'),
  c2: z.number().describe('F'),
  gain: z.number().optional().describe('Sallen-Key only: gain of the amplifier, V/V'),
});

const response = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('amplifier') }),
    z.strictObject({
      kind: z.literal('transimpedance'),
      feedback: z.number().describe('Ω'),
      inputCapacitance: z.number().describe('Diode and wiring at the node, F'),
      feedbackCapacitance: z.number().nullable().describe('F; null: for each part the maximally flat one'),
      largestCurrent: z.number().describe('Signal, ambient and dark current together, A'),
    }),
    z.strictObject({
      kind: z.literal('low-pass'),
      form: z.enum(['sallen-key', 'multiple-feedback']),
      parts: filterParts,
      corner: z.number().describe('Natural frequency with the parts as fitted, Hz'),
      q: z.number().describe('Q with the parts as fitted'),
    }),
    z.strictObject({ kind: z.literal('integrator'), resistance: z.number().describe('Ω'), capacitance: z.number().describe('F'), window: z.number().nullable().describe('Time from reset to reset, s') }),
    z.strictObject({
      kind: z.literal('oscillator'),
      frequency: z.number().describe('Wanted, Hz'),
      edge: z.number().describe('Longest edge, 10 % to 90 %, s'),
      toSupply: z.number().describe('Ω'),
      toGround: z.number().describe('Ω'),
      toOutput: z.number().describe('Ω'),
      timeConstant: z.number().describe('R · C, s'),
      spread: z.number().describe('Relative spread of it from component tolerances'),
      resistance: z.number().describe('Ω'),
      capacitance: z.number().describe('F'),
      drives: z
        .strictObject({ low: z.number().describe('Share of the supply'), high: z.number().describe('Share of the supply'), maxEdge: z.number().nullable().describe('Longest time between the two, s') })
        .nullable(),
    }),
  ])
  .describe('What the stage does over frequency, beyond a constant gain');

/** The stage as every answer about one carries it. */
export const stage = z
  .strictObject({
    name: z.string().nullable().describe('As written in the stage file; null without one'),
    topology: z.string(),
    coupling: z.enum(['dc', 'ac']),
    supply: span('Supply', 'V'),
    supplyPeak: z.number().describe('Highest transient of the supply, V'),
    gain: z.number().nullable().describe('Signal gain at nominal components in gainUnit; negative when the stage inverts; null without one'),
    gainUnit: z.enum(['V/V', 'V/A', '1/s']).nullable().describe('V/A: transresistance; 1/s: integrator; null: oscillator'),
    noiseGain: z.number().describe('Noise gain that sets bandwidth and stability, nominal resistors, V/V'),
    noiseGainCorners: ends('The same over the tolerance of the resistors', 'V/V'),
    dcNoiseGain: span('Noise gain at DC: what multiplies an offset', 'V/V'),
    output: ends('Extremes of the ideal output over all corners', 'V'),
    outputNominal: ends('Extremes of the ideal output at nominal values', 'V'),
    commonMode: ends('Extremes of the voltage at the inputs over all corners', 'V'),
    resistors: resistors.nullable().describe('Null for a stage without resistors'),
    frequency: z.number().nullable().describe('Top of the signal band, Hz; null when not given'),
    shape: z.enum(['sine', 'band-limited', 'step', 'pulse']),
    edge: z.number().nullable().describe('Step and pulse: 10 % to 90 % time wanted at the output, s'),
    outputStep: z.number().describe('Peak-to-peak size of the signal at the output, V'),
    response,
    load: load.nullable().describe('Null without a load'),
    temperature: span('Ambient temperature', '°C'),
    resistorRejection: z.number().nullable().describe('Difference only: common-mode rejection that the resistors alone leave, V/V; null where it does not apply or is unlimited'),
    cautions: z.array(z.string()).describe('What the stage does not do as it was asked, one sentence each'),
    assumptions: z.array(z.string()).describe('Every default that was taken, one sentence each'),
  })
  .meta({ id: 'stage', title: 'Stage', description: 'The circuit the stage file and the options imply' });
