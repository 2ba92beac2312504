import { answerProcess } from './answer-process.js';
import { runCommandLine } from './run.js';

// The command as the compiler leaves it, file by file; what is installed starts in start.ts.
await answerProcess(runCommandLine);
