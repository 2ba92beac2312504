export { comfortOf, marginForOrder } from './comfort.js';
export { meritOf, priceInEuro, type Merit } from './merit.js';
export { ORDERS, rank, STEPS, type Order, type RankedPart } from './rank.js';
export { rankSurveyed } from './rank-survey.js';
