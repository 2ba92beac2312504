import { central, COMMON_PRACTICE, from, limit, stated, type Relation } from './band-figures.js';

/** Relations between ratings of the inputs, recovery, start-up and the corner of the supply rejection. */
export const HAZARD_RELATIONS: readonly Relation[] = [
  {
    name: 'input rating beyond a rail',
    source: `${COMMON_PRACTICE}: the diodes to the rails conduct from a fraction of a volt on`,
    unit: 'V',
    band: [0.1, 1],
    values: (part) => from([limit(part, 'inputOverdrive')], (volts) => volts),
  },
  {
    name: 'current into an input beyond a rail',
    source: `${COMMON_PRACTICE}: bond and metal of a pin carry tens of milliamperes at most`,
    unit: 'A',
    band: [1e-4, 50e-3],
    values: (part) => from([limit(part, 'overdriveCurrent')], (amperes) => amperes),
  },
  {
    name: 'differential rating against the supply',
    source: `${COMMON_PRACTICE}: a diode drop where diodes join the inputs, about the supply at most without`,
    unit: 'of the supply',
    band: [0.01, 1.1],
    values: (part) => from([limit(part, 'differentialInput'), stated(part, 'supplyVoltage', 'max')], (apart, supply) => apart / supply),
  },
  {
    name: 'overload recovery against gain bandwidth',
    source: `${COMMON_PRACTICE}: what must be discharged inside is small in a fast part; chopped parts have a filter to empty`,
    unit: 'times 1/GBW',
    band: [0.5, 100],
    values: (part) => from([central(part, 'overloadRecovery'), central(part, 'gainBandwidth')], (time, bandwidth) => time * bandwidth),
  },
  {
    name: 'start-up against gain bandwidth',
    source: `${COMMON_PRACTICE}: bias currents charge the same nodes, and some microseconds pass before they flow`,
    unit: 'times 1/GBW',
    band: [5, 5000],
    values: (part) => from([central(part, 'startUpTime'), central(part, 'gainBandwidth')], (time, bandwidth) => time * bandwidth),
  },
  {
    name: 'supply rejection corner against gain bandwidth',
    source: `${COMMON_PRACTICE}: the rejection is lost as the loop gain is, and meets 0 dB about the gain bandwidth`,
    unit: 'of GBW',
    band: [0.1, 10],
    values: (part) => from([central(part, 'supplyRejectionCorner'), limit(part, 'supplyRejection'), central(part, 'gainBandwidth')], (corner, rejection, bandwidth) => (corner * rejection) / bandwidth),
  },
];
