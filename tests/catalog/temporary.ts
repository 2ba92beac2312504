import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { onTestFinished } from 'vitest';

/** A new folder that is removed after the test that asks for it. */
export function temporaryFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'catalog-'));
  // Said per test, not once when this file is loaded: the files of a run share their modules.
  onTestFinished(() => { rmSync(folder, { recursive: true, force: true }); });
  return folder;
}
