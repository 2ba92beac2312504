import { pathToFileURL } from 'node:url';

/** Stands for `import.meta.url` in the bundle, which is no module of its own. */
export const programUrl = pathToFileURL(__filename).href;
