import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readCondition } from '../../src/intake/condition.js';
import { readList } from '../../src/intake/read-list.js';
import { PARAMETERS } from '../../src/parts/figures.js';
import { central, from, stated } from '../support/band-figures.js';
import { RELATIONS } from '../support/bands.js';
import { DIES, genericList } from '../support/generic-list.js';

const readme = readFileSync(new URL('../../catalog/README.md', import.meta.url), 'utf8');
const { columns, parts } = genericList;

/** Cells of the table rows below a heading, without the header row and the rule under it. */
function table(heading: string): string[][] {
  const section = readme.split(/^#+ /m).find((text) => text.startsWith(heading));
  if (section === undefined) throw new Error(`catalog/README.md has no section "${heading}"`);
  const rows = section.split('\n').filter((line) => line.startsWith('|'));
  return rows.slice(2).map((line) => line.split('|').slice(1, -1).map((cell) => cell.trim()));
}

const quoted = (cell: string | undefined): string[] => [...(cell ?? '').matchAll(/`([^`]+)`/g)].map(([, text]) => text ?? '');

describe('catalog/README.md', () => {
  it('describes every parameter by its words, unit and kinds, in the order of the columns', () => {
    const described = table('Figures').map(([words, unit, kinds]) => ({
      words: quoted(words)[0],
      unit,
      kinds: (kinds ?? '').replace(/\(.*\)/, '').trim().split(', '),
    }));
    const wanted = Object.values(PARAMETERS).map(({ words, headerUnit, kinds }) => ({ words, unit: headerUnit, kinds: [...kinds] }));
    expect(described, 'src/parts/figures.ts and the table "Figures" of catalog/README.md differ').toEqual(wanted);
  });

  it('says of every parameter what it means and where it stands in a datasheet', () => {
    for (const [words, , , meaning, where] of table('Figures')) {
      expect((meaning ?? '').length, words).toBeGreaterThan(10);
      expect((where ?? '').length, words).toBeGreaterThan(10);
    }
  });

  it('describes every column that is not a figure', () => {
    const described = table('Identity columns').flatMap(([header]) => quoted(header));
    const others = columns.filter(({ reading }) => reading.kind !== 'figure').map(({ header }) => header);
    expect(new Set(described)).toEqual(new Set(others));
  });

  it('teaches only conditions that are read', () => {
    const taught = table('Conditions').flatMap(([written]) => quoted(written));
    expect(taught.length).toBeGreaterThan(6);
    for (const text of taught) expect(readCondition(text), text).toMatchObject({ ok: true });
  });

  it('gives reasons for every set, under its class, in the order of the file', () => {
    const told = readme.split(/^### /m).flatMap((section) => [...section.matchAll(/^\*\*(GX-[A-Z0-9-]+)\.\*\* (.+)$/gm)].map(([, id, why]) => ({ class: section.split('\n')[0], id, why: why ?? '' })));
    expect(told.map((one) => [one.class, one.id])).toEqual(DIES.map((part) => [part.class, part.id]));
    for (const { id, why } of told) expect(why.split(' ').length, id).toBeGreaterThan(20);
    expect(new Set(told.map(({ why }) => why)).size).toBe(told.length);
  });

  it('names the other packages of a die as the file has them', () => {
    const told = table('Families').map(([id, name, channels, first]) => [id, name, Number(channels), first]);
    const variants = parts.filter((part) => !DIES.includes(part));
    expect(told).toEqual(variants.map((part) => [part.id, part.package, part.channels, part.family]));
  });

  it('counts rows, sets and classes', () => {
    expect(readme).toContain(`holds ${parts.length} rows`);
    expect(readme).toContain(`of ${DIES.length} amplifiers in ${new Set(parts.map((part) => part.class)).size} classes`);
  });

  it('names every relation the sets keep', () => {
    expect(table('Relations every set keeps').map(([name]) => name)).toEqual(RELATIONS.map(({ name }) => name));
  });

  it('tells how far the short-circuit current stands above the usable one', () => {
    const ratios = parts.flatMap((part) => from([central(part, 'shortCircuitCurrent'), stated(part, 'outputCurrent', 'min')], (short, usable) => short / usable));
    const told = /\*Short-circuit current\* is ([\d.]+) to ([\d.]+) times/.exec(readme)?.slice(1).map(Number) ?? [];
    expect([Math.floor(10 * Math.min(...ratios)) / 10, Math.ceil(10 * Math.max(...ratios)) / 10]).toEqual(told);
  });

  it('teaches by an example that is read as it says', () => {
    const rows = table('Example').map(([, header, cell]) => ({ header: quoted(header)[0] ?? '', cell: cell ?? '' }));
    expect(rows.length).toBeGreaterThan(12);
    const line = (cells: readonly string[]): string => cells.map((cell) => `"${cell}"`).join(',');
    const text = `${line(['id', ...rows.map(({ header }) => header)])}\n${line(['EXAMPLE', ...rows.map(({ cell }) => cell)])}\n`;
    const example = readList(Buffer.from(text), { file: 'example.csv', tier: 'approved' });
    if (!example.ok) throw new Error(example.problems.map(({ message }) => message).join('\n'));
    expect(example.parts[0]?.figures).toHaveLength(rows.length);
  });

  it('tells the thermal resistance of each package as the file has it', () => {
    const resistance = new Map<string, number>();
    for (const part of parts) {
      const figure = part.figures.find(({ parameter }) => parameter === 'thermalResistance');
      if (part.package === null || figure === undefined) throw new Error(`${part.id}: package or thermal resistance missing`);
      expect(resistance.get(part.package) ?? figure.value, part.package).toBe(figure.value);
      resistance.set(part.package, figure.value);
    }
    const told = /\*Thermal resistance\* goes by package: (.*) K\/W/.exec(readme)?.[1]?.split(', ').map((text) => text.split(' '));
    expect(new Map(told?.map(([name = '', kelvin]) => [name, Number(kelvin)]))).toEqual(resistance);
  });

  it('carries the three cautions', () => {
    expect(readme).toContain('The datasheet of the part you choose governs.');
    expect(readme).toContain('Prototypes are measured');
    expect(readme).toContain('qualified review and the applicable codes decide');
  });
});
