import type { Kysely } from 'kysely';
import { sql } from 'kysely';

/** Marks the file as a catalog of railfit: "rail" in ASCII. */
const APPLICATION_ID = 0x7261696c;

/** Parameters with the kinds they had when this migration was written: one REAL column each, and one for points under conditions. */
const FIGURES = {
  supply_voltage: ['min', 'max'],
  supply_absolute_maximum: ['max'],
  input_low_headroom: ['typ', 'max'],
  input_high_headroom: ['typ', 'max'],
  output_low_headroom: ['typ', 'max'],
  output_high_headroom: ['typ', 'max'],
  slew_rate: ['min', 'typ'],
  gain_bandwidth: ['min', 'typ'],
  minimum_stable_gain: ['max'],
  open_loop_gain: ['min', 'typ'],
  offset_voltage: ['typ', 'max'],
  offset_drift: ['typ', 'max'],
  bias_current: ['typ', 'max'],
  offset_current: ['typ', 'max'],
  common_mode_rejection: ['min', 'typ'],
  supply_rejection: ['min', 'typ'],
  voltage_noise: ['typ', 'max'],
  noise_corner: ['typ', 'max'],
  current_noise: ['typ', 'max'],
  quiescent_current: ['typ', 'max'],
  output_current: ['min'],
  short_circuit_current: ['min', 'typ'],
  phase_margin: ['typ'],
  unity_crossover: ['typ'],
  output_resistance: ['typ'],
  capacitive_load: ['max'],
  input_capacitance: ['typ'],
  temperature: ['min', 'max'],
  thermal_resistance: ['typ', 'max'],
  junction_temperature: ['max'],
  input_crossover: ['min', 'max'],
} as const;

const TEXTS = [
  'description', 'status', 'lifecycle', 'package', 'qualification', 'class', 'family', 'price_currency', 'input_type',
] as const;
const INTEGERS = ['channels', 'price_quantity', 'phase_reversal', 'input_clamp'] as const;

/** Lists, the parts they brought, and the record each part was read from. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await createListImport(db);
  await createPart(db);
  await createRecord(db);
  await sql`pragma application_id = ${sql.lit(APPLICATION_ID)}`.execute(db);
  await sql`pragma user_version = 1`.execute(db);
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await db.schema.dropTable('record').execute();
  await db.schema.dropTable('part').execute();
  await db.schema.dropTable('list_import').execute();
  await sql`pragma user_version = 0`.execute(db);
}

/** One row an import; `columns` is its column table as JSON, `undone` 1 after the import was taken back. */
async function createListImport(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('list_import')
    .addColumn('id', 'integer', (column) => column.primaryKey().autoIncrement())
    .addColumn('tier', 'text', (column) => column.notNull().check(sql`tier in ('approved', 'generic')`))
    .addColumn('file', 'text', (column) => column.notNull())
    .addColumn('sha256', 'text', (column) => column.notNull())
    .addColumn('content_sha256', 'text', (column) => column.notNull())
    .addColumn('imported_at', 'text')
    .addColumn('columns', 'text', (column) => column.notNull())
    .addColumn('rows', 'integer', (column) => column.notNull())
    .addColumn('added', 'integer', (column) => column.notNull())
    .addColumn('changed', 'integer', (column) => column.notNull())
    .addColumn('removed', 'integer', (column) => column.notNull())
    .addColumn('unchanged', 'integer', (column) => column.notNull())
    .addColumn('undone', 'integer', (column) => column.notNull().defaultTo(0))
    .modifyEnd(sql`strict`)
    .execute();
}

/** One row a version of a part, in force from `import_id` until `withdrawn_at`; both are imports. Versions are never erased. */
async function createPart(db: Kysely<unknown>): Promise<void> {
  let table = db.schema
    .createTable('part')
    .addColumn('key', 'integer', (column) => column.primaryKey())
    .addColumn('import_id', 'integer', (column) => column.notNull().references('list_import.id'))
    .addColumn('withdrawn_at', 'integer', (column) => column.references('list_import.id'))
    .addColumn('tier', 'text', (column) => column.notNull())
    .addColumn('id', 'text', (column) => column.notNull());
  for (const name of TEXTS) table = table.addColumn(name, 'text');
  for (const name of INTEGERS) table = table.addColumn(name, 'integer');
  table = table.addColumn('price_amount', 'real');
  for (const [parameter, kinds] of Object.entries(FIGURES)) {
    for (const kind of kinds) table = table.addColumn(`${parameter}_${kind}`, 'real');
    table = table.addColumn(`${parameter}_points`, 'text');
  }
  await table.modifyEnd(sql`strict`).execute();
  await db.schema
    .createIndex('part_in_force')
    .unique()
    .on('part')
    .columns(['tier', 'id'])
    .where(sql.ref('withdrawn_at'), 'is', null)
    .execute();
}

/** The record of a part in one import: physical line, row, and the cells as JSON. */
async function createRecord(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('record')
    .addColumn('import_id', 'integer', (column) => column.notNull().references('list_import.id'))
    .addColumn('part_id', 'text', (column) => column.notNull())
    .addColumn('line', 'integer', (column) => column.notNull())
    .addColumn('row', 'integer', (column) => column.notNull())
    .addColumn('cells', 'text', (column) => column.notNull())
    .addPrimaryKeyConstraint('record_key', ['import_id', 'part_id'])
    .modifyEnd(sql`strict, without rowid`)
    .execute();
}
