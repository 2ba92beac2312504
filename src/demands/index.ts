export { demandsWhenAsked, deriveDemands } from './derive.js';
export { circuitMark, markOf } from './circuit-mark.js';
export { oneCircuit } from './one-circuit.js';
export { CHECK_IDS } from './demand.js';
export { listDemands } from './list-demands.js';
export type {
  AnyDemand, CheckId, Corner, DcErrorDemand, Demands, DirectedPeak, HeadroomDemand, HeadroomVertex, NumberDemand, OutputCurrentDemand, PriceDemand, Sense,
  SupplyCurrentDemand, UnbuiltDemand, WordDemand,
} from './demand.js';
export { withFeedbackCapacitor } from './feedback-capacitor.js';
export { openNoiseGain } from './stable-gain.js';
export type { FeedbackPlace, OpenTransimpedance, PhaseMarginDemand, StableGainDemand } from './loop-demand.js';
export type {
  ClampDemand, CrossoverDemand, InputReach, OverdriveDemand, PhaseReversalDemand, StartUpDemand, SupplyRippleDemand,
} from './hazard-demand.js';
export type { NoiseDemand, PartCapacitances } from './noise-demand.js';
export type { Operating } from './operating.js';
export type { BatteryBudget, FrequencyErrorDemand, JunctionDemand, OscillatorEnd } from './power-demand.js';
export type {
  ChargedLoad, ClippingCorner, ClosedLoop, DistortionDemand, EdgeMotion, GainBandwidthDemand, InputSwing, Loop, SettlingDemand, SineMotion, SlewNeed,
  SlewingDemand, SlewRateDemand,
} from './speed-demand.js';
