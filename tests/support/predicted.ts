import { predictStage, type Form, type Prediction, type Quantity } from '../../src/prediction/index.js';
import { PARAMETERS, type Figure, type LoadCondition, type Parameter } from '../../src/parts/figures.js';
import type { Stage } from '../../src/stage/index.js';
import { partWith } from './bench.js';

/** Typical and guaranteed value of each figure; one number where they are alike. */
export type Figures = Readonly<Partial<Record<Parameter, number | readonly [typical: number, worst: number]>>>;

/** A head-room point: V typical and guaranteed at a current in A. */
export type Point = readonly [typical: number, worst: number, amperes: number];

export function figuresOf(values: Figures): Figure[] {
  return Object.entries(values).flatMap(([name, value]) => {
    const parameter = name as Parameter;
    const [typical, worst] = typeof value === 'number' ? [value, value] : value;
    const { kinds } = PARAMETERS[parameter];
    return kinds.map((kind): Figure => ({ parameter, kind, value: kind === 'typ' ? typical : worst, condition: {} }));
  });
}

export function headroomPoints(parameter: 'outputLowHeadroom' | 'outputHighHeadroom', points: readonly Point[], supply: number): Figure[] {
  return points.flatMap(([typical, worst, amperes]) => {
    const load: LoadCondition = { kind: 'current', amperes };
    return ([['typ', typical], ['max', worst]] as const).map(([kind, value]): Figure => ({ parameter, kind, value, condition: { load, supply } }));
  });
}

export function predicted(stage: Stage, figures: readonly Figure[]): Prediction {
  const { temperature, supply } = stage;
  const operating = { coldest: temperature.min, hottest: temperature.max, nominalSupply: supply.nominal };
  return predictStage(stage, partWith(figures), { operating, strict: false, classWorst: null });
}

/** The number, or a failure with the reason. */
export function numberOf({ results }: Form, quantity: Quantity): number {
  const found = results[quantity];
  if (found?.value == null) throw new Error(`${quantity}: ${found === undefined ? 'not told' : found.reason}`);
  return found.value;
}
