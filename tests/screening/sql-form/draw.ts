import { compareFigures } from '../../../src/parts/figure-order.js';
import { figureSlot, PARAMETERS, type Condition, type Figure } from '../../../src/parts/figures.js';
import type { Part } from '../../../src/parts/part.js';
import { plausibleParts } from '../../bench/plausible-part.js';
import { drawStage } from '../../simulate/draw-stage.js';
import { dice, written, type Dice } from '../../simulate/random.js';
import { genericList } from '../../support/generic-list.js';

/** A stage that asks nothing SQL has no answer to: no capacitance at the output (it asks for a phase margin), but limits, wishes and hazards of all kinds. */
export function drawSqlStage(roll: Dice): string {
  const base = drawStage(roll).file.replace(/, capacitance: [\d.]+ nF/u, '');
  const maybe = (share: number, entry: string): string[] => (roll.chance(share) ? [entry] : []);
  const limits = [
    ...maybe(0.7, `supplyCurrent: ${written(roll.ratio(5e-6, 5e-3))} A`), ...maybe(0.3, 'supplyCurrentPer: package'),
    ...maybe(0.3, `junctionTemperature: ${roll.pick([90, 125, 130])} °C`), ...maybe(0.3, `startUp: ${written(roll.ratio(1e-5, 1e-2))} s`),
  ];
  const wishes = [
    ...maybe(0.5, `channels: ${roll.pick([1, 2])}`), ...maybe(0.3, 'package: [SOT-23-5, so-8]'), ...maybe(0.3, `qualification: AEC-Q100 grade ${roll.pick([1, 2])}`),
    ...maybe(0.4, 'status: [approved, conditional]'), ...maybe(0.4, 'lifecycle: [active]'), ...maybe(0.4, `price: ${roll.pick([0.4, 0.9])} EUR`),
  ];
  const avoid = ['crossover', 'phase-reversal', 'clamp', 'overdrive'].filter(() => roll.chance(0.3));
  const lines = [
    ...(wishes.length === 0 ? [] : [`wishes: {${wishes.join(', ')}}`]), ...(avoid.length === 0 ? [] : [`avoid: [${avoid.join(', ')}]`]),
    ...maybe(0.5, `overdrive: ${roll.pick([0, 0.3, 2])} V`), ...maybe(0.4, `sequencing: ${roll.pick(['supply-first', 'signal-first'])}`),
  ];
  return `${base.replace('limits: {', `limits: {${limits.map((entry) => `${entry}, `).join('')}`)}${lines.map((line) => `${line}\n`).join('')}`;
}

/** Approved parts and generic sets as no list would have them all at once: conditions of every kind, several figures of one parameter, typical ones alone, some assumed, some gone. */
export function drawCatalog(seed: number, count: number): { readonly approved: Part[]; readonly generic: Part[] } {
  const roll = dice(seed, 77);
  const plausible = plausibleParts(dice(seed, 0));
  const approved = Array.from({ length: count }, () => plausible.next().value as Part).map((part, at) => (at % 3 === 0 ? part : odd(part, roll)));
  const generic = genericList.parts.filter(() => roll.chance(0.2)).map((part) => (roll.chance(0.5) ? part : { ...part, figures: oddFigures(part.figures, roll) }));
  return { approved, generic };
}

function odd(part: Part, roll: Dice): Part {
  const flag = (): boolean | null => roll.pick([true, false, null]);
  return {
    ...part,
    phaseReversal: flag(), inputClamp: flag(), crossoverFree: flag(),
    inputType: roll.pick(['fet', 'bipolar', null]),
    channels: roll.chance(0.1) ? null : part.channels,
    qualification: roll.pick([null, 'none', 'AEC-Q100 Grade 1', ' aec-q100 grade 2']),
    package: roll.chance(0.1) ? null : part.package,
    status: roll.chance(0.1) ? null : part.status,
    price: part.price !== null && roll.chance(0.15) ? { ...part.price, currency: 'USD' } : part.price,
    figures: oddFigures(part.figures, roll),
  };
}

function oddFigures(figures: readonly Figure[], roll: Dice): Figure[] {
  const slots = new Map<string, Figure>();
  for (const figure of figures) {
    if (roll.chance(0.07)) continue;
    for (const one of [figure, ...(roll.chance(0.25) ? [other(figure, roll)] : []), ...(roll.chance(0.1) ? [other(figure, roll)] : [])]) {
      const changed = roll.chance(0.3) ? { ...one, condition: oddCondition(one, roll) } : one;
      slots.set(figureSlot(changed), roll.chance(0.04) ? { ...changed, assumed: true } : changed);
    }
  }
  return [...slots.values()].sort(compareFigures);
}

/** The same parameter once more: another value, kind and condition. */
function other(figure: Figure, roll: Dice): Figure {
  const kind = roll.pick(PARAMETERS[figure.parameter].kinds);
  return { ...figure, kind, value: Number((figure.value * roll.ratio(0.5, 2)).toPrecision(3)), condition: oddCondition(figure, roll) };
}

function oddCondition({ parameter, condition }: Figure, roll: Dice): Condition {
  const supply = roll.pick([undefined, undefined, 1.8, 2.5, 3.3, 5, 10]);
  const temperature = roll.pick([undefined, undefined, 25, 85, 125, -40, 'over'] as const);
  const load = parameter.startsWith('output') && parameter.endsWith('Headroom') ? roll.pick([condition.load, condition.load, undefined, ...LOADS]) : condition.load;
  return { ...(supply === undefined ? {} : { supply }), ...(load === undefined ? {} : { load }), ...(temperature === undefined ? {} : { temperature }) };
}

const LOADS = [
  { kind: 'current', amperes: 1e-3 }, { kind: 'current', amperes: 1e-4 }, { kind: 'resistance', ohms: 2000, to: 'ground' },
  { kind: 'resistance', ohms: 10e3, to: 'supply' }, { kind: 'resistance', ohms: 600, to: 'mid-supply' },
] as const;
