import { renderStageHelp, type Topology } from '../../index.js';
import type { Answers } from './question.js';

const OWNERS: ReadonlyMap<string, readonly string[]> = new Map(renderStageHelp().map(({ path, topologies }) => [path, topologies]));

export const isAc = (answers: Answers): boolean => answers.get('signal.coupling') === 'ac';
export const isDc = (answers: Answers): boolean => !isAc(answers);

/** True for the topologies named. */
export const of = (...topologies: readonly Topology[]) => (answers: Answers): boolean => topologies.some((one) => one === answers.get('topology'));

/** True when the topology answered has the field. */
export const has = (path: string) => (answers: Answers): boolean => OWNERS.get(path)?.includes(answers.get('topology') ?? '') === true;

/** True when all conditions hold. */
export const all = (...conditions: readonly ((answers: Answers) => boolean)[]) => (answers: Answers): boolean => conditions.every((one) => one(answers));

/** A range of volts asked for in place of a gain or a resistor. */
export const isOutput = (text: string): boolean => /V\s*$/u.test(text) && !/V\s*\/\s*V\s*$/u.test(text);
