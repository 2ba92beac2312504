import type { Basis } from '../parts/basis.js';
import type { LimitKind, Parameter } from '../parts/figures.js';

export type Sense = 'at-least' | 'at-most';

/** One addend of an offered value. SI unit of its check; the origin is joined on its slot later. */
export interface Term {
  readonly name: string;
  readonly value: number;
  readonly slot: string | null;
  readonly basis: Basis;
  /** The figure as it counts, and what it is multiplied by, in words: `3 mV`, `noise gain 8.14`. */
  readonly figure: { readonly value: number; readonly unit: string } | null;
  readonly how: string | null;
}

/** The value of one figure at which the verdict turns. */
export interface TurningPoint {
  readonly figure: Parameter;
  readonly kind: LimitKind;
  readonly value: number;
  readonly unit: string;
  /** Of a head-room: the current towards the rail, A, and the supply, V, it must hold at. */
  readonly condition?: { readonly current: number; readonly supply: number };
}

/** A figure that is not known and passed over, and its value from which on the check would no longer pass. */
export type Uncharged = Omit<TurningPoint, 'condition'>;

/** A missing figure that kept a check from being decided. */
export interface Missing {
  readonly figure: Parameter | 'phaseReversal' | 'inputClamp' | 'channels' | 'package' | 'qualification' | 'status' | 'lifecycle' | 'price';
  readonly kind: LimitKind | null;
  /** Points are known, but none that reaches the current that flows. */
  readonly beyond?: Beyond;
}

/** How far head-room points reach: heaviest current known and current asked, A, at this supply, V. */
export interface Beyond {
  readonly covers: number;
  readonly current: number;
  readonly supply: number;
}

/** What would turn the check, recomputed with it on the worst reading: a field of the stage file and the value to write. */
export interface Remedy {
  /** `load.isolation`. */
  readonly path: string;
  /** As it is typed: `47 Ω`. */
  readonly text: string;
  /** Offered value of the check with it, in the unit of the finding. */
  readonly offered: number;
  /** What it costs, in words. */
  readonly cost: string;
}

/** What stands beside the numbers of a finding, as it applies. */
export interface Remarks {
  /** Terms add as squares (independent noise); otherwise as they are. */
  readonly adds?: 'squares';
  /** SI unit of the terms where it is not that of the finding (signal to noise against volts). */
  readonly termUnit?: string;
  /** The same result as engineers also say it, one sentence each. */
  readonly notes?: readonly string[];
  readonly remedies?: readonly Remedy[];
  /** Numbers that belong to the finding and are not compared: size of a step, how often it comes. */
  readonly measures?: readonly Measure[];
  /** Where a figure is passed over: the check holds up to this value of it. */
  readonly uncharged?: Uncharged;
}

/** A number beside a finding, worst reading, SI. */
export interface Measure {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  readonly basis: Basis;
}

interface Common extends Remarks {
  readonly unit: string;
  readonly sense: Sense;
  readonly required: number;
  readonly terms?: readonly Term[];
  readonly corner?: Readonly<Record<string, number>>;
  readonly turnsAt?: TurningPoint | null;
  readonly cautions?: readonly string[];
}

/** Two numbers side by side. */
export interface NumberFinding extends Common {
  readonly kind: 'numbers';
  readonly offered: number;
  readonly basis: Basis;
  readonly slot?: string | null;
  readonly how?: string | null;
  /** Root-sum-square of the terms, shown beside their sum. */
  readonly rss?: number;
  /** Sum of borrowed terms: more than a tenth of the limit cannot pass. */
  readonly borrowed?: number;
}

/** Only a bound is known: the part offers at least this much of something that must be small, at most this much of something that must be large. */
export interface BoundFinding extends Common {
  readonly kind: 'bound';
  readonly known: number;
  readonly basis: Basis;
  readonly missing: readonly Missing[];
  readonly cause: Cause;
}

export type Cause = 'missing-figure' | 'beyond-data' | 'no-counting-point' | 'currency' | 'not-built' | 'not-said';

/** Nothing to compare. */
export interface UndecidedFinding {
  readonly kind: 'undecided';
  readonly required: number | readonly string[] | null;
  readonly unit: string | null;
  readonly sense: Sense | null;
  readonly cause: Cause;
  readonly missing: readonly Missing[];
  readonly turnsAt?: TurningPoint | null;
  readonly corner?: Readonly<Record<string, number>>;
  readonly cautions?: readonly string[];
}

/** Words: the part's word must be one of those required. */
export interface WordFinding extends Pick<Remarks, 'notes' | 'measures'> {
  readonly kind: 'words';
  readonly required: readonly string[];
  readonly offered: string;
  /** What the word rests on; a limit when not said. */
  readonly basis?: Basis;
}

export type SingleFinding = NumberFinding | BoundFinding | UndecidedFinding;

/** The same question asked at every vertex of the stage; all must hold. */
export interface VertexFindings {
  readonly kind: 'vertices';
  readonly findings: readonly SingleFinding[];
  /** Weakest basis of all vertices, where only those that can decide are among the findings. */
  readonly basis?: Basis;
}

export type Finding = SingleFinding | WordFinding | VertexFindings;
