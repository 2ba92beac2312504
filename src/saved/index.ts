export { judgeAgain, type JudgedAgain, type KeptStage } from './again.js';
export type { ChosenAnswer, StageAnswer } from './answer.js';
export { foundPath, keptPath, shownPath } from './stage-path.js';
export { readStageFile, type StageFile } from './stage-file.js';
