/** Why reading stopped. Thrown inside this room only; `parseQuantity` turns it into a QuantityProblem. */
export class Refusal extends Error {
  readonly code: string;
  /** [start, end) in the normalised text. */
  readonly span: readonly [number, number];
  readonly fix: string | undefined;

  constructor(code: string, message: string, where: Where) {
    super(message);
    this.code = code;
    this.span = [where.start, where.end];
    this.fix = where.fix;
  }
}

/** Which part of the normalised text is meant, and what to type instead. */
export interface Where {
  readonly start: number;
  readonly end: number;
  readonly fix?: string | undefined;
}
