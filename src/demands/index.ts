export { deriveDemands } from './derive.js';
export { CHECK_IDS, listDemands } from './demand.js';
export type {
  AnyDemand, CheckId, Corner, DcErrorDemand, Demands, DirectedPeak, HeadroomDemand, HeadroomVertex, NumberDemand, OutputCurrentDemand, PriceDemand, Sense,
  SlewRateDemand, SupplyCurrentDemand, UnbuiltDemand, WordDemand,
} from './demand.js';
export type { Operating } from './operating.js';
