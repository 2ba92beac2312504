import type { Style } from '../style.js';

/** What a bar is drawn with. Each sign is one column wide in every locale (none is of ambiguous East Asian width), and each has a shape of its own: colour adds nothing. */
export interface Signs {
  /** The signal, or what is left of a limit. */
  readonly full: string;
  /** Head-room the part needs. */
  readonly taken: string;
  /** Free: may be used, nothing is there. */
  readonly free: string;
  /** What offset and drift may add. */
  readonly error: string;
  /** Out of reach, or missing to a limit. */
  readonly missing: string;
  /** Not known. */
  readonly open: string;
}

const PLAIN: Signs = { full: '=', taken: '/', free: '.', error: '-', missing: 'x', open: '?' };
const DRAWN: Signs = { ...PLAIN, full: '▬', taken: '░' };

export const signsOf = ({ ascii }: Pick<Style, 'ascii'>): Signs => (ascii ? PLAIN : DRAWN);
