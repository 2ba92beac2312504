import type { Figure } from '../figure.js';
import { html, prose, slug, type Html, type Piece } from '../html.js';
import type { Review, ReviewedStage } from '../review.js';

/** A stage on the page: its number, the level of its headings, and the review it stands in. */
export interface Place {
  readonly review: Review;
  readonly stage: ReviewedStage;
  /** From 1. */
  readonly number: number;
  /** Level of the headings of its sections. */
  readonly level: 2 | 3;
  /** Its plots, drawn once for the contents list and the section. */
  readonly plots: readonly Figure[];
}

/** A fragment id within a stage; the same for the same stage and subject, whatever else is on the page. */
export const idOf = ({ number }: Pick<Place, 'number'>, ...names: readonly string[]): string => [`s${number}`, ...names.map(slug)].join('-');

/** The sections of a stage in reading order, as the contents list names them. */
export const SECTIONS = {
  answer: 'Answer',
  stage: 'Stage',
  margins: 'Margins',
  shortlist: 'Shortlist',
  budgets: 'Budgets',
  plots: 'Plots',
  assumptions: 'Assumptions',
  method: 'Method',
  rejected: 'What does not fit',
  sources: 'Sources',
} as const;
export type SectionName = keyof typeof SECTIONS;

/** A section with its heading. */
export function section(place: Place, name: SectionName, content: Piece): Html {
  const id = idOf(place, name);
  // Among several stages a section is told from the others by its stage.
  const names = place.level === 2 ? `${id}-title` : `${idOf(place, 'title')} ${id}-title`;
  return html`<section id="${id}" aria-labelledby="${names}">
${heading(place.level, SECTIONS[name], `${id}-title`)}
${content}
</section>
`;
}

export function heading(level: 2 | 3 | 4, title: string, id?: string): Html {
  const named = id === undefined ? '' : html` id="${id}"`;
  if (level === 2) return html`<h2${named}>${prose(title)}</h2>`;
  return level === 3 ? html`<h3${named}>${prose(title)}</h3>` : html`<h4${named}>${prose(title)}</h4>`;
}

/** A heading inside a section. */
export const subheading = ({ level }: Place, title: string): Html => heading(level === 2 ? 3 : 4, title);

export const paragraphOf = (text: string): Html => html`<p>${prose(text)}</p>`;

/** Items as a list; nothing for none. */
export function listOf(items: readonly Piece[], kind = ''): Html {
  return items.length === 0 ? html`` : html`<ul${kind === '' ? '' : html` class="${kind}"`}>${items.map((item) => html`<li>${item}</li>`)}</ul>`;
}
