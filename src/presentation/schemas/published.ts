import * as z from 'zod';
import { DOCUMENTS, type DocumentName } from './index.js';

/** The JSON Schema files that ship with the package (draft 2020-12), file name to text. */
export function publishedSchemas(): ReadonlyMap<string, string> {
  const names = Object.keys(DOCUMENTS) as DocumentName[];
  return new Map(names.map((name) => [schemaFile(name), `${JSON.stringify(publishedSchema(name), null, 2)}\n`]));
}

export const schemaFile = (name: DocumentName): string => `railfit-${name}.schema.json`;

/** One document; fields that it does not name are allowed, since within a version fields are added. */
function publishedSchema(name: DocumentName): object {
  const { $schema, ...rest } = z.toJSONSchema(DOCUMENTS[name], { override: ({ jsonSchema }) => { open(jsonSchema); } });
  return { $schema, $id: `urn:railfit:schema:${name}:1`, ...rest };
}

interface Keywords {
  additionalProperties?: unknown;
  maximum?: number;
}

/** Takes back the strictness of the definitions, and the largest safe integer where no maximum was meant. */
function open(schema: Keywords): void {
  if (schema.additionalProperties === false) delete schema.additionalProperties;
  if (schema.maximum === Number.MAX_SAFE_INTEGER) delete schema.maximum;
}
