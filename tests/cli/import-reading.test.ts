import { copyFileSync, existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { requireBuilt, ROOT } from '../support/built.js';
import { makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';
import { workbookBytes, type WorkbookSheets } from '../support/workbook.js';
import { onTerminal, type Place } from '../support/terminal.js';

const SAMPLES = join(ROOT, 'tests', 'intake', 'samples');
let place: Workplace;
/** A catalog of each test's own: a copy of one that holds the generic sets. */
let home: string;
let count = 0;

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  for (const name of readdirSync(SAMPLES)) copyFileSync(join(SAMPLES, name), join(place.folder, name.slice(0, 2) + '.csv'));
  await place.run(['parts']);
  return () => { place.remove(); };
});
beforeEach(() => {
  count += 1;
  home = join(place.folder, `home-${count}`);
  mkdirSync(home);
  copyFileSync(place.catalog, join(home, 'catalog.sqlite'));
});

const railfit = (...words: string[]): Promise<Ran> => place.run(words, { env: { RAILFIT_CATALOG: join(home, 'catalog.sqlite') } });
const run = (...words: string[]): Promise<Ran> => railfit('import', ...words);
const folderOfMappings = (): string => join(home, 'mappings');

describe('an ordinary list', () => {
  it('is imported, says how it was read, and keeps that beside the catalog', async () => {
    const ran = await run('01.csv');
    expect(ran).toMatchObject({ exit: 0, stdout: expect.stringMatching(/^Imported 8 parts from 01\.csv/u) as string });
    expect(ran.stderr).toContain('encoding UTF-8 (byte-order mark, removed)');
    const [file = ''] = readdirSync(folderOfMappings());
    expect(JSON.parse(readFileSync(join(folderOfMappings(), file), 'utf8'))).toMatchObject({ url: '01.csv', dialect: { delimiter: ';' } });
    expect((await run('01.csv')).stdout).toMatch(/no change/u);
    expect(readdirSync(folderOfMappings())).toEqual([file]);
  });

  it('tells the cell of every figure', async () => {
    await run('01.csv');
    const part = await railfit('part', 'ORG-OA-0006', '--json');
    const { figures } = JSON.parse(part.stdout) as { figures: { parameter: string; kind: string; origin: unknown; cell?: string }[] };
    expect(JSON.stringify(figures.find(({ parameter }) => parameter === 'biasCurrent'))).toContain('45.000');
  });

  it('tells where two figures of one cell, words and declarations come from, in part and in explain', async () => {
    writeFileSync(join(place.folder, 'words.csv'), 'Part number,Status,Vos typ/max (mV),Rail-to-rail,GBW typ (MHz),Supply (V)\nW-1,Approved,0.5/3,RRIO,1,1.8..5.5\n');
    expect((await run('words.csv', '--declare', 'temperature=-40..85 °C', '--declare', 'by=A. Owner')).exit).toBe(0);
    const shown = (await place.run(['part', 'W-1', '--sources'], { env: { RAILFIT_CATALOG: join(home, 'catalog.sqlite'), COLUMNS: '200' } })).stdout;
    expect(shown).toMatch(/offset voltage +max +3 mV .*line 2, row 2, column C, Vos typ\/max \(mV\) = "0\.5\/3"/u);
    expect(shown).toMatch(/input head-room to V- +typ, assumed +0 V .*column D, Rail-to-rail = "RRIO"/u);
    expect(shown).toMatch(/specified temperature +max, assumed +85 °C .*declared for the whole list: temperature -40\.\.85 °C, by A\. Owner/u);
    const stage = ['--topology', 'follower', '--supply', '5 V', '--input', '0.5..2 V', '--set', 'limits.dcError=20 mV'];
    const explained = (await railfit('explain', 'W-1', ...stage, '--sources', '--json')).stdout;
    expect(explained).toContain('words.csv#cell=2,3');
    const figures = (JSON.parse((await railfit('part', 'W-1', '--json')).stdout) as { figures: { parameter: string; assumed?: boolean; origin: string }[] }).figures;
    expect(figures.filter(({ assumed }) => assumed === true).map(({ parameter, origin }) => [parameter, origin])).toEqual([
      ['inputLowHeadroom', 'words.csv#cell=2,4'],
      ['inputHighHeadroom', 'words.csv#cell=2,4'],
      ['temperature', 'assumption declared for the whole list: temperature -40..85 °C, by A. Owner'],
      ['temperature', 'assumption declared for the whole list: temperature -40..85 °C, by A. Owner'],
    ]);
  });

  it('with --dry-run keeps nothing', async () => {
    expect((await run('01.csv', '-n')).exit).toBe(0);
    expect(existsSync(folderOfMappings())).toBe(false);
  });

  it('--show-mapping is the document on stdout, and imports nothing', async () => {
    const shown = await run('02.csv', '--show-mapping');
    expect(JSON.parse(shown.stdout)).toMatchObject({ '@context': ['http://www.w3.org/ns/csvw', { railfit: 'urn:railfit:mapping#' }] });
    expect((await railfit('parts', '--tier', 'approved')).exit).toBe(1);
  });

  it('--mapping names the file, edited by hand it counts, broken it is told', async () => {
    const list = (supplier: string): void => writeFileSync(join(place.folder, 'hardware.csv'), `Part number,Status,Maker,Ib max (nA)\nA-1,Approved,${supplier},0.5\n`);
    list('MKA');
    await run('hardware.csv', '--mapping', 'hardware.json');
    const path = join(place.folder, 'hardware.json');
    const text = readFileSync(path, 'utf8');
    writeFileSync(path, text.replace('"railfit:unit": "nA"', '"railfit:unit": "pA"'));
    list('MKB');
    await run('hardware.csv', '--mapping', 'hardware.json');
    expect((await railfit('part', 'A-1')).stdout).toMatch(/bias current +max +500 fA/u);
    writeFileSync(path, text.replace('"railfit:field": "bias current"', '"railfit:field": "bias"'));
    const broken = await run('hardware.csv', '--mapping', 'hardware.json');
    expect(broken).toMatchObject({ exit: 3, stderr: expect.stringContaining('error[I212]: hardware.json, tableSchema.columns[3]: "bias" is no field') as string });
  });

  it('next quarter a changed unit is one error, and the option that answers it is right', async () => {
    await run('01.csv');
    const refused = await run('12.csv');
    expect(refused.exit).toBe(3);
    expect(refused.stderr).toContain('are exactly 1000 times the last import in 7 of 7');
    expect(refused.stderr).toContain('--map "I=Iq typ (µA/ch)"');
    const answered = await run('12.csv', '--map', 'I=Iq typ (µA/ch)', '--map', 'J=Iq max (µA/ch)', '-n');
    expect(answered).toMatchObject({ exit: 0, stdout: expect.stringContaining('12.csv') as string });
  });
});

describe('what only the owner knows', () => {
  it('is refused with the option that answers, which is then kept', async () => {
    const refused = await run('04.csv');
    expect(refused).toMatchObject({ exit: 3, stdout: '' });
    expect(refused.stderr).toContain('--header-rows 4-5 --until-blank');
    const answered = await run('04.csv', '--header-rows', '4-5', '--until-blank', '--map', 'Load (kΩ)=Load (kΩ)');
    expect(answered).toMatchObject({ exit: 0, stdout: expect.stringMatching(/^Imported 5 parts/u) as string });
    expect((await run('04.csv')).stdout).toMatch(/no change/u);
  });

  it('an own status word is answered once', async () => {
    writeFileSync(join(place.folder, 'own.csv'), 'Part number,Approval,Vos max (mV)\nA-1,Preferred,3\n');
    expect((await run('own.csv')).stderr).toContain('--word "Preferred=approved"');
    expect((await run('own.csv', '--word', 'Preferred=approved')).exit).toBe(0);
    writeFileSync(join(place.folder, 'own.csv'), 'Part number,Approval,Vos max (mV)\nA-1,Preferred,2\n');
    expect((await run('own.csv')).exit).toBe(0);
  });

  it.each([
    [['--map', 'M'], 'the form is COLUMN=HEADER'],
    [['--header-rows', '5-4'], 'one row, or two that follow each other'],
    [['--encoding', 'latin9'], 'no encoding railfit reads'],
    [['--delimiter', 'x'], 'no separator'],
    [['--word', 'Preferred=best'], 'the form is WORD=STATUS'],
    [['--declare', 'temp=1'], 'declares nothing that is known'],
    [['--classes', '7'], 'a distance in decades'],
  ])('%j is refused before the list is read', async (words, reason) => {
    const ran = await run('01.csv', ...words);
    expect(ran).toMatchObject({ exit: 2, stderr: expect.stringContaining(reason) as string });
  });
});

describe('faults', () => {
  it('as JSON point at their cells (RFC 7111)', async () => {
    const ran = await run('10.csv', '--json');
    expect(ran).toMatchObject({ exit: 3, stderr: '' });
    const { problems } = JSON.parse(ran.stdout) as { problems: { code: string; at: string; value: string }[] };
    expect(problems.find(({ code }) => code === 'Q012')).toMatchObject({ at: '10.csv#cell=7,5', value: '0.01k', line: 7, row: 7, column: 'E', header: 'Ib max (nA)', part: 'ORG-OA-0906' });
  });

  it('go to a file for the owner of the list', async () => {
    await run('05.csv', '--errors', 'faults.csv');
    const [header, ...lines] = readFileSync(join(place.folder, 'faults.csv'), 'utf8').trim().split(/\r?\n/u);
    expect(header).toBe('line,row,column,header,part,value,code,reason,fix,at');
    expect(lines[1]).toContain('5,5,B,Vos [mV] typ/max,ORG-OA-0404,3.5/0.6,Q007');
  });

  it.each(['I202', 'I207', 'I208', 'I209', 'I211', 'I212', 'I408', 'I510', 'I516', 'I518', 'I519', 'I521', 'I605', 'I606', 'I607', 'I608'])('help %s has a page', async (code) => {
    const page = await railfit('help', code);
    expect(page.exit).toBe(0);
    expect(page.stdout.length).toBeGreaterThan(100);
  });
});

describe('on a terminal', () => {
  const LIST = 'Part number,Status,VOH @ 2k (V),Rail-to-rail,Vos max (mV)\nA-1,Approved,4.95,yes,3\nA-2,Approved,4.9,no,2\nA-3,Approved,4.8,yes,1\n';
  const inFolder = (work: (at: Place) => void): void => {
    const folder = mkdtempSync(join(tmpdir(), 'railfit-'));
    writeFileSync(join(folder, 'list.csv'), LIST);
    try {
      copyFileSync(place.catalog, join(folder, 'catalog.sqlite'));
      work({ folder, catalog: join(folder, 'catalog.sqlite') });
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
  };
  const DOWN = '\u001b[B';

  it('each open question is asked with three cells, and the list is imported', () => inFolder((at) => {
    const seen = onTerminal(['import', 'list.csv'], [['4.95   4.9   4.8', DOWN], ['> a voltage against ground', '\r'], ['yes   no', '\r'], ['Imported', '']], at);
    expect(seen).toMatchObject({ exit: 0, restored: true, cursor: true });
    expect(seen.screens.at(-1)).toContain('Imported 3 parts from list.csv');
    expect(readdirSync(join(at.folder, 'mappings'))).toHaveLength(1);
  }));

  it('Ctrl-C imports nothing', () => inFolder((at) => {
    const seen = onTerminal(['import', 'list.csv'], [['4.95   4.9   4.8', '\u0003']], at);
    expect(seen).toMatchObject({ exit: 130, restored: true, cursor: true });
    expect(existsSync(join(at.folder, 'mappings'))).toBe(false);
  }));

  it('never without one, nor with --no-input', () => inFolder((at) => {
    const seen = onTerminal(['import', 'list.csv', '--no-input'], [['exit', '']], at);
    expect(seen.exit).toBe(3);
    expect(seen.screens.at(-1)).toContain('--map "C=output high headroom typ (V)');
  }));
});

describe('a mapping that cannot be kept or read', () => {
  it('is a warning once the list is in, and says so', async () => {
    const ran = await run('01.csv', '--mapping', join('no-such-file.csv', 'map.json'), '--json');
    expect(ran.exit).toBe(0);
    writeFileSync(join(home, 'plain'), '');
    const unkept = await run('02.csv', '--accept', 'removed', '--mapping', join(home, 'plain', 'map.json'), '--json');
    expect(unkept.exit).toBe(0);
    const { outcome, problems } = JSON.parse(unkept.stdout) as { outcome: string; problems: { code: string; severity: string; reason: string }[] };
    expect(outcome).toBe('imported');
    expect(problems.filter(({ code }) => code === 'E503')).toEqual([expect.objectContaining({ severity: 'warning', reason: expect.stringContaining('the list was imported, but how it was read is not kept') as string })]);
  });

  it('a file in place of the folder of mappings is told, not a fault', async () => {
    writeFileSync(folderOfMappings(), '');
    const ran = await run('01.csv');
    expect(ran).toMatchObject({ exit: 5, stderr: expect.stringContaining('error[E502]') as string });
    expect((await run('01.csv', '--mapping', '')).exit).toBe(2);
  });

  it('another list that shares the usual headers is read for itself', async () => {
    writeFileSync(join(place.folder, 'short.csv'), 'Part number,Status,GBW typ (MHz)\nA-1,Approved,1\n');
    expect((await run('short.csv', '--declare', 'temperature=-40..85 °C')).exit).toBe(0);
    writeFileSync(join(place.folder, 'wide.csv'), 'Part number,Status,GBW typ (MHz),SR typ (V/µs),Iq (µA),Vos typ (mV),Ib typ (pA)\nA-1,Approved,1,0.5,80,1,2\n');
    const ran = await run('wide.csv', '--dry-run');
    expect(ran.stderr).not.toContain('mapping');
    expect(ran.stderr).not.toContain('declared');
  });
});

describe('a workbook', () => {
  const save = (name: string, sheets: WorkbookSheets): void => writeFileSync(join(place.folder, name), workbookBytes(sheets));

  it('is imported with the sheet in every origin, and remembered by its headers', async () => {
    save('house.xlsx', { Cover: [['Team list']], Approved: [['Part number', 'Status', 'Vos max (mV)'], ['W-1', 'Approved', 3]] });
    const asked = await run('house.xlsx', '--no-input');
    expect(asked).toMatchObject({ exit: 3, stdout: '' });
    expect(asked.stderr).toContain('fix: --sheet "Cover" or --sheet "Approved"');
    const ran = await run('house.xlsx', '--sheet', 'Approved');
    expect(ran).toMatchObject({ exit: 0, stdout: expect.stringMatching(/^Imported 1 part from house\.xlsx \[Approved\]/u) as string });
    expect((await railfit('part', 'W-1')).stdout).toContain('house.xlsx [Approved] row 2, C');
    expect(await run('house.xlsx')).toMatchObject({ exit: 0, stdout: expect.stringMatching(/no change/u) as string });
  });

  it('with a fault names sheet and cell', async () => {
    save('faulty.xlsx', { Approved: [['id', 'bias current max (pA)'], ['W-1', '5 mV']] });
    const ran = await run('faulty.xlsx');
    expect(ran).toMatchObject({ exit: 3, stdout: '' });
    expect(ran.stderr).toContain('--> faulty.xlsx [Approved] row 2, column B "bias current max (pA)", part W-1');
  });

  it('in the older format is refused with what to do', async () => {
    writeFileSync(join(place.folder, 'old.xls'), Uint8Array.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]));
    expect(await run('old.xls')).toMatchObject({ exit: 3, stdout: '', stderr: expect.stringContaining('save it without password as .xlsx') as string });
  });
});
