/** A run of unit letters; `p-p` and `pk-pk` keep their hyphen. */
const PIECE = /^(?:[A-Z]{1,3}\$|[%‰€$#&@]|[A-Za-zµΩω°√]+(?:(?<=pk)-pk\b|(?<=p)-p\b)?)/i;
/** Words that end a unit: they say something about the number, not about what it measures. */
const STOP = /^(?:max|min|typ|nom|maximum|minimum|typical|typically|nominal|to|at|up|less|more|not|no|magnitude|and|or)(?![A-Za-z])/i;
const TAILS: readonly RegExp[] = [
  /^ *\^ *\(? *-? *(?:½|\d+(?:\.\d+)?(?:\/\d+)?) *\)?/,
  /^[⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹½]+/,
];
const JOINTS = /^(?: *\/ *| *· *|\*| +)(?=[A-Za-zµΩω°√%‰€$])/;

/** Length of the unit the text starts with, 0 when it starts with none. Quotients, powers and blanks inside a unit belong to it. */
export function unitLength(text: string): number {
  let length = PIECE.exec(text)?.[0].length ?? 0;
  while (length > 0) {
    const more = tailLength(text, length) || jointLength(text.slice(length));
    if (more === 0) break;
    length += more;
  }
  return length;
}

function tailLength(text: string, at: number): number {
  if (/(?:rt|sqrt|root|√)$/.test(text.slice(0, at))) {
    const bracket = /^ *\( *[hH][zZ] *\)/.exec(text.slice(at));
    if (bracket !== null) return bracket[0].length;
  }
  for (const tail of TAILS) {
    const match = tail.exec(text.slice(at));
    if (match !== null) return match[0].length;
  }
  return 0;
}

function jointLength(rest: string): number {
  const joint = JOINTS.exec(rest)?.[0].length ?? 0;
  if (joint === 0) return 0;
  const after = rest.slice(joint);
  // A letter code (`R47`) after a blank is a number of its own.
  if (STOP.test(after) || /^[A-Za-zµ]\d/.test(after)) return 0;
  const piece = PIECE.exec(after)?.[0].length ?? 0;
  return piece === 0 ? 0 : joint + piece;
}
