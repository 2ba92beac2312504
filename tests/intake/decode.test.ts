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

  it('takes what is not UTF-8 for Windows-1252, stating the first byte with line and offset', () => {
    const decoded = decodeList(bytes('id,price\r\nA,1 ', 0x80, ' \r\nB,', 0x92, 0xb5));
    expect(decoded).toMatchObject({ ok: true, encoding: 'windows-1252', text: 'id,price\r\nA,1 \u20ac \r\nB,\u2019\u00b5' });
    expect(decoded.ok && decoded.how).toBe('not UTF-8: the byte 0x80 at offset 14, line 2');
  });

  it('refuses bytes that are no character of Windows-1252 either', () => {
    const refusal = decodeList(bytes('id\nA', 0x81));
    expect(refusal).toMatchObject({ ok: false, code: 'I101', line: 2 });
    expect(!refusal.ok && refusal.reason).toMatch(/0x81 at offset 4/u);
  });

  it('refuses a bad byte behind the mark of UTF-8, counting the mark', () => {
    const marked = decodeList(bytes(0xef, 0xbb, 0xbf, 'id', 0xff));
    expect(marked).toMatchObject({ ok: false, code: 'I101' });
    expect(!marked.ok && marked.reason).toContain('offset 5');
  });

  it('has the whole upper half of Windows-1252', () => {
    const known = '\u20ac\u201a\u0192\u201e\u2026\u2020\u2021\u02c6\u2030\u0160\u2039\u0152\u017d\u2018\u2019\u201c\u201d\u2022\u2013\u2014\u02dc\u2122\u0161\u203a\u0153\u017e\u0178';
    const codes = Array.from({ length: 32 }, (_, index) => 0x80 + index).filter((byte) => ![0x81, 0x8d, 0x8f, 0x90, 0x9d].includes(byte));
    expect(decodeList(Uint8Array.from(codes), { encoding: 'windows-1252' })).toMatchObject({ ok: true, text: known });
    const latin = Uint8Array.from({ length: 96 }, (_, index) => 0xa0 + index);
    expect(decodeList(latin, { encoding: 'windows-1252' })).toMatchObject({ text: Buffer.from(latin).toString('latin1') });
  });

  it.each(['utf16le', 'utf16be'])('reads %s by its mark', (name) => {
    const little = Buffer.from('\ufeffid,\u00b5\nA,1', 'utf16le');
    const input = name === 'utf16le' ? little : Buffer.from(little).swap16();
    expect(decodeList(input)).toMatchObject({ ok: true, text: 'id,\u00b5\nA,1', encoding: name === 'utf16le' ? 'utf-16le' : 'utf-16be' });
  });

  it('refuses UTF-16 cut in half, and half a surrogate pair', () => {
    expect(decodeList(Buffer.from('\ufeffid', 'utf16le').subarray(0, 5))).toMatchObject({ ok: false, code: 'I102' });
    expect(decodeList(Buffer.from([0xff, 0xfe, 0x00, 0xd8]))).toMatchObject({ ok: false, code: 'I102' });
  });

  it('over the limit names the option that lifts it', () => {
    const big = new Uint8Array(64 * 1024 * 1024 + 1).fill(0x41);
    expect(decodeList(big)).toMatchObject({ ok: false, code: 'I105', fix: 'split the list, or lift the limit with --large' });
    expect(decodeList(big, { large: true })).toMatchObject({ ok: true });
  });

  it.each([
    ['an overlong form', bytes(0xc0, 0x80)],
    ['a surrogate', bytes(0xed, 0xa0, 0x80)],
    ['beyond U+10FFFF', bytes(0xf4, 0x90, 0x80, 0x80)],
    ['a cut sequence', bytes('a', 0xe2, 0x82)],
  ])('takes %s for no UTF-8', (_, input) => {
    expect(decodeList(input)).not.toMatchObject({ ok: true, encoding: 'utf-8' });
    expect(decodeList(input, { encoding: 'utf-8' })).toMatchObject({ ok: false, code: 'I101' });
    expect(() => new TextDecoder('utf-8', { fatal: true }).decode(input)).toThrow();
  });

  it('accepts every character', () => {
    const text = 'a\u07ff\u0800\ud7ff\ue000\uffff\u{10000}\u{10ffff}';
    expect(decodeList(utf8(text))).toMatchObject({ ok: true, text });
  });

  it.each([
    ['UTF-16 without mark', Buffer.from('id,x', 'utf16le')],
    ['a NUL byte', bytes('id\nA', 0, 'B')],
  ])('refuses %s by name', (_, input) => {
    const refusal = decodeList(input);
    expect(refusal).toMatchObject({ ok: false, code: 'I102' });
    expect(!refusal.ok && refusal.fix).toContain('save the file as "CSV UTF-8"');
    expect(!refusal.ok && refusal.reason).toMatch(/UTF-16/u);
  });
});
