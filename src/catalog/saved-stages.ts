import type Database from 'better-sqlite3';

/** A stage file the team keeps: its path as the caller gave it, and the part chosen for it; null while none is. */
export interface SavedStage {
  readonly path: string;
  readonly part: string | null;
}

/** Every saved stage, by path. None in a catalog that could not be brought up to date. */
export function savedStages(database: Database.Database): SavedStage[] {
  if (!hasTable(database)) return [];
  return database.prepare<[], SavedStage>('select path, part from saved_stage').all().sort((a, b) => (a.path < b.path ? -1 : Number(a.path > b.path)));
}

/** Keeps these stages, all or none of them; one that is kept already gets the part of this call. */
export function saveStages(database: Database.Database, stages: readonly SavedStage[]): void {
  const insert = database.prepare('insert into saved_stage (path, part) values (@path, @part) on conflict (path) do update set part = excluded.part');
  const work = database.transaction(() => {
    for (const stage of stages) insert.run(stage);
  });
  work.immediate();
}

/** Forgets these stages; the files are left alone. */
export function removeStages(database: Database.Database, paths: readonly string[]): void {
  const remove = database.prepare('delete from saved_stage where path = ?');
  const work = database.transaction(() => {
    for (const path of paths) remove.run(path);
  });
  work.immediate();
}

function hasTable(database: Database.Database): boolean {
  return database.prepare("select 1 from sqlite_schema where type = 'table' and name = 'saved_stage'").get() !== undefined;
}
