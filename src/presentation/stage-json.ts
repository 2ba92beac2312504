import type { Stage } from '../stage/index.js';

/** The stage as documents carry it: SI units, inverting gain negative. */
export function stageJson(stage: Stage): object {
  return {
    name: stage.name,
    topology: stage.topology,
    coupling: stage.coupling,
    supply: stage.supply,
    supplyPeak: stage.supplyPeak,
    gain: stage.gainUnit === null ? null : stage.gain,
    gainUnit: stage.gainUnit,
    noiseGain: stage.noiseGain.nominal,
    noiseGainCorners: { min: stage.noiseGain.min, max: stage.noiseGain.max },
    dcNoiseGain: stage.dcNoiseGain,
    output: stage.output,
    outputNominal: stage.outputNominal,
    commonMode: stage.commonMode,
    resistors: resistorsJson(stage),
    frequency: stage.frequency,
    shape: stage.shape,
    edge: stage.edge,
    outputStep: stage.outputStep,
    response: responseJson(stage.response),
    load: stage.load,
    temperature: stage.temperature,
    resistorRejection: stage.resistorRejection !== null && Number.isFinite(stage.resistorRejection) ? stage.resistorRejection : null,
    cautions: stage.cautions,
    assumptions: stage.assumptions,
  };
}

/** A stage whose inverting input sees no resistor to the signal has none: null. */
function resistorsJson({ resistors }: Stage): object | null {
  return resistors === null ? null : { ...resistors, input: Number.isFinite(resistors.input) ? resistors.input : null };
}

/** What the stage does over frequency, with its components; relations themselves are not data. */
function responseJson(response: Stage['response']): object {
  if (response.kind !== 'low-pass') return response;
  const { kind, form, parts, corner, q } = response;
  return { kind, form, parts, corner, q };
}
