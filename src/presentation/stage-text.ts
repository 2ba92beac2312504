import type { Stage } from '../stage/index.js';
import { amount, range } from './amounts.js';
import { inputRange } from './input-words.js';
import { flow, LABEL, labelled, padded, paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { GLUE, glued, held } from './spelling.js';
import type { Style } from './style.js';
import { counted } from './words.js';

/** The stage as it was understood, so that a reader sees at once what was judged. */
export function stageLines(stage: Stage, style: Style): string[] {
  const title = stage.name === null ? [] : labelled('Stage', safeLine(stage.name), style);
  const asked = askedOf(stage);
  return [
    ...title,
    ...labelled(stage.name === null ? 'Stage' : '', circuitOf(stage).join(', '), style),
    ...flow(surroundingsOf(stage), style, { lead: padded('Supply', LABEL) }),
    ...(asked.length === 0 ? [] : labelled('Limits', asked.join(', '), style)),
  ];
}

/** The stage in one short sentence. */
export function stageInShort(stage: Stage): string {
  return [...(stage.name === null ? [] : [`${safeLine(stage.name)}:`]), circuitOf(stage).join(', '), `on ${range(stage.supply.min, stage.supply.max, 'V')}`].join(' ');
}

/** What the stage does not do as asked, before anything is judged on it. */
export function stageCautions({ cautions }: Stage, style: Style): string[] {
  return cautions.flatMap((sentence) => paragraph(glued(safeLine(sentence)), style, { lead: 'caution: ', indent: 9 }));
}

/** Assumptions of the stage, one sentence each, then what the user assumed and how it was judged. */
export function assumptionLines(sentences: readonly string[], style: Style): string[] {
  const all = sentences.map((sentence) => glued(safeLine(sentence)));
  return all.length === 0 ? [] : labelled('Assumed', all.join('; '), style);
}

export function circuitOf(stage: Stage): string[] {
  const { output, outputNominal } = stage;
  const coupled = stage.coupling === 'ac' ? `, AC-coupled` : '';
  const corners = output.min === outputNominal.min && output.max === outputNominal.max ? '' : ` (${range(output.min, output.max, 'V')} at the corners)`;
  return [
    `${stage.topology}${coupled}`,
    ...gainOf(stage),
    ...inputsOf(stage),
    `output ${range(outputNominal.min, outputNominal.max, 'V')}${corners}`,
    ...motionOf(stage),
    ...responseOf(stage),
    ...referenceOf(stage),
  ];
}

/** Extremes at each input; AC-coupled the peak about the bias. */
function inputsOf({ vertices, coupling }: Stage): string[] {
  const names = Object.keys(vertices[0]?.inputs ?? {});
  return names.flatMap((name) => {
    const values = vertices.map((vertex) => vertex.inputs[name] ?? 0);
    const words = inputRange(name, { low: Math.min(...values), high: Math.max(...values) }, coupling === 'ac');
    return words === null ? [] : [words];
  });
}

/** Signal gain in its own unit, and the noise gain where it says more. */
function gainOf({ gain, gainUnit, noiseGain }: Stage): string[] {
  if (gainUnit === null) return [];
  if (gainUnit === 'V/A') return [`transresistance ${amount(Math.abs(gain), 'Ω')}${gain < 0 ? ', inverting' : ''}`];
  if (gainUnit === '1/s') return [`time constant ${amount(Math.abs(1 / gain), 's')}`];
  return [`gain ${amount(gain, 'V/V')}`, `noise gain ${amount(noiseGain.nominal, 'V/V')}`];
}

function motionOf({ frequency, shape, edge, outputStep, response }: Stage): string[] {
  if (response.kind === 'oscillator') return [];
  const steps = shape === 'step' || shape === 'pulse' ? [`${shape} of ${amount(outputStep, 'V')}${edge === null ? '' : ` with an edge of ${amount(edge, 's')}`}`] : [];
  if (frequency === null) return steps.length > 0 ? steps : ['no frequency given'];
  return [...steps, `up to ${amount(frequency, 'Hz')}`];
}

/** What the stage does over frequency, with the components that make it so. */
function responseOf({ response }: Stage): string[] {
  if (response.kind === 'low-pass') {
    const { r1, r2, c1, c2 } = response.parts;
    const r3 = 'r3' in response.parts ? [`R3 ${amount(response.parts.r3, 'Ω')}`] : [];
    return [`corner ${amount(response.corner, 'Hz')} at a Q of ${amount(response.q, '1')}`, `R1 ${amount(r1, 'Ω')}`, `R2 ${amount(r2, 'Ω')}`, ...r3, `C1 ${amount(c1, 'F')}`, `C2 ${amount(c2, 'F')}`];
  }
  if (response.kind === 'transimpedance') {
    const { inputCapacitance, feedbackCapacitance } = response;
    return [`${amount(inputCapacitance, 'F')} at the node`, feedbackCapacitance === null ? 'feedback capacitor by part' : `feedback capacitor ${amount(feedbackCapacitance, 'F')}`];
  }
  if (response.kind === 'oscillator') return [`frequency ${amount(response.frequency, 'Hz')}`, `timing ${amount(response.resistance, 'Ω')} with ${amount(response.capacitance, 'F')}`];
  return [];
}

function referenceOf({ vertices, referenceTolerance, referenceResistance }: Stage): string[] {
  const values = vertices.map((vertex) => vertex.reference);
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const tolerance = referenceTolerance === 0 ? '' : ` ±${amount(referenceTolerance * 100, '%')}`;
  const resistance = referenceResistance === 0 ? '' : ` behind ${amount(referenceResistance, 'Ω')}`;
  return low === 0 && high === 0 ? [] : [`reference ${range(low, high, 'V')}${tolerance === '' ? '' : ` (${held(tolerance.trim())})`}${resistance}`];
}

function surroundingsOf(stage: Stage): string[] {
  const { supply, supplyPeak, load, temperature } = stage;
  const peak = supplyPeak > supply.max ? `, peak ${amount(supplyPeak, 'V')}` : '';
  return [`${range(supply.min, supply.max, 'V')} single${peak}`, `Load${GLUE}${GLUE}${loadOf(load)}`, `Temperature${GLUE}${GLUE}${range(temperature.min, temperature.max, '°C')}`, ...circumstancesOf(stage)];
}

/** What can happen to the stage beside its signal. */
function circumstancesOf({ asked: { overdrive, sequencing, supplyRipple, dutyCycle } }: Stage): string[] {
  const said = (words: string, text: string): string => `${words}${GLUE}${GLUE}${text}`;
  return [
    ...(overdrive === null ? [] : [said('Overdrive', `${amount(overdrive.value, 'V')} beyond a rail`)]),
    ...(sequencing === null ? [] : [said('Sequencing', sequencing)]),
    ...(supplyRipple === null ? [] : [said('Ripple', `${amount(supplyRipple.amplitude.value, 'V')} peak at ${amount(supplyRipple.frequency.value, 'Hz')}`)]),
    ...(dutyCycle === null ? [] : [said('On', `${amount(dutyCycle.on.value, 's')} of every ${amount(dutyCycle.every.value, 's')}`)]),
  ];
}

export function loadOf(load: Stage['load']): string {
  if (load === null) return 'none';
  const parts = [
    ...(load.resistance === null ? [] : [`${amount(load.resistance, 'Ω')} to ${load.to}`]),
    ...(load.capacitance === 0 ? [] : [amount(load.capacitance, 'F')]),
    ...(load.isolation === 0 ? [] : [`behind ${amount(load.isolation, 'Ω')}`]),
  ];
  return parts.length === 0 ? 'none' : parts.join(', ');
}

export function askedOf({ asked }: Stage): string[] {
  const { limits, wishes, margins } = asked;
  const most = (words: string, text: string | undefined): string[] => (text === undefined ? [] : [`${words} ≤${GLUE}${glued(safeLine(text))}`]);
  const least = (words: string, text: string | undefined): string[] => (text === undefined ? [] : [`${words} ≥${GLUE}${glued(safeLine(text))}`]);
  const settling = limits.settling === undefined ? [] : [`settling to ${glued(safeLine(limits.settling.to.text))} within ${glued(safeLine(limits.settling.within.text))}`];
  const times = (words: string, factor: number | undefined): string[] => (factor === undefined || factor === 1 ? [] : [`${words} with a margin of ×${GLUE}${factor}`]);
  return [
    ...most('DC error at the output', limits.dcError?.text),
    ...most(`supply current per ${limits.supplyCurrentPer ?? 'amplifier'}`, limits.supplyCurrent?.text),
    ...most('gain error', limits.gainError?.text),
    ...most('swing loss', limits.swingLoss?.value === 0 ? undefined : limits.swingLoss?.text),
    ...most('output noise', limits.outputNoise?.text),
    ...least('signal to noise', limits.snr?.text),
    ...most('distortion', limits.distortion?.text),
    ...settling,
    ...least('phase margin', limits.phaseMargin?.text),
    ...most('junction temperature', limits.junctionTemperature?.text),
    ...most('frequency error', limits.frequencyError?.text),
    ...most('supply ripple at the output', limits.supplyRipple?.text),
    ...most('start-up', limits.startUp?.text),
    ...times('slew rate', margins.slewRate),
    ...times('gain bandwidth', margins.gainBandwidth),
    ...(margins.outputHeadroom === undefined || margins.outputHeadroom.value === 0 ? [] : [`${glued(safeLine(margins.outputHeadroom.text))} kept free at each rail`]),
    ...(wishes.channels === undefined ? [] : [held(counted(wishes.channels, 'channel'))]),
    ...most('price', wishes.price?.text),
    ...listed('package', wishes.package),
    ...(wishes.qualification === undefined ? [] : [safeLine(wishes.qualification)]),
    ...listed('status', wishes.status),
    ...listed('lifecycle', wishes.lifecycle),
    ...asked.avoid.map((hazard) => `no ${hazard}`),
  ];
}

function listed(words: string, wanted: readonly string[] | undefined): string[] {
  return wanted === undefined || wanted.length === 0 ? [] : [`${words} ${wanted.map(safeLine).join(' or ')}`];
}
