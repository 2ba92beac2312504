import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Part, PartSource } from '../../src/parts/part.js';
import { judgeAgain, type JudgedAgain, type KeptStage } from '../../src/saved/index.js';
import { ROOT } from '../support/built.js';
import { SAMPLE_PARTS, sampleSource } from '../support/sample-report.js';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'saved-'));
  // The sample parts say nothing about capacitive loads, so the stage has none here.
  const probe = readFileSync(join(ROOT, 'catalog', 'stages', 'soil-moisture-probe.yaml'), 'utf8');
  writeFileSync(join(folder, 'probe.yaml'), probe.replace(/, capacitance: [^,}]*/u, ''));
});
afterAll(() => { rmSync(folder, { recursive: true, force: true }); });

const kept = (name: string, part: string | null = null): KeptStage => ({ path: join(folder, name), name, part });
const sourceOf = (parts: readonly Part[]): PartSource => ({ ...sampleSource(), parts });
const ALL = sourceOf(SAMPLE_PARTS);

function judged(stage: KeptStage, before: PartSource, after: PartSource): JudgedAgain {
  const [one] = judgeAgain([stage], before, after);
  if (one === undefined) throw new Error('one stage, one answer');
  return one;
}

function both(stage: KeptStage, before: PartSource, after: PartSource): Extract<JudgedAgain, { isOther: boolean }> {
  const one = judged(stage, before, after);
  if ('failed' in one) throw new Error(`not judged: ${one.failed.cause}`);
  return one;
}

describe('a kept stage on two catalogs', () => {
  let fits: readonly string[] = [];
  beforeAll(() => {
    fits = both(kept('probe.yaml'), ALL, ALL).before.fits;
    expect(fits.length).toBeGreaterThan(0);
  });

  it('is about the part the file itself names, before the one that was kept with it', () => {
    const named = fits[0] ?? '';
    writeFileSync(join(folder, 'named.yaml'), `${readFileSync(join(folder, 'probe.yaml'), 'utf8')}part: ${named}\n`);
    const one = both(kept('named.yaml', 'NO-SUCH'), ALL, ALL);
    expect(one.kept.part).toBe(named);
    expect(one.after.chosen).toMatchObject({ outcome: 'fits', rank: 1 });
  });

  it('is the same answer on the same parts, in any order', () => {
    const one = both(kept('probe.yaml', fits[0] ?? ''), ALL, sourceOf([...SAMPLE_PARTS].reverse()));
    expect(one.isOther).toBe(false);
    expect(one.after).toEqual(one.before);
    expect(one.before.chosen).toMatchObject({ outcome: 'fits', rank: 1 });
  });

  it('is another answer when the chosen part is gone, and says so', () => {
    const one = both(kept('probe.yaml', fits[0] ?? ''), ALL, sourceOf(SAMPLE_PARTS.filter(({ id }) => id !== fits[0])));
    expect(one).toMatchObject({ isOther: true, after: { chosen: { outcome: 'absent', proof: null, rank: null } } });
    expect(one.after.fits).toEqual(fits.slice(1));
  });

  it('is another answer when one more fits, the same when one more does not', () => {
    const [first] = SAMPLE_PARTS.filter(({ id }) => id === fits[0]);
    if (first === undefined) throw new Error('the first choice is a sample part');
    const twin = { ...first, id: 'TWIN', family: null };
    const hopeless = { ...twin, id: 'HOPELESS', figures: twin.figures.map((figure) => (figure.parameter === 'supplyVoltage' && figure.kind === 'max' ? { ...figure, value: 1 } : figure)) };
    expect(both(kept('probe.yaml'), ALL, sourceOf([...SAMPLE_PARTS, twin])).isOther).toBe(true);
    const worse = both(kept('probe.yaml'), ALL, sourceOf([...SAMPLE_PARTS, hopeless]));
    expect(worse.isOther).toBe(false);
    expect(worse.after.rejected).toBe(worse.before.rejected + 1);
  });
});

describe('a file that is no stage any more', () => {
  it('that is gone, or under a name that is no folder', () => {
    expect(judged(kept('nowhere.yaml'), ALL, ALL)).toMatchObject({ failed: { cause: 'gone', problems: [] } });
    expect(judged(kept('probe.yaml/nowhere.yaml'), ALL, ALL)).toMatchObject({ failed: { cause: 'gone' } });
  });

  it('that is a folder, or not UTF-8, or no stage', () => {
    mkdirSync(join(folder, 'folder.yaml'));
    writeFileSync(join(folder, 'latin.yaml'), Buffer.from([0x74, 0x3a, 0x20, 0xb5]));
    writeFileSync(join(folder, 'wrong.yaml'), 'topology: follower\nsupply: 5\n');
    writeFileSync(join(folder, 'beyond.yaml'), 'topology: non-inverting\nsupply: 3.3 V\ngain: 40\nsignal: {input: 25 mV..330 mV}\n');
    expect(judged(kept('folder.yaml'), ALL, ALL)).toMatchObject({ failed: { cause: 'unreadable' } });
    expect(judged(kept('latin.yaml'), ALL, ALL)).toMatchObject({ failed: { cause: 'wrong', problems: [] } });
    expect(judged(kept('wrong.yaml'), ALL, ALL)).toMatchObject({ failed: { cause: 'wrong', problems: [{ code: 'Q001' }, {}] } });
    expect(judged(kept('beyond.yaml'), ALL, ALL)).toMatchObject({ failed: { cause: 'wrong', problems: [{ code: 'S201' }] } });
  });

  it('does not keep the others from being judged, in the order given', () => {
    const all = judgeAgain([kept('nowhere.yaml'), kept('probe.yaml')], ALL, ALL);
    expect(all.map((one) => ('failed' in one ? one.failed.cause : one.isOther))).toEqual(['gone', false]);
  });
});
