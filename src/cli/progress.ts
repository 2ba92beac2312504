import type { Session } from './session.js';

/** A bar on the terminal for work that takes long. */
export interface ProgressBar {
  /** One step of several, told by its name. */
  step(name: string): (done: number, total: number) => void;
  /** Takes the bar away. */
  end(): void;
}

const SILENT: ProgressBar = { step: () => () => undefined, end: () => undefined };

/** Milliseconds: shorter work shows nothing, and the bar is not drawn more often than this again and again. */
const PATIENCE = 500;
const REDRAW = 100;
const CELLS = 24;

/**
 * On stderr, and only when that is a terminal; after half a second, erased at the end. Works inside one long synchronous piece of
 * work: writing to a terminal is synchronous.
 */
export function progressBar({ stderr, env }: Pick<Session, 'stderr' | 'env'>, write: (text: string) => void): ProgressBar {
  if (!stderr.isTTY || env['TERM'] === 'dumb') return SILENT;
  const start = performance.now();
  let drawn = start + PATIENCE - REDRAW;
  let isShown = false;
  const draw = (text: string): void => {
    write(`\r\u001b[K${text}`);
    isShown = true;
    drawn = performance.now();
  };
  return {
    step: (name) => (done, total) => {
      // The clock is asked once in so many calls: it costs more than the work of a row.
      if (done % 64 !== 0 || performance.now() - drawn < REDRAW) return;
      draw(barText(name, done / total));
    },
    end: () => { if (isShown) write('\r\u001b[K'); },
  };
}

function barText(name: string, share: number): string {
  const full = Math.floor(share * CELLS);
  return `${name} [${'#'.repeat(full)}${'.'.repeat(CELLS - full)}] ${Math.floor(100 * share)} %`;
}
