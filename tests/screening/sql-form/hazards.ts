import type { ClampDemand, CrossoverDemand, Demands, OverdriveDemand, PhaseReversalDemand, StartUpDemand } from '../../../src/demands/index.js';
import { flag, meets, type Outlook, real, standing } from './sql.js';

/** What a stage avoids, and how long it may take to start. */
export function hazardChecks(demands: Demands): string[] {
  const { crossover, 'phase-reversal': reversal, clamp, overdrive, 'start-up': start } = demands;
  return [
    ...(start?.required == null ? [] : [startUp(start, start.required)]),
    ...(crossover.avoided ? [handOver(crossover)] : []),
    ...(reversal.avoided ? [phaseReversal(reversal)] : []),
    ...(clamp.avoided ? [inputClamp(clamp)] : []),
    ...(overdrive.avoided ? [inputOverdrive(overdrive)] : []),
  ];
}

/** Start-up, and recovery after it where the output starts from an overload. */
function startUp({ overloaded }: StartUpDemand, required: number): string {
  const recovery = (outlook: Outlook): string => (overloaded ? `overloadRecovery_${outlook}` : '0.0');
  const against = (outlook: Outlook): string => {
    const known = `coalesce(startUpTime_${outlook}, 0.0) + coalesce(${recovery(outlook)}, 0.0)`;
    return `case when not ${meets(real(required), known, 'at-most')} then 0 when startUpTime_w is null or ${recovery('w')} is null then null else 1 end`;
  };
  return standing({ check: 'start-up', worst: against('w'), best: against('b'), basis: `max(startUpTime_basis, ${overloaded ? 'overloadRecovery_basis' : '0'})` });
}

/** The region of the hand-over, or that there is none: inputs 0.9 V and more below V+ have one pair, and no pairs hand over 2 V below it (common practice). */
function handOver({ inputs }: CrossoverDemand): string {
  const against = (outlook: Outlook): string => {
    const [min, max] = [`inputCrossover_min_${outlook}`, `inputCrossover_max_${outlook}`];
    return `case when crossover_free = 1 then 1
      when ${min} is not null and ${max} is not null then not (${real(inputs.max)} > ${min} and ${real(inputs.min)} < ${max})
      when inputHighHeadroom_${outlook} >= 0.9 or ${flag(inputs.min >= 2)} then 1 end`;
  };
  const stated = 'coalesce(crossover_free, 0) or (inputCrossover_min_w is not null and inputCrossover_max_w is not null)';
  return standing({ check: 'crossover', worst: against('w'), best: against('b'), basis: `case when ${stated} then 0 else 2 end` });
}

/** Ruled out by the stage, by the list, or by inputs that work as far beyond the rails as they are taken; else possible, unless nothing is known. */
function phaseReversal({ reach: { still, beyond, unpowered } }: PhaseReversalDemand): string {
  const isRuledOut = still || (beyond === 0 && unpowered === 0);
  const reaches = (outlook: Outlook): string => `${flag(beyond !== null && unpowered === 0)} and min(-inputLowHeadroom_${outlook}, -inputHighHeadroom_${outlook}) >= ${real(beyond ?? Number.POSITIVE_INFINITY)}`;
  const against = (outlook: Outlook): string =>
    `case when ${flag(isRuledOut)} or phase_reversal = 0 or (${reaches(outlook)}) then 1 when phase_reversal = 1 then 0 end`;
  return standing({
    check: 'phase-reversal', worst: against('w'), best: against('b'),
    basis: `case when ${flag(isRuledOut)} or phase_reversal = 0 then 0 else max(inputLowHeadroom_basis, inputHighHeadroom_basis) end`,
  });
}

/** Diodes between the inputs begin to conduct at 0.5 V and conduct in earnest at 0.7 V (common practice); a part slower than the signal lets its inputs part. */
function inputClamp({ required, slewing, supply }: ClampDemand): string {
  const isSlow = (outlook: Outlook): string => (slewing === null ? '0' : `coalesce(slewRate_${outlook} < ${real(slewing.slewRate * (1 - 1e-9))}, 0)`);
  const farther = real(Math.max(required, slewing?.apart ?? 0));
  const apart = (outlook: Outlook): string => `case when ${isSlow(outlook)} then ${farther} else ${real(required)} end`;
  const most = (outlook: Outlook): string => `case when ${flag(slewing !== null)} and slewRate_w is null then ${farther} else ${apart(outlook)} end`;
  const conducts = (outlook: Outlook): string => (outlook === 'w' ? '0.5' : '0.7');
  const endures = (outlook: Outlook): string => `case when input_clamp = 1 then min(${conducts(outlook)}, coalesce(differentialInput_${outlook}, 9e999))
    when differentialInput_w is not null then differentialInput_${outlook} when input_clamp = 0 then ${real(Math.max(supply, required))} end`;
  const against = (outlook: Outlook): string => `case when ${most(outlook)} <= 0.5 then 1
    when (${endures(outlook)}) is null or (${most(outlook)} <> ${apart(outlook)} and ${endures(outlook)} < ${most(outlook)}) then null
    else ${meets(`(${apart(outlook)})`, `(${endures(outlook)})`, 'at-least')} end`;
  const basis = `case when ${most('w')} <= 0.5 then 0 when input_clamp = 1 and not coalesce(differentialInput_w < 0.5, 0) then 2 else coalesce(differentialInput_basis, 0) end`;
  return standing({ check: 'clamp', worst: against('w'), best: against('b'), basis });
}

/** The voltage an input endures beyond a rail, or what its current drops across the resistance in series, whichever is more. */
function inputOverdrive({ required, reach: { series } }: OverdriveDemand): string {
  if (required === null) return standing({ check: 'overdrive', worst: 'null', best: 'null', basis: '0' });
  if (required === 0) return standing({ check: 'overdrive', worst: '1', best: '1', basis: '0' });
  const through = (outlook: Outlook): string => (series > 0 ? `overdriveCurrent_${outlook} * ${real(series)}` : 'null');
  const endures = (outlook: Outlook): string => `max(coalesce(inputOverdrive_${outlook}, ${through(outlook)}), coalesce(${through(outlook)}, inputOverdrive_${outlook}))`;
  const isOpen = `inputOverdrive_w is null or ${series > 0 ? 'overdriveCurrent_w is null' : '0'}`;
  const against = (outlook: Outlook): string =>
    `case when (${isOpen}) and coalesce(${endures(outlook)} < ${real(required)}, 1) then null else ${meets(real(required), endures(outlook), 'at-least')} end`;
  const basis = `case when coalesce(${through('w')} > inputOverdrive_w, inputOverdrive_w is null) then overdriveCurrent_basis else inputOverdrive_basis end`;
  return standing({ check: 'overdrive', worst: against('w'), best: against('b'), basis });
}
