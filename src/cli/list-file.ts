import { closeSync, fstatSync, openSync, readSync, statSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import { CHUNK, wholeBytes, type ByteSource } from '../intake/byte-source.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import { readStandardInput, STDIN, STDIN_NAME } from './standard-input.js';
import { unreadable } from './stage-input.js';

/** A list as the command line names it. */
export interface ListFile {
  /** For messages and origins. */
  readonly name: string;
  readonly source: ByteSource;
  /** All of it. */
  bytes(): Uint8Array;
  close(): void;
}

/** Opens a list, to be read as often as it is wanted. Throws `RequestError` where it cannot be opened or read, also later on. */
export async function openListFile(file: string): Promise<ListFile> {
  try {
    if (file === STDIN) return inMemory(STDIN_NAME, await readStandardInput());
    // A pipe can be read once.
    return statSync(file).isFile() ? onDisk(file, openSync(file, 'r')) : inMemory(basename(file), await readFile(file));
  } catch (error) {
    throw refusal(unreadable(file, error));
  }
}

function onDisk(file: string, descriptor: number): ListFile {
  const { size, mtimeMs } = fstatSync(descriptor);
  const readInto = (buffer: Buffer, at: number): number => {
    try {
      const count = readSync(descriptor, buffer, 0, buffer.length, at);
      const now = fstatSync(descriptor);
      if (now.size === size && now.mtimeMs === mtimeMs) return count;
    } catch (error) {
      throw refusal(unreadable(file, error));
    }
    throw refusal(commandProblem('E502', `${file}: was changed while it was read`, { fix: 'run the command again when nobody is writing it', path: file }));
  };
  const source: ByteSource = {
    length: size,
    *chunks() {
      const buffer = Buffer.allocUnsafe(CHUNK);
      for (let at = 0, count = 0; (count = readInto(buffer, at)) > 0; at += count) yield buffer.subarray(0, count);
    },
  };
  return { name: basename(file), source, bytes: () => allOf(size, readInto), close: () => closeSync(descriptor) };
}

function allOf(size: number, readInto: (buffer: Buffer, at: number) => number): Buffer {
  const all = Buffer.allocUnsafe(size);
  for (let at = 0, count = 0; at < size && (count = readInto(all.subarray(at, at + LARGEST_READ), at)) > 0; at += count);
  return all;
}

/** Bytes: some systems read no more than 2 GiB at once. */
const LARGEST_READ = 2 ** 30;

function inMemory(name: string, bytes: Uint8Array): ListFile {
  return { name, source: wholeBytes(bytes), bytes: () => bytes, close: () => undefined };
}

function refusal(problem: ReturnType<typeof commandProblem>): RequestError {
  return new RequestError([problem], EXIT.surroundings, `Nothing was imported. (exit ${EXIT.surroundings})`);
}
