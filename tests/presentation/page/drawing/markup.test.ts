import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { px, sentence, tag, xml } from '../../../../src/presentation/page/drawing/markup.js';
import { named } from '../../../../src/presentation/page/drawing/said.js';

const HOSTILE = `</text><script>alert(1)</script><svg onload="x">&'`;

describe('markup', () => {
  it('escapes what a list says', () => {
    expect(xml(HOSTILE)).toBe('&lt;/text&gt;&lt;script&gt;alert(1)&lt;/script&gt;&lt;svg onload=&quot;x&quot;&gt;&amp;&#39;');
    expect(tag('text', { class: HOSTILE })).not.toContain('<script');
  });

  it('leaves no markup, control or invisible character of any text', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => {
      expect(xml(text)).not.toMatch(/[<>"'\p{Cc}\p{Cf}\p{Cs}\ufffe\uffff]/u);
    }));
  });

  it('shows what turns the reading direction, and keeps a right-to-left name to itself', () => {
    expect(xml('A\u202eB')).toBe('A\\u{202e}B');
    const id = '\u05d0\u05d1-100';
    expect(named(id)).toBe(`\u2068${id}\u2069`);
    expect(sentence(`${named(id)} costs <1>`)).toBe(`\u2068${id}\u2069 costs &lt;1&gt;`);
    expect(sentence('\u2068open')).toBe('\\u{2068}open');
  });

  it('stops marks that pile up', () => {
    expect(xml(`A${'\u0301'.repeat(50)}`)).toBe('A\u0301\u0301');
  });

  it('places with one decimal, and never nowhere', () => {
    expect([px(1.25), px(-0.04), px(10)]).toEqual(['1.3', '0', '10']);
    expect(() => px(Number.NaN)).toThrow(RangeError);
  });
});
