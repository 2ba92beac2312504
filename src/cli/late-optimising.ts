import { setFlagsFromString } from 'node:v8';

/**
 * Bytes of bytecode a function runs through before the engine weighs optimising it; its own figure is 67 584. A command lives for about a
 * second: compiling what it runs a few thousand times takes longer than running it as it stands (measured: a third of the time of a
 * report). What goes on for longer reaches this within milliseconds all the same.
 */
const BUDGET = 8 * 67_584;

/** The engine the figure was measured with: the options of another may mean something else. */
const MEASURED = '11.3.';

/** The flag that tells an engine of this version that most of the code runs once; null for an engine that was not measured. */
export function lateOptimising(engine: string): string | null {
  return engine.startsWith(MEASURED) ? `--interrupt-budget=${BUDGET}` : null;
}

/** Tells the engine, for what is compiled from here on. */
export function optimiseLate(): void {
  const flag = lateOptimising(process.versions.v8);
  if (flag !== null) setFlagsFromString(flag);
}
