/** One answer of the demo that is held in a file. */
export interface DemoCase {
  /** Stem of the file in tests/golden/demo. */
  readonly name: string;
  readonly words: readonly string[];
  readonly exit: number;
}

interface DemoStage {
  readonly name: string;
  /** Three house parts: one that fits, one that does not, one that cannot be decided. */
  readonly fits: string;
  readonly rejected: string;
  readonly undecided: string;
}

const STAGES: readonly DemoStage[] = [
  { name: 'soil-moisture-probe', fits: 'GH-AMP-01', rejected: 'GH-AMP-04', undecided: 'GH-AMP-05' },
  { name: 'thermistor-bridge', fits: 'GH-AMP-09', rejected: 'GH-AMP-12', undecided: 'GH-AMP-06' },
  { name: 'vent-motor-control', fits: 'GH-AMP-14', rejected: 'GH-AMP-15', undecided: 'GH-AMP-16' },
  { name: 'vent-vibration-pickup', fits: 'GH-AMP-11', rejected: 'GH-AMP-03', undecided: 'GH-AMP-04' },
  { name: 'reference-buffer', fits: 'GH-AMP-07', rejected: 'GH-AMP-08', undecided: 'GH-AMP-20' },
];

const fileOf = ({ name }: DemoStage): string => `catalog/stages/${name}.yaml`;

/** On the generic sets alone. */
export const BEFORE: readonly DemoCase[] = STAGES.flatMap((stage) => [
  { name: `${stage.name}.demands`, words: ['demands', fileOf(stage)], exit: 0 },
  { name: `${stage.name}.before`, words: ['shortlist', fileOf(stage)], exit: 0 },
]);

export const IMPORT: DemoCase = { name: 'import', words: ['import', 'catalog/demo-approved.csv'], exit: 0 };

/** With the house list imported. */
export const AFTER: readonly DemoCase[] = STAGES.flatMap((stage) => [
  { name: `${stage.name}.after`, words: ['shortlist', fileOf(stage)], exit: 0 },
  { name: `${stage.name}.fits`, words: ['explain', stage.fits, fileOf(stage)], exit: 0 },
  { name: `${stage.name}.rejected`, words: ['explain', stage.rejected, fileOf(stage)], exit: 1 },
  { name: `${stage.name}.undecided`, words: ['explain', stage.undecided, fileOf(stage)], exit: 4 },
]);

export const WIDTHS = [60, 80, 120] as const;
