/** One run of the built command and the file its document must equal, byte for byte. */
export interface GoldenCase {
  readonly file: string;
  readonly words: readonly string[];
  readonly exit: number;
  readonly env?: Readonly<Record<string, string>>;
  /** Where the text is expected; stdout by default. */
  readonly stream?: 'stdout' | 'stderr';
  /** What the other stream says, where it is not empty. */
  readonly told?: string;
}

const STAGES = ['reference-buffer', 'soil-moisture-probe', 'thermistor-bridge', 'vent-motor-control', 'vent-vibration-pickup'];
const PROBE = 'soil-moisture-probe.yaml';
const FITS = 'HOUSE-02';
const UNDECIDED = 'HOUSE-03';
const REJECTED = 'HOUSE-06';

/** In this order, on one catalog: the first run fills it. */
export const IMPORTS: readonly GoldenCase[] = [
  { file: 'import.imported.json', words: ['import', 'approved.csv', '--json'], exit: 0 },
  { file: 'import.no-change.json', words: ['import', 'approved.csv', '--json'], exit: 0 },
  { file: 'import.dry-run.json', words: ['import', 'approved-next.csv', '--dry-run', '--json'], exit: 0 },
  { file: 'import.refused.json', words: ['import', 'refused.csv', '--json'], exit: 3 },
  { file: 'import.no-change.txt', words: ['import', 'approved.csv'], exit: 0 },
  { file: 'import.dry-run.txt', words: ['import', 'approved-next.csv', '--dry-run'], exit: 0 },
  { file: 'import.refused.txt', words: ['import', 'refused.csv'], exit: 3, stream: 'stderr' },
  { file: 'stages.add.json', words: ['stages', 'add', PROBE, '--part', 'HOUSE-03', '--json'], exit: 0 },
  { file: 'stages.add.txt', words: ['stages', 'add', 'reference-buffer.yaml'], exit: 0 },
  { file: 'import.stages.json', words: ['import', 'approved-next.csv', '--dry-run', '--json'], exit: 0 },
  { file: 'import.stages.txt', words: ['import', 'approved-next.csv', '--dry-run'], exit: 0 },
  { file: 'import.held.json', words: ['import', 'approved-short.csv', '--json'], exit: 3 },
  { file: 'import.held.txt', words: ['import', 'approved-short.csv'], exit: 3, stream: 'stderr' },
];

const wrong = ['shortlist', '--supply', '4.2..3.0 V', '--load', '10M', '--set', 'signal.amplitude=1 V', '--gian', '8'];

/** Read-only runs on the catalog the imports left. */
export const DOCUMENTS: readonly GoldenCase[] = [
  ...STAGES.flatMap((stage): GoldenCase[] => [
    { file: `shortlist.${stage}.json`, words: ['shortlist', `${stage}.yaml`, '--json'], exit: 0 },
    { file: `demands.${stage}.json`, words: ['demands', `${stage}.yaml`, '--json'], exit: 0 },
  ]),
  { file: 'shortlist.all.json', words: ['shortlist', PROBE, '--json', '--all'], exit: 0 },
  { file: 'shortlist.asked.json', words: ['shortlist', PROBE, '--json', '--top', '2', '--strict', '--order', 'price', '--assume', `${UNDECIDED}.offsetDrift=4µV/K`], exit: 0 },
  { file: 'lookups.json', words: ['shortlist', PROBE, '--lookups', '--json'], exit: 0 },
  { file: 'shortlist.csv', words: ['shortlist', PROBE, '--csv'], exit: 0 },
  { file: 'explain.fits.json', words: ['explain', FITS, PROBE, '--json'], exit: 0 },
  { file: 'explain.undecided.json', words: ['explain', UNDECIDED, PROBE, '--json'], exit: 4 },
  { file: 'explain.rejected.json', words: ['explain', REJECTED, PROBE, '--json'], exit: 1 },
  { file: 'explain.changes.json', words: ['explain', 'GX-CMOS-1M-RRIO', PROBE, '--json'], exit: 1 },
  { file: 'shortlist.nothing-fits.json', words: ['shortlist', PROBE, '--set', 'limits.supplyCurrent=200 nA', '--json'], exit: 1 },
  { file: 'predict.json', words: ['predict', FITS, PROBE, '--json'], exit: 0 },
  { file: 'predict.compared.csv', words: ['predict', FITS, '--compare', REJECTED, PROBE, '--csv'], exit: 0 },
  { file: 'comparison.json', words: ['explain', FITS, PROBE, '--against', REJECTED, '--json'], exit: 0 },
  { file: 'comparison.fits.json', words: ['explain', 'HOUSE-01', PROBE, '--against', FITS, '--json'], exit: 0 },
  { file: 'sweep.json', words: ['sweep', PROBE, '--over', 'supply=1V..5.5V', '--steps', '10', '--json'], exit: 0 },
  { file: 'parts.json', words: ['parts', '--json'], exit: 0 },
  { file: 'parts.failing.json', words: ['parts', '--failing', 'dc-error', '--stage', PROBE, '--json'], exit: 0 },
  { file: 'parts.csv', words: ['parts', '--csv'], exit: 0, told: 'note: 1 cell starts like a formula and got an apostrophe in front; import takes it off again, --raw leaves it out\n' },
  { file: 'part.approved.json', words: ['part', 'HOUSE-07', '--json'], exit: 0 },
  { file: 'part.generic.json', words: ['part', 'GX-NANO', '--json'], exit: 0 },
  { file: 'stages.json', words: ['stages', '--json'], exit: 0 },
  { file: 'check.json', words: ['check', '--json'], exit: 4 },
  { file: 'check.fits.json', words: ['check', PROBE, '--part', FITS, '--json'], exit: 0 },
  { file: 'draft.json', words: ['draft', '--json'], exit: 0 },
  { file: 'help.json', words: ['help', 'Q002', '--json'], exit: 0 },
  { file: 'problems.request.json', words: [...wrong, '--json'], exit: 2 },
  { file: 'problems.request.txt', words: wrong, exit: 2, stream: 'stderr' },
  { file: 'problems.surroundings.json', words: ['demands', 'nowhere.yaml', '--json'], exit: 5 },
];

const MADE = ['--time', '2026-03-14T09:30:00Z'];

/** In this order: the second judges again what the first wrote. */
export const REPORTS: readonly GoldenCase[] = [
  { file: 'report.json', words: ['report', PROBE, '--json', '--top', '1', ...MADE, '-o', 'review.html'], exit: 0, told: 'wrote review.html; railfit verify review.html judges it again\n' },
  { file: 'report.md', words: ['report', PROBE, 'reference-buffer.yaml', '--format', 'md', '--top', '3', ...MADE], exit: 0 },
  { file: 'verification.json', words: ['verify', 'review.html', '--json'], exit: 0 },
  { file: 'verification.txt', words: ['verify', 'review.html'], exit: 0 },
];

const WIDTHS = [40, 60, 80, 100, 200];

const TEXTS: readonly { readonly name: string; readonly words: readonly string[]; readonly exit: number }[] = [
  { name: 'shortlist', words: ['shortlist', PROBE], exit: 0 },
  { name: 'explain.fits', words: ['explain', FITS, PROBE], exit: 0 },
  { name: 'explain.undecided', words: ['explain', UNDECIDED, PROBE], exit: 4 },
  { name: 'explain.rejected', words: ['explain', REJECTED, PROBE], exit: 1 },
  { name: 'predict', words: ['predict', FITS, PROBE], exit: 0 },
  { name: 'demands', words: ['demands', PROBE], exit: 0 },
  { name: 'check', words: ['check', PROBE, 'reference-buffer.yaml'], exit: 2 },
  { name: 'stages', words: ['stages'], exit: 0 },
  { name: 'parts', words: ['parts'], exit: 0 },
  { name: 'part', words: ['part', 'HOUSE-01'], exit: 0 },
];

const atWidth = (width: number): Readonly<Record<string, string>> => ({ COLUMNS: String(width) });

/** Text, plain and in ASCII at five widths, in colour at the usual one. */
export const TEXT_CASES: readonly GoldenCase[] = [
  ...TEXTS.flatMap(({ name, words, exit }) => [
    ...WIDTHS.flatMap((width): GoldenCase[] => [
      { file: `text/${name}.${width}.txt`, words, exit, env: atWidth(width) },
      { file: `text/${name}.${width}.ascii.txt`, words: [...words, '--ascii'], exit, env: atWidth(width) },
    ]),
    { file: `text/${name}.100.colour.txt`, words: [...words, '--color=always'], exit, env: atWidth(100) },
  ]),
  ...STAGES.filter((stage) => `${stage}.yaml` !== PROBE).map((stage) => ({ file: `text/shortlist.${stage}.100.txt`, words: ['shortlist', `${stage}.yaml`], exit: 0, env: atWidth(100) })),
  { file: 'text/predict.compared.100.txt', words: ['predict', FITS, '--compare', REJECTED, PROBE], exit: 0, env: atWidth(100) },
  { file: 'text/shortlist.all.100.txt', words: ['shortlist', PROBE, '--all'], exit: 0, env: atWidth(100) },
  { file: 'text/explain.sources.100.txt', words: ['explain', REJECTED, PROBE, '--all', '--sources'], exit: 1, env: atWidth(100) },
  ...[40, 100].map((width) => ({ file: `text/lookups.${width}.txt`, words: ['shortlist', PROBE, '--lookups'], exit: 0, env: atWidth(width) })),
  { file: 'text/explain.formulas.100.txt', words: ['explain', REJECTED, PROBE, '--formulas'], exit: 1, env: atWidth(100) },
  { file: 'text/shortlist.nothing-fits.100.txt', words: ['shortlist', PROBE, '--set', 'limits.supplyCurrent=1 µA'], exit: 1, env: atWidth(100) },
];

/** The same texts in colour, upright, usual and wide: stripped of colour they equal the plain files. */
export const COLOUR_CASES: readonly GoldenCase[] = TEXTS.flatMap(({ name, words, exit }) =>
  [40, 100, 200].map((width) => ({ file: `text/${name}.${width}.txt`, words: [...words, '--color=always'], exit, env: atWidth(width) })),
);
