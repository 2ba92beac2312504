import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { escaped, foreign, html, preformatted, prose, slug } from '../../../src/presentation/page/html.js';

describe('markup from templates', () => {
  it('escapes text wherever it stands, and joins markup as it is', () => {
    const cell = '<script>alert("1")</script>';
    expect(html`<td title="${cell}">${[html`<b>${cell}</b>`, ' & ']}${null}</td>`.markup).toBe(
      '<td title="&#60;script&#62;alert(&#34;1&#34;)&#60;/script&#62;"><b>&#60;script&#62;alert(&#34;1&#34;)&#60;/script&#62;</b> &#38; </td>',
    );
  });

  it('leaves no sign that ends text or an attribute, and no control or bidi character', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => { expect(escaped(text)).not.toMatch(/[<>"'`\p{Cc}\p{Cf}\p{Cs}\p{Co}\u2028\u2029]/u); }));
  });

  it('isolates what the list says, and cuts what is very long, saying how long it was', () => {
    expect(foreign('مكبر 1').markup).toBe('<bdi class="k">مكبر 1</bdi>');
    expect(foreign('a\r\n b').markup).toBe('<bdi class="k">a b</bdi>');
    expect(foreign('x'.repeat(240)).markup).toBe(`<bdi>${'x'.repeat(240)}</bdi>`);
    expect(foreign('x'.repeat(241)).markup).toBe(`<bdi>${'x'.repeat(240)}… (241 characters)</bdi>`);
  });

  it('keeps the lines of a file, and nothing else of it', () => {
    expect(preformatted('a: <b>\r\n\tc\n').markup).toBe('a: &#60;b&#62;\n\\u{9}c\n');
  });

  it.each([
    ['at -20 °C', 'at −20 °C'],
    ['-20 °C..-5 °C', '−20 °C..−5 °C'],
    ['(-3 mV)', '(−3 mV)'],
    ['head-room to V- and V+', 'head-room to V− and V+'],
    ['TEAM-0012, 25-30, 2026-03-14', 'TEAM-0012, 25-30, 2026-03-14'],
    ['1e-9', '1e-9'],
  ])('sets %j as %j', (text, expected) => { expect(prose(text)).toBe(expected); });

  it('makes ids that no other text has, of signs any fragment may have', () => {
    expect(slug('GX-1 µ')).toBe('GX-1_20__b5_');
    fc.assert(fc.property(fc.string(), fc.string(), (a, b) => {
      expect(slug(a)).toMatch(/^[A-Za-z0-9._-]*$/u);
      if (a !== b) expect(slug(a)).not.toBe(slug(b));
    }));
  });
});
