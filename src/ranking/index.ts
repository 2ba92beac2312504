export { comfortOf, marginForOrder } from './comfort.js';
export { EQUAL, type Merit, meritOf, priceInEuro, type Share, SHARES, type ShareWeights } from './merit.js';
export { type Decision, decisionBetween, type Order, ORDERS, placeOf, rank, type RankedPart, STEPS } from './rank.js';
export { dominatorsOf } from './dominance.js';
export { type PriceTurn, type Stability, stabilityOf, type WeightTurn } from './stability.js';
export { rankSurveyed } from './rank-survey.js';
export { outlineAndRank, outlinesIn, type OutlinedAndRanked, screenAndRank, type ScreenedAndRanked } from './screen-and-rank.js';
