import { sep } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { foundPath, keptPath, shownPath } from '../../src/saved/index.js';

const CATALOG = '/team/greenhouse/catalog.sqlite';

// Written for folders as POSIX has them.
describe.skipIf(sep === '\\')('the path of a stage file', () => {
  it('is kept below the folder of the catalog, so that the folder can be moved', () => {
    expect(keptPath('/team/greenhouse/stages/probe.yaml', CATALOG)).toBe('stages/probe.yaml');
    expect(foundPath('stages/probe.yaml', '/elsewhere/catalog.sqlite')).toBe('/elsewhere/stages/probe.yaml');
  });

  it('is kept whole elsewhere, also where a name only looks like the way up', () => {
    expect(keptPath('/team/probe.yaml', CATALOG)).toBe('/team/probe.yaml');
    expect(keptPath('/team/greenhouse/..probe.yaml', CATALOG)).toBe('..probe.yaml');
    expect(foundPath('/team/probe.yaml', CATALOG)).toBe('/team/probe.yaml');
  });

  it('is shown as it can be typed where one is', () => {
    expect(shownPath('stages/probe.yaml', CATALOG, '/team/greenhouse')).toBe('stages/probe.yaml');
    expect(shownPath('stages/probe.yaml', CATALOG, '/team/greenhouse/stages')).toBe('probe.yaml');
    expect(shownPath('stages/probe.yaml', CATALOG, '/home')).toBe('/team/greenhouse/stages/probe.yaml');
  });

  it('leads back to the file, wherever file, catalog and reader stand', () => {
    const folder = fc.array(fc.constantFrom('a', 'b', '..c', 'd e'), { maxLength: 4 }).map((names) => `/${names.join('/')}`);
    fc.assert(fc.property(folder, folder, folder, (here, there, cwd) => {
      const [file, catalog] = [`${there}/s.yaml`.replace('//', '/'), `${here}/c.sqlite`.replace('//', '/')];
      const kept = keptPath(file, catalog);
      expect(foundPath(kept, catalog)).toBe(file);
      const shown = shownPath(kept, catalog, cwd);
      expect(shown.startsWith('/') ? shown : `${cwd}/${shown}`.replace('//', '/')).toBe(file);
    }));
  });
});
