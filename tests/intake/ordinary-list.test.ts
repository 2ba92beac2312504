import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { shortlist } from '../../src/engine.js';
import type { ReadList } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';
import { writeList } from '../../src/intake/write-list.js';
import type { Report } from '../../src/report.js';
import { readStage } from '../../src/spec/read.js';
import { buildStage } from '../../src/stage/index.js';
import { genericList } from '../support/generic-list.js';

// Forty invented rows as hardware lists have them: typical figures, one swing number, words for the rails, here and there a hole.

const STAGES = join(import.meta.dirname, '../../catalog/stages');
const BYTES = readFileSync(join(import.meta.dirname, 'ordinary-list.csv'));

function read(classWithin?: number): ReadList {
  const list = readList(BYTES, { file: 'hardware-list.csv', tier: 'approved', generic: genericList.parts, ...(classWithin === undefined ? {} : { classWithin }) });
  if (!list.ok) throw new Error(JSON.stringify(list.problems, null, 1));
  return list;
}

function judged(list: ReadList, name: string): Report {
  const spec = readStage(readFileSync(join(STAGES, name), 'utf8'), { file: name, overrides: [] });
  if (!spec.ok) throw new Error(JSON.stringify(spec.problems));
  const built = buildStage(spec.spec);
  if (!built.ok) throw new Error(JSON.stringify(built.problems));
  return shortlist(built.stage, { parts: [...list.parts, ...genericList.parts], sha256: list.sha256, origin: () => null });
}

const approved = <Line extends { readonly part: { readonly tier: string } }>(lines: readonly Line[]): Line[] => lines.filter(({ part }) => part.tier === 'approved');

describe('forty ordinary rows', () => {
  const list = read();
  const withClasses = read(0.3);

  it('are read without a question or a fault', () => {
    expect(list.parts).toHaveLength(40);
    expect(list.warnings).toEqual([]);
    expect(list.parts.every(({ figures }) => figures.length > 12)).toBe(true);
  });

  it('make no limit out of a typical figure', () => {
    const limits = list.parts.flatMap(({ figures }) => figures.filter(({ kind, parameter }) => kind !== 'typ' && parameter !== 'supplyVoltage' && parameter !== 'temperature'));
    // The one column whose header says so.
    expect(new Set(limits.map(({ parameter, kind }) => `${parameter} ${kind}`))).toEqual(new Set(['capacitiveLoad max']));
  });

  it('keep what words say as assumed, never as limits', () => {
    const rails = list.parts.flatMap(({ figures }) => figures.filter(({ parameter }) => parameter === 'inputLowHeadroom' || parameter === 'inputHighHeadroom'));
    expect(rails.length).toBeGreaterThan(50);
    expect(rails.every(({ assumed, kind }) => assumed === true && kind === 'typ')).toBe(true);
  });

  it('get a class proposed with its distance, and none unasked', () => {
    expect(list.parts.every((part) => part.class === null)).toBe(true);
    expect(list.proposals).toHaveLength(40);
    expect(list.proposals.find(({ part }) => part === 'HL-1021')).toMatchObject({ class: 'zero-drift-micropower' });
    expect(list.proposals.every(({ distance, compared }) => distance >= 0 && distance < 0.5 && compared >= 5)).toBe(true);
    expect(withClasses.parts.filter((part) => part.class !== null).length).toBe(40 - withClasses.proposals.length);
  });

  it('keeps with the mapping that classes were applied', () => {
    const again = readList(BYTES, { file: 'hardware-list.csv', tier: 'approved', generic: genericList.parts, mappings: [withClasses.mapping!] });
    expect(again.ok && again.parts).toEqual(withClasses.parts);
  });

  it.each([
    ['soil-moisture-probe.yaml', 8],
    ['thermistor-bridge.yaml', 10],
    ['reference-buffer.yaml', 8],
    ['vent-vibration-pickup.yaml', 5],
  ])('%s: parts fit with proof typical and named confirmations, and few are undecided', (stage, least) => {
    const { fit, undecided, rejected } = judged(withClasses, stage);
    const [fits, open] = [approved(fit), approved(undecided)];
    expect(fits.length).toBeGreaterThanOrEqual(least);
    expect(new Set(fits.map(({ proof }) => proof))).toEqual(new Set(['typical']));
    expect(fits.every(({ confirm }) => confirm.length > 0 && confirm.every(({ figure }) => figure !== ''))).toBe(true);
    expect(open.length).toBeLessThan(approved(rejected).length);
    expect(open.length).toBeLessThanOrEqual(fits.length);
  });

  it.each(readdirSync(STAGES).filter((name) => name.endsWith('.yaml')))('%s: no part of the list fits with proof limits', (stage) => {
    expect(approved(judged(withClasses, stage).fit).every(({ proof }) => proof === 'typical')).toBe(true);
  });

  it('without classes borrow nothing: fewer fit, and nothing else does', () => {
    const [plain, lent] = [judged(list, 'soil-moisture-probe.yaml'), judged(withClasses, 'soil-moisture-probe.yaml')];
    const ids = (report: Report): string[] => approved(report.fit).flatMap(({ part, variants }) => [part.id, ...variants.map((one) => one.part.id)]);
    expect(ids(plain).length).toBeLessThan(ids(lent).length);
    expect(ids(lent)).toEqual(expect.arrayContaining(ids(plain)));
  });
});

it('the canonical export has no assumed figure: it would come back as printed', () => {
  const { parts } = read(0.3);
  const back = readList(new TextEncoder().encode(writeList(parts)), { file: 'back.csv', tier: 'approved' });
  if (!back.ok) throw new Error(JSON.stringify(back.problems, null, 1));
  expect(back.parts).toEqual(parts.map((part) => ({ ...part, figures: part.figures.filter(({ assumed }) => assumed !== true) })));
});

describe('what is declared once for a list', () => {
  const text = 'Part number,Status,Vos max (mV),Iq max (µA),Temp range (°C)\nA-1,Approved,3,85,\nA-2,Approved,3,85,0..70\n';
  const list = readList(new TextEncoder().encode(text), { file: 'x.csv', tier: 'approved', declare: { temperature: [-40, 85], offsetVoltage: 'over', limits: 'over', by: 'A. Owner', date: '2024-02-17' } });
  if (!list.ok) throw new Error('refused');
  const [first, second] = list.parts;

  it('completes parts that say nothing, as assumed', () => {
    expect(first?.figures.filter(({ parameter }) => parameter === 'temperature')).toEqual([
      { parameter: 'temperature', kind: 'min', value: -40, condition: {}, assumed: true },
      { parameter: 'temperature', kind: 'max', value: 85, condition: {}, assumed: true },
    ]);
    expect(second?.figures.filter(({ parameter, assumed }) => parameter === 'temperature' && assumed === true)).toEqual([]);
    expect(first?.figures.find(({ parameter }) => parameter === 'offsetVoltage')).toEqual({ parameter: 'offsetVoltage', kind: 'max', value: 0.003, condition: { temperature: 'over' }, assumed: true });
  });

  it('adds nothing where the declaration is what holds anyway', () => {
    expect(first?.figures.find(({ parameter }) => parameter === 'quiescentCurrent')).toEqual({ parameter: 'quiescentCurrent', kind: 'max', value: 85e-6, condition: {} });
  });

  it('is told, with name and date, and kept with the mapping', () => {
    expect(list.notes).toContain('declared: temperature -40..85 °C, offset voltage over temperature, limits over temperature, by A. Owner, 2024-02-17; figures so completed are assumed.');
    const again = readList(new TextEncoder().encode(text), { file: 'x.csv', tier: 'approved', mappings: [list.mapping!] });
    expect(again.ok && again.parts).toEqual(list.parts);
  });
});
