import { readFile } from 'node:fs/promises';
import { differencesOf, embeddedIn, pageDifference, readRecorded, renderVerification, reportJson, reportLine, verificationJson, type Difference, type RecordedReport, type Review } from '../index.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { pageOf } from './page-file.js';
import { commandProblem, RequestError } from './request-error.js';
import { reviewAgain, type Failed } from './review-again.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';
import { unreadable } from './stage-input.js';
import { VERSION } from './version.js';

/** `railfit verify FILE`: a report judged again from what it carries, with the catalog in force; tells what differs. */
export async function runVerify(session: Session, file: string | undefined, options: CommonOptions): Promise<Outcome> {
  if (file === undefined) throw new RequestError([commandProblem('C102', 'verify: no FILE', { fix: 'railfit verify review.html' })], EXIT.request);
  const page = await textOf(file);
  const recorded = recordedIn(page, file);
  return withCatalog(session, options, (catalog) => {
    const again = reviewAgain(recorded, catalog);
    const differences = again.ok ? compared(recorded, page, again.review) : again.failed.map(failedDifference);
    const { time, tool, stages } = recorded;
    const verification = { file, time, tool: { was: tool, is: VERSION }, stages: stages.length, differences };
    const text = options.json === true ? verificationJson(verification) : renderVerification(verification, styleFor(session, options));
    return { text, exit: differences.length === 0 ? EXIT.yes : EXIT.no };
  });
}

async function textOf(file: string): Promise<string> {
  try {
    return new TextDecoder('utf-8', { ignoreBOM: true }).decode(await readFile(file));
  } catch (error) {
    throw new RequestError([unreadable(file, error)], EXIT.surroundings, `The report could not be read. (exit ${EXIT.surroundings})`);
  }
}

/** A page, or the document alone as `report --json` prints it. */
function recordedIn(page: string, file: string): RecordedReport {
  const text = isDocument(page) ? page : embeddedIn(page);
  if (text === null) throw noReport(`${file}: no railfit report in it`);
  const read = readRecorded(text);
  if (read.ok) return read.report;
  throw noReport(`${file}: ${read.why}`);
}

const isDocument = (page: string): boolean => page.trimStart().startsWith('{');

const noReport = (message: string): RequestError =>
  new RequestError([commandProblem('C121', message, { fix: 'the page as railfit report wrote it, whole', path: 'FILE' })], EXIT.request, `Nothing was verified. (exit ${EXIT.request})`);

/** First the answers; when all of them are the same, the page letter by letter. */
function compared(recorded: RecordedReport, page: string, review: Review): Difference[] {
  const fresh = readRecorded(reportLine(review));
  if (!fresh.ok) throw new Error(`the report of this railfit is not readable by itself: ${fresh.why}`);
  const differences = differencesOf(recorded, fresh.report);
  if (differences.length > 0) return differences;
  const written = isDocument(page) ? reportJson(review) : pageOf(review);
  return written === page ? [] : [pageDifference(page, written)];
}

function failedDifference({ file, message }: Failed): Difference {
  return { stage: file, what: 'stage-file', subject: 'it cannot be judged again', was: 'judged', is: message };
}
