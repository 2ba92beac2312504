import { createHash } from 'node:crypto';
import { chosenPart } from '../../src/presentation/page/chosen-part.js';
import { renderPage } from '../../src/presentation/page/page.js';
import { reportLine } from '../../src/presentation/page/report-json.js';
import type { Review, ReviewedStage } from '../../src/presentation/page/review.js';
import type { Report } from '../../src/report.js';
import { SAMPLE_PARTS, sampleReport, STAGE_TEXT } from './sample-report.js';

export const sha256 = (text: string): string => createHash('sha256').update(text).digest('hex');

/** A stage of the sample report; without an id about the first in order. */
export function sampleReviewed(report: Report = sampleReport(), id: string | null = null): ReviewedStage {
  return { file: 'probe.yaml', text: STAGE_TEXT, sha256: sha256(STAGE_TEXT), changes: [], chosen: chosenPart(report, id, 'named'), report: { ...report, data: { ...report.data, catalog: { ...report.data.catalog, sha256: sha256(`a sample of ${report.counts.parts}`) } } }, prediction: null, sweep: null };
}

export function sampleReview(more: Partial<Review> = {}): Review {
  return { stages: [sampleReviewed()], name: 'review.html', time: '2026-03-14T09:30:00Z', tool: 'railfit 0.1.0 (rules 1)', command: 'railfit report probe.yaml -o review.html', symbols: 'iec', top: 20, all: false, ...more };
}

export function pageOf(review: Review): string {
  const text = reportLine(review);
  return renderPage(review, { text, sha256: sha256(text) });
}

/** What a list may say to hurt its reader. */
export const HOSTILE = {
  id: '"><script>document.title="owned"</script>',
  description: `<img src=x onerror="document.title='owned'"><svg onload="document.title='owned'"></svg> مكبر عمليات ${'very'.repeat(500)} \u202egnp.exe`,
} as const;

/** The sample with one part whose words are hostile; it is the first in order. */
export function hostileReport(): Report {
  const [first, ...rest] = SAMPLE_PARTS;
  if (first === undefined) throw new Error('no sample part');
  return sampleReport({ name: '</title><script>document.title="owned"</script>' }, [{ ...first, ...HOSTILE }, ...rest]);
}
