import { CHECK_IDS, type AnyDemand, type Demands, type NumberDemand, type UnsaidDemand } from './demand.js';
import type { OverdriveDemand, StartUpDemand, SupplyRippleDemand } from './hazard-demand.js';
import type { JunctionDemand } from './power-demand.js';

/** Every demand the stage makes, in the order of the checks. */
export function listDemands(demands: Demands): AnyDemand[] {
  const {
    operating: _operating, battery: _battery, 'junction-temperature': junction, 'supply-ripple': ripple, 'start-up': startUp,
    crossover, 'phase-reversal': reversal, clamp, overdrive, unbuilt, ...built
  } = demands;
  const hazards = [crossover, reversal, clamp].filter(({ avoided }) => avoided);
  const all: AnyDemand[] = [
    ...Object.values(built).filter((demand) => demand !== null), ...written(junction), ...written(ripple), ...written(startUp), ...hazards, ...(overdrive.avoided ? [whole(overdrive)] : []), ...unbuilt,
  ];
  return all.sort((a, b) => CHECK_IDS.indexOf(a.check) - CHECK_IDS.indexOf(b.check));
}

type Limited = JunctionDemand | SupplyRippleDemand | StartUpDemand;

/** Only a limit that is written is asked of every part. */
function written(demand: Limited | null): NumberDemand[] {
  const required = demand?.required ?? null;
  return demand === null || required === null ? [] : [{ ...demand, required }];
}

function whole(demand: OverdriveDemand): NumberDemand | UnsaidDemand {
  const { required } = demand;
  return required === null ? { ...demand, required } : { ...demand, required };
}
