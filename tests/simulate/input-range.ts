import { allBenches, cornersOf } from './corners.js';
import { both, type Bench } from './measured.js';
import { staticPoints } from './static-points.js';

/** Do the input pins leave the range of the part: operating points with the signal at every end, every end of every resistor. */
export function inputRange(side: 'low' | 'high'): Bench {
  return {
    simplification: null,
    measure: async (draw) => {
      const points = await staticPoints(draw.stage, cornersOf(draw.stage, allBenches(draw.stage)));
      const room = Math.min(...points.map(({ plus, corner }) => (side === 'low' ? plus : corner.supply - plus)));
      return both((reading) => ({ excess: draw.part.physical(draw.scale, reading)!.value! - room, unit: 'V', resolution: 2e-6 }));
    },
  };
}
