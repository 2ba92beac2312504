/** One stage of the greenhouse controller, as a draft shows it. Texts as they are typed, by dotted path. */
export interface Scene {
  /** What the stage is for. */
  readonly told: string;
  /** Fields without which this stage cannot be derived. */
  readonly live: Readonly<Record<string, string>>;
  /** Examples that agree with what is live; other fields take the example of the table of fields. */
  readonly examples: Readonly<Record<string, string>>;
}
