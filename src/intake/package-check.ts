import type { Doubt } from './cross-checks.js';
import { checkedFigure } from './cross-checks.js';
import type { ReadPart } from './identity.js';
import type { ListColumn } from './list.js';

/** Warns where a package has too few pins for its amplifiers: one takes five, two take eight, four take fourteen (three pins each and two rails). */
export function packageWarning(one: ReadPart, columns: readonly ListColumn[]): Doubt | null {
  const { package: name, channels } = one.part;
  const column = columns.find(({ reading }) => reading.kind === 'identity' && reading.field === 'channels');
  const pins = pinsOf(name);
  if (pins === null || channels === null || column === undefined || pins >= 3 * channels + 2) return null;
  const reason = `${channels} amplifiers need ${3 * channels + 2} pins, and ${name ?? ''} has ${pins}`;
  return { one, column, fault: { code: 'I605', reason, fix: 'check package and channels' } };
}

/** The pins in a package name: `SOT-23-5` has 5, `SO-14 (MS-012)` has 14. The 23 of SOT-23 is a name. */
function pinsOf(name: string | null): number | null {
  const match = /^(?:SOT-?23|SC-?70|SOIC|SO|V?SSOP|MSOP|TSSOP|DFN|QFN|DIP|PDIP|WLCSP)-(\d{1,2})(?![\d-])/iu.exec(name?.trim() ?? '');
  const pins = match === null ? 0 : Number(match[1]);
  return pins >= 4 && pins <= 64 ? pins : null;
}

/** Ranges of the grades of AEC-Q100 (Automotive Electronics Council, failure mechanism based stress test qualification), °C. */
const GRADES: Readonly<Record<string, readonly [number, number]>> = { 0: [-40, 150], 1: [-40, 125], 2: [-40, 105], 3: [-40, 85] };

/** Warns where the qualification grade and the stated temperature range do not agree. */
export function qualificationWarning(one: ReadPart, columns: readonly ListColumn[]): Doubt | null {
  const grade = /\bgrade\s*([0-3])\b/iu.exec(one.part.qualification ?? '')?.[1];
  const range = grade === undefined ? undefined : GRADES[grade];
  const [low, high] = [checkedFigure(one, 'temperature', ['min']), checkedFigure(one, 'temperature', ['max'])];
  const column = columns.find(({ reading }) => reading.kind === 'identity' && reading.field === 'qualification');
  if (range === undefined || column === undefined || low === null || high === null || (low.value <= range[0] && high.value >= range[1])) return null;
  const reason = `${one.part.qualification ?? ''} means ${range[0]}..${range[1]} °C, and the list says ${low.value}..${high.value} °C`;
  return { one, column, fault: { code: 'I606', reason, fix: 'check grade and range' } };
}
