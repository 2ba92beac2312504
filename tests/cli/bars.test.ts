import stringWidth from 'string-width';
import { describe, expect, it } from 'vitest';
import { withWorkplace } from '../support/railfit.js';
import { sentToTerminal, type Place } from '../support/terminal.js';

const PROBE = 'soil-moisture-probe.yaml';
const COMMANDS = { explain: ['explain', 'GX-BIP-GS', PROBE], shortlist: ['shortlist', PROBE] } as const;
/** Several runs of the command on a busy machine, ms. */
const LONG = 30_000;

const workplace = withWorkplace(['parts']);

const seen = (words: readonly string[], columns: number, env: Place['env'] = {}) => sentToTerminal(words, { folder: workplace().folder, catalog: workplace().catalog, columns, env });
const swing = /^ {2}output {2}(?:PASS|FAIL|\? {3}) {2} *0 V [<|].+[|>] \d\S* V$/mu;

describe.each(Object.entries(COMMANDS))('%s on a terminal', (_, words) => {
  it.each([40, 60])('of %i columns has no bars', (columns) => {
    expect(seen(words, columns).screen).not.toMatch(/▬|^Rails|^Margins/mu);
  });

  it.each([80, 100])('of %i columns has bars, none wider', (columns) => {
    const { sent, screen } = seen(words, columns);
    expect(screen).toMatch(swing);
    expect(screen).toContain('▬');
    for (const line of sent.split('\r\n')) expect(stringWidth(line), line).toBeLessThanOrEqual(columns);
  });

  it('has them in ASCII when asked, and without colour nothing but text', () => {
    const { sent } = seen([...words, '--ascii'], 100);
    expect(sent).toMatch(/^[\x20-\x7e\r\n]+$/u);
    expect(sent).toMatch(/\|[./]*=+/u);
  });

  it('adds colour to the same text', () => {
    const plain = seen(words, 100);
    const coloured = seen(words, 100, { NO_COLOR: '' });
    expect(coloured.sent).toContain('\u001b[3');
    expect(plain.sent).not.toContain('\u001b[');
    expect(coloured.sent.replace(/\u001b\[\d+m/gu, '')).toBe(plain.sent);
  }, LONG);

  it('has none when TERM is dumb', () => {
    expect(seen(words, 100, { TERM: 'dumb' }).screen).not.toMatch(/▬|^Rails/mu);
  }, LONG);

  it('has none in a pipe, whatever the environment says', async () => {
    const piped = await workplace().run(words, { env: { COLUMNS: '100', FORCE_COLOR: '1' } });
    expect(piped.stdout).not.toMatch(/▬|^Rails/mu);
  }, LONG);

  it('writes the same JSON as into a pipe', async () => {
    const json = await workplace().run([...words, '--json']);
    expect(seen([...words, '--json'], 100).sent.replaceAll('\r\n', '\n')).toBe(json.stdout);
  }, LONG);
});

describe('the bars of a part that does not fit', () => {
  it('stand on a terminal as they are drawn', () => {
    const text = seen(COMMANDS.explain, 100).screen;
    expect(`\n${text.slice(text.indexOf('Margins'), text.indexOf('Swing  '))}`).toMatchInlineSnapshot(`
      "
      Margins spare as a share of the limit, linear; x missing; > beyond the scale
                                 -100 %       limit                       200 %
      FAIL  output high          <xxxxxxxxxxxxxx|                                short by 1.25 V (400 %)
      FAIL  DC error                  xxxxxxxxxx|                                over by 22.6 mV (65 %)
      FAIL  supply current       <xxxxxxxxxxxxxx|                                over by 260 µA (290 %)
      PASS  lowest supply                       |                                met exactly
      PASS  input range high                    |▬▬▬▬                            670 mV spare
      PASS  output low                          |▬▬▬▬▬▬▬▬▬                       113 mV spare (estimate)
      PASS  phase margin                        |▬▬▬▬▬▬▬▬▬▬▬▬▬                   85 % spare (typical)
      PASS  minimum stable gain                 |▬▬▬▬▬▬▬▬▬▬▬▬▬                   7.8 times
      PASS  input range low                     |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬                 25 mV spare
      PASS  gain bandwidth                      |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  5.3 times (typical)
      PASS  supply peak                         |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  29.5 V spare
      PASS  highest supply                      |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  27.8 V spare
      PASS  slew rate                           |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  15 times (typical)
      PASS  output current                      |▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬▬>  50 times

      PASS  lowest temperature   20 °C spare    highest temperature  25 °C spare
            channels             has 2

      Rails   at the supply end with the least room, figures at their worst
        output  FAIL  0 V |...xxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxx░░░░░| 3 V
                      signal 197 mV..2.69 V, off by up to 47 mV; usable 37.4 mV..155 mV
        input   PASS  0 V |▬▬▬▬▬▬▬.............░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░░| 3 V
                      signal 25 mV..330 mV; usable 0 V..1 V
        ▬ signal, . free, ░ head-room kept by the part, x out of its reach

      "
    `);
  });
});

describe('every stage that ships', () => {
  it.each(['leaf-wetness', 'light-meter', 'reference-buffer', 'bus-current', 'vent-trim'])('%s: bars within 80 columns', (stage) => {
    const { sent, screen } = seen(['shortlist', `${stage}.yaml`], 80);
    expect(screen).toMatch(swing);
    for (const line of sent.split('\r\n')) expect(stringWidth(line), line).toBeLessThanOrEqual(80);
  });
});
