import { RULES } from '../rules.js';

/** Version of the tool; a test holds it equal to package.json. */
export const TOOL_VERSION = '0.1.0';

export const VERSION = `railfit ${TOOL_VERSION} (rules ${RULES})`;
