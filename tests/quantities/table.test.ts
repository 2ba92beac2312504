import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import { describe, expect, it } from 'vitest';
import { FIELD_KINDS, type FieldKind } from '../../src/quantities/kinds.js';
import { parseQuantity } from '../../src/quantities/parse.js';

interface Row {
  readonly id: string;
  readonly input_escaped: string;
  readonly context: string;
  readonly field_kind: string;
  readonly verdict: 'accept' | 'accept-with-note' | 'refuse';
  readonly si_min: string;
  readonly si_nominal: string;
  readonly si_max: string;
  readonly si_unit: string;
  readonly canonical_echo: string;
  readonly code: string;
  readonly message_or_note: string;
  readonly suggestion: string;
}

const rows: Row[] = parse(readFileSync(new URL('./quantities.csv', import.meta.url)), { columns: true });

/** The bytes of `input` may be changed by an editor; the escapes are not. */
const typed = (row: Row): string => row.input_escaped.replace(/\\u([0-9a-f]{4})/g, (_, code: string) => String.fromCharCode(Number.parseInt(code, 16)));
const kindOf = (row: Row): FieldKind => FIELD_KINDS.find((kind) => kind === row.field_kind) ?? expect.unreachable(row.field_kind);
const read = (row: Row) => parseQuantity(typed(row), kindOf(row), row.context === 'decimal=comma' ? { decimal: 'comma' } : {});

/** 1e-12, or half a unit of the last digit where the table rounds more than that (1.41421356237 for the root of two). */
function expectNumber(actual: number | undefined, expected: string): void {
  if (expected === '') { expect(actual).toBeUndefined(); return; }
  const value = Number(expected);
  const digits = expected.replace(/e.*/, '').replace(/[^0-9]/g, '').replace(/^0+/, '').length;
  const tolerance = digits >= 11 ? Math.max(1e-12, 5 * 10 ** -digits) : 1e-12;
  expect(Math.abs((actual ?? Number.NaN) - value)).toBeLessThanOrEqual(tolerance * Math.abs(value));
}

describe('the table of quantities', () => {
  it('has its rows', () => expect(rows.length).toBe(175));

  it.each(rows.filter((row) => row.verdict !== 'refuse'))('$id accepts $input as $field_kind', (row) => {
    const result = read(row);
    if (!result.ok) return expect.unreachable(`${result.problem.code} ${result.problem.message}`);
    const { quantity } = result;
    expectNumber(quantity.min, row.si_min);
    expectNumber(quantity.nominal, row.si_nominal);
    expectNumber(quantity.max, row.si_max);
    expect(quantity.echo).toBe(row.canonical_echo);
    expect(row.si_unit === 'cur' ? /^[A-Z]{3}$/.test(quantity.unit) : quantity.unit).toBe(row.si_unit === 'cur' ? true : row.si_unit);
    expect(quantity.note !== undefined).toBe(row.verdict === 'accept-with-note');
  });

  it.each(rows.filter((row) => row.verdict === 'refuse'))('$id refuses $input as $field_kind', (row) => {
    const result = read(row);
    if (result.ok) return expect.unreachable(result.quantity.echo);
    expect(result.problem.code).toBe(row.code);
    const fix = row.suggestion.replace(/^write /, '');
    if (fix !== '') expect(result.problem.fix).toBe(fix);
    const [start, end] = result.problem.span;
    expect(start >= 0 && start <= end && end <= typed(row).length).toBe(true);
    expect(start < end || typed(row) === '').toBe(true);
  });

  /** Advice rather than text to paste. */
  const ADVICE = /^(?:check|delete|leave|restore|give|10 V if)/;
  it.each(rows.filter((row) => row.verdict === 'refuse'))('$id: what it offers instead of $input is accepted', (row) => {
    const result = read(row);
    if (result.ok) return expect.unreachable(result.quantity.echo);
    const { fix } = result.problem;
    if (fix === undefined || ADVICE.test(fix)) { expect(fix ?? '').toMatch(/^$|^[a-z1]/); return; }
    const [first = ''] = fix.split(/, | or |; | \(or/);
    expect(parseQuantity(first, kindOf(row))).toMatchObject({ ok: true });
  });
});
