export { renderDemands } from './demands-text.js';
export { renderExplanation } from './explain-text.js';
export { renderPart } from './part-text.js';
export { renderParts, type PartsList } from './parts-text.js';
export { renderProblems } from './problems-text.js';
export { safeLine, safeText } from './safe-text.js';
export { renderShortlist } from './shortlist-text.js';
export type { CommandContext, Style } from './style.js';
