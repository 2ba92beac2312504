/** Number of migrations this version knows; a catalog keeps the number it stands at as its `user_version`. */
export const SCHEMA_VERSION = 6;

/** `application_id` of a catalog: "rail" in ASCII. */
export const APPLICATION_ID = 0x7261696c;
