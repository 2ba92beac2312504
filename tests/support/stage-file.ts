import type { Problem } from '../../src/quantities/problem.js';
import { readStage } from '../../src/spec/read.js';
import type { Override, StageSpec } from '../../src/spec/spec.js';

/** Fewest lines that make a stage, for tests of one field. */
export const BASE = 'topology: non-inverting\nsupply: 5 V\ngain: 8\nsignal: {input: 25 mV..330 mV}\n';

/** The demo stage of the contract, with its comments. */
export const DEMO = `name: Soil-moisture probe, second amplifier
topology: non-inverting
supply: 3.0..4.2 V          # or 5 V ± 5 %
supplyPeak: 4.5 V           # transient, against the absolute maximum
gain: 8                     # V/V or dB
resistors: {feedback: 70 kΩ, input: 10 kΩ, tolerance: 1 %}
reference: ground
signal:
  input: 25 mV..330 mV      # DC-coupled
  output: 0.2..2.64 V
  coupling: dc
  shape: sine
  frequency: 2 kHz          # top of the band
source: {resistance: 1 kΩ}
load: {resistance: 10 kΩ, to: ground, capacitance: 100 pF}
temperature: -20..60 °C
limits:                     # what is absent is not judged
  swingLoss: 0 mV
  gainError: 1 %
  dcError: 20 mV            # at the output
  outputNoise: 300 µVrms
  distortion: -70 dB
  supplyCurrent: 80 µA
  settling: {within: 20 µs, to: 0.1 %}
  phaseMargin: 45°
wishes: {channels: 1, package: [SOT-23-5, SC-70-5], qualification: AEC-Q100 grade 1, status: [approved], price: 1 EUR}
margins: {slewRate: 1.0, gainBandwidth: 1.0, outputHeadroom: 0 mV}
mayChange: [limits.dcError, limits.swingLoss, gain]
`;

export function specOf(text: string | null, overrides: readonly Override[] = []): StageSpec {
  const result = readStage(text, { file: 'stage.yaml', overrides });
  if (result.ok) return result.spec;
  throw new Error(`refused: ${result.problems.map(printed).join('\n')}`);
}

export function problemsOf(text: string | null, overrides: readonly Override[] = []): readonly Problem[] {
  const result = readStage(text, { file: 'stage.yaml', overrides });
  return result.ok ? [] : result.problems;
}

export function codesOf(text: string | null, overrides: readonly Override[] = []): string[] {
  return problemsOf(text, overrides).map(({ code }) => code);
}

/** `--gain 6` and `--set limits.dcError=5 mV` as the command line hands them on. */
export function option(path: string, text: string, name?: string): Override {
  return { path, text, option: name ?? `--set ${path}` };
}

/** A problem as a reader of the terminal sees it, close enough to test whole messages. */
export function printed(problem: Problem): string {
  const { file, line, column, path } = problem.place ?? {};
  const where = [file, line, column].filter((part) => part !== undefined).join(':');
  const lines = [`error[${problem.code}]: ${path === undefined ? '' : `${path}: `}${problem.message}`];
  if (where !== '') lines.push(`  --> ${where}`);
  if (problem.text !== undefined && problem.span !== undefined) {
    const [start, end] = problem.span;
    lines.push(`   ${problem.text}`, `   ${' '.repeat(start)}${'^'.repeat(Math.max(end - start, 1))}`);
  }
  if (problem.fix !== undefined) lines.push(`   fix: ${problem.fix}`);
  return lines.join('\n');
}

export function printedAll(text: string | null, overrides: readonly Override[] = []): string {
  return `\n${problemsOf(text, overrides).map(printed).join('\n')}\n`;
}
