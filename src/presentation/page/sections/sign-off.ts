import { html, type Html } from '../html.js';

const CAUTION = "railfit advises. The datasheet of the chosen part governs, and prototypes are measured. Where failure can hurt someone (medical, mains-connected, automotive, machinery), qualified review and the applicable codes decide. Generic sets are invented classes of parts, not something to order.";

/** Lines for names and dates, and what was revised when. Empty: people fill them in. */
export function signOffSection(): Html {
  const line = (what: string): Html => html`<li>${what}: name, date, signature</li>`;
  return html`<section id="sign-off" aria-labelledby="sign-off-title">
<h2 id="sign-off-title">Sign-off</h2>
<p class="caution">${CAUTION}</p>
<ul class="sign">${['Prepared by', 'Reviewed by', 'Approved by'].map(line)}</ul>
<h3>Revision history</h3>
<ul class="sign">${['Revision 1', 'Revision 2'].map((revision) => html`<li>${revision}: date, what changed, by whom</li>`)}</ul>
</section>
`;
}
