import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';

export type Expected = number | string | readonly number[] | readonly (readonly number[])[];

/** One published or independently computed value; inputs in SI. */
export interface Entry {
  readonly id: string;
  readonly topic: string;
  readonly quantity: string;
  readonly inputs: Readonly<Record<string, unknown>>;
  readonly expected: Expected;
  readonly relation: '==' | '<=';
  readonly unit: string;
  readonly tolerance_rel: number;
  readonly source: string;
  readonly naive?: { readonly value: number | null; readonly why: string };
}

export const ENTRIES: readonly Entry[] = (
  JSON.parse(readFileSync(new URL('../outside/check-values.json', import.meta.url), 'utf8')) as { cases: Entry[] }
).cases;

/** Reads the inputs of one entry; a key that is not there fails the test instead of becoming undefined. */
export interface Given {
  (key: string): number;
  list(key: string): readonly number[];
  raw(key: string): unknown;
}

/** Our value against an entry, with the entry's own tolerance; and against the value of its short-cut, which must differ. */
export function published(id: string, ours: (given: Given) => Expected): void {
  const entry = find(id);
  it(`${id} ${entry.quantity} (${entry.source})`, () => {
    const actual = ours(given(entry));
    expectAgreement(entry, actual);
    const naive = entry.naive?.value;
    if (naive === undefined || naive === null) return;
    const allowed = entry.tolerance_rel * Math.abs(entry.expected as number);
    expect(Math.abs((actual as number) - naive), `the short-cut: ${entry.naive?.why}`).toBeGreaterThan(allowed);
  });
}

/** The entry computed once more by a route that shares nothing with ours but the physics, within a stated relative tolerance. */
export function rederived(id: string, route: { readonly by: string; readonly within: number; readonly value: (given: Given) => number }): void {
  const entry = find(id);
  it(`${id} again, by ${route.by} (${entry.source})`, () => {
    expectWithin(route.value(given(entry)), entry.expected as number, route.within);
  });
}

/** |actual − expected| ≤ within·|expected|. */
export function expectWithin(actual: number, expected: number, within: number): void {
  const text = `${actual} against ${expected}, allowed ${within} relative`;
  expect(Math.abs(actual - expected), text).toBeLessThanOrEqual(within * Math.abs(expected));
}

function expectAgreement(entry: Entry, actual: Expected): void {
  if (typeof entry.expected !== 'number') return expect(actual).toEqual(entry.expected);
  if (entry.relation === '==') return expectWithin(actual as number, entry.expected, entry.tolerance_rel);
  // A ceiling has no tolerance upwards.
  expect(actual).toBeLessThanOrEqual(entry.expected);
}

function find(id: string): Entry {
  const entry = ENTRIES.find((candidate) => candidate.id === id);
  if (!entry) throw new Error(`tests/outside/check-values.json has no entry ${id}`);
  return entry;
}

function given({ id, inputs }: Entry): Given {
  const raw = (key: string): unknown => {
    if (!(key in inputs)) throw new Error(`${id} has no input ${key}; it has ${Object.keys(inputs).join(', ')}`);
    return inputs[key];
  };
  const number = (key: string): number => {
    const value = raw(key);
    if (typeof value !== 'number') throw new Error(`${id}: ${key} is not a number`);
    return value;
  };
  return Object.assign(number, { raw, list: (key: string) => raw(key) as readonly number[] });
}
