import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import { accepted, places, refused } from './reading.js';

/** The figures of one part with one column, as `parameter.kind value`. */
function figures(header: string, cell: string, more: readonly [string, string][] = []): string[] {
  const [headers, cells] = [[header, ...more.map(([name]) => name)], [cell, ...more.map(([, text]) => text)]];
  const list = accepted(`Part number\t${headers.join('\t')}\nA-1\t${cells.join('\t')}\n`);
  return list.parts[0]!.figures.map(({ parameter, kind, value }: Figure) => `${parameter}.${kind} ${value}`);
}

const code = (header: string, cell: string): string[] => refused(`Part number\t${header}\nA-1\t${cell}\n`).problems.map((one) => one.code);

describe('the high and the low end of the inputs', () => {
  it.each([
    ['CMVR low (V)', '-0.1', ['inputLowHeadroom.typ -0.1']],
    ['CMVR low min (V)', 'V- - 0.1 V', ['inputLowHeadroom.max -0.1']],
    ['CMVR high', 'V+ - 1.5 V', ['inputHighHeadroom.typ 1.5']],
    ['CMVR high (V)', '(V+) + 0.1', ['inputHighHeadroom.typ -0.1']],
    ['CMVR high min (V)', 'VCC-1.2', ['inputHighHeadroom.max 1.2']],
    ['CMVR high (V) @ 5 V', '3.5', ['inputHighHeadroom.typ 1.5']],
    ['CMVR high from V+ (V)', '-1.5', ['inputHighHeadroom.typ 1.5']],
    ['Input range (V)', '-0.1 to V+ - 1.5', ['inputLowHeadroom.typ -0.1', 'inputHighHeadroom.typ 1.5']],
    ['Input range', 'V-..V+', ['inputLowHeadroom.typ 0', 'inputHighHeadroom.typ 0']],
    ['Input range (V) @ 5 V', '0…3.5', ['inputLowHeadroom.typ 0', 'inputHighHeadroom.typ 1.5']],
  ])('%s: %s', (header, cell, expected) => expect(figures(header, cell)).toEqual(expected));

  it('asks from where bare numbers count, with the cells', () => {
    const { problems, questions } = refused('Part number,CMVR high (V)\nA,3.5\nB,-1.5\n');
    expect(places(problems)).toEqual(['I209 1 1 B']);
    expect(questions[0]?.samples).toEqual(['3.5', '-1.5']);
    for (const { answer } of questions[0]!.choices) expect(accepted('Part number,CMVR high (V)\nA,-1.5\n', answer).parts).toHaveLength(1);
  });

  it('refuses a range whose ends do not say what they count from', () => expect(code('Input range (V)', '0 to 3.5')).toEqual(['I521']));
});

describe('one cell, several figures', () => {
  it.each([
    ['GBW (MHz) min/typ', '0.7/1', ['gainBandwidth.min 700000', 'gainBandwidth.typ 1000000']],
    ['Vos typ/max', '0.5/3 mV', ['offsetVoltage.typ 0.0005', 'offsetVoltage.max 0.003']],
    ['Vos typ/max (mV)', '±0.5/±3', ['offsetVoltage.typ 0.0005', 'offsetVoltage.max 0.003']],
    ['Vos (mV)', '1 typ, 3 max', ['offsetVoltage.typ 0.001', 'offsetVoltage.max 0.003']],
    ['SR (V/µs)', '>0.4', ['slewRate.min 400000']],
    ['Supply (V)', '1.8 to 5.5', ['supplyVoltage.min 1.8', 'supplyVoltage.max 5.5']],
    ['Temp (°C)', '-40/+85', ['temperature.min -40', 'temperature.max 85']],
    ['VOH min (V) @ 2 kΩ, 5 V', '4.9', ['outputHighHeadroom.max 0.1']],
    ['VOH typ (V) @ 2 kΩ, 5 V', '4.95', ['outputHighHeadroom.typ 0.05']],
  ])('%s: %s', (header, cell, expected) => expect(figures(header, cell)).toEqual(expected));

  it.each([
    ['Vos max (mV)', '2 typ', 'I507'],
    ['Vos (mV)', '1..3', 'I508'],
    ['Supply (V)', '5', 'I508'],
    ['Vos typ/max (mV)', '1..2/5', 'I508'],
    ['Supply (V)', '1.8/5.5', 'Q009'],
    ['Vos typ/max (mV)', '3/0.5', 'Q007'],
    ['Iq (µA)', '=A1', 'I510'],
    ['Load', '0 Ω', 'I505'],
  ])('refuses %s: %s', (header, cell, expected) => expect(code(header, cell)).toEqual([expected]));
});

describe('figures that need other cells of the row', () => {
  it('a current of the whole package is shared out; without channels it is not kept', () => {
    expect(figures('Iq total (µA)', '200', [['Ch', '2']])).toEqual(['quiescentCurrent.typ 0.0001']);
    expect(figures('Iq total (µA)', '200')).toEqual([]);
  });

  it('a load column holds for the swings of its row, not against their own', () => {
    const list = accepted('Part number,Swing low (mV),Swing high @ 2k (mV),Load (kΩ)\nA,20,30,10\nB,20,30,-\n');
    const loads = list.parts.map((part) => part.figures.map(({ condition }) => (condition.load?.kind === 'resistance' ? condition.load.ohms : null)));
    expect(loads).toEqual([[10_000, 2000], [null, 2000]]);
  });

  it('the same figure in two columns is told', () => {
    expect(places(refused('Part number,Vos typ (mV),Vos typ/max (mV)\nA,1,2/5\n').problems)).toEqual(['I518 2 2 C']);
    expect(accepted('Part number,Vos typ (mV),Vos typ/max (mV)\nA,2,2/5\n').parts).toHaveLength(1);
  });
});

describe('words about the rails', () => {
  const rails = (header: string, cell: string): string[] => figures(header, cell, [['Vos (mV)', '-']]).map((one) => one.replace('.typ 0', ''));
  it.each([
    ['Rail-to-rail', 'RRIO', ['inputLowHeadroom', 'inputHighHeadroom']],
    ['Rail-to-rail', 'in/out', ['inputLowHeadroom', 'inputHighHeadroom']],
    ['Rail-to-rail', 'out', []],
    ['Rail-to-rail', 'no', []],
    ['Rail-to-rail', 'RRO, ground sensing', ['inputLowHeadroom']],
    ['RRI', 'yes', ['inputLowHeadroom', 'inputHighHeadroom']],
    ['Ground sensing', 'yes', ['inputLowHeadroom']],
    ['Description', '1 MHz CMOS, rail-to-rail in/out', ['inputLowHeadroom', 'inputHighHeadroom']],
    ['Description', 'Bipolar, inputs to ground, dual', ['inputLowHeadroom']],
    ['Description', 'Dual, plain', []],
  ])('%s: %s', (header, cell, expected) => expect(rails(header, cell)).toEqual(expected));

  it('in a description of the canonical CSV say nothing: it has columns for them', () => {
    expect(accepted('id,description\nA,RRIO\n').parts[0]?.figures).toEqual([]);
  });

  it('a figure of the list stands before the words', () => {
    expect(figures('Rail-to-rail', 'RRIO', [['CMVR low (V)', '0.1']])).toEqual(['inputLowHeadroom.typ 0.1', 'inputHighHeadroom.typ 0']);
  });

  it('asks which side goes to the rails when cells only say yes', () => {
    const { problems, questions } = refused('Part number,Rail-to-rail\nA,yes\nB,no\n');
    expect(places(problems)).toEqual(['I209 1 1 B']);
    expect(questions[0]?.choices.map(({ answer }) => answer.map?.[0]?.header)).toEqual(['rail-to-rail input and output', 'rail-to-rail output', 'rail-to-rail input', 'text']);
  });
});

describe('delimiters', () => {
  it.each([',', ';', '\t', '|'])('%j is found on the whole file, also below a title', (delimiter) => {
    const rows = [['Part number', 'Status', 'Vos max (mV)'], ['A', 'Approved', '3'], ['B', 'Approved', '4']].map((cells) => cells.join(delimiter));
    expect(accepted(rows.join('\n')).delimiter).toBe(delimiter);
    expect(refused(`Amplifiers of the hardware group\n${rows.join('\n')}`).problems.map(({ code: one }) => one)).toEqual(['I207']);
    expect(accepted(`Amplifiers of the hardware group\n${rows.join('\n')}`, { layout: { headerRows: [2], untilBlank: false } }).delimiter).toBe(delimiter);
  });

  it('honours sep= in the first line, keeping the row numbers of the file', () => {
    const list = accepted('sep=;\nPart number;Vos max (mV)\nA;3\n');
    expect(list.delimiter).toBe(';');
    expect(list.records[0]).toMatchObject({ line: 3, row: 3 });
  });

  it('a tie is a question, and an option answers it', () => {
    const text = 'a,b;c\n1,2;3\n4,5;6';
    const { problems, questions } = refused(text);
    expect([problems[0]?.code, problems[0]?.fix]).toEqual(['I306', '--delimiter "," or --delimiter ";"; or quotes around a cell or header that holds the other']);
    expect(questions[0]?.choices.map(({ answer }) => answer.delimiter)).toEqual([',', ';']);
    expect(refused(text, { delimiter: ';' }).problems.map(({ code: one }) => one)).toContain('I206');
  });

  it('names the limit of records and lifts it', () => {
    const text = `id\n${Array.from({ length: 200_001 }, (_, index) => `P${index}`).join('\n')}\n`;
    expect(refused(text).problems.map(({ code: one, fix }) => [one, fix])).toEqual([['I105', 'split the list, or lift the limit with --large']]);
  });
});
