import { answerProcess } from './answer-process.js';
import { optimiseLate } from './late-optimising.js';
import { runCommandLine } from './run.js';

// The command as the compiler leaves it, file by file; what is installed starts in start.ts.
optimiseLate();
await answerProcess(runCommandLine);
