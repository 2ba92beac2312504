import { describe, expect, it } from 'vitest';
import { aligned, boxes, figure, quoted, words } from '../../../src/presentation/page/cell.js';
import { tableOf } from '../../../src/presentation/page/table.js';

const TABLE = {
  id: 's1-checks',
  caption: 'Margins',
  columns: [{ title: 'Check' }, { title: 'Value', kind: 'number' }, { title: 'Nothing' }],
  rows: [
    { id: 's1-a', cells: [words('lowest temperature'), figure('-20.5\u00a0°C', -20.5), words('')] },
    { id: 's1-b', cells: [quoted('=1+1'), figure('7.125\u00a0mV', 0.007125), words('')] },
  ],
} as const;

describe('tables of the page', () => {
  const { markup } = tableOf(TABLE);

  it('have a caption, heads with scope, and ids on every row', () => {
    expect(markup).toContain('<caption id="s1-checks-caption">Margins</caption>');
    expect(markup).toContain('<th scope="col">Check</th><th scope="col" class="n">Value</th>');
    expect(markup).toContain('<tr id="s1-a"><th scope="row">lowest temperature</th>');
    expect(markup).toContain('role="group" tabindex="0" aria-labelledby="s1-checks-caption"');
  });

  it('leave out a column that says nothing, and say nothing without rows', () => {
    expect(markup).not.toContain('Nothing');
    expect(tableOf({ ...TABLE, rows: [] }).markup).toBe('');
  });

  it('set numbers on their decimal mark: decimals and unit in boxes as wide as the widest', () => {
    expect(markup).toContain('class="n f4 u3" data-order="-20.5">−20<span class="f">.5</span><span class="u">\u00a0°C</span>');
    expect(boxes([figure('45°', 45), figure('0.25\u00a0mV/µs', 1), words('approved')])).toEqual({ decimals: 3, unit: 6 });
    expect(aligned(words('approved'))).toBeNull();
    expect(aligned(figure('-20\u00a0°C..60\u00a0°C', null))).toBeNull();
  });

  it('carry the same as CSV, formulas disarmed', () => {
    const [, csv = ''] = /href="data:text\/csv;charset=utf-8,([^"]*)"/u.exec(markup) ?? [];
    expect(decodeURIComponent(csv.replaceAll('&#39;', "'"))).toBe("Check,Value\r\nlowest temperature,−20.5 °C\r\n'=1+1,7.125 mV\r\n");
  });
});
