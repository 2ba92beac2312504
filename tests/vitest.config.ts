import { availableParallelism } from 'node:os';
import { relative } from 'node:path';
import { defineConfig } from 'vitest/config';
import { BaseSequencer, type TestSpecification } from 'vitest/node';

/** Folders whose tests start commands, a browser or a simulator: first, so that no long file is left for the end. */
const LONG_FIRST = ['tests/browser/', 'tests/golden/', 'tests/outside/', 'tests/scenarios/', 'tests/cli/', 'tests/screening/', 'tests/explanation/'];

class LongFirst extends BaseSequencer {
  override async sort(files: TestSpecification[]): Promise<TestSpecification[]> {
    const rank = ({ moduleId }: TestSpecification): number => {
      const at = LONG_FIRST.findIndex((folder) => relative(this.ctx.config.root, moduleId).startsWith(folder));
      return at < 0 ? LONG_FIRST.length : at;
    };
    return (await super.sort(files)).sort((a, b) => rank(a) - rank(b));
  }
}

export default defineConfig({
  test: {
    // Half of the suite waits for commands it started: a machine of two cores does two files at once.
    maxWorkers: Math.max(2, availableParallelism() - 1),
    isolate: false,
    maxConcurrency: 2,
    testTimeout: 60_000,
    hookTimeout: 60_000,
    sequence: { sequencer: LongFirst },
  },
});
