import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { accepted, places, read, refused } from './reading.js';

const codes = (text: string): string[] => refused(text).problems.map(({ code }) => code);
const figures = (text: string): Record<string, number> =>
  Object.fromEntries(accepted(text).parts.flatMap((part) => part.figures.map(({ parameter, kind, value }) => [`${parameter}.${kind}`, value])));

describe('a list that is read', () => {
  const LIST = [
    'id,description,status,lifecycle,package,channels,qualification,class,family,price (EUR) @ 1000,phase reversal,input clamp,input type,supply voltage min (V),output low headroom max (mV) @ 2 kΩ to ground',
    '0012,"Plain, low power",Approved,NRND,SOT-23-5,1,AEC-Q100 grade 1,GX-1,F1,0.14,no,yes,FET,1.8,30',
    '1E10,-,Not approved,Last-time buy,N/A,2,none,,,TBD,?,,bipolar,n/a,',
  ].join('\r\n');

  it('keeps everything the contract knows, ids as text, unknown as null', () => {
    const [first, second] = accepted(LIST).parts;
    expect(first).toEqual({
      id: '0012', tier: 'approved', description: 'Plain, low power', status: 'approved', lifecycle: 'nrnd', package: 'SOT-23-5', channels: 1,
      qualification: 'AEC-Q100 grade 1', class: 'GX-1', family: 'F1', price: { amount: 0.14, currency: 'EUR', quantity: 1000 },
      phaseReversal: false, inputClamp: true, inputType: 'fet', crossoverFree: null,
      figures: [
        { parameter: 'supplyVoltage', kind: 'min', value: 1.8, condition: {} },
        { parameter: 'outputLowHeadroom', kind: 'max', value: 0.03, condition: { load: { kind: 'resistance', ohms: 2000, to: 'ground' } } },
      ],
    });
    expect(second).toEqual({
      id: '1E10', tier: 'approved', description: null, status: 'not-approved', lifecycle: 'last-time-buy', package: null, channels: 2,
      qualification: 'none', class: null, family: null, price: null, phaseReversal: null, inputClamp: null, inputType: 'bipolar', crossoverFree: null, figures: [],
    });
  });

  it('keeps columns, records and the hash of the bytes', () => {
    const list = accepted(LIST);
    expect(list.sha256).toBe(createHash('sha256').update(LIST).digest('hex'));
    expect(list.columns[14]).toMatchObject({ number: 15, letter: 'O', header: 'output low headroom max (mV) @ 2 kΩ to ground' });
    expect(list.records.map(({ line, row }) => [line, row])).toEqual([[2, 2], [3, 3]]);
    expect(list.records[1]?.cells[9]).toBe('TBD');
    expect(list.warnings).toEqual([]);
  });

  it('reads the same with a byte-order mark, and every missing-value word as unknown', () => {
    const words = ['', '-', '–', 'N/A', 'n/a', 'n.a.', 'NA', '#N/A', 'NULL', 'TBD', 'tbd', '?', '  '];
    const text = `\ufeffid,slew rate min (V/µs)\n${words.map((word, index) => `P${index},${word}`).join('\n')}`;
    expect(accepted(text).parts.map((part) => part.figures.length)).toEqual(words.map(() => 0));
  });

  it('lets the unit of a cell win over the header, and says so once per column', () => {
    const list = accepted('id,offset voltage max (mV)\nA,5 mV\nB,3500 µV\nC,3\nD,20 µV');
    expect(list.parts.map((part) => part.figures[0]?.value)).toEqual([0.005, 0.0035, 0.003, 2e-5]);
    expect(list.warnings.map(({ code, message }) => [code, message])).toEqual([['I515', '3500 µV: the cell\'s own unit µV taken, not mV of the header']]);
  });

  it('reads decibels as ratios, inputs beyond a rail as negative, and currents without their direction', () => {
    const text = 'id,open loop gain min (dB),input low headroom max (V),bias current max (nA),supply rejection min\nA,100,-0.1,-45,10 µV/V';
    const found = figures(text);
    expect(found['openLoopGain.min']).toBeCloseTo(1e5, 6);
    expect(found['supplyRejection.min']).toBeCloseTo(1e5, 6);
    expect(found['inputLowHeadroom.max']).toBe(-0.1);
    expect(found['biasCurrent.max']).toBe(4.5e-8);
    expect(accepted(text).warnings.some(({ message }) => message === '-45: the sign is a direction; the magnitude is kept')).toBe(true);
  });

  it('accepts a bound written in the cell when the header says the same', () => {
    expect(figures('id,bias current max (pA),slew rate min (V/µs)\nA,<10,>0.5')).toEqual({ 'slewRate.min': 5e5, 'biasCurrent.max': 1e-11 });
  });

  it('reads semicolons with a decimal comma where a cell proves it', () => {
    const list = accepted('id;supply voltage min (V);supply voltage max (V)\nA;1,8;5,500\n');
    expect(list).toMatchObject({ delimiter: ';', decimal: 'comma' });
    expect(list.parts[0]?.figures.map(({ value }) => value)).toEqual([1.8, 5.5]);
  });

  it('reads semicolons under canonical headers that hold commas', () => {
    const header = 'id;description;supply voltage min (V);output low headroom max (mV) @ 10 kΩ, 5 V;output high headroom max (mV) @ 10 kΩ, 5 V';
    const list = accepted(`${header}\nA;House part, dual-use;1,8;16;21\nB;"one; two";1,8;17;\n`);
    expect(list).toMatchObject({ delimiter: ';', decimal: 'comma' });
    expect(list.parts.map(({ description, figures: all }) => [description, all.map(({ value }) => value)])).toEqual([['House part, dual-use', [1.8, 0.016, 0.021]], ['one; two', [1.8, 0.017]]]);
  });

  it('keeps unknown columns as text and lists each once', () => {
    const list = accepted('id,where used,pakage\nA,pump,SO-8\nB,fan,SO-8');
    expect(list.columns.map(({ reading }) => reading.kind)).toEqual(['identity', 'text', 'text']);
    expect(list.warnings.map(({ code, fix }) => [code, fix])).toEqual([['I203', undefined], ['I203', 'package']]);
  });

  it('skips blank rows, saying so except at the end of the file', () => {
    const list = accepted('id,package\nA,SO-8\n,\nB,SO-8\n\n,\n');
    expect(list.parts.map(({ id }) => id)).toEqual(['A', 'B']);
    expect(places(list.warnings)).toEqual(['I305 3 3 -']);
  });

  it('accepts the trailing separators of a spreadsheet, and warns of a value without header', () => {
    const list = accepted('id,package,,\nA,SO-8,,\nB,SO-8,,see note\nC,SO-8\n');
    expect(places(list.warnings)).toEqual(['I205 3 3 D']);
  });

  it('takes the first of two prices and keeps price 0 as unknown, both with a warning', () => {
    const list = accepted('id,price (EUR) @ 1,price (EUR) @ 1000\nA,0.3,0.14\nB,0,0.15');
    expect(list.parts.map(({ price }) => price)).toEqual([
      { amount: 0.3, currency: 'EUR', quantity: 1 },
      { amount: 0.15, currency: 'EUR', quantity: 1000 },
    ]);
    expect(places(list.warnings)).toEqual(['I514 2 2 C', 'I506 3 3 B']);
  });

  it('removes the apostrophe that keeps a spreadsheet from running a cell', () => {
    expect(accepted("id,description\nA,'=SUM(1)\nB,'plain\n").parts.map(({ description }) => description)).toEqual(['=SUM(1)', "'plain"]);
  });

  it('brings ids to one form of Unicode', () => {
    expect(accepted('id\nCAFE\u0301\n').parts[0]?.id).toBe('CAF\u00c9');
  });
});

describe('a list that is refused', () => {
  it('reports every bad cell with all of its place', () => {
    const text = [
      'id,status,supply voltage min (V),gain bandwidth min,bias current max (nA)',
      'A,Approved,1.8,10M,10 pA',
      'B,Aproved,"2,000",1 MHz,0',
      'C,,x,,see DS',
    ].join('\n');
    const { problems, counts } = refused(text);
    expect(places(problems)).toEqual(['Q002 2 2 D', 'I515 2 2 E', 'I501 3 3 B', 'Q005 3 3 C', 'I505 3 3 E', 'I501 4 4 B', 'I502 4 4 C', 'I502 4 4 E']);
    expect(counts).toEqual({ rows: 3, errors: 7, cells: 7, parts: 3 });
    const [first, , second] = problems;
    expect(first?.place).toEqual({
      file: 'list.csv', line: 2, row: 2, column: 4, columnLetter: 'D', header: 'gain bandwidth min', part: 'A',
    });
    expect(first?.text).toBe('10M');
    expect(first?.span).toBeDefined();
    expect(second?.fix).toBe('approved');
  });

  it('tells line and row apart behind a cell of several lines', () => {
    const text = 'id,description,channels\nA,"one\r\ntwo",1\nB,x,many\n';
    expect(places(refused(text).problems)).toEqual(['I502 4 3 C']);
  });

  it.each([
    ['an empty file', '', 'I103'],
    ['only blank lines', '\n\n', 'I103'],
    ['a header only', 'id,package\n', 'I104'],
    ['no id column', 'package\nSO-8\n', 'I206'],
    ['the same header twice', 'id,package,Package\nA,SO-8,SO-8\n', 'I201'],
    ['the same figure in two units', 'id,bias current max (pA),bias current max (nA)\nA,1,1\n', 'I201'],
    ['a wrong unit', 'id,bias current max (mV)\nA,1\n', 'I204'],
    ['an empty id', 'id,package\n-,SO-8\n', 'I406'],
    ['an invisible character in an id', 'id\nA\u200bB\n', 'I407'],
    ['an unknown lifecycle', 'id,lifecycle\nA,retired\n', 'I509'],
    ['an unknown yes or no', 'id,phase reversal\nA,maybe\n', 'I503'],
    ['an unknown input type', 'id,input type\nA,valve\n', 'I503'],
    ['two figures in a cell', 'id,supply voltage min (V)\nA,1.8..5.5\n', 'I508'],
    ['three figures in a cell', 'id,supply voltage min (V)\nA,1.8/3/5.5\n', 'I508'],
    ['typ and max in a cell', 'id,offset voltage max (mV)\nA,2 (5 max)\n', 'I508'],
    ['a typical under a limit', 'id,offset voltage max (mV)\nA,2 typ\n', 'I507'],
    ['a limit under a typical', 'id,offset voltage typ (mV)\nA,<2\n', 'I507'],
    ['a negative current', 'id,quiescent current max (µA)\nA,-5\n', 'I504'],
    ['a noise gain below 1', 'id,minimum stable gain max (V/V)\nA,0.5\n', 'I505'],
    ['no channel', 'id,channels\nA,0\n', 'I513'],
    ['a fraction of a channel', 'id,channels\nA,1.5\n', 'I513'],
    ['more channels than a package holds', 'id,channels\nA,9\n', 'I513'],
    ['a separator that cannot be told', 'id;a,b\nA;1;2\nB\n', 'I306'],
    ['min above typ', 'id,slew rate min (V/µs),slew rate typ (V/µs)\nA,2,1\n', 'I512'],
    ['typ above max', 'id,offset voltage typ (mV),offset voltage max (mV)\nA,2,1\n', 'I512'],
    ['lowest supply above the highest', 'id,supply voltage min (V),supply voltage max (V)\nA,5.5,1.8\n', 'I512'],
    ['the same id with another value', 'id,package\nA,SO-8\nA,SC-70-5\n', 'I402'],
    ['an id that differs in case', 'id\nab\nAB\n', 'I403'],
    ['too many cells', 'id,package\nA,SO-8,1\n', 'I301'],
    ['too few cells', 'id,package\nA\n', 'I302'],
    ['an open quote', 'id,package\nA,"SO-8\n', 'I303'],
    ['a stray quote', 'id,package\nA,5" reel\n', 'I304'],
  ])('for %s', (_, text, code) => {
    expect(codes(text)).toEqual([code]);
  });

  it('with a broken structure reads no cell', () => {
    expect(codes('id,slew rate min (V/µs)\nA,x\nB\nC,1,2\n')).toEqual(['I302', 'I301']);
  });

  it('when an approved part has the id of a generic set', () => {
    const options = { genericIds: new Set(['GX-1']) };
    expect(places(refused('id\nGX-1\n', options).problems)).toEqual(['I405 2 2 A']);
    expect(accepted('id,class\nA,cmos\n', options).warnings).toEqual([]);
    expect(accepted('id\nGX-1\n', { ...options, tier: 'generic' }).parts).toHaveLength(1);
  });

  it('when an approved part has the prefix of generic sets to come, in any case', () => {
    const { problems } = refused('id\nGX-NEW\ngx-new-2\nAGX-1\n');
    expect(places(problems)).toEqual(['I405 2 2 A', 'I405 3 3 A']);
    expect(problems[0]?.message).toBe('GX-NEW: GX- is reserved for generic sets, also for those to come');
  });

  it('offers a unit that can be pasted for one that does not fit', () => {
    const { problems } = refused('id,supply rejection min (dB),offset voltage max (mV),quiescent current max (µA),slew rate typ\nA,80 µV,2 mA,70 V,5 Hz\n');
    expect(problems.map(({ code, fix }) => [code, fix])).toEqual([['Q004', '80 µV/V'], ['Q004', '2 mV'], ['Q004', '70 µA'], ['Q004', '5 V/µs']]);
  });

  it('quotes figures in the wrong order as they are written', () => {
    const { problems } = refused('id,offset voltage typ (mV),offset voltage max (mV)\nA,3,1\nB,2,900 µV\n');
    expect(problems.filter(({ code }) => code === 'I512').map(({ message }) => message)).toEqual([
      'offset voltage: typ 3 mV (B2) is above max 1 mV (C2)',
      'offset voltage: typ 2 mV (B3) is above max 900 µV (C3)',
    ]);
  });

  it('quotes the cells in which two rows of one id differ', () => {
    const { problems } = refused('id,description,package\nA,"low, slow",SO-8\nA,"fast, dear",SO-8\n');
    expect(problems.map(({ message }) => message)).toEqual(['A is also in row 2 and differs in B ("low, slow", then "fast, dear")']);
  });

  it('offers what the channels may be', () => {
    const { problems } = refused('id,channels\nA,0\nB,2.5\nC,3\n');
    expect(problems.map(({ message, fix }) => [message, fix])).toEqual(['0', '2.5'].map((cell) => [`${cell} is not a number of amplifiers in one package`, '1, 2 or 4; empty if unknown']));
  });

  it('over a limit of size', () => {
    expect(codes(`id,description\nA,${'x'.repeat(65_537)}\n`)).toEqual(['I105']);
    expect(codes(`id,${'x,'.repeat(512)}y\nA${','.repeat(513)}\n`)).toEqual(['I105']);
    expect(accepted(`id,description\nA,${'x'.repeat(65_536)}\n`).parts).toHaveLength(1);
  });
});

describe('warnings', () => {
  it.each([
    ['an identical repetition, kept once', 'id,package\nA,SO-8\nA,SO-8\n', 'I401 3 3 A', 1],
    ['ids that look alike', 'id\nA-0705\nA-O705\n', 'I404 3 3 A', 2],
    ['an absolute maximum below the operating one', 'id,supply voltage max (V),supply absolute maximum (V)\nA,5.5,5\n', 'I517 2 2 C', 1],
  ])('of %s', (_, text, place, count) => {
    const list = accepted(text);
    expect(places(list.warnings)).toEqual([place]);
    expect(list.parts).toHaveLength(count);
  });

  it('of a class that is no generic set, with the one that may be meant', () => {
    const list = accepted('id,class\nA,cmos-1mzh\n', { classes: new Set(['cmos-1mhz', 'bipolar-fast']) });
    expect(list.warnings.map(({ code, fix }) => [code, fix])).toEqual([['I511', 'cmos-1mhz']]);
    expect(list.parts[0]?.class).toBe('cmos-1mzh');
  });
});

it('a refused list keeps at most 10 000 problems and counts all', () => {
  const text = `id,channels\n${Array.from({ length: 10_050 }, (_, index) => `P${index},many`).join('\n')}`;
  const result = read(text);
  expect(!result.ok && result.problems.length).toBe(10_000);
  expect(!result.ok && result.counts.errors).toBe(10_050);
});

describe('whatever the file', () => {
  const word = fc.constantFrom(
    'id', 'status', 'slew rate min (V/µs)', 'bias current max (pA) @ 85 °C', '1', 'A', '10M', '-', '"', ',', ';', '\t', '\n', '\r\n', '""', ' ', '@', '(', ')',
    '0', '1,000', '±5', '\u200b', '1e999', 'µ', '√',
  );
  const text = fc.array(fc.oneof({ weight: 4, arbitrary: word }, fc.string({ maxLength: 4 })), { maxLength: 40 }).map((words) => words.join(''));

  it('reading gives a list or a refusal with a reason, and never throws', { timeout: 60_000 }, () => {
    fc.assert(
      fc.property(fc.oneof(text, text.map((tail) => `id,slew rate min (V/µs)\n${tail}`)), (content) => {
        const result = read(content);
        if (result.ok) expect(result.parts.every(({ id, figures: all }) => id !== '' && all.every(({ value }) => Number.isFinite(value)))).toBe(true);
        else expect(result.problems.filter(({ severity }) => severity === 'error').length).toBe(result.counts.errors);
      }),
      { numRuns: 500 },
    );
  });

  it('also with bytes that are no text', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 40 }), (bytes) => {
        const result = read(bytes);
        if (!result.ok) expect(result.counts.errors).toBeGreaterThan(0);
      }),
    );
  });
});
