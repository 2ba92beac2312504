import type { Stage } from '../../../stage/index.js';
import { sheetSvg } from '../drawing/svg.js';
import { compose } from './compose.js';
import type { Piece, Symbols } from './piece.js';
import { difference } from './topologies/difference.js';
import { follower } from './topologies/follower.js';
import { highSideSense } from './topologies/high-side-sense.js';
import { integrator } from './topologies/integrator.js';
import { inverting } from './topologies/inverting.js';
import { lowSideSense } from './topologies/low-side-sense.js';
import { multipleFeedback } from './topologies/multiple-feedback-low-pass.js';
import { nonInverting } from './topologies/non-inverting.js';
import { relaxationOscillator } from './topologies/relaxation-oscillator.js';
import { sallenKey } from './topologies/sallen-key-low-pass.js';
import { summing } from './topologies/summing.js';
import { transimpedance } from './topologies/transimpedance.js';

export type { Symbols } from './piece.js';

const DRAWN: Readonly<Record<Stage['topology'], (stage: Stage, symbols: Symbols) => readonly Piece[]>> = {
  follower,
  'non-inverting': nonInverting,
  inverting,
  summing,
  difference,
  transimpedance,
  'low-side-sense': lowSideSense,
  'high-side-sense': highSideSense,
  'sallen-key-low-pass': sallenKey,
  'multiple-feedback-low-pass': multipleFeedback,
  integrator,
  'relaxation-oscillator': relaxationOscillator,
};

/** The stage drawn with its values: one `<svg>` whose description names every part. Same stage, same bytes. */
export function schematicOf(stage: Stage, symbols: Symbols): string {
  const pieces = DRAWN[stage.topology](stage, symbols);
  const { body, width, height } = compose(pieces);
  const parts = pieces.flatMap(({ labels }) => labels.map(({ text }) => text));
  return sheetSvg({ kind: 'schematic', title: `Schematic: ${stage.topology.replaceAll('-', ' ')} stage`, description: `${parts.join('; ')}.`, width, height, body });
}

/** Labels of a schematic that found no place; for tests of the vocabulary. */
export function unplacedLabels(stage: Stage, symbols: Symbols): readonly string[] {
  return compose(DRAWN[stage.topology](stage, symbols)).unplaced;
}
