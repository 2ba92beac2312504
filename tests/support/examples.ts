import { expect, it } from 'vitest';

/** The worked example of a formula, to half a unit in its fourth digit. */
export function example(text: string, value: () => number, expected: number): void {
  const within = 5e-4;
  it(`${text} is ${expected}`, () => {
    const actual = value();
    expect(Math.abs(actual - expected), `${actual}`).toBeLessThanOrEqual(within * Math.abs(expected));
  });
}

/** A call outside the range of a formula, and the whole sentence it throws. */
export function refuses(call: () => unknown, message: string): void {
  it(`refuses: ${message}`, () => {
    expect(call).toThrow(new RangeError(message));
  });
}
