import { multipleFeedback, type MultipleFeedback } from '../formulas/filters.js';
import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import type { FilterSpec, StageSpec } from '../spec/spec.js';
import { chooseMultipleFeedback } from './choose-multiple-feedback.js';
import { parallel, type Circuit, type Surroundings } from './circuit.js';
import { excitation } from './excitation.js';
import { fittedParts, notMade, notSaid, partsAgainstCorner, partsNote, wantedOf } from './filter-parts.js';
import { capacitorTolerance, grid, grown, grownCorners, growthNotes, naturalOf, swingGrowth, toleranceEnds, type Growth } from './filter-response.js';
import { toleranceOf } from './fitted.js';
import { inverting } from './inverting.js';
import type { Maker, Settled } from './making.js';
import { capacitor, pinOf, referencePin, resistor } from './networks.js';

/**
 * Inverting second-order low-pass: vo = Vref(1+|H0|) − |H0|·vi in the pass band, |H0| = r2/r1, both pins at the reference
 * (Mancini (ed.), Op Amps for Everyone, 2002, ch. 16, from memory).
 */
export const makeMultipleFeedback: Maker = (spec, settled, around) => {
  const filter = partsOf(spec, settled, around);
  if ('code' in filter) return { ok: false, problems: [filter] };
  const { parts, chosen } = filter;
  const drive = excitation(spec.signal);
  const fitted = { ...parts, r1: parts.r1 + around.sourceResistance };
  const natural = naturalOf(multipleFeedback(fitted, Infinity));
  const problem = chosen ? null : (gainAgainstParts(spec, parts) ?? partsAgainstCorner(spec, natural, toleranceOf(spec) + capacitorTolerance(spec)));
  if (problem !== null) return { ok: false, problems: [problem] };
  const base = inverting({ feedback: parts.r2, input: parts.r1, tolerance: toleranceOf(spec) }, around);
  const growth = growthOf(spec, parts, around);
  const circuit: Circuit = {
    ...base,
    nominal: grown(base.nominal, growth.nominal, drive.centre),
    corners: grownCorners(base.corners, growth, drive.centre),
    seriesNegative: parts.r3 + (around.ac ? parts.r2 : parallel(parts.r2, fitted.r1)),
    network: { plus: referencePin(around), minus: minusPin(parts, around) },
  };
  const response = { kind: 'low-pass', form: 'multiple-feedback', parts: fitted, ...natural, growth: growth.nominal, responseAt: (gbw: number) => multipleFeedback(fitted, gbw) } as const;
  const gain = chosen ? [`gain ${formatQuantity(circuit.gain, 'V/V', { digits: 4 })} of the components chosen`] : [];
  const fitNotes = [partsNote(parts, chosen, natural), ...gain, ...growthNotes(spec.signal, natural.q, growth)];
  return { ok: true, made: { circuit, excitation: drive, response, fitNotes, cautions: [] } };
};

interface Parts {
  readonly parts: MultipleFeedback;
  readonly chosen: boolean;
}

function partsOf(spec: StageSpec, { gain }: Settled, around: Surroundings): Parts | Problem {
  const filter: FilterSpec = spec.filter ?? {};
  const written = fittedParts(filter, ['r1', 'r2', 'r3', 'c1', 'c2']);
  if (written !== null) return { parts: written, chosen: false };
  const wanted = wantedOf(filter);
  if (wanted === null) return notSaid(spec, 'all of r1, r2, r3, c1 and c2');
  const parts = chooseMultipleFeedback({ ...wanted, gain, source: around.sourceResistance });
  return parts === null ? notMade(spec, wanted) : { parts, chosen: true };
}

/** A written gain and written components must agree within the tolerance, before the source resistance is added. */
function gainAgainstParts(spec: StageSpec, { r1, r2 }: MultipleFeedback): Problem | null {
  const gain = spec.gain?.value;
  if (gain === undefined || Math.abs(r2 / r1 / gain - 1) <= toleranceOf(spec) * (1 + 1e-9) + 1e-12) return null;
  return contradiction(spec, {
    code: 'S203',
    paths: ['gain', 'filter', 'filter.r1'],
    message: `gain ${spec.gain?.text ?? ''} and components disagree: r2/r1 gives ${formatQuantity(r2 / r1, 'V/V', { digits: 4 })}, more than the tolerance away`,
    fix: `write gain: -${Number((r2 / r1).toPrecision(6))}, or leave the gain out`,
  });
}

/** Over every component at both ends of its tolerance. */
function growthOf(spec: StageSpec, parts: MultipleFeedback, around: Surroundings): Growth {
  const [t, tc] = [toleranceOf(spec), capacitorTolerance(spec)];
  const source = { value: around.sourceResistance, tolerance: around.sourceTolerance };
  const ends = [toleranceEnds(parts.r1, t, source), toleranceEnds(parts.r2, t), toleranceEnds(parts.r3, t), toleranceEnds(parts.c1, tc), toleranceEnds(parts.c2, tc)];
  const growths = grid(ends).map(([r1 = 0, r2 = 0, r3 = 0, c1 = 0, c2 = 0]) => swingGrowth(multipleFeedback({ r1, r2, r3, c1, c2 }, Infinity), spec.signal));
  const nominal = swingGrowth(multipleFeedback({ ...parts, r1: parts.r1 + source.value }, Infinity), spec.signal);
  return { nominal, largest: Math.max(nominal, ...growths) };
}

/** Source and R1 to the inner node, R2 to the output, R3 to the pin; C1 to the AC ground, C2 from the pin to the output. */
function minusPin({ r1, r2, r3, c1, c2 }: MultipleFeedback, { sourceResistance }: Surroundings) {
  return pinOf([
    ...resistor('source', sourceResistance, ['input', 'leg']),
    ...resistor('R1', r1, [sourceResistance === 0 ? 'input' : 'leg', 'inner']),
    ...resistor('R2', r2, ['inner', 'output']),
    ...resistor('R3', r3, ['inner', 'pin']),
    ...capacitor('C1', c1, ['inner', 'ground']),
    ...capacitor('C2', c2, ['pin', 'output']),
  ]);
}
