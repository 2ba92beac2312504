import type { Asking, Order, PartSource } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import { assumeFigures } from './assume.js';
import { EXIT } from './exit-code.js';
import { RequestError } from './request-error.js';
import type { StageOptions } from './stage-input.js';
import type { CommonOptions } from './session.js';

/** Options of the commands that judge parts. */
export interface JudgingOptions extends CommonOptions, StageOptions {
  readonly strict?: boolean;
  readonly order?: Order;
  readonly assume?: readonly string[];
}

/** The parts with what the user assumes for this run, and how the answer was asked for. */
export function judgingInput(catalog: Catalog, options: JudgingOptions): { source: PartSource; asking: Asking } {
  const wishes = options.assume ?? [];
  const { source, problems } = assumeFigures(catalog.source(), wishes);
  if (problems.length > 0) throw new RequestError(problems, EXIT.request);
  return { source, asking: { strict: options.strict === true, order: options.order ?? 'merit', assumed: wishes } };
}
