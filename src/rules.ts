/** Version of the judging rules. By itself, so that asking for it loads none of them. */
export const RULES = '1';
