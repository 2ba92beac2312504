import type { ClippingCorner, DistortionDemand } from '../demands/index.js';
import { clippedSineDistortion } from '../formulas/clipping.js';
import { weakest } from '../parts/basis.js';
import type { Side } from '../parts/headroom.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { Missing, NumberFinding, SingleFinding } from '../verdicts/finding.js';
import { NONE, type DistortionPart } from './distortion-part.js';
import { judgeHeadroom } from './output-headroom.js';

/** A sine of which less than this is left is as good as gone. */
const LEAST = 1e-3;
/** Below this nothing is missing, V. */
const NOTHING = 1e-12;

/** What the output cuts off the peaks where the head-room it needs exceeds the room, at the worst corner of the rails. */
export function clippingPart(asked: DistortionDemand, readings: Readings): DistortionPart {
  const corners = asked.corners.filter(({ peak }) => peak > NOTHING).map((corner) => clippedAt(asked, corner, readings));
  const missing = corners.flatMap((corner) => corner.missing);
  if (missing.length > 0) return { ...NONE, missing: unique(missing) };
  const worst = corners.reduce<Clipped | null>((best, next) => (best === null || next.value > best.value ? next : best), null);
  if (worst === null) return NONE;
  const { value, lost, finding } = worst;
  const how = lost > 0 ? `${formatQuantity(lost, 'V')} of the peak are missing` : 'the whole swing is there';
  const basis = weakest(corners.map((corner) => corner.basis));
  return { ...NONE, terms: [{ name: 'clipping', value, slot: finding?.slot ?? null, basis, figure: null, how }] };
}

interface Clipped {
  readonly value: number;
  readonly lost: number;
  readonly basis: ReturnType<typeof weakest>;
  readonly finding: NumberFinding | null;
  readonly missing: readonly Missing[];
}

function clippedAt({ noiseGain, kelvin }: DistortionDemand, corner: ClippingCorner, readings: Readings): Clipped {
  const sides = (['low', 'high'] as const).map((side: Side) => judgeHeadroom({ vertices: corner[side], noiseGain, kelvin }, side, readings).findings);
  const [low, high] = sides.map(worstOf) as [NumberFinding | null, NumberFinding | null];
  const all = sides.flat();
  const left = (finding: NumberFinding | null): number => Math.max(LEAST, 1 - lostOf(finding) / corner.peak);
  return {
    value: clippedSineDistortion({ top: left(high), bottom: left(low) }),
    lost: Math.max(lostOf(low), lostOf(high)),
    basis: weakest(all.map((finding) => (finding.kind === 'undecided' ? 'guaranteed' : finding.basis))),
    finding: lostOf(low) > lostOf(high) ? low : high,
    missing: all.flatMap((finding) => (finding.kind === 'numbers' ? [] : finding.missing)),
  };
}

/** Volts the peak is short of. */
function lostOf(finding: NumberFinding | null): number {
  const lost = finding === null ? 0 : finding.offered - finding.required;
  return lost > NOTHING ? lost : 0;
}

function worstOf(findings: readonly SingleFinding[]): NumberFinding | null {
  const numbers = findings.filter((finding): finding is NumberFinding => finding.kind === 'numbers');
  return numbers.reduce<NumberFinding | null>((best, next) => (best === null || next.offered - next.required > best.offered - best.required ? next : best), null);
}

function unique(missing: readonly Missing[]): Missing[] {
  return [...new Map(missing.map((one) => [one.figure, one])).values()];
}
