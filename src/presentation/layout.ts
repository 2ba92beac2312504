import stringWidth from 'string-width';
import { spelled } from './spelling.js';
import type { Style } from './style.js';

/** Columns a text takes on a terminal; colour takes none. */
export const displayWidth = (text: string): number => (NARROW.test(text) ? text.length : stringWidth(text));

/** Characters that take one column each beside whatever stands next to them, which nearly all texts consist of: Latin, Greek, the trade's signs, lines and blocks, and the joint of what is to be pasted. */
const NARROW = /^[ -~\u00a0-\u00ac\u00ae-\u024f\u0391-\u03a1\u03a3-\u03c9\u2010-\u2015\u2018-\u2022\u2026\u2030\u2032\u2033\u2070\u2074-\u207b\u2190-\u2193\u2212\u221a\u221e\u2248\u2260\u2264\u2265\u2500-\u259f\u2713\u2717\ue000]*$/u;

export const padded = (text: string, width: number): string => text + ' '.repeat(Math.max(0, width - displayWidth(text)));
export const padStart = (text: string, width: number): string => ' '.repeat(Math.max(0, width - displayWidth(text))) + text;

export interface ParagraphShape {
  /** What stands before the first line. */
  readonly lead?: string;
  /** Columns before the other lines; by default as wide as the lead. */
  readonly indent?: number;
}

/** A text wrapped at its blanks. A single word wider than the line stays whole. */
export function paragraph(text: string, style: Style, shape: ParagraphShape = {}): string[] {
  const lead = spelled(shape.lead ?? '', style);
  const indent = ' '.repeat(shape.indent ?? displayWidth(lead));
  const lines: string[] = [];
  let line = lead;
  let isEmpty = true;
  for (const word of spelled(text, style).split(' ').filter((one) => one !== '')) {
    const joined = isEmpty ? line + word : `${line} ${word}`;
    if (!isEmpty && displayWidth(joined) > style.width) {
      lines.push(line);
      line = indent + word;
    } else line = joined;
    isEmpty = false;
  }
  return [...lines, line];
}

export interface FlowShape extends ParagraphShape {
  /** Blanks between two pieces of one line. */
  readonly gap?: number;
}

/** Pieces side by side as long as they fit, each whole where it can be. */
export function flow(pieces: readonly string[], style: Style, shape: FlowShape = {}): string[] {
  const lead = spelled(shape.lead ?? '', style);
  const indent = shape.indent ?? displayWidth(lead);
  const gap = ' '.repeat(shape.gap ?? 4);
  const lines: string[] = [];
  for (const piece of pieces.map((one) => spelled(one, style))) {
    const last = lines.at(-1);
    if (last !== undefined && displayWidth(last + gap + piece.trimEnd()) <= style.width) {
      lines[lines.length - 1] = last + gap + piece;
      continue;
    }
    const before = last === undefined ? lead : ' '.repeat(indent);
    const isWhole = displayWidth(before + piece.trimEnd()) <= style.width;
    lines.push(...(isWhole ? [before + piece] : paragraph(piece, style, { lead: before, indent })));
  }
  return lines;
}

/** A label in its own column, the text beside it. */
export function labelled(label: string, text: string, style: Style): string[] {
  return paragraph(text, style, { lead: padded(label, LABEL) });
}

export const LABEL = 8;
