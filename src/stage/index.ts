export { buildStage, type StageResult } from './build.js';
export { USUAL } from './usual.js';
export { withLimits, type Built } from './with-limits.js';
export type { Asked, CurrentPeak, InputPoint, Span, Stage, StageLoad, StageResistors, Vertex } from './stage.js';
