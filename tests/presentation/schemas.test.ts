import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020.js';
import { describe, expect, expectTypeOf, it } from 'vitest';
import type * as z from 'zod';
import type { Basis } from '../../src/parts/basis.js';
import type { LimitKind } from '../../src/parts/figures.js';
import type { Lifecycle, Status, Tier } from '../../src/parts/part.js';
import { DOCUMENTS, type DocumentName } from '../../src/presentation/schemas/index.js';
import type { outcome, proof, tier } from '../../src/presentation/schemas/judged-part.js';
import type { part } from '../../src/presentation/schemas/part.js';
import { publishedSchemas, schemaFile } from '../../src/presentation/schemas/published.js';
import type { basis, limitKind, reason } from '../../src/presentation/schemas/verdict.js';
import type { JudgedPart, PartOutcome } from '../../src/screening/index.js';
import type { Reason } from '../../src/verdicts/verdict.js';

const ROOT = join(import.meta.dirname, '..', '..');
const PUBLISHED = join(ROOT, 'src', 'presentation', 'schemas', 'json');
const GOLDEN = join(ROOT, 'tests', 'golden');

type Json = Record<string, unknown>;
const NAMES = Object.keys(DOCUMENTS) as DocumentName[];
const GOLDENS = readdirSync(GOLDEN).filter((name) => name.endsWith('.json'));
const golden = (file: string): Json => JSON.parse(readFileSync(join(GOLDEN, file), 'utf8')) as Json;
const nameOf = (document: Json): DocumentName => String(document['schema']).replace('railfit/', '') as DocumentName;

// A validator written by others, reading nothing but the files that ship.
const ajv = new Ajv2020({ strict: true, allowUnionTypes: true, allErrors: true });
const shipped = new Map(NAMES.map((name): [DocumentName, ValidateFunction] => [name, ajv.compile(JSON.parse(readFileSync(join(PUBLISHED, schemaFile(name)), 'utf8')) as Json)]));

function faults(document: Json): unknown[] {
  const validate = shipped.get(nameOf(document));
  if (validate === undefined) return [`no schema for ${String(document['schema'])}`];
  validate(document);
  return validate.errors ?? [];
}

describe('the files that ship', () => {
  it('are what the definitions say; after a change: npm run schemas', () => {
    const files = readdirSync(PUBLISHED).sort();
    expect(files).toEqual([...publishedSchemas().keys()].sort());
    for (const [file, text] of publishedSchemas()) expect(readFileSync(join(PUBLISHED, file), 'utf8'), file).toBe(text);
  });

  it('are in the package', () => {
    const { files, exports } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8')) as { files: string[]; exports: Json };
    expect(files).toContain('src/presentation/schemas/json');
    expect(exports['./schemas/*']).toBe('./src/presentation/schemas/json/*');
  });

  it.each(NAMES)('%s has an id, a title and a description', (name) => {
    const schema = JSON.parse(readFileSync(join(PUBLISHED, schemaFile(name)), 'utf8')) as Json;
    expect(schema).toMatchObject({ $schema: 'https://json-schema.org/draft/2020-12/schema', $id: `urn:railfit:schema:${name}:1`, title: `railfit ${name}`, description: expect.stringMatching(/.{10}/u) as unknown });
  });
});

describe('golden documents', () => {
  it('cover every document', () => {
    expect(new Set(GOLDENS.map((file) => nameOf(golden(file))))).toEqual(new Set(NAMES));
  });

  it.each(GOLDENS)('%s holds exactly the fields that are defined', (file) => {
    const document = golden(file);
    const read = DOCUMENTS[nameOf(document)].safeParse(document);
    expect(read.error?.issues ?? []).toEqual([]);
  });

  it.each(GOLDENS)('%s validates against the file that ships', (file) => {
    expect(faults(golden(file))).toEqual([]);
  });
});

describe('the schemas tell right from wrong', () => {
  const explained = (): Json & { verdicts: Json[] } => golden('explain.undecided.json') as Json & { verdicts: Json[] };

  it('a later railfit may add fields', () => {
    const more = { ...golden('demands.soil-moisture-probe.json'), added: 1 };
    expect(faults(more)).toEqual([]);
    expect(DOCUMENTS.demands.safeParse(more).success).toBe(false);
  });

  it.each<[string, (document: Json & { verdicts: Json[] }) => void]>([
    ['another version', (document) => { document['schemaVersion'] = 2; }],
    ['another document', (document) => { document['schema'] = 'railfit/shortlists'; }],
    ['a field that is gone', (document) => { delete document['stage']; }],
    ['a number written as text', (document) => { (document['stage'] as Json)['gain'] = '8'; }],
    ['an unknown verdict without a reason', (document) => { delete document.verdicts.find((one) => one['outcome'] === 'unknown')?.['reason']; }],
    ['an unknown verdict that rests on something', (document) => { Object.assign(document.verdicts.find((one) => one['outcome'] === 'unknown') ?? {}, { basis: 'guaranteed' }); }],
    ['a pass that rests on nothing', (document) => { Object.assign(document.verdicts.find((one) => one['outcome'] === 'pass') ?? {}, { basis: null }); }],
    ['an outcome of another name', (document) => { document['outcome'] = 'fit'; }],
  ])('%s is refused by both', (_name, damage) => {
    const document = explained();
    expect(faults(document)).toEqual([]);
    damage(document);
    expect(shipped.get('explanation')?.(document)).toBe(false);
    expect(DOCUMENTS.explanation.safeParse(document).success).toBe(false);
  });
});

// Checked by the compiler: a word added to a type without its schema does not build.
it('words of the schemas are the words of the types', () => {
  expectTypeOf<z.infer<typeof basis>>().toEqualTypeOf<Basis>();
  expectTypeOf<z.infer<typeof reason>>().toEqualTypeOf<Reason>();
  expectTypeOf<z.infer<typeof limitKind>>().toEqualTypeOf<LimitKind>();
  expectTypeOf<z.infer<typeof outcome>>().toEqualTypeOf<PartOutcome>();
  expectTypeOf<z.infer<typeof proof> | null>().toEqualTypeOf<JudgedPart['proof']>();
  expectTypeOf<z.infer<typeof tier>>().toEqualTypeOf<Tier>();
  expectTypeOf<z.infer<typeof part>['part']['status']>().toEqualTypeOf<Status | null>();
  expectTypeOf<z.infer<typeof part>['part']['lifecycle']>().toEqualTypeOf<Lifecycle | null>();
});
