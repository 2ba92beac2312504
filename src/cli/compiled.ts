import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { setFlagsFromString } from 'node:v8';
import { Script } from 'node:vm';
import { crc32 } from 'node:zlib';
import { optimiseLate } from './late-optimising.js';
import type { runCommandLine } from './run.js';

/** What the bundled program hands out. */
interface Program {
  readonly runCommandLine: typeof runCommandLine;
}

export interface Compiled extends Program {
  /** Whether kept code was there and the engine took it. */
  readonly isKept: boolean;
  /** Keeps what the engine has compiled so far beside the program, for the next process. Throws where the folder cannot be written. */
  readonly keep: () => void;
}

/**
 * The program bundled into `folder`, with the code kept when it was built. An engine that did not make that code refuses it and compiles
 * the program anew: slower, the same answers. The bundle carries a hash of its text in its name and the code carries the same name, so that
 * code of another program is never taken. Null where there is no program.
 */
export function compiled(folder: string): Compiled | null {
  const name = existsSync(folder) ? readdirSync(folder).find((file) => file.endsWith('.cjs')) : undefined;
  if (name === undefined) return null;
  // Before compiling: the engine takes only code that was made with the same flags. Code that ran once is not thrown away: it is to be kept.
  setFlagsFromString('--no-flush-bytecode');
  optimiseLate();
  const file = join(folder, name);
  const codeFile = file.replace(/cjs$/u, 'code');
  const text = `(function(exports,require,module,__filename,__dirname){${readFileSync(file, 'utf8')}\n})`;
  const cachedData = keptCode(codeFile);
  const script = new Script(text, { filename: file, ...(cachedData === null ? {} : { cachedData }) });
  const module: { exports: unknown } = { exports: {} };
  const run = script.runInThisContext() as (...given: unknown[]) => void;
  run(module.exports, createRequire(file), module, file, dirname(file));
  return {
    ...(module.exports as Program),
    isKept: script.cachedDataRejected === false,
    keep: () => {
      const code = script.createCachedData();
      writeFileSync(codeFile, Buffer.concat([code, sumOf(code)]));
    },
  };
}

/** The engine trusts what is inside: a damaged file would end the process, so that a sum of it stands at its end. */
function keptCode(file: string): Buffer | null {
  try {
    const whole = readFileSync(file);
    const code = whole.subarray(0, -SUM);
    return whole.length > SUM && sumOf(code).equals(whole.subarray(-SUM)) ? code : null;
  } catch {
    return null;
  }
}

const SUM = 4;

function sumOf(code: Buffer): Buffer {
  const sum = Buffer.alloc(SUM);
  sum.writeUInt32LE(crc32(code));
  return sum;
}
