import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { genericSet } from './generic-list.js';

/** A set nobody could make: one that ships, with a few figures changed so that one relation breaks and no other. */
export interface IncoherentSet {
  readonly claim: string;
  readonly relation: string;
  readonly part: Part;
}

/** `slewRate.typ` to a new value in SI, or to null: not known. With `@ a condition` in SI only the figure that has it. */
type Changes = Readonly<Record<string, number | null>>;

const MILLI = 1e-3;
const MICRO = 1e-6;
const NANO = 1e-9;
const PICO = 1e-12;
const MEGA = 1e6;
const ratioOf = (decibels: number): number => 10 ** (decibels / 20);

/** Nothing is said of what goes with the gain bandwidth. */
const SILENT: Changes = { 'overloadRecovery.typ': null, 'startUpTime.typ': null, 'supplyRejectionCorner.typ': null };

/** Where one relation reads what another reads too, the other's figure is left unknown. */
export const INCOHERENT: readonly IncoherentSet[] = [
  but('a bipolar pair that is steered with 24 mV', 'slew rate against gain bandwidth', 'GX-BIP-MICRO', { 'slewRate.typ': 0.03 * MEGA }),
  but('5 MHz from 7.5 µA', 'gain bandwidth against current', 'GX-CMOS-MICRO', { 'gainBandwidth.typ': 5 * MEGA, 'slewRate.typ': 2 * MEGA, 'unityCrossover.typ': 4.4 * MEGA, 'capacitiveLoad.max': null, ...SILENT }),
  but('unity gain beyond the gain bandwidth', 'unity crossover against gain bandwidth', 'GX-CMOS-1M-RRIO', { 'unityCrossover.typ': 1.4 * MEGA, 'capacitiveLoad.max': null }),
  but('a pole at half a millihertz', 'open-loop gain against gain bandwidth', 'GX-NANO', { 'openLoopGain.typ': ratioOf(146) }),
  but('an amplifier with a gain of 1000', 'open-loop gain', 'GX-BIP-GS', { 'openLoopGain.min': ratioOf(60) }),
  but('half an ohm, open loop, from 3.4 mA', 'output resistance against current', 'GX-DRIVE', { 'outputResistance.typ': 0.5 }),
  but('22 nF behind 900 Ω, stable', 'capacitive load against output resistance', 'GX-CMOS-1M-RRIO', { 'capacitiveLoad.max': 22 * NANO }),
  but('0.6 nV/√Hz from 1.9 mA', 'voltage noise against current', 'GX-BIP-LN', { 'voltageNoise.typ': 0.6 * NANO }),
  but('less noise than the charges of its bias make', 'current noise against bias current', 'GX-BIP-LN', { 'currentNoise.typ': 150e-15 }),
  but('unchopped CMOS with a corner of 2 Hz', 'noise corner', 'GX-CMOS-DEC-3', { 'noiseCorner.typ': 2 }),
  but('a corner of 20 Hz from 11 pF of gate', '1/f noise against input capacitance', 'GX-CMOS-LN', { 'noiseCorner.typ': 20 }),
  but('5 nV/√Hz from 2 pF of gate', 'white noise against input capacitance', 'GX-CMOS-LN', { 'inputCapacitance.typ': 2 * PICO }),
  but('gates that take 40 nA', 'bias current of the input type', 'GX-CMOS-1M-RRIO', { 'biasCurrent.typ': 20 * NANO, 'biasCurrent.max': 40 * NANO, 'offsetCurrent.max': null }),
  but('bases that take 1.5 % of all the current', 'bias current against quiescent current', 'GX-BIP-LN-ECO', { 'biasCurrent.typ': 15 * MICRO, 'biasCurrent.max': 28 * MICRO, 'offsetCurrent.max': null, 'currentNoise.typ': null }),
  but('a gate that leaks less when hot', 'bias current over temperature', 'GX-ELECTRO', { 'biasCurrent.max@85': 0.1 * PICO }),
  but('two currents that differ by more than either', 'offset current against bias current', 'GX-CMOS-10M-RRIO', { 'offsetCurrent.max': 60 * PICO }),
  but('10 nV/K with 150 µV', 'drift against offset', 'GX-CMOS-TRIM', { 'offsetDrift.max': 10 * NANO }),
  but('chopped, and 2 mV', 'offset without 1/f noise', 'GX-ZD-MICRO', { 'offsetVoltage.max': 2 * MILLI, 'offsetVoltage.typ': null, 'offsetDrift.max': 3 * MICRO }),
  but('160 dB of common-mode rejection', 'common-mode rejection', 'GX-CMOS-1M-GS', { 'commonModeRejection.min': ratioOf(160) }),
  but('20 dB of supply rejection', 'supply rejection', 'GX-CMOS-LN', { 'supplyRejection.min': ratioOf(20), 'supplyRejectionCorner.typ': null }),
  but('two pairs of 4 mV each, and 5 µV of step', 'rejection across the crossover', 'GX-CMOS-1M-RRIO', { 'commonModeRejection.min': ratioOf(120) }),
  but('inputs 2 V short of V+, on 1.8 V', 'input range at the lowest supply', 'GX-CMOS-1M-GS', { 'inputHighHeadroom.max': 2 }),
  but('a hand-over 3 V below V+, on 1.8 V', 'crossover inside the supply', 'GX-CMOS-1M-RRIO', { 'inputCrossover.max': 3 }),
  but('a limit 50 times the typical offset', 'limit against typical figure', 'GX-CMOS-LN', { 'offsetVoltage.typ': 20 * MICRO }),
  but('less head-room with more current', 'head-room rises with current', 'GX-BIP-CONV', { 'outputLowHeadroom.max@R2000': 1.7 }),
  but('a swing that improves as the supply falls', 'head-room against supply', 'GX-CMOS-1M-RRIO', { ...both('R10000V1.8', 5), ...both('I0.0005V1.8', 8), ...both('I0.001V1.8', 10) }),
  but('one rail four times the other', 'both rails alike', 'GX-CMOS-DEC-3', { 'outputHighHeadroom.max@R10000': 0.148, 'outputHighHeadroom.max@R2000': 0.328, 'outputHighHeadroom.max@I0.005': 0.88 }),
  but('bipolar, and 5 mV from the rail', 'saturation of a bipolar output', 'GX-BIP-LN-ECO', both('R10000', 5)),
  but('2 A from devices of 50 Ω', 'short-circuit current against on-resistance', 'GX-CMOS-1M-RRIO', { 'shortCircuitCurrent.typ': 2, 'outputCurrent.min': null }),
  but('usable nearly to the short circuit', 'usable against short-circuit current', 'GX-DRIVE', { 'outputCurrent.min': 0.24 }),
  but('a swing rated beyond the usable current', 'heaviest swing row against usable current', 'GX-CMOS-10M-RRIO-FINE', { 'outputCurrent.min': 12 * MILLI }),
  but('1.6 V of supply, 1.5 V of head-room', 'swing left at the lowest supply', 'GX-NANO-ECO', { ...both('R100000', 750), ...both('I0.00005', 800, 'typ'), ...both('I0.0002', 900, 'typ') }),
  but('rated at 5 V, works to 4.8 V', 'rows on supplies the part works on', 'GX-ELECTRO-FINE', { 'supplyVoltage.max': 4.8 }),
  but('destroyed at its operating maximum', 'absolute against operating maximum', 'GX-CMOS-LN', { 'supplyAbsoluteMaximum.max': 5.5 }),
  but('a junction cooler than the air', 'junction above ambient', 'GX-CMOS-LN', { 'junctionTemperature.max': 120 }),
  but('inputs that endure 5 V beyond a rail', 'input rating beyond a rail', 'GX-CMOS-LN', { 'inputOverdrive.max': 5 }),
  but('an ampere into a pin', 'current into an input beyond a rail', 'GX-CMOS-LN', { 'overdriveCurrent.max': 1 }),
  but('inputs 60 V apart on 36 V', 'differential rating against the supply', 'GX-HV-CMOS', { 'differentialInput.max': 60 }),
  but('recovered before it can move', 'overload recovery against gain bandwidth', 'GX-CMOS-LN', { 'overloadRecovery.typ': NANO }),
  but('awake within a nanosecond', 'start-up against gain bandwidth', 'GX-CMOS-LN', { 'startUpTime.typ': NANO }),
  but('84 dB of supply rejection at a megahertz', 'supply rejection corner against gain bandwidth', 'GX-CMOS-LN', { 'supplyRejectionCorner.typ': MEGA }),
];

function but(...[claim, relation, id, changes]: [string, string, string, Changes]): IncoherentSet {
  const part = genericSet(id);
  const unmet = Object.keys(changes).filter((key) => !part.figures.some((figure) => names(key, figure)));
  if (unmet.length > 0) throw new Error(`${id} has no ${unmet.join(', ')}`);
  return { claim, relation, part: { ...part, figures: part.figures.flatMap((figure) => changed(figure, changes)) } };
}

/** Millivolts at both rails. */
function both(at: string, millivolts: number, kind: 'typ' | 'max' = 'max'): Changes {
  return { [`outputLowHeadroom.${kind}@${at}`]: millivolts * MILLI, [`outputHighHeadroom.${kind}@${at}`]: millivolts * MILLI };
}

function changed(figure: Figure, changes: Changes): Figure[] {
  const entry = Object.entries(changes).find(([key]) => names(key, figure));
  if (entry === undefined) return [figure];
  const [, value] = entry;
  return value === null ? [] : [{ ...figure, value }];
}

/** `biasCurrent.max` any figure of that kind; `…@85` at 85 °C; `…@R2000`, `…@I0.005`, `…@R10000V1.8` of that load and supply. */
function names(key: string, { parameter, kind, condition }: Figure): boolean {
  const [slot, at] = key.split('@');
  if (slot !== `${parameter}.${kind}`) return false;
  if (at === undefined) return true;
  const load = condition.load?.kind === 'current' ? `I${condition.load.amperes}` : `R${condition.load?.ohms ?? ''}`;
  return at === String(condition.temperature) || at === load || at === `${load}V${condition.supply ?? ''}`;
}
