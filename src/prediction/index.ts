export type { FigureUsed } from './amplifier.js';
export { predictStage } from './predict.js';
export type { Form, FrequencyResponse, Predicted, Prediction, Quantity, Results, Wanted, Waveform } from './prediction.js';
