import { partJson, renderPart } from '../index.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { findPart } from './find-part.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';

/** `railfit part ID`: every figure of one part with kind, condition, origin. */
export async function runPart(session: Session, id: string | undefined, options: CommonOptions): Promise<Outcome> {
  if (id === undefined) throw new RequestError([commandProblem('C102', 'part: no ID', { fix: 'railfit parts lists the ids' })], EXIT.request);
  return withCatalog(session, options, (catalog) => {
    const source = catalog.source();
    const found = findPart(source.parts, id);
    if (!found.ok) throw new RequestError([found.problem], EXIT.no, `Nothing to show. (exit ${EXIT.no})`);
    const origin = (slot: string): ReturnType<typeof source.origin> => source.origin(found.part.id, slot);
    const text = options.json === true ? partJson(found.part, origin) : renderPart(found.part, origin, styleFor(session, options));
    return { text, exit: EXIT.yes };
  });
}
