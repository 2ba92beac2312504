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
  // With nothing assumed the parts need not be read to be judged.
  if (wishes.length === 0) return { source: catalog.screenSource(), asking: askingOf(options) };
  const { source, problems } = assumeFigures(catalog.source(), wishes);
  if (problems.length > 0) throw new RequestError(problems, EXIT.request);
  return { source, asking: askingOf(options) };
}

function askingOf({ strict = false, order = 'merit', assume = [] }: JudgingOptions): Asking {
  return { strict, order, assumed: assume };
}
