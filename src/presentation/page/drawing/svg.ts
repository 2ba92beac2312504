import { INK } from './colours.js';
import { sentence, tag } from './markup.js';
import { SIZE } from './marks.js';

export interface Sheet {
  readonly kind: 'plot' | 'schematic';
  readonly title: string;
  readonly description: string;
  readonly width: number;
  readonly height: number;
  readonly body: string;
}

/**
 * One drawing: an image with a name and a description (the first child names an SVG, so no ids are needed and many drawings may
 * stand in one document). Width and height are those at which its text has its own size; a narrow page scrolls it.
 */
export function sheetSvg({ kind, title, description, width, height, body }: Sheet): string {
  const attributes = {
    xmlns: 'http://www.w3.org/2000/svg', class: `figure ${kind}`, role: 'img', viewBox: `0 0 ${width} ${height}`, width, height,
    'font-family': "system-ui, 'DejaVu Sans', sans-serif", 'font-size': SIZE, fill: INK,
  };
  return tag('svg', attributes, `<title>${sentence(title)}</title><desc>${sentence(description)}</desc>${body}`);
}
