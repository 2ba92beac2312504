import type { Stage } from '../../stage/index.js';
import type { Figure } from './figure.js';
import { html, trusted, type Html } from './html.js';
import type { PageInput } from './page-input.js';
import { plotsOf } from './plots/index.js';
import type { Symbols } from './review.js';
import { schematicOf } from './schematic/index.js';

/** The plots of one stage, in reading order. */
export function figuresOf(input: PageInput): readonly Figure[] {
  return plotsOf(input);
}

/** The stage drawn with its values, one svg element. */
export function schematicSvg(stage: Stage, symbols: Symbols): string {
  return schematicOf(stage, symbols);
}

/** A drawing on the page: as wide as it is drawn, and growing with the reader's text size. */
export function drawn(svg: string): Html {
  const [, width = '640'] = / width="([\d.]+)"/u.exec(svg) ?? [];
  return html`<div class="drawn" style="--w:${width}">${trusted(svg)}</div>`;
}
