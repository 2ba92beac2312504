import Database from 'better-sqlite3';
import type { ListStream } from '../intake/list.js';
import { NeedsWhole } from '../intake/stream-errors.js';
import type { IncomingRow } from './incoming.js';
import { partToRow, rowToPart, type Cell } from './part-row.js';
import type { Progress } from './progress.js';

/**
 * A list that was read without a fault, row by row, and stands in a temporary file of SQLite's own: the catalog is locked for the
 * comparison and the writing alone, not while the list is read, and memory holds a row of it.
 */
export interface StagedList extends Pick<ListStream, 'ok' | 'file' | 'tier' | 'columns' | 'sources' | 'patched' | 'sha256' | 'warnings' | 'tallies'> {
  readonly length: number;
  rows(): Iterable<IncomingRow>;
  /** Gives the temporary file back. */
  close(): void;
}

/**
 * Reads a stream to its end. Throws what the stream throws, and `NeedsWhole` where there is no room for a temporary file: memory may
 * hold what a disk does not.
 */
export function stageList(stream: ListStream, progress: Progress): StagedList {
  let database: Database.Database | null = null;
  try {
    database = temporary();
    const length = fill(database, stream, progress);
    const { file, tier, columns, sources, sha256, warnings, tallies } = stream;
    const open = database;
    return { ok: true, file, tier, columns, sources, sha256, warnings, tallies, length, rows: () => rowsOf(open), close: () => void open.close() };
  } catch (error) {
    database?.close();
    throw error instanceof Database.SqliteError ? new NeedsWhole() : error;
  }
}

/** Nobody else sees it and nothing of it outlives the process, so it needs neither journal nor waiting for the disk. */
function temporary(): Database.Database {
  const database = new Database('');
  database.pragma('page_size = 65536');
  database.pragma('journal_mode = off');
  database.pragma('synchronous = off');
  database.exec('create table staged (place integer primary key, line integer, row integer, content text, cells text)');
  return database;
}

function fill(database: Database.Database, stream: ListStream, progress: Progress): number {
  const insert = database.prepare('insert into staged values (?, ?, ?, ?, ?)');
  let length = 0;
  database.exec('begin');
  for (const { part, record, index } of stream.rows()) {
    insert.run(index, record.line, record.row, JSON.stringify(partToRow(part)), JSON.stringify(record.cells));
    length += 1;
    progress(length, length / Math.max(stream.share(), 1e-9));
  }
  database.exec('commit');
  return length;
}

type StagedRow = [place: number, line: number, row: number, content: string, cells: string];

function* rowsOf(database: Database.Database): Generator<IncomingRow> {
  const query = database.prepare<[], StagedRow>('select place, line, row, content, cells from staged order by place').raw();
  for (const [index, line, number, content, cells] of query.iterate()) {
    const row = JSON.parse(content) as Cell[];
    yield { id: String(row[ID]), row, content, index, place: { line, row: number }, part: () => rowToPart(row), cells: () => cells };
  }
}

/** Place of the id in a row. */
const ID = 1;
