export { buildStage, type StageResult } from './build.js';
export type { Asked, CurrentPeak, InputPoint, Span, Stage, StageLoad, StageResistors, Vertex } from './stage.js';
