import type { Style } from '../index.js';
import { usesAscii, usesBars, usesColour, widthOf, type ColourWish, type Environment, type StreamFacts } from './terminal.js';

/** The world a command runs in; tests hand in their own. */
export interface Session {
  readonly env: Environment;
  readonly stdout: StreamFacts;
  readonly stderr: StreamFacts;
  /** Talk: notes and progress go to stderr. */
  tell(line: string): void;
}

/** Options every command understands. */
export interface CommonOptions {
  readonly json?: boolean;
  readonly csv?: boolean;
  readonly color?: ColourWish;
  readonly ascii?: boolean;
  readonly catalog?: string;
  readonly top?: number;
  readonly all?: boolean;
  readonly sources?: boolean;
  readonly formulas?: boolean;
}

/** What a command hands back: a document for stdout and an exit code. */
export interface Outcome {
  readonly text: string;
  /** Text for stderr, written before the result. */
  readonly talk?: string;
  readonly exit: number;
}

export const DEFAULT_TOP = 20;

/** How text is written on one of the two streams. */
export function styleFor(session: Session, options: CommonOptions, stream: 'stdout' | 'stderr' = 'stdout'): Style {
  const facts = session[stream];
  return {
    width: widthOf(session.env, facts),
    ascii: usesAscii(options.ascii === true, session.env),
    colour: usesColour(options.color ?? 'auto', session.env, facts),
    top: options.top ?? DEFAULT_TOP,
    all: options.all === true,
    sources: options.sources === true,
    formulas: options.formulas === true,
    bars: usesBars(session.env, facts),
    gluedUnits: facts.isTTY,
  };
}
