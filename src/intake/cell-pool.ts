/** Gives equal cells of a list one text. A long list says the same few things again and again. */
export type CellPool = (text: string) => string;

/** So many different cells are remembered; behind them each is a text of its own. */
const MOST = 50_000;
/** Characters: a longer piece of a text is kept by the engine as a window on the whole of it. */
const SHORT = 12;

/** A pool for one file. What it gives out no longer holds on to the text of the file. */
export function cellPool(): CellPool {
  const known = new Map<string, string>();
  return (text) => {
    const earlier = known.get(text);
    if (earlier !== undefined) return earlier;
    const own = text.length <= SHORT ? text : Buffer.from(text, 'utf16le').toString('utf16le');
    if (known.size < MOST) known.set(own, own);
    return own;
  };
}
