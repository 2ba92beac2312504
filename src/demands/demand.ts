import type { ClampDemand, CrossoverDemand, OverdriveDemand, PhaseReversalDemand, StartUpDemand, SupplyRippleDemand } from './hazard-demand.js';
import type { PhaseMarginDemand, StableGainDemand } from './loop-demand.js';
import type { NoiseDemand } from './noise-demand.js';
import type { Operating } from './operating.js';
import type { BatteryBudget, FrequencyErrorDemand, JunctionDemand } from './power-demand.js';
import type { DistortionDemand, GainBandwidthDemand, SettlingDemand, SlewRateDemand } from './speed-demand.js';

export type Sense = 'at-least' | 'at-most';

/** All check ids in the order of the contract. Those not built yet still have a demand, so that no limit passes silently. */
export const CHECK_IDS = [
  'supply-low', 'supply-high', 'supply-peak', 'input-low', 'input-high', 'output-low', 'output-high', 'output-current',
  'slew-rate', 'gain-bandwidth', 'stable-gain', 'phase-margin', 'noise', 'distortion', 'dc-error', 'supply-ripple', 'settling', 'start-up', 'frequency-error', 'supply-current',
  'temperature-low', 'temperature-high', 'junction-temperature', 'channels', 'package', 'qualification', 'status', 'lifecycle', 'price',
  'crossover', 'phase-reversal', 'clamp', 'overdrive',
] as const;
export type CheckId = (typeof CHECK_IDS)[number];

/** What the stage asks of any amplifier in one respect. */
export interface DemandBase {
  readonly check: CheckId;
  /** The figures it came from, in words. */
  readonly because: string;
  /** Section of the method, with the published source. */
  readonly source: string;
}

/** A number the part is compared with; SI unit. */
export interface NumberDemand extends DemandBase {
  readonly required: number;
  readonly unit: string;
  readonly sense: Sense;
}

/** Words one of which the part must have. */
export interface WordDemand extends DemandBase {
  readonly required: readonly string[];
  readonly unit: null;
  readonly sense: 'one-of';
}

/** A limit whose check does not exist yet. */
export interface UnbuiltDemand extends DemandBase {
  readonly required: number | null;
  readonly unit: string | null;
  readonly sense: Sense | null;
  readonly built: false;
}

/** A corner as a verdict shows it. */
export type Corner = Readonly<Record<string, number>>;

/** Room at one vertex, and the current that flows there. */
export interface HeadroomVertex {
  readonly room: number;
  readonly supply: number;
  /** Towards this side's rail, A. */
  readonly current: number;
  /** See `HeadroomQuestion`. */
  readonly assistingLoad: number | null;
  readonly corner: Corner;
}

export interface HeadroomDemand extends NumberDemand {
  readonly vertices: readonly HeadroomVertex[];
  /** Upper corner of the DC noise gain. */
  readonly noiseGain: number;
  /** Largest distance from 25 °C, K. */
  readonly kelvin: number;
}

export interface OutputCurrentDemand extends NumberDemand {
  /** Peak in each direction at every corner of supply and reference, A (above nothing), with its corner. */
  readonly peaks: readonly DirectedPeak[];
  readonly corner: Corner;
}

/** Room the stage leaves between the inputs and V+, and how far below it they come at most, V; `still`: they rest at the reference, out of reach of any signal. */
export interface InputHighDemand extends NumberDemand {
  readonly corner: Corner;
  readonly farthest: number;
  readonly still: boolean;
}

/** Distances below V+, V. */
export interface InputSwingRange {
  readonly min: number;
  readonly max: number;
}

/** A peak current towards one rail: `high` is sourced, `low` is sunk. */
export interface DirectedPeak {
  readonly side: 'low' | 'high';
  readonly amperes: number;
  readonly supply: number;
  readonly corner: Corner;
}

export interface DcErrorDemand extends NumberDemand {
  /** Upper corner of the DC noise gain. */
  readonly noiseGain: number;
  readonly kelvin: number;
  /** Resistance in series with the + and the - input, Ω, and the tolerance their mismatch is charged with. */
  readonly positive: number;
  readonly negative: number;
  readonly tolerance: number;
  /** How much the source resistance may be off, Ω; told, not charged. */
  readonly sourceSpread: number;
  /** Largest distance of common mode and output from half the supply at their corner, V. */
  readonly commonModeMove: number;
  readonly outputMove: number;
  readonly supply: { readonly min: number; readonly nominal: number; readonly max: number };
  /** °C farthest from 25 °C. */
  readonly temperature: number;
  /** °C: there currents that double count. */
  readonly hottest: number;
}

export interface SupplyCurrentDemand extends NumberDemand {
  readonly per: 'amplifier' | 'package';
}

export interface PriceDemand extends NumberDemand {
  readonly currency: string;
}

/** What each check may be asked; null when the stage asks nothing. */
export interface Demands {
  readonly operating: Operating;
  readonly 'supply-low': NumberDemand;
  readonly 'supply-high': NumberDemand;
  readonly 'supply-peak': NumberDemand;
  readonly 'input-low': NumberDemand;
  readonly 'input-high': InputHighDemand;
  readonly 'output-low': HeadroomDemand;
  readonly 'output-high': HeadroomDemand;
  readonly 'output-current': OutputCurrentDemand;
  readonly 'slew-rate': SlewRateDemand | null;
  readonly 'gain-bandwidth': GainBandwidthDemand | null;
  /** Null for the oscillator, which switches. */
  readonly 'stable-gain': StableGainDemand | null;
  readonly 'phase-margin': PhaseMarginDemand | null;
  readonly noise: NoiseDemand | null;
  readonly distortion: DistortionDemand | null;
  readonly 'dc-error': DcErrorDemand | null;
  /** Null without ripple; asked with a limit. */
  readonly 'supply-ripple': SupplyRippleDemand | null;
  readonly settling: SettlingDemand | null;
  /** Null for a stage that is always on; asked with a limit. */
  readonly 'start-up': StartUpDemand | null;
  readonly 'frequency-error': FrequencyErrorDemand | null;
  readonly 'supply-current': SupplyCurrentDemand | null;
  readonly 'temperature-low': NumberDemand;
  readonly 'temperature-high': NumberDemand;
  /** Asked with a limit, or of parts that state their own. */
  readonly 'junction-temperature': JunctionDemand;
  readonly channels: NumberDemand | null;
  readonly package: WordDemand | null;
  readonly qualification: WordDemand | null;
  readonly status: WordDemand | null;
  readonly lifecycle: WordDemand | null;
  readonly price: PriceDemand | null;
  /** Hazards: asked when the stage avoids them, cautions otherwise. */
  readonly crossover: CrossoverDemand;
  readonly 'phase-reversal': PhaseReversalDemand;
  readonly clamp: ClampDemand;
  readonly overdrive: OverdriveDemand;
  /** No demand but information: null without a battery. */
  readonly battery: BatteryBudget | null;
  /** Limits written whose check is not built yet. */
  readonly unbuilt: readonly UnbuiltDemand[];
}

/** A hazard to avoid whose size the stage does not say. */
export interface UnsaidDemand extends DemandBase {
  readonly required: null;
  readonly unit: string;
  readonly sense: Sense;
}

export type AnyDemand = NumberDemand | WordDemand | UnbuiltDemand | UnsaidDemand;
