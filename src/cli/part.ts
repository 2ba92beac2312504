import { partJson, renderPart, renderWithdrawn } from '../index.js';
import type { WithdrawnPart } from '../catalog/index.js';
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
    const found = findPart(source, id);
    const was = found.ok ? null : catalog.withdrawn(id);
    if (was !== null) return withdrawn(was, session, options);
    if (!found.ok) throw new RequestError([found.problem], EXIT.no, `Nothing to show. (exit ${EXIT.no})`);
    const origin = (slot: string): ReturnType<typeof source.origin> => source.origin(found.part.id, slot);
    const text = options.json === true ? partJson(found.part, origin) : renderPart(found.part, origin, styleFor(session, options));
    return { text, exit: EXIT.yes };
  });
}

/** As it was last, so that old reports resolve; it is not on the list, so the answer is no. */
function withdrawn(was: WithdrawnPart, session: Session, options: CommonOptions): Outcome {
  const { part, by, takenBack } = was;
  const origin = (slot: string): ReturnType<typeof was.origin> => was.origin(slot);
  const about = { file: by.file, sha256: by.sha256, takenBack };
  const text = options.json === true ? partJson(part, origin, about) : renderWithdrawn(part, { ...about, origin }, styleFor(session, options));
  return { text, exit: EXIT.no };
}
