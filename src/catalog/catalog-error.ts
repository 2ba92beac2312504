/** Why a catalog could not be used; each is a matter of the surroundings, not of the list. */
export type CatalogErrorCode = 'locked' | 'unreadable' | 'notADatabase' | 'newerSchema' | 'readOnly' | 'diskFull';

export class CatalogError extends Error {
  readonly code: CatalogErrorCode;
  readonly file: string;
  /** What to do about it. */
  readonly fix: string;

  constructor(code: CatalogErrorCode, file: string, options: { readonly message?: string; readonly cause?: unknown } = {}) {
    super(`${file}: ${options.message ?? MESSAGES[code]}`, { cause: options.cause });
    this.name = 'CatalogError';
    this.code = code;
    this.file = file;
    this.fix = FIXES[code];
  }
}

/** The error of SQLite or the file system as a `CatalogError`; what is neither comes back as it is. */
export function asCatalogError(error: unknown, file: string): unknown {
  if (error instanceof CatalogError || !(error instanceof Error)) return error;
  const { code = '' } = error as Error & { code?: unknown };
  const found = KNOWN.find(([pattern]) => pattern.test(String(code)));
  return found === undefined ? error : new CatalogError(found[1], file, { cause: error });
}

/** Runs `work`, turning what SQLite or the file system throws into a `CatalogError`. */
export function guarded<Result>(file: string, work: () => Result): Result {
  try {
    return work();
  } catch (error) {
    throw asCatalogError(error, file);
  }
}

// Result codes of SQLite with their extended forms, and of the operating system.
const KNOWN: readonly (readonly [RegExp, CatalogErrorCode])[] = [
  [/^SQLITE_(?:BUSY|LOCKED)/u, 'locked'],
  [/^SQLITE_NOTADB/u, 'notADatabase'],
  [/^(?:SQLITE_READONLY|EROFS)/u, 'readOnly'],
  [/^(?:SQLITE_FULL|ENOSPC|EDQUOT)/u, 'diskFull'],
  [/^(?:SQLITE_(?:CANTOPEN|IOERR|CORRUPT|PERM|AUTH)|EACCES|EPERM|EISDIR|ENOTDIR|ENOENT|ENAMETOOLONG|EIO|ELOOP)/u, 'unreadable'],
];

const MESSAGES: Readonly<Record<CatalogErrorCode, string>> = {
  locked: 'the catalog is locked by another process',
  unreadable: 'the catalog cannot be read',
  notADatabase: 'not a catalog of railfit',
  newerSchema: 'the catalog was written by a newer railfit',
  readOnly: 'the catalog cannot be written',
  diskFull: 'no space left for the catalog',
};

const FIXES: Readonly<Record<CatalogErrorCode, string>> = {
  locked: 'run the command again when the other one has ended',
  unreadable: 'check that the path is a file you may read, or name another with --catalog',
  notADatabase: 'name another file with --catalog; this one was left as it is',
  newerSchema: 'install the railfit that wrote it, or name another file with --catalog',
  readOnly: 'name a file in a folder you may write with --catalog',
  diskFull: 'free some space and run the command again; nothing was changed',
};
