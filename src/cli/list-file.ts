import { closeSync, fstatSync, openSync, readSync, statSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import { CHUNK, wholeBytes, type ByteSource } from '../intake/byte-source.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import { readStandardInput, STDIN, STDIN_NAME } from './standard-input.js';

/** A list as the command line names it. */
export interface ListFile {
  /** For messages and origins. */
  readonly name: string;
  readonly source: ByteSource;
  /** All of it. */
  bytes(): Uint8Array;
  close(): void;
}

/** Opens a list; throws what the system says of a file that cannot be opened. */
export async function openListFile(file: string): Promise<ListFile> {
  if (file === STDIN) return inMemory(STDIN_NAME, await readStandardInput());
  // A pipe can be read once.
  if (!statSync(file).isFile()) return inMemory(basename(file), await readFile(file));
  const descriptor = openSync(file, 'r');
  const { size, mtimeMs } = fstatSync(descriptor);
  const isAsBefore = (): boolean => fstatSync(descriptor).size === size && fstatSync(descriptor).mtimeMs === mtimeMs;
  const source: ByteSource = {
    length: size,
    *chunks() {
      const buffer = Buffer.alloc(CHUNK);
      for (let at = 0; ; ) {
        const count = readSync(descriptor, buffer, 0, CHUNK, at);
        if (!isAsBefore()) throw changed(file);
        if (count === 0) return;
        at += count;
        yield buffer.subarray(0, count);
      }
    },
  };
  return { name: basename(file), source, bytes: () => Buffer.concat([...copies(source)]), close: () => closeSync(descriptor) };
}

function inMemory(name: string, bytes: Uint8Array): ListFile {
  return { name, source: wholeBytes(bytes), bytes: () => bytes, close: () => undefined };
}

function* copies(source: ByteSource): Generator<Buffer> {
  for (const chunk of source.chunks()) yield Buffer.from(chunk);
}

function changed(file: string): RequestError {
  return new RequestError([commandProblem('E501', `${file}: was changed while it was read`, { fix: 'run the command again when nobody is writing it' })], EXIT.surroundings, `Nothing was imported. (exit ${EXIT.surroundings})`);
}
