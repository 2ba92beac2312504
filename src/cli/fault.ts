import { writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { EXIT } from './exit-code.js';
import type { Session } from './session.js';
import { TOOL_VERSION } from './version.js';

/** A fault of the program itself: one line, details in a file, the trace only with --debug. Nothing is sent anywhere. */
export function reportFault(error: unknown, argv: readonly string[], session: Session): number {
  const what = error instanceof Error ? error.message : String(error);
  const trace = error instanceof Error ? (error.stack ?? what) : what;
  const file = keep(`railfit ${TOOL_VERSION}\ncommand: ${argv.join(' ')}\n${trace}\n`);
  session.tell(`fault in railfit itself: ${what}. ${file === null ? '' : `Details: ${file}. `}Report it with that file; nothing was sent anywhere. (exit ${EXIT.fault})`);
  if (argv.includes('--debug')) session.tell(trace);
  return EXIT.fault;
}

function keep(details: string): string | null {
  const file = join(tmpdir(), `railfit-fault-${process.pid}.txt`);
  try {
    writeFileSync(file, details);
    return file;
  } catch {
    return null;
  }
}
