import { html, foreign, preformatted, type Html } from '../html.js';
import type { Review, ReviewedStage } from '../review.js';

/** All it takes to get the same answer again: command, stage files as they were read, versions, hashes, time. */
export function reproduceSection(review: Review, sha256: string): Html {
  const [first] = review.stages;
  const catalog = first?.report.data.catalog.sha256 ?? '';
  return html`<section id="reproduce" aria-labelledby="reproduce-title">
<h2 id="reproduce-title">Reproduce</h2>
<p>This command made the page:</p>
<pre class="wrap"><code>${preformatted(review.command)}</code></pre>
<p>This one judges the embedded stages again with the catalog then in force, and tells what differs; it needs nothing but this file:</p>
<pre class="wrap"><code>railfit verify ${review.name ?? 'review.html'}</code></pre>
<dl>
<dt>Made</dt><dd><time datetime="${review.time}">${review.time}</time></dd>
<dt>Tool</dt><dd>${review.tool}</dd>
<dt>Catalog, SHA-256</dt><dd><code>${broken(catalog)}</code></dd>
<dt>Answer, SHA-256</dt><dd><code>${broken(sha256)}</code> (of the embedded document)</dd>
</dl>
${review.stages.map(stageFile)}
</section>
`;
}

/** A hash may be parted, so that it does not push a narrow page wide. */
const broken = (hash: string): Html => html`<bdi>${hash}</bdi>`;

function stageFile({ file, text, sha256, changes }: ReviewedStage): Html {
  const changed = changes.length === 0 ? '' : html`<p>Changed by options: ${changes.map(({ option, path, text: value }, at) => html`${at === 0 ? '' : ', '}<code>${foreign(option === path || option.startsWith('--set') ? `${option}=${value}` : `${option} "${value}"`)}</code>`)}.</p>`;
  if (text === null) return html`<p>The stage stands in options alone.</p>${changed}`;
  return html`<details><summary>Stage file ${foreign(file ?? 'as read')}</summary>
<p>SHA-256 <code>${broken(sha256 ?? '')}</code></p>
<pre role="group" tabindex="0" aria-label="Stage file"><code>${preformatted(text)}</code></pre>
</details>
${changed}`;
}
