import type { Stage } from '../stage/index.js';

/** The stage as documents carry it: SI units, inverting gain negative. */
export function stageJson(stage: Stage): object {
  return {
    name: stage.name,
    topology: stage.topology,
    coupling: stage.coupling,
    supply: stage.supply,
    supplyPeak: stage.supplyPeak,
    gain: stage.gain,
    noiseGain: stage.noiseGain.nominal,
    noiseGainCorners: { min: stage.noiseGain.min, max: stage.noiseGain.max },
    dcNoiseGain: stage.dcNoiseGain,
    output: stage.output,
    outputNominal: stage.outputNominal,
    commonMode: stage.commonMode,
    resistors: stage.resistors,
    frequency: stage.frequency,
    load: stage.load,
    temperature: stage.temperature,
    resistorRejection: stage.resistorRejection !== null && Number.isFinite(stage.resistorRejection) ? stage.resistorRejection : null,
    assumptions: stage.assumptions,
  };
}
