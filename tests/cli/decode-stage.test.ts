import { describe, expect, it } from 'vitest';
import { decodeStage } from '../../src/cli/decode-stage.js';
import { RequestError } from '../../src/cli/request-error.js';

function told(bytes: Buffer): string {
  try {
    return decodeStage(bytes, 'stage.yaml');
  } catch (error) {
    return error instanceof RequestError ? error.problems.map(({ code, message }) => `${code} ${message}`).join() : 'another error';
  }
}

describe('a stage file in bytes', () => {
  it('is read as UTF-8, with a byte order mark or without', () => {
    expect(told(Buffer.from('supply: 5 V ± 5 %'))).toBe('supply: 5 V ± 5 %');
    expect(told(Buffer.from('\uFEFFsupply: 5 V'))).toBe('supply: 5 V');
  });

  it('is refused with byte and line in another encoding', () => {
    expect(told(Buffer.from('topology: follower\nsupply: 5 V ± 5 %', 'latin1'))).toBe('S100 not UTF-8: byte 0xB1 in line 2');
    expect(told(Buffer.from('name: Prüfung\n', 'latin1'))).toBe('S100 not UTF-8: byte 0xFC in line 1');
    expect(told(Buffer.from('name: café', 'latin1'))).toBe('S100 not UTF-8: byte 0xE9 in line 1');
    expect(told(Buffer.from('name: ±é\nsupply: 5 V é x', 'latin1'))).toBe('S100 not UTF-8: byte 0xB1 in line 1');
  });
});
