import { readStage, readSwept, sweptOverride, type Stage, type StageSpec, type SweptField } from '../index.js';
import { EXIT } from './exit-code.js';
import { RequestError } from './request-error.js';
import { stageFrom, stageText, type StageOptions, type StageText } from './stage-input.js';

/** A stage with the field that is swept; the stage is null where it is none as it stands. */
export interface SweptStage extends StageText {
  readonly stage: Stage | null;
  readonly field: SweptField;
}

/**
 * Reads the stage of a sweep. One that is none as it stands may be one at the values it is swept over (no supply written, an output
 * beyond it): then the ends of the field are those of the sweep alone.
 */
export async function readSweptStage(operand: string | undefined, options: StageOptions & { readonly over?: readonly string[] }): Promise<SweptStage> {
  const over = options.over?.[0] ?? '';
  const source = await stageText(operand, options);
  try {
    const { stage, spec } = stageFrom(source, options);
    return { ...source, stage, field: fieldOf(over, spec) };
  } catch (error) {
    if (!(error instanceof RequestError) || (options.already ?? []).length > 0) throw error;
    const field = fieldOf(over, null);
    const { text, file, overrides } = source;
    const read = readStage(text, { overrides: [...overrides, sweptOverride(field, field.from)], ...(file === null ? {} : { file }) });
    if (!read.ok) throw error;
    return { ...source, stage: null, field };
  }
}

/** Its form has been looked at by then. */
function fieldOf(over: string, spec: StageSpec | null): SweptField {
  const read = readSwept(over, spec);
  if (!read.ok) throw new RequestError(read.problems, EXIT.request);
  return read.field;
}
