// Writes the JSON Schemas that ship with the package from their definitions: npm run schemas
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { publishedSchemas } from '../../dist/src/presentation/schemas/published.js';

const folder = join(import.meta.dirname, '..', '..', 'src', 'presentation', 'schemas', 'json');
mkdirSync(folder, { recursive: true });
for (const [name, text] of publishedSchemas()) writeFileSync(join(folder, name), text);
