import { describe, expect, it } from 'vitest';
import { noteLines } from '../../../../src/presentation/page/drawing/notes.js';
import { fitted, textWidth } from '../../../../src/presentation/page/drawing/text-width.js';

describe('text', () => {
  it('is cut in the middle, whole characters only', () => {
    const cut = fitted('GX-\u{1d11e}'.repeat(10), 12, 100);
    expect(textWidth(cut, 12)).toBeLessThanOrEqual(100);
    expect(cut).toContain('…');
    expect(cut).not.toMatch(/\p{Cs}/u);
    expect(fitted('GX-A', 12, 100)).toBe('GX-A');
  });

  it('breaks into lines at blanks, never at held ones', () => {
    const broken = noteLines(['A supply current (34), B lowest\u00a0supply\u00a0(19)'], 150);
    expect(broken.length).toBeGreaterThan(1);
    expect(broken.join(' ')).toBe('A supply current (34), B lowest\u00a0supply\u00a0(19)');
    expect(broken.some((line) => line.includes('lowest\u00a0supply\u00a0(19)'))).toBe(true);
  });
});
