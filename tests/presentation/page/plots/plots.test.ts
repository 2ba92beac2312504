import { describe, expect, it } from 'vitest';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import type { Part } from '../../../../src/parts/part.js';
import { PAGE_PARTS, pageInput } from '../../../support/page.js';

const HOSTILE = ['</text><script>alert(1)</script>', 'A'.repeat(500), '\u202egnp.exe', '\u05d0\u05d1\u05d2-100', '=HYPERLINK("x")', '"><svg onload=alert(1)>'];

describe('plots', () => {
  it('are all there, in reading order, each with title, finding, table and CSV', () => {
    const plots = plotsOf(pageInput());
    expect(plots.map(({ id }) => id)).toEqual(['swing-window', 'margins', 'bode', 'waveform', 'dc-error-budget', 'noise-budget', 'price-current', 'supply-temperature', 'limit-cost']);
    for (const { title, finding, table, csv } of plots) {
      expect(title).not.toBe('');
      expect(finding).toMatch(/\d.*\.$/u);
      expect(table.rows.length).toBeGreaterThan(0);
      expect(table.rows.every((row) => row.length === table.columns.length)).toBe(true);
      expect(csv).toMatch(/\r\n$/u);
    }
  });

  it('are the same bytes twice', () => {
    expect(plotsOf(pageInput())).toEqual(plotsOf(pageInput()));
  });

  it('without a part show the list alone', () => {
    const { report } = pageInput();
    expect(plotsOf({ report, chosen: null }).map(({ id }) => id)).toEqual(['price-current']);
  });

  it('are images with a name and a description, no id, no script, no reference to anything', () => {
    for (const { svg, title } of plotsOf(pageInput())) {
      expect(svg).toMatch(/^<svg xmlns="http:\/\/www\.w3\.org\/2000\/svg" class="figure plot" role="img" viewBox="0 0 \d+ \d+"/u);
      expect(svg).toContain(`<title>${title}</title><desc>`);
      expect(svg).not.toMatch(/\sid=|url\(|href|<script|<style/u);
      expect([...svg.matchAll(/font-size="([\d.]+)"/gu)].every(([, size]) => Number(size) >= 12)).toBe(true);
    }
  });

  it.each(HOSTILE)('show the id %j as text only', (id) => {
    const parts = PAGE_PARTS.map((part, at): Part => (at === 1 ? { ...part, id } : part));
    const input = pageInput({}, { parts, about: id });
    const sweep = { ...input.sweep!, points: input.sweep!.points.map((point) => ({ ...point, first: id })), turns: [{ at: 0.03, from: null, to: id }] };
    for (const { svg, csv } of plotsOf({ ...input, sweep })) {
      expect(svg).not.toMatch(/<script|<svg onload|\u202e/u);
      expect(svg.match(/<svg/gu)).toHaveLength(1);
      for (const [, shown] of svg.matchAll(/<text[^>]*>([^<]*)<\/text>/gu)) expect(shown!.length).toBeLessThan(200);
      expect(csv).not.toMatch(/(?:^|,|\n)"?=/u);
    }
  });
});
