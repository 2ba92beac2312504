import { describe, expect, it } from 'vitest';
import { decodeList } from '../../src/intake/decode.js';

const utf8 = (text: string): Uint8Array => new TextEncoder().encode(text);
const bytes = (...values: (number | string)[]): Uint8Array =>
  Uint8Array.from(values.flatMap((value) => (typeof value === 'number' ? [value] : [...utf8(value)])));

describe('decodeList', () => {
  it('removes the byte-order mark of UTF-8 and only that', () => {
    expect(decodeList(bytes(0xef, 0xbb, 0xbf, 'id,µ'))).toMatchObject({ ok: true, text: 'id,µ' });
    expect(decodeList(utf8('id\ufeff'))).toMatchObject({ ok: true, text: 'id\ufeff' });
  });

  it('names the first bad byte with line and offset, counting the mark', () => {
    const refusal = decodeList(bytes('id,price\r\nA,1 ', 0x80, '\r\n'));
    expect(refusal).toMatchObject({ ok: false, code: 'I101', line: 2 });
    expect(!refusal.ok && refusal.reason).toBe('not UTF-8: the byte 0x80 at offset 14 begins no valid character');
    const marked = decodeList(bytes(0xef, 0xbb, 0xbf, 'id', 0xff));
    expect(!marked.ok && marked.reason).toContain('offset 5');
  });

  it.each([
    ['an overlong form', bytes(0xc0, 0x80)],
    ['a surrogate', bytes(0xed, 0xa0, 0x80)],
    ['beyond U+10FFFF', bytes(0xf4, 0x90, 0x80, 0x80)],
    ['a cut sequence', bytes('a', 0xe2, 0x82)],
  ])('refuses %s', (_, input) => {
    expect(decodeList(input)).toMatchObject({ ok: false, code: 'I101' });
    expect(() => new TextDecoder('utf-8', { fatal: true }).decode(input)).toThrow();
  });

  it('accepts every character', () => {
    const text = 'a\u07ff\u0800\ud7ff\ue000\uffff\u{10000}\u{10ffff}';
    expect(decodeList(utf8(text))).toMatchObject({ ok: true, text });
  });

  it.each([
    ['UTF-16 little-endian', Buffer.from('\ufeffid', 'utf16le')],
    ['UTF-16 without mark', Buffer.from('id,x', 'utf16le')],
    ['a NUL byte', bytes('id\nA', 0, 'B')],
  ])('refuses %s by name', (_, input) => {
    const refusal = decodeList(input);
    expect(refusal).toMatchObject({ ok: false, code: 'I102', fix: 'save the file as "CSV UTF-8"' });
    expect(!refusal.ok && refusal.reason).toMatch(/UTF-16/u);
  });
});
