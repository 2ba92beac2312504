import type { Stage } from '../../../../stage/index.js';
import type { Piece, Symbols } from '../piece.js';
import { follower } from './follower.js';

/** As the follower, with a gain leg at the − input: the blocks draw what the network has. */
export const nonInverting = (stage: Stage, symbols: Symbols): Piece[] => follower(stage, symbols);
