import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { readList } from '../../src/intake/read-list.js';
import { readWorkbook, isWorkbook } from '../../src/intake/workbook.js';
import { damaged, WOUNDS, type Wound } from '../support/damage.js';
import { faultsOf } from '../support/whole.js';
import { workbookBytes } from '../support/workbook.js';
import { drawing } from './draw.js';

export interface FuzzPlan {
  readonly files: number;
  readonly seed: number;
  readonly tell: (line: string) => void;
}

/** Reads damaged lists; gives the number of those that broke a rule, each told with what makes it again. */
export async function fuzzReading({ files, seed, tell }: FuzzPlan): Promise<{ readonly broken: number; readonly accepted: number }> {
  const samples = sampleFiles();
  const draw = drawing(seed);
  let [broken, accepted] = [0, 0];
  for (let file = 0; file < files; file += 1) {
    const sample = samples[draw(samples.length)]!;
    const wounds = Array.from({ length: 1 + draw(6) }, (): Wound => ({ at: draw(1 << 20), kind: WOUNDS[draw(WOUNDS.length)] ?? 'flip', byte: draw(256) }));
    const faults = await faultsOfFile(damaged(sample.bytes, wounds));
    if (faults === null) accepted += 1;
    else if (faults.length > 0) {
      broken += 1;
      tell(`seed ${seed}, file ${file}, ${sample.name}, wounds ${JSON.stringify(wounds)}: ${faults.join('; ')}`);
    }
    if ((file + 1) % 10_000 === 0) tell(`${file + 1} files, ${accepted} of them still lists, ${broken} broke a rule`);
  }
  return { broken, accepted };
}

/** Faults of the result; null for a list that was accepted without one. */
async function faultsOfFile(bytes: Uint8Array): Promise<readonly string[] | null> {
  try {
    const workbook = isWorkbook(bytes) ? { workbook: await readWorkbook(bytes) } : {};
    const result = readList(bytes, { file: 'list.csv', tier: 'approved', ...workbook });
    const faults = faultsOf(result);
    return result.ok && faults.length === 0 ? null : faults;
  } catch (error) {
    return [error instanceof Error ? (error.stack ?? error.message) : String(error)];
  }
}

interface Sample {
  readonly name: string;
  readonly bytes: Uint8Array;
}

function sampleFiles(): readonly Sample[] {
  const intake = join(process.cwd(), 'tests', 'intake');
  const paths = [...readdirSync(join(intake, 'samples')).map((name) => join('samples', name)), 'ordinary-list.csv'];
  const sheet = workbookBytes({ Approved: [['Part number', 'Status', 'Vos max (mV)', 'GBW typ (MHz)'], ['W-1', 'Approved', 3, 1], ['W-2', 'NRND', '2,5', 0.9]] });
  return [...paths.map((name) => ({ name, bytes: new Uint8Array(readFileSync(join(intake, name))) })), { name: 'a workbook', bytes: sheet }];
}
