import * as z from 'zod';

/** A document as printed with --json: its name and version first, then its body. Within a version only additions. */
export function envelope<Body extends z.ZodRawShape>(name: string, description: string, body: Body) {
  const head = {
    schema: z.literal(`railfit/${name}`).describe('Name of the document'),
    schemaVersion: z.literal(1).describe('Within a version fields are only added, never removed or given another meaning'),
  };
  return z.strictObject({ ...head, ...body }).meta({ title: `railfit ${name}`, description });
}
