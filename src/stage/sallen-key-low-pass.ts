import { sallenKey, sallenKeyLoading, stopBandFloor, type SallenKey } from '../formulas/filters.js';
import { formatDecibels } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import type { FilterSpec, StageSpec } from '../spec/spec.js';
import { chooseSallenKey } from './choose-sallen-key.js';
import type { Circuit, Surroundings } from './circuit.js';
import { excitation } from './excitation.js';
import { fittedParts, noFilter, notMade, notSaid, partsAgainstCorner, partsNote, wantedOf } from './filter-parts.js';
import { capacitorTolerance, grid, grown, grownCorners, growthNotes, naturalOf, swingGrowth, toleranceEnds, type Growth } from './filter-response.js';
import { fitResistors, toleranceOf } from './fitted.js';
import { follower } from './follower.js';
import type { Maker } from './making.js';
import { capacitor, FOLLOWING_PIN, pinOf, resistor } from './networks.js';
import { nonInverting } from './non-inverting.js';
import type { StageResistors } from './stage.js';

/**
 * Second-order low-pass about an amplifier of gain K: vo = Vref + K(vi − Vref) in the pass band, the pins at Vref + (vo − Vref)/K
 * (Karki, Analysis of the Sallen-Key Architecture, 1999; Mancini (ed.), Op Amps for Everyone, 2002, ch. 16; both from memory).
 */
export const makeSallenKey: Maker = (spec, settled, around) => {
  const amplifier = amplifierOf(spec, settled.gain);
  if (!amplifier.ok) return amplifier;
  const gain = amplifier.resistors === null ? 1 : 1 + amplifier.resistors.feedback / (amplifier.resistors.input + legSeries(around));
  const filter = partsOf(spec, gain, around);
  if ('code' in filter) return { ok: false, problems: [filter] };
  const drive = excitation(spec.signal);
  const fitted = { ...filter.parts, r1: filter.parts.r1 + around.sourceResistance };
  const ideal = sallenKey(fitted, Infinity);
  const natural = naturalOf(ideal);
  const base = amplifier.resistors === null ? follower(around) : nonInverting(amplifier.resistors, around);
  const growth = growthOf(spec, { base, parts: filter.parts, around });
  const problem = growth === null ? oscillates(spec) : filter.chosen ? null : partsAgainstCorner(spec, natural, toleranceOf(spec) + capacitorTolerance(spec));
  if (growth === null || problem !== null) return { ok: false, problems: problem === null ? [] : [problem] };
  const circuit: Circuit = {
    ...base,
    nominal: grown(base.nominal, growth.nominal, drive.centre),
    corners: grownCorners(base.corners, growth, drive.centre),
    ...(base.signalCorners === undefined ? {} : { signalCorners: grownCorners(base.signalCorners, growth, drive.centre) }),
    capacitiveLoading: (frequency) => sallenKeyLoading(fitted, frequency),
    seriesPositive: base.seriesPositive + filter.parts.r1 + filter.parts.r2,
    network: { plus: plusPin(filter.parts, around), minus: base.network?.minus ?? FOLLOWING_PIN },
  };
  const response = { kind: 'low-pass', form: 'sallen-key', parts: fitted, ...natural, growth: growth.nominal, responseAt: (gbw: number) => sallenKey(fitted, gbw) } as const;
  const fitNotes = [...amplifier.notes, partsNote(filter.parts, filter.chosen, natural), ...growthNotes(spec.signal, natural.q, growth)];
  return { ok: true, made: { circuit, excitation: drive, response, fitNotes, cautions: [leak(fitted)] } };
};

type Amplifier =
  | { readonly ok: true; readonly resistors: StageResistors | null; readonly notes: readonly string[] }
  | { readonly ok: false; readonly problems: readonly Problem[] };

const SAME = 1e-9;

/** Its gain resistors; none at a gain of 1. */
function amplifierOf(spec: StageSpec, gain: number): Amplifier {
  if (gain < 1 - SAME) {
    return { ok: false, problems: [noFilter(spec, 'a Sallen-Key low-pass has a gain of 1 + Rf/Rg, never below 1', 'topology: multiple-feedback-low-pass, or gain: 1')] };
  }
  if (gain > 1 + SAME) return fitResistors(spec, gain);
  if (spec.resistors?.feedback === undefined && spec.resistors?.input === undefined) return { ok: true, resistors: null, notes: [] };
  const message = 'a Sallen-Key low-pass with a gain of 1 feeds its output straight back: it has no gain resistors';
  return { ok: false, problems: [contradiction(spec, { code: 'S203', paths: ['resistors', 'gain'], message, fix: 'leave feedback and input out, or write a gain above 1' })] };
}

/** What stands in the gain leg where the filter works, Ω: nothing behind a bypass. */
const legSeries = ({ ac, referenceResistance, referenceBypass }: Surroundings): number => (ac || referenceBypass > 0 ? 0 : referenceResistance);

interface Parts {
  readonly parts: SallenKey;
  readonly chosen: boolean;
}

function partsOf(spec: StageSpec, gain: number, around: Surroundings): Parts | Problem {
  const filter: FilterSpec = spec.filter ?? {};
  const written = fittedParts(filter, ['r1', 'r2', 'c1', 'c2']);
  if (written !== null) return { parts: { ...written, gain }, chosen: false };
  const wanted = wantedOf(filter);
  if (wanted === null) return notSaid(spec, 'all of r1, r2, c1 and c2');
  const parts = chooseSallenKey({ ...wanted, gain, source: around.sourceResistance });
  return parts === null ? notMade(spec, wanted) : { parts, chosen: true };
}

/** Over every component and the gain at both ends of their tolerances; null when it oscillates at one of them. */
function growthOf(spec: StageSpec, { base, parts, around }: { base: Circuit; parts: SallenKey; around: Surroundings }): Growth | null {
  const [t, tc] = [toleranceOf(spec), capacitorTolerance(spec)];
  const source = { value: around.sourceResistance, tolerance: around.sourceTolerance };
  const gains = [...new Set([base.noiseGain.min, base.noiseGain.max])];
  const ends = [toleranceEnds(parts.r1, t, source), toleranceEnds(parts.r2, t), toleranceEnds(parts.c1, tc), toleranceEnds(parts.c2, tc), gains];
  const responses = grid(ends).map(([r1 = 0, r2 = 0, c1 = 0, c2 = 0, gain = 1]) => sallenKey({ r1, r2, c1, c2, gain }, Infinity));
  const ideal = sallenKey({ ...parts, r1: parts.r1 + source.value }, Infinity);
  if ([ideal, ...responses].some(({ a }) => a <= 0)) return null;
  const nominal = swingGrowth(ideal, spec.signal);
  return { nominal, largest: Math.max(nominal, ...responses.map((response) => swingGrowth(response, spec.signal))) };
}

function oscillates(spec: StageSpec): Problem {
  return noFilter(spec, 'with these components, or at the ends of their tolerances, the filter oscillates: (R1+R2)·C2 + R1·C1·(1−K) is not above 0', 'a lower gain, a lower q, or components of closer tolerance');
}

/** Source and R1 to the inner node, R2 to the pin; C1 back from the output, C2 to the AC ground. AC-coupled, the bias resistor stands before R1. */
function plusPin({ r1, r2, c1, c2 }: SallenKey, { ac, sourceResistance, referenceResistance }: Surroundings) {
  const leg = sourceResistance === 0 ? 'input' : 'leg';
  return pinOf([
    ...resistor('source', sourceResistance, ['input', 'leg']),
    ...(ac && sourceResistance > 0 ? resistor('bias', referenceResistance, ['leg', 'ground']) : []),
    ...resistor('R1', r1, [leg, 'inner']),
    ...resistor('R2', r2, ['inner', 'pin']),
    ...capacitor('C1', c1, ['inner', 'output']),
    ...capacitor('C2', c2, ['pin', 'ground']),
  ]);
}

/** An open-loop output resistance to show the size of the leak with, Ω. */
const EXAMPLE_OUTPUT = 100;

function leak({ r1, r2 }: SallenKey): string {
  const floor = formatDecibels(stopBandFloor(r1, r2, EXAMPLE_OUTPUT), { digits: 2 });
  return `far above the amplifier's bandwidth the signal leaks through C1: the gain comes back to (Ro||R2)/(R1 + Ro||R2), about ${floor} for ${EXAMPLE_OUTPUT} Ω of output resistance`;
}
