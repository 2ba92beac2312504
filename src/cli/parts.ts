import { CHECK_IDS, partsJson, renderParts, shortlist, suggest, type Part, type PartLine, type Stage, type Tier } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { guardedCells, writeList } from '../intake/write-list.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError, twoForms } from './request-error.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';
import { readStageOf } from './stage-input.js';

export interface PartsOptions extends CommonOptions {
  readonly tier?: Tier;
  /** A check, with the stage it is asked for. */
  readonly failing?: string;
  readonly stage?: string;
  /** With --csv: no apostrophe before what a spreadsheet would run. */
  readonly raw?: boolean;
}

/** `railfit parts [WORD…]`: the catalog, or the parts whose id, class or description has every word. */
export async function runParts(session: Session, words: readonly string[], options: PartsOptions): Promise<Outcome> {
  const stage = await stageOf(options);
  return withCatalog(session, options, (catalog) => {
    const source = stage === null ? catalog.source() : catalog.screenSource();
    const failing = stage === null ? null : failingChecks(shortlist(stage, source));
    const tier = options.tier ?? (options.csv === true ? 'approved' : undefined);
    const wanted = (part: Part): boolean => matches(part, words) && (tier === undefined || part.tier === tier);
    const lines: PartLine[] = source.parts.filter(wanted).map((part) => ({ part, ...(failing === null ? {} : { failing: failing.get(part.id) ?? [] }) }));
    const shown = lines.filter((line) => options.failing === undefined || line.failing?.includes(options.failing) === true);
    const exit = shown.length === 0 ? EXIT.no : EXIT.yes;
    if (options.csv === true) return { ...written(shown.map(({ part }) => part), options), exit };
    const list = { total: source.parts.length, parts: shown };
    if (options.json === true) return { text: partsJson(list), exit };
    return { text: renderParts(list, styleFor(session, options)), exit };
  });
}

/** Canonical CSV, and on stderr how many cells were made safe: whoever reads the file elsewhere must know. */
function written(parts: readonly Part[], { raw = false }: PartsOptions): Pick<Outcome, 'text' | 'talk'> {
  const text = writeList(parts, { raw });
  const guarded = raw ? 0 : guardedCells(parts);
  if (guarded === 0) return { text };
  const [cells, start] = guarded === 1 ? ['1 cell', 'starts'] : [`${guarded} cells`, 'start'];
  return { text, talk: `note: ${cells} ${start} like a formula and got an apostrophe in front; import takes it off again, --raw leaves it out\n` };
}

async function stageOf(options: PartsOptions): Promise<Stage | null> {
  const { failing, stage } = options;
  const rawAlone = options.raw === true && options.csv !== true ? [commandProblem('C106', '--raw belongs to --csv', { fix: 'railfit parts --csv --raw', path: '--raw' })] : [];
  const already = [...twoForms(options), ...rawAlone, ...(failing === undefined ? [] : failingProblems(failing, stage))];
  if (stage !== undefined) return (await readStageOf(stage, { already })).stage;
  if (already.length > 0) throw new RequestError(already, EXIT.request);
  return null;
}

/** What is wrong with `--failing CHECK`: no stage to fail on, or no such check. */
function failingProblems(check: string, stage: string | undefined): Problem[] {
  const problems: Problem[] = [];
  if (stage === undefined) problems.push(commandProblem('C106', '--failing asks for a stage', { fix: '--failing dc-error --stage stage.yaml', path: '--failing' }));
  if (!(CHECK_IDS as readonly string[]).includes(check)) {
    const near = suggest(check, CHECK_IDS);
    const fix = near.length === 0 ? 'railfit help checks lists them' : `did you mean ${near.join(', ')}?`;
    problems.push(commandProblem('C104', `--failing ${check}: no such check`, { fix, path: '--failing' }));
  }
  return problems;
}

function failingChecks(report: ReturnType<typeof shortlist>): Map<string, readonly string[]> {
  return new Map(report.rejected.map((one) => [one.part.id, one.deciding]));
}

function matches(part: Part, words: readonly string[]): boolean {
  const text = [part.id, part.class, part.family, part.description].join(' ').toLowerCase();
  return words.every((word) => text.includes(word.toLowerCase()));
}
