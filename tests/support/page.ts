import type { Figure, LimitKind, Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import type { PageInput, PredictionCurves, SweepCurve } from '../../src/presentation/page/page-input.js';
import type { JudgedPart } from '../../src/screening/index.js';
import { sampleReport, SAMPLE_PARTS } from './sample-report.js';

const NOISE: readonly (readonly [Parameter, LimitKind, number])[] = [
  ['voltageNoise', 'typ', 30e-9], ['noiseCorner', 'typ', 100], ['currentNoise', 'typ', 1e-15], ['gainBandwidth', 'typ', 1e6], ['offsetVoltage', 'typ', 0.2e-3], ['phaseMargin', 'typ', 65], ['openLoopGain', 'typ', 1e6],
];

/** The sample parts with noise and typical figures where they have none of that kind. */
export const PAGE_PARTS: readonly Part[] = SAMPLE_PARTS.map((part) => {
  const has = (parameter: Parameter, kind: LimitKind): boolean => part.figures.some((figure) => figure.parameter === parameter && figure.kind === kind);
  const added = NOISE.filter(([parameter, kind]) => !has(parameter, kind)).map(([parameter, kind, value]): Figure => ({ parameter, kind, value, condition: {} }));
  return { ...part, figures: [...part.figures, ...added] };
});

export const ASKED = { 'limits.outputNoise': '300 µVrms', 'limits.phaseMargin': '45°' };

/** Two periods of a sine that comes out late and a little small. */
export const PREDICTION: PredictionCurves = {
  part: 'TEAM-0005',
  waveform: waves(101, (phase) => [1.4 + 1.2 * Math.sin(phase), 1.4 + 1.195 * Math.sin(phase - 0.02), 1.42 + 1.18 * Math.sin(phase - 0.05)]),
};

function waves(points: number, at: (phase: number) => [number, number, number]): NonNullable<PredictionCurves['waveform']> {
  const t = Array.from({ length: points }, (_, index) => (index * 1e-3) / (points - 1));
  const values = t.map((time) => at(2 * Math.PI * 2e3 * time));
  return { t, ideal: values.map(([ideal]) => ideal), typical: values.map(([, typical]) => typical), worst: values.map(([, , worst]) => worst) };
}

export const SWEEP: SweepCurve = {
  over: 'limits.dcError',
  points: [2, 5, 10, 20, 40, 80].map((millivolts, at) => ({ value: millivolts * 1e-3, counts: { fit: at, undecided: 1, rejected: 5 - at }, first: at === 0 ? null : at < 4 ? 'TEAM-0005' : 'TEAM-0012' })),
  turns: [{ at: 4.1e-3, from: null, to: 'TEAM-0005' }, { at: 36e-3, from: 'TEAM-0005', to: 'TEAM-0012' }],
};

/** Everything a page may be given (a limit of no text is not asked), of the sample stage and the first that fits, or of the part named. */
export function pageInput(changes: Readonly<Record<string, string>> = {}, { parts = PAGE_PARTS, about }: { readonly parts?: readonly Part[]; readonly about?: string } = {}): PageInput {
  const asked = Object.entries({ ...ASKED, ...changes }).filter(([, text]) => text !== '');
  const report = sampleReport(Object.fromEntries(asked), parts);
  const judged: readonly JudgedPart[] = [...report.fit, ...report.undecided, ...report.rejected];
  const chosen = judged.find(({ part }) => about === undefined || part.id === about) ?? null;
  return { report, chosen, prediction: PREDICTION, sweep: SWEEP };
}

/** One of the plots by its id; a missing one fails the test. */
export function plotNamed<T extends { readonly id: string }>(plots: readonly T[], id: string): T {
  const found = plots.find((plot) => plot.id === id);
  if (found === undefined) throw new Error(`no plot ${id} among ${plots.map((plot) => plot.id).join(', ')}`);
  return found;
}

/** Markup with one tag a line: a golden file that can be read, and compared line by line. */
export const lines = (svg: string): string => `${svg.replaceAll('><', '>\n<')}\n`;
