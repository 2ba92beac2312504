import { asEmbedded } from './embedded.js';
import { foreign, html, trusted, type Html } from './html.js';
import type { Review } from './review.js';
import { SCRIPT, SCRIPT_HASH } from './script.js';
import { answerSection } from './sections/answer.js';
import { assumptionsSection } from './sections/assumptions.js';
import { budgetsSection } from './sections/budgets.js';
import type { Place } from './sections/ids.js';
import { marginsSection } from './sections/margins.js';
import { methodSection } from './sections/method.js';
import { plotsOfStage, plotsSection } from './sections/plots.js';
import { rejectedSection } from './sections/rejected.js';
import { reproduceSection } from './sections/reproduce.js';
import { shortlistSection } from './sections/shortlist.js';
import { signOffSection } from './sections/sign-off.js';
import { sourcesSection } from './sections/sources.js';
import { stageSection } from './sections/stage.js';
import { contents, reviewTitle, stageTitle, summarySection } from './sections/summary.js';
import { styleSheet } from './style-sheet.js';

/** The document behind a page: its text as embedded, and the SHA-256 of that text. */
export interface PageDocument {
  readonly text: string;
  readonly sha256: string;
}

/** No request to anything; styles inline, the one script by its hash (Content Security Policy Level 3). */
const POLICY = `default-src 'none'; style-src 'unsafe-inline'; img-src data:; script-src '${SCRIPT_HASH}'; base-uri 'none'; form-action 'none'`;

/** Hexadecimal digits of a hash in the margin of a printed page. */
const SHORT = 16;

/** The design review as one self-contained page; the same review gives the same bytes. */
export function renderPage(review: Review, document: PageDocument): string {
  const title = reviewTitle(review);
  const level = review.stages.length === 1 ? 2 : 3;
  const places = review.stages.map((stage, at): Place => ({ review, stage, number: at + 1, level, plots: plotsOfStage(stage) }));
  const mark = `${review.name ?? 'Design review'} · ${document.sha256.slice(0, SHORT)}`;
  return html`<!DOCTYPE html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${trusted(POLICY)}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="referrer" content="no-referrer">
<title>Design review: ${title}</title>
<style>${trusted(styleSheet(mark))}</style>
</head>
<body>
<header>
<a class="skip" href="#main">Skip to the answer</a>
<h1>Design review: ${foreign(title)}</h1>
<p class="made">Made ${review.time} by ${review.tool} from a catalog with SHA-256 ${review.stages[0]?.report.data.catalog.sha256.slice(0, SHORT) ?? ''}…; <code>railfit verify</code> tells whether it still holds with the list then in force.</p>
${contents(places)}
</header>
<main id="main">
${summarySection(places)}${places.map((place) => stageArticle(place, level))}${reproduceSection(review, document.sha256)}${signOffSection()}</main>
<footer><p id="sorted" class="out" role="status"></p><p>Document SHA-256 ${foreign(document.sha256)}</p></footer>
<script type="application/json" id="railfit-report">${trusted(asEmbedded(document.text))}</script>
<script>${trusted(SCRIPT)}</script>
</body>
</html>
`.markup;
}

function stageArticle(place: Place, level: 2 | 3): Html {
  const sections = [answerSection, stageSection, marginsSection, shortlistSection, budgetsSection, plotsSection, assumptionsSection, methodSection, rejectedSection, sourcesSection].map((make) => make(place));
  const title = `s${place.number}-title`;
  if (level === 2) return html`${sections}`;
  return html`<section id="s${place.number}" aria-labelledby="${title}">
<h2 id="${title}">${place.number}. ${foreign(stageTitle(place))}</h2>
${sections}</section>
`;
}
