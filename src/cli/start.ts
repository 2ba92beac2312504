import { fileURLToPath } from 'node:url';
import { answerProcess } from './answer-process.js';
import { compiled } from './compiled.js';
import { EXIT } from './exit-code.js';

const folder = fileURLToPath(new URL('railfit', import.meta.url));
const program = compiled(folder);
if (program !== null) await answerProcess(program.runCommandLine);
else {
  process.stderr.write(`error: the program is not built: ${folder} holds none (exit ${EXIT.surroundings})\n   fix: npm run build\n`);
  process.exitCode = EXIT.surroundings;
}
