/** One drawing of the page with its words and its numbers. */
export interface Figure {
  /** Stable within a stage: `swing-window`. */
  readonly id: string;
  readonly title: string;
  /** One sentence with numbers: what a glance at the drawing answers. Plain text, not escaped; a right-to-left name stands between U+2068 and U+2069. */
  readonly finding: string;
  /** Self-contained `<svg>`; it carries no id, so that many may stand in one document. */
  readonly svg: string;
  /** What the drawing shows, as read. Plain text, not escaped. */
  readonly table: { readonly columns: readonly string[]; readonly rows: readonly (readonly string[])[] };
  /** The same in SI units, unrounded; formulas of spreadsheets disarmed. */
  readonly csv: string;
}
