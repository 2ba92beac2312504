/** Remembers texts by 64 bits each, whatever their length; two texts may, once in many lists, be taken for one. */
export interface LikenessSet {
  /** True when the text, or one taken for it, was there before. */
  add(text: string): boolean;
}

/** A table with open addressing, at most half full. */
export function likenessSet(): LikenessSet {
  let table = new Uint32Array(2 * FIRST_ROOM);
  let count = 0;
  const place = (into: Uint32Array, [low, high]: Pair): boolean => {
    const room = into.length / 2;
    for (let at = low % room; ; at = (at + 1) % room) {
      const [known, other] = [into[2 * at], into[2 * at + 1]];
      if (known === low && other === high) return true;
      if (known !== 0 || other !== 0) continue;
      into[2 * at] = low;
      into[2 * at + 1] = high;
      return false;
    }
  };
  return {
    add(text) {
      if (count * 4 >= table.length) table = moved(table, place);
      const wasThere = place(table, hashOf(text));
      if (!wasThere) count += 1;
      return wasThere;
    },
  };
}

type Pair = readonly [low: number, high: number];

const FIRST_ROOM = 1 << 12;

function moved(table: Uint32Array, place: (into: Uint32Array, pair: Pair) => boolean): Uint32Array<ArrayBuffer> {
  const larger = new Uint32Array(2 * table.length);
  for (let at = 0; at < table.length; at += 2) {
    const [low = 0, high = 0] = [table[at], table[at + 1]];
    if (low !== 0 || high !== 0) place(larger, [low, high]);
  }
  return larger;
}

/**
 * Two hashes of 32 bits (FNV-1a: G. Fowler, L. C. Noll, K.-P. Vo, "The FNV Non-Cryptographic Hash Algorithm", IETF draft; from memory),
 * the second with another start and multiplier. Never both 0, which marks an empty place.
 */
function hashOf(text: string): Pair {
  let [low, high] = [0x811c9dc5, 0x9e3779b9];
  for (let at = 0; at < text.length; at += 1) {
    const unit = text.charCodeAt(at);
    low = Math.imul(low ^ unit, 0x01000193);
    high = Math.imul(high ^ unit, 0x85ebca6b) ^ (high >>> 15);
  }
  return [low >>> 0, high >>> 0 || 1];
}
