import { fuzzKilling } from './kill.js';
import { fuzzReading } from './read.js';

/** `npm run fuzz [-- kill] [-- COUNT [SEED]]`: 100 000 damaged lists are read, or 500 imports killed. Ends with 1 when a rule was broken. */
const words = process.argv.slice(2);
const isKill = words[0] === 'kill';
const [count, seed] = (isKill ? words.slice(1) : words).map(Number);
const tell = (line: string): void => void process.stdout.write(`${line}\n`);
const plan = { seed: seed ?? Date.now() % 1_000_000, tell };
tell(`seed ${plan.seed}`);
const broken = isKill ? (await fuzzKilling({ ...plan, points: count ?? 500 })).length : (await fuzzReading({ ...plan, files: count ?? 100_000 })).broken;
tell(broken === 0 ? 'no rule was broken' : `${broken} broke a rule`);
process.exitCode = broken === 0 ? 0 : 1;
