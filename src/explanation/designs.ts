import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { remediesOf } from '../verdicts/remarks.js';
import { allPass, type Errand } from './boundary.js';
import { setting, type Changing, type Move } from './changing.js';
import { gainWords, pairAt } from './resistor-pair.js';
import { moversOf, valueMover, type Mover } from './movers.js';
import { reaching, type Reacher } from './reacher.js';

/** Changes of the circuit itself that are certain to work where they are offered: each is judged on the stage it makes. */
export function designsFor(errand: Errand, changing: Changing): Reacher[] {
  const taken = new Set(moversOf(changing, errand.bench.stage).map(({ path }) => path));
  const made = [...remedies(errand), ...otherRail(errand), ...buffered(errand), ...feedback(errand, changing)];
  return [...made, ...referenceMovers(errand, changing)].filter(({ path, reach }) => reach.size > 0 && !taken.has(path));
}

/** A connection or a preferred value, tried on every check that does not pass. */
function tried(errand: Errand, design: string, moves: readonly Move[]): Reacher {
  const overrides = moves.map(({ path, text }) => setting(path, text));
  const probe = errand.bench.tried(overrides);
  const reach = probe === null ? [] : errand.checks.filter((check) => allPass(probe, [check]));
  return { path: moves[0]?.path ?? '', reach: new Set(reach), does: { moves }, design };
}

/** A move to a value that is chosen, not searched. */
const move = (path: string, [text, was]: readonly [string, string], factor = 1): Move => ({ path, text, was, written: was !== '', value: null, boundary: null, direction: null, factor });

/** What the stability check computed itself: an isolation resistor, a feedback capacitor. */
function remedies(errand: Errand): Reacher[] {
  const finding = errand.checks.includes('phase-margin') ? errand.bench.tried([])?.check('phase-margin')?.worst : undefined;
  if (finding === undefined) return [];
  return remediesOf(finding).map(({ path, text, cost }) => tried(errand, `${REMEDIES[path] ?? path}: ${cost}`, [move(path, [text, ''])]));
}

const REMEDIES: Readonly<Record<string, string>> = {
  'load.isolation': 'an isolation resistor in front of the load',
  'capacitors.feedback': 'a capacitor across the feedback resistor',
};

const SWING = ['output-low', 'output-high', 'output-current'];
const concerns = ({ checks }: Errand, asked: readonly string[]): boolean => checks.some((check) => asked.includes(check));

/** A load to the rail the output cannot reach helps it there. */
function otherRail(errand: Errand): Reacher[] {
  const { load } = errand.bench.stage;
  if (load?.resistance == null || load.to === 'reference' || !concerns(errand, SWING)) return [];
  const to = load.to === 'ground' ? 'supply' : 'ground';
  return [tried(errand, `the load to ${to}: it pulls the output there`, [move('load.to', [to, load.to])])];
}

/** A buffer makes the reference stiff: its resistance is then in no path of a bias current, and in no gain. */
function buffered(errand: Errand): Reacher[] {
  const { referenceResistance, coupling } = errand.bench.stage;
  if (referenceResistance === 0 || coupling === 'ac') return [];
  return [tried(errand, 'a buffer for the reference', [move('reference.resistance', ['0 Ω', formatQuantity(referenceResistance, 'Ω')])])];
}

/** Stages whose gain is a ratio of resistors. */
const RATIO: readonly Stage['topology'][] = ['non-inverting', 'inverting', 'difference', 'low-side-sense', 'high-side-sense'];
const LOWER = [0.5, 0.2, 0.1, 0.05, 0.02];
const HIGHER = [2, 5, 10];

/** Feedback resistors are a source of error and noise where they are large, and a load where they are small. The gain stays. */
function feedback(errand: Errand, { inputs }: Changing): Reacher[] {
  const { resistors, topology, seriesNegative } = errand.bench.stage;
  if (resistors === null || !RATIO.includes(topology)) return [];
  const ratios = [...(concerns(errand, ['dc-error', 'noise']) ? LOWER : []), ...(concerns(errand, SWING) ? HIGHER : [])];
  const hasGain = inputs.some(({ path }) => path === 'gain');
  const scaled = (ratio: number): Reacher[] => {
    // Where the gain is written the input resistor follows from it, exactly; else both are values one can buy.
    const pair = pairAt({ ...resistors, series: seriesNegative }, ratio, { exactly: hasGain });
    if (pair === null) return [];
    const factor = Math.max(pair.feedback / resistors.feedback, resistors.feedback / pair.feedback);
    const moves = [move('resistors.feedback', [formatQuantity(pair.feedback, 'Ω'), formatQuantity(resistors.feedback, 'Ω')], factor)];
    const both = hasGain ? moves : [...moves, move('resistors.input', [formatQuantity(pair.input, 'Ω'), formatQuantity(resistors.input, 'Ω')], factor)];
    return [tried(errand, `${ratio < 1 ? 'lower' : 'higher'} feedback resistors, ${gainWords(pair)}`, both)];
  };
  const helping = (list: readonly number[]): Reacher[] => list.flatMap(scaled).filter(({ reach }) => reach.size > 0).slice(0, 1);
  return [...helping(ratios.filter((ratio) => ratio < 1)), ...helping(ratios.filter((ratio) => ratio > 1))];
}

const LEVELS = ['input-low', 'input-high', 'output-low', 'output-high'];

/** A reference moved takes the output, and with some circuits the inputs, away from a rail. */
function referenceMovers(errand: Errand, { inputs }: Changing): Reacher[] {
  const touches = LEVELS.filter((check) => errand.checks.includes(check));
  const { stage } = errand.bench;
  if (touches.length === 0 || stage.topology === 'follower' || stage.topology === 'relaxation-oscillator') return [];
  const written = inputs.find(({ path, form }) => path === 'reference.value' && form === 'value');
  const grounded = stage.vertices.every(({ reference }) => reference === 0);
  if (written?.form !== 'value' && !grounded) return [];
  const movers: Mover[] = grounded
    ? [{ path: 'reference', input: { form: 'value', path: 'reference', value: 0, unit: 'V', text: 'ground', written: false }, end: 'value', from: 0, direction: 'up', most: stage.supply.min / 2, touches, design: 'raise the reference' }]
    : (['up', 'down'] as const).flatMap((direction) => (written?.form === 'value' && written.value > 0 ? [{ ...valueMover(written, direction), touches, design: direction === 'up' ? 'raise the reference' : 'lower the reference' }] : []));
  return movers.map((mover) => reaching(mover, errand)).map((one) => ({ ...one, path: 'reference' }));
}
