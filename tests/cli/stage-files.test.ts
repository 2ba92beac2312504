import { copyFileSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';
let place: Workplace;

beforeAll(() => {
  requireBuilt();
  place = makeWorkplace();
  return () => { place.remove(); };
});

function demandsOf(content: string | Uint8Array): Promise<Ran> {
  writeFileSync(join(place.folder, 'odd.yaml'), content);
  return place.run(['demands', 'odd.yaml']);
}

const FOLLOWER = 'topology: follower\nsupply: 5 V\nsignal: {input: 1..4 V}\n';
/** Bytes without a pattern, the same in every run. */
const noise = Uint8Array.from({ length: 4000 }, (_, at) => (at * 7919 + ((at * at) >> 3)) % 256);

describe('stage files that are not what they should be', () => {
  it.each<[string, string | Uint8Array, string]>([
    ['empty', '', 'S102'],
    ['only a comment', '# nothing\n', 'S102'],
    ['binary', noise, 'S100'],
    ['UTF-16', Buffer.from(`\ufeff${FOLLOWER}`, 'utf16le'), 'S100'],
    ['10 MB of comments', FOLLOWER + '# '.padEnd(79, 'x').concat('\n').repeat(130_000), 'S100'],
    ['10 MB in one line', `${FOLLOWER}name: ${'x'.repeat(10_000_000)}\n`, 'S100'],
    ['a tab where YAML has none', 'topology: follower\n\tsupply: 5 V\n', 'S100'],
  ])('%s: refused by name, exit 2', async (_what, content, code) => {
    const started = performance.now();
    const ran = await demandsOf(content);
    expect(ran.exit, ran.stderr).toBe(2);
    expect(ran.stderr).toContain(`error[${code}]`);
    expect(ran.stderr).toContain('odd.yaml');
    expect(ran.stderr.length).toBeLessThan(4000);
    expect(ran.stdout).toBe('');
    expect(performance.now() - started).toBeLessThan(20_000);
  });

  it('a byte-order mark, and the line ends of another system, change nothing', async () => {
    const text = readFileSync(join(place.folder, PROBE), 'utf8');
    const { stdout } = await place.run(['demands', PROBE]);
    expect((await demandsOf(`\ufeff${text}`)).stdout).toBe(stdout);
    expect((await demandsOf(text.replaceAll('\n', '\r\n'))).stdout).toBe(stdout);
  });

  it('JSON is read as well, and so is standard input', async () => {
    const stage = JSON.stringify({ topology: 'follower', supply: '5 V', signal: { input: '1..4 V' } });
    const { stdout } = await demandsOf(FOLLOWER);
    expect((await demandsOf(stage)).stdout).toBe(stdout);
    expect((await place.run(['demands', '-'], { input: stage })).stdout).toBe(stdout);
  });

  it('a name with blanks, a minus and letters of any script is only a name', async () => {
    const name = '- Gewächshaus 2 (ß).yaml';
    copyFileSync(join(place.folder, PROBE), join(place.folder, name));
    const ran = await place.run(['shortlist', `./${name}`]);
    expect(ran.exit).toBe(0);
    expect(ran.stdout).toContain(`'./${name}'`);
  });
});
