import { beforeAll, describe, expect, it } from 'vitest';
import { usesAscii, usesBars, usesColour, widthOf, type ColourWish, type Environment } from '../../src/cli/terminal.js';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

const terminal = { isTTY: true, columns: 80 };
const pipe = { isTTY: false, columns: undefined };

// CL-5 as a matrix: --color beats NO_COLOR (not empty) beats FORCE_COLOR beats what the stream is.
const MATRIX: readonly (readonly [wish: ColourWish, env: Environment, isTTY: boolean, colour: boolean])[] = [
  ['auto', {}, true, true],
  ['auto', {}, false, false],
  ['auto', { TERM: 'dumb' }, true, false],
  ['auto', { NO_COLOR: '1' }, true, false],
  ['auto', { NO_COLOR: '' }, true, true],
  ['auto', { FORCE_COLOR: '1' }, false, true],
  ['auto', { FORCE_COLOR: '0' }, true, false],
  ['auto', { NO_COLOR: '1', FORCE_COLOR: '1' }, false, false],
  ['auto', { FORCE_COLOR: '1', TERM: 'dumb' }, false, true],
  ['always', { NO_COLOR: '1', TERM: 'dumb' }, false, true],
  ['never', { FORCE_COLOR: '1' }, true, false],
  ['auto', { FORCE_COLOR: '' }, false, false],
];

describe('colour', () => {
  it.each(MATRIX)('--color=%s with %j, a terminal %s: %s', (wish, env, isTTY, colour) => {
    expect(usesColour(wish, env, isTTY ? terminal : pipe)).toBe(colour);
  });
});

describe('width', () => {
  it.each<[number | undefined, string | undefined, number]>([
    [120, '60', 120],
    [undefined, '60', 60],
    [undefined, undefined, 100],
    [undefined, '', 100],
    [undefined, 'wide', 100],
    [undefined, '20', 40],
    [undefined, '500', 200],
  ])('terminal %s, COLUMNS %s: %i', (columns, told, width) => {
    expect(widthOf(told === undefined ? {} : { COLUMNS: told }, { isTTY: columns !== undefined, columns })).toBe(width);
  });
});

describe('bars', () => {
  it.each<[Environment, boolean, number | undefined, boolean]>([
    [{}, true, 80, true],
    [{}, true, 200, true],
    [{}, true, 79, false],
    [{}, true, 40, false],
    [{}, true, undefined, true],
    [{ COLUMNS: '79' }, true, undefined, false],
    [{ NO_COLOR: '1' }, true, 100, true],
    [{ TERM: 'dumb' }, true, 100, false],
    [{}, false, undefined, false],
    [{ COLUMNS: '200', FORCE_COLOR: '1' }, false, undefined, false],
  ])('%j, a terminal %s of %s columns: %s', (env, isTTY, columns, bars) => {
    expect(usesBars(env, { isTTY, columns })).toBe(bars);
  });
});

describe('character set', () => {
  it.each<[Environment, boolean]>([
    [{}, false],
    [{ LANG: 'C.UTF-8' }, false],
    [{ LANG: 'de_DE.utf8' }, false],
    [{ LC_ALL: 'C' }, true],
    [{ LC_ALL: 'C', LANG: 'en_US.UTF-8' }, true],
    [{ LC_ALL: '', LANG: 'en_US.UTF-8' }, false],
    [{ LC_CTYPE: 'POSIX', LANG: 'en_US.UTF-8' }, true],
    [{ LANG: 'en_US.ISO-8859-1' }, true],
  ])('%j: ASCII %s', (env, ascii) => {
    expect(usesAscii(false, env)).toBe(ascii);
    expect(usesAscii(true, env)).toBe(true);
  });
});

describe('the built command', () => {
  const words = ['explain', 'GX-NANO', 'soil-moisture-probe.yaml'];
  let place: Workplace;
  beforeAll(async () => {
    requireBuilt();
    place = makeWorkplace();
    await place.run(['parts']);
    return () => { place.remove(); };
  });

  it('writes no colour into a pipe, and colour when asked', async () => {
    expect((await place.run(words)).stdout).not.toContain('\u001b');
    expect((await place.run([...words, '--color=always'])).stdout).toContain('\u001b[31m');
    expect((await place.run([...words, '--color', 'always'], { env: { NO_COLOR: '1' } })).stdout).toContain('\u001b[31m');
  });

  it('is not warned about by the runtime when NO_COLOR and FORCE_COLOR meet', async () => {
    const ran = await place.run(words, { env: { NO_COLOR: '1', FORCE_COLOR: '1' } });
    expect(ran.stderr).toBe('');
    expect(ran.stdout).not.toContain('\u001b');
  });

  it('colours problems as it colours answers', async () => {
    expect((await place.run(['demands', '--color=always'])).stderr).toContain('\u001b[31m');
    expect((await place.run(['demands', '--color=never'], { env: { FORCE_COLOR: '1' } })).stderr).not.toContain('\u001b');
  });

  it('writes ASCII when the locale has nothing else, on both streams', async () => {
    const plain = /^[\n\u0020-\u007e]*$/u;
    const asked = await place.run([...words, '--all', '--ascii']);
    expect(asked.stdout).toMatch(plain);
    expect((await place.run([...words, '--all'], { env: { LC_ALL: 'C' } })).stdout).toBe(asked.stdout);
    const refused = await place.run(['demands', '--supply', '±5 V', '--load', '10M'], { env: { LC_ALL: 'C' } });
    expect(refused.exit).toBe(2);
    expect(refused.stderr).toMatch(plain);
  });

  it('keeps to COLUMNS', async () => {
    for (const width of [60, 100]) {
      const { stdout } = await place.run(['shortlist', 'soil-moisture-probe.yaml'], { env: { COLUMNS: String(width) } });
      expect(Math.max(...stdout.split('\n').map((line) => line.length))).toBeLessThanOrEqual(width);
    }
  });
});
