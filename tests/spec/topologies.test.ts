import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { belongsTo, OWNED_FIELDS } from '../../src/spec/ownership.js';
import { readStage } from '../../src/spec/read.js';
import { FIELDS } from '../../src/spec/schema.js';
import { TOPOLOGIES, type StageSpec, type Topology } from '../../src/spec/spec.js';
import { codesOf, printed, problemsOf, specOf } from '../support/stage-file.js';
import { ALL_TOPOLOGIES, stageFile } from '../support/topology-stages.js';

type Accepted = readonly [topology: Topology, lines: string, pick: (spec: StageSpec) => unknown, value: unknown];

const ACCEPTED: readonly Accepted[] = [
  ['transimpedance', 'photodiode: {current: 0..1.2 µA, direction: out-of-node, capacitance: 80 pF, dark: 200 pA, ambient: 0..100 nA}', (s) => [s.photodiode?.current.max, s.photodiode?.direction, s.photodiode?.capacitance.value, s.photodiode?.dark?.value, s.photodiode?.ambient?.max], [1.2e-6, 'out-of-node', 80e-12, 200e-12, 100e-9]],
  ['transimpedance', 'reference: {value: 100 mV ± 2 %, resistance: 5 kΩ, bypass: 1 µF}', (s) => [s.reference?.value.min, s.reference?.value.max, s.reference?.bypass?.value], [0.098, 0.102, 1e-6]],
  ['transimpedance', 'capacitors: {feedback: 3.3 pF, tolerance: 5 %}', (s) => [s.capacitors?.feedback?.value, s.capacitors?.tolerance?.value], [3.3e-12, 0.05]],
  ['low-side-sense', 'shunt: {resistance: 20 mΩ, tolerance: 1 %, current: -3..3 A}', (s) => [s.shunt?.resistance.value, s.shunt?.tolerance?.value, s.shunt?.current.min, s.shunt?.bus], [0.02, 0.01, -3, undefined]],
  ['high-side-sense', 'shunt: {resistance: R05, current: 0..2 A, bus: 12 V ± 10 %}', (s) => [s.shunt?.resistance.value, s.shunt?.bus?.min, s.shunt?.bus?.nominal, s.shunt?.bus?.max], [0.05, 10.8, 12, 13.2]],
  ['high-side-sense', 'resistors: {feedback: 100k, input: 250k, positiveInput: 250k, toReference: 100k, tolerance: 0.01 %}\ngain: 0.4', (s) => s.resistors?.toReference?.value, 100e3],
  ['sallen-key-low-pass', 'filter: {corner: 10 kHz, q: 0.5}', (s) => [s.filter?.corner?.value, s.filter?.q], [10e3, { value: 0.5, text: '0.5' }]],
  ['sallen-key-low-pass', 'filter: {r1: 10k, r2: 11k, c1: 22 nF, c2: 10 nF}\ngain: 1', (s) => [s.filter?.r1?.value, s.filter?.r2?.value, s.filter?.c1?.value, s.filter?.c2?.value, s.gain?.value], [10e3, 11e3, 22e-9, 10e-9, 1]],
  ['multiple-feedback-low-pass', 'filter: {r1: 10k, r2: 20k, r3: 5k, c1: 22 nF, c2: 2.2 nF}\ngain: -2', (s) => [s.filter?.r3?.value, s.gain], [5e3, { value: 2, text: '2 V/V' }]],
  ['multiple-feedback-low-pass', 'limits: {gainErrorKind: corner, gainError: 2 %}', (s) => s.limits.gainErrorKind, 'corner'],
  ['integrator', 'signal: {coupling: ac, amplitude: 1 Vpk, frequency: 50 Hz..1 kHz}\nintegrator: {resistance: 100 kΩ, capacitance: 100 nF}', (s) => [s.integrator?.window, s.signal.frequency?.bottom], [undefined, 50]],
  ['integrator', 'integrator: {resistance: 100 kΩ, capacitance: 100 nF}\nresistors: {feedback: 1 MΩ}', (s) => s.resistors?.feedback?.value, 1e6],
  ['integrator', 'integrator: {resistance: 100 kΩ, capacitance: 0.1 µF, window: max 20 ms}', (s) => s.integrator?.window, { value: 0.02, text: '20 ms' }],
  ['relaxation-oscillator', 'oscillator: {frequency: 2 kHz, edge: 5 %, resistance: 330k, capacitance: 1.1 nF, toSupply: 100k, toGround: 100k, toOutput: 82k}', (s) => [s.oscillator?.edge?.value, s.oscillator?.toOutput?.value], [0.05, 82e3]],
  ['relaxation-oscillator', 'drives: {threshold: 0.3..0.7, maxEdge: 10 µs}', (s) => [s.drives?.threshold.min, s.drives?.threshold.max, s.drives?.maxEdge?.value], [0.3, 0.7, 1e-5]],
  ['relaxation-oscillator', 'drives: {threshold: 30..70 %}', (s) => [s.drives?.threshold.min, s.drives?.threshold.max], [0.3, 0.7]],
  ['relaxation-oscillator', 'limits: {frequencyError: 3 %, junctionTemperature: 125 °C}', (s) => [s.limits.frequencyError?.value, s.limits.junctionTemperature?.value], [0.03, 125]],
  ['relaxation-oscillator', 'name: Clock', (s) => s.signal, { coupling: 'dc', shape: 'band-limited' }],
  ['follower', 'following: {corner: 200 Hz, order: 2}', (s) => [s.following?.corner.value, s.following?.order], [200, 2]],
  ['follower', 'converter: {bits: 12, range: 0..2.5 V}', (s) => [s.converter?.bits, s.converter?.range.max], [12, 2.5]],
  ['follower', 'battery: {capacity: 2.4 Ah, usable: 80 %, others: 20 µA}', (s) => [s.battery?.capacity.value, s.battery?.usable?.value, s.battery?.others?.value], [8640, 0.8, 20e-6]],
  ['follower', 'battery: {capacity: 500 mAh, usable: 100 %}', (s) => s.battery?.usable?.value, 1],
  ['follower', 'load: {resistance: 10 kΩ, capacitance: 1 nF, isolation: 220 Ω}', (s) => s.load?.isolation?.value, 220],
  ['follower', 'signal: {input: 1..2 V, shape: step, edge: 100 µs}', (s) => [s.signal.shape, s.signal.edge?.value], ['step', 1e-4]],
  ['follower', 'signal: {input: 1..2 V, shape: step}', (s) => [s.signal.shape, s.signal.edge], ['step', undefined]],
  ['follower', 'signal: {input: 1..2 V, shape: pulse, edge: 1 µs, duty: 30 %, frequency: 1 kHz}', (s) => s.signal.duty?.value, 0.3],
  ['follower', 'signal: {input: 1..2 V, shape: pulse, duty: 0.25}', (s) => s.signal.duty?.value, 0.25],
  ['follower', 'signal: {input: 1..2 V, observation: 10 s}', (s) => s.signal.observation?.value, 10],
  ['follower', 'limits: {settling: {within: 20 µs, to: 0.1 %}}', (s) => [s.signal.shape, s.limits.settling?.to.value], ['band-limited', 0.001]],
];

describe('a topology', () => {
  it.each(ALL_TOPOLOGIES)('$topology reads from its fewest lines', ({ topology }) => {
    expect(specOf(stageFile(topology)).topology).toBe(topology);
  });

  it.each(ACCEPTED.map(([topology, lines, pick, value]) => ({ topology, lines, pick, value })))('$topology takes $lines', ({ topology, lines, pick, value }) => {
    expect(pick(specOf(stageFile(topology, lines)))).toEqual(value);
  });

  it.each(ALL_TOPOLOGIES.filter(({ topology }) => topology !== 'relaxation-oscillator'))('$topology takes a step and a pulse', ({ topology }) => {
    for (const shape of ['step', 'pulse']) {
      const read = readStage(stageFile(topology), { overrides: [{ path: 'signal.shape', text: shape, option: 'shape' }, { path: 'signal.edge', text: '1 µs', option: 'edge' }] });
      expect(read.ok ? read.spec.signal.shape : read.problems).toBe(shape);
    }
  });
});

describe('the stages of the greenhouse', () => {
  const folder = new URL('../../catalog/stages/', import.meta.url);
  const files = readdirSync(folder).filter((name) => name.endsWith('.yaml'));

  it('show every topology', () => {
    expect(new Set(files.map((name) => specOf(readFileSync(new URL(name, folder), 'utf8')).topology))).toEqual(new Set(TOPOLOGIES));
  });

  it.each(files)('%s reads', (name) => {
    expect(problemsOf(readFileSync(new URL(name, folder), 'utf8')).map(printed)).toEqual([]);
  });
});

type Refused = readonly [topology: Topology, lines: string, said: string];

/** One refusal per rule: code, place, why, and what to type instead. */
const REFUSED: readonly Refused[] = [
  ['summing', 'gain: 3', 'S108 gain: each leg of a summing stage has a gain of its own: legs.NAME.gain, or legs.NAME.resistance | legs: {command: {input: 0.5..4.5 V, gain: 0.3}}'],
  ['summing', 'signal: {input: 0..1 V}', 'S108 signal.input: a summing stage is fed through its legs: legs.NAME.input, or AC-coupled legs.NAME.amplitude | legs: {command: {input: 0.5..4.5 V, resistance: 100 kΩ}}'],
  ['summing', 'source: 1 kΩ', 'S108 source: what drives a leg is part of its resistance: legs.NAME.resistance | leave it out, and add it to the resistance of the leg'],
  ['summing', 'resistors: {input: 10 kΩ}', 'S108 resistors.input: each leg of a summing stage has an input resistor of its own: legs.NAME.resistance | legs: {command: {input: 0.5..4.5 V, resistance: 100 kΩ}}'],
  ['transimpedance', 'gain: 8', 'S108 gain: a transimpedance stage turns a current into a voltage: its gain is resistors.feedback, volts per ampere | resistors: {feedback: 1 MΩ}'],
  ['transimpedance', 'signal: {input: 0..1 V}', 'S108 signal.input: a transimpedance stage is fed by its photodiode: photodiode.current | photodiode: {current: 0..1.2 µA, direction: out-of-node, capacitance: 80 pF}'],
  ['transimpedance', 'signal: {coupling: ac}', 'S108 signal.coupling: the photodiode of a transimpedance stage drives it directly: there is no coupling capacitor | dc'],
  ['transimpedance', 'source: 1 kΩ', 'S108 source: a photodiode is a source of current: no resistance of a source counts | leave it out'],
  ['transimpedance', 'photodiode: {current: 0..2 µA, direction: into-node}', 'S102 photodiode.capacitance: photodiode.capacitance is missing; accepted: a capacitance: 80 pF | photodiode: {capacitance: 80 pF}'],
  ['transimpedance', 'photodiode: {current: -1..2 µA, direction: into-node, capacitance: 50 pF}', 'S110 photodiode.current: -1..2 µA: the current of a photodiode is written positive; direction says which way it flows | 0..1.2 µA'],
  ['transimpedance', 'photodiode: {current: 0..2 µA, direction: in, capacitance: 50 pF}', 'S104 photodiode.direction: in is not one of the words taken here; accepted: into-node (anode at the summing node: the output falls) or out-of-node (cathode there: the output rises) | out-of-node'],
  ['low-side-sense', 'source: 1 kΩ', 'S108 source: the shunt itself is the source: shunt.resistance | leave it out'],
  ['low-side-sense', 'gain: 1', 'S110 gain: a low-side stage has a gain of 1 + Rf/Rg, above 1: it makes the small voltage of the shunt larger | 40'],
  ['low-side-sense', 'gain: -40', 'S110 gain: a low-side-sense stage does not invert: its gain is above 0; write shunt.current with the other sign to turn it | 40'],
  ['low-side-sense', 'shunt: {resistance: 20 mΩ, current: 0..3 A, bus: 12 V}', 'S108 shunt.bus: a low-side shunt sits at ground: only a high-side one has a bus | leave it out, or topology: high-side-sense'],
  ['low-side-sense', 'shunt: {resistance: 0 Ω, current: 0..3 A}', 'S110 shunt.resistance: 0 Ω: a shunt of 0 Ω shows nothing | 20 mΩ'],
  ['low-side-sense', 'resistors: {toReference: 10 kΩ}', 'S108 resistors.toReference: resistors.toReference belongs to a difference or high-side-sense stage, not to topology low-side-sense | leave it out'],
  ['high-side-sense', 'shunt: {resistance: 20 mΩ, current: 0..3 A}', 'S102 shunt.bus: shunt.bus is missing; accepted: a voltage, a tolerance or a range: 10.8..13.2 V | shunt: {bus: 10.8..13.2 V}'],
  ['high-side-sense', 'shunt: {resistance: 20 mΩ, current: 0..3 A, bus: -5 V}', 'S110 shunt.bus: -5 V: the line that is measured lies at or above ground | 10.8..13.2 V'],
  ['sallen-key-low-pass', 'gain: 0.5', 'S110 gain: a Sallen-Key filter has a gain of 1 or more; a multiple-feedback filter can attenuate | 1, or topology: multiple-feedback-low-pass'],
  ['sallen-key-low-pass', 'gain: -2', 'S110 gain: a sallen-key-low-pass stage does not invert: its gain is above 0; only a multiple-feedback filter turns the sign | 2'],
  ['sallen-key-low-pass', 'filter: {corner: 1 kHz}', 'S102 filter.q: filter.q is missing; accepted: a number: 0.707 | filter: {q: 0.707}'],
  ['sallen-key-low-pass', 'filter: {r1: 10k, r2: 10k, c1: 1 nF}', 'S102 filter.c2: filter.c2 is missing; accepted: a capacitance: 1 nF | filter: {c2: 10 nF}'],
  ['sallen-key-low-pass', 'filter: {corner: 1 kHz, q: 0.7, r1: 10k, r2: 10k, c1: 1 nF, c2: 1 nF}', 'S108 filter.r1: the filter is written twice: by filter.corner and filter.q, and by its components | keep corner and q, or all components'],
  ['sallen-key-low-pass', 'filter: {corner: 1 kHz, q: 25}', 'S110 filter.q: 25: a second-order stage is built with a Q of 0.3 to 20 | 0.707'],
  ['sallen-key-low-pass', 'filter: {corner: 1 kHz, q: 0.2}', 'S110 filter.q: 0.2: a second-order stage is built with a Q of 0.3 to 20 | 0.707'],
  ['sallen-key-low-pass', 'filter: {r1: 10k, r2: 10k, r3: 10k, c1: 1 nF, c2: 1 nF}', 'S108 filter.r3: a Sallen-Key low-pass has two resistors, r1 and r2; r3 belongs to multiple feedback | leave it out, or topology: multiple-feedback-low-pass'],
  ['sallen-key-low-pass', 'capacitors: {feedback: 10 pF}', 'S108 capacitors.feedback: the capacitors of a filter are filter.c1 and c2 | leave it out; tolerance may stay'],
  ['multiple-feedback-low-pass', 'filter: {r1: 10k, r2: 10k, c1: 1 nF, c2: 1 nF}', 'S102 filter.r3: filter.r3 is missing; accepted: a resistance: 10 kΩ | filter: {r3: 10 kΩ}'],
  ['multiple-feedback-low-pass', 'resistors: {feedback: 10 kΩ}', 'S108 resistors.feedback: the resistors of a multiple-feedback filter are filter.r1, r2 and r3 | filter: {corner: 1 kHz, q: 0.707}, and gain: -2'],
  ['multiple-feedback-low-pass', 'gain: 0', 'S110 gain: 0: a gain of 0 leaves no signal | 8'],
  ['integrator', 'gain: 2', 'S108 gain: an integrator gains with time: integrator.resistance and integrator.capacitance say how fast | integrator: {resistance: 100 kΩ, capacitance: 100 nF}'],
  ['integrator', 'integrator: {resistance: 100 kΩ, window: 20 ms}', 'S102 integrator.capacitance: integrator.capacitance is missing; accepted: a capacitance: 100 nF | integrator: {capacitance: 100 nF}'],
  ['integrator', 'integrator: {resistance: 100 kΩ, capacitance: 100 nF}', 'S102 integrator.window: integrator.window is missing: a DC-coupled integrator needs the time from one reset to the next, or resistors.feedback across its capacitor, or its output runs to a rail; accepted: a time: 20 ms | integrator: {window: 20 ms}'],
  ['integrator', 'integrator: {resistance: 100 kΩ, capacitance: 100 nF}\nsignal: {coupling: ac, amplitude: 1 Vpk, frequency: 1 kHz}', 'S102 integrator.window: integrator.window is missing: an AC-coupled integrator needs the lowest frequency, a window or resistors.feedback to bound its swing; accepted: a time: 20 ms | signal: {frequency: 50 Hz..1 kHz}'],
  ['integrator', 'signal: {input: 2..3 V, output: 1..2 V}', 'S108 signal.output: where an integrator ends follows from its input, resistance, capacitance and window | leave it out'],
  ['relaxation-oscillator', 'signal: {input: 0..1 V}', 'S108 signal: an oscillator makes its own signal: what it runs at is oscillator.frequency | oscillator: {frequency: 2 kHz}'],
  ['relaxation-oscillator', 'source: 1 kΩ', 'S108 source: nothing drives an oscillator | leave it out'],
  ['relaxation-oscillator', 'reference: mid-supply', 'S108 reference: an oscillator has no reference: oscillator.toSupply, toGround and toOutput set its thresholds | leave it out'],
  ['relaxation-oscillator', 'load: 10 kΩ to reference', 'S108 load.to: an oscillator has no reference that a load could go to; accepted: ground or supply | ground'],
  ['relaxation-oscillator', 'oscillator: {edge: 5 %}', 'S102 oscillator.frequency: oscillator.frequency is missing; accepted: a frequency: 2 kHz | oscillator: {frequency: 2 kHz}'],
  ['relaxation-oscillator', 'oscillator: {frequency: 1 kHz, edge: 100 %}', 'S110 oscillator.edge: 100 %: an edge takes more than none and less than all of the half period | 5 %'],
  ['relaxation-oscillator', 'drives: {maxEdge: 10 µs}', 'S102 drives.threshold: drives.threshold is missing; accepted: a range of shares of the supply: 0.3..0.7, 30..70 % | drives: {threshold: 0.3..0.7}'],
  ['relaxation-oscillator', 'drives: {threshold: 0.5}', 'S112 drives.threshold: 0.5 is one figure where the lower and the upper threshold are expected; accepted: a range of shares of the supply: 0.3..0.7, 30..70 % | 0.3..0.7'],
  ['relaxation-oscillator', 'drives: {threshold: 0.3..1}', 'S110 drives.threshold: 0.3..1: a logic threshold lies inside the supply: above 0 and below 1 of it | 0.3..0.7'],
  ['relaxation-oscillator', 'limits: {dcError: 5 mV}', 'S108 limits.dcError: an oscillator switches from end to end: it is judged by limits.frequencyError, oscillator.edge and drives | limits: {frequencyError: 3 %}'],
  ['relaxation-oscillator', 'converter: {bits: 12, range: 0..2.5 V}', 'S108 converter: an oscillator drives logic, not a converter: drives says which | drives: {threshold: 0.3..0.7}'],
  ['follower', 'drives: {threshold: 0.3..0.7}', 'S108 drives: drives belongs to a relaxation-oscillator stage, not to topology follower | leave it out'],
  ['follower', 'capacitors: {feedback: 10 pF}', 'S108 capacitors: a follower has no feedback resistor that a capacitor could bridge | leave it out, or load: {isolation: 220 Ω} against a capacitive load'],
  ['follower', 'signal: {input: 1..2 V, edge: 1 µs}', 'S108 signal.edge: a band-limited signal (the default) has no edge; a step and a pulse have | shape: step'],
  ['follower', 'signal: {input: 1..2 V, shape: sine, edge: 1 µs}', 'S108 signal.edge: a sine signal has no edge; a step and a pulse have | shape: step'],
  ['follower', 'signal: {input: 1..2 V, shape: step, duty: 0.3}', 'S108 signal.duty: a step has no duty; a pulse has | shape: pulse'],
  ['follower', 'signal: {input: 1..2 V, shape: pulse, duty: 1}', 'S110 signal.duty: 1: a duty lies above 0 and below 1 | 0.3'],
  ['follower', 'signal: {input: 1..2 V, shape: pulse, duty: 150 %}', 'S110 signal.duty: 150 %: a duty lies above 0 and below 1 | 0.3'],
  ['follower', 'signal: {input: 1..2 V, shape: square}', 'S104 signal.shape: square is not one of the words taken here; accepted: sine, band-limited, step or pulse | sine'],
  ['follower', 'limits: {gainErrorKind: corner}', 'S108 limits.gainErrorKind: corner counts the shift of the −3 dB frequency of a filter; this stage is none; accepted: magnitude or vector | magnitude'],
  ['follower', 'limits: {frequencyError: 3 %}', 'S108 limits.frequencyError: limits.frequencyError belongs to a relaxation-oscillator stage, not to topology follower | leave it out'],
  ['follower', 'following: {corner: 200 Hz}', 'S102 following.order: following.order is missing; accepted: a whole number from 1 to 10: 1 | following: {order: 1}'],
  ['follower', 'following: {corner: 200 Hz, order: 11}', 'S110 following.order: 11: a low-pass that follows is of order 1 to 10 | 1'],
  ['follower', 'converter: {bits: 33, range: 0..2.5 V}', 'S110 converter.bits: 33: a converter has 4 to 32 bits | 12'],
  ['follower', 'converter: {bits: 12.5, range: 0..2.5 V}', 'Q013 converter.bits: 12.5 is not a whole number; accepted: a whole number from 4 to 32: 12 | 12'],
  ['follower', 'converter: {bits: 12, range: 2.5 V}', 'S112 converter.range: 2.5 V is one figure where the lowest and the highest voltage it reads are expected; accepted: a range: 0..2.5 V | 0..2.5 V'],
  ['follower', 'battery: {usable: 80 %}', 'S102 battery.capacity: battery.capacity is missing; accepted: a charge: 500 mAh, 2.4 Ah | battery: {capacity: 500 mAh}'],
  ['follower', 'battery: {capacity: 500 mA}', 'Q004 battery.capacity: a current where a charge is expected | 500 mAh'],
  ['follower', 'battery: {capacity: 500 mAh, usable: 120 %}', 'S110 battery.usable: 120 %: what can be used lies above 0 % and at most at 100 % | 80 %'],
  ['difference', 'signal: {positive: 1 V, negative: 1 V, coupling: ac}', 'S107 signal.coupling: an AC-coupled difference stage is not built yet; built: difference with coupling dc | dc'],
];

describe('refusals', () => {
  it.each(REFUSED.map(([topology, lines, said]) => ({ topology, lines, said })))('$topology: $lines', ({ topology, lines, said }) => {
    const told = problemsOf(stageFile(topology, lines)).map(({ code, place, message, fix }) => `${code} ${place?.path ?? ''}: ${message} | ${fix ?? ''}`);
    expect(told).toEqual([said]);
  });

  it.each<readonly [Topology, string]>([['transimpedance', 'photodiode'], ['low-side-sense', 'shunt'], ['high-side-sense', 'shunt'], ['sallen-key-low-pass', 'filter'], ['integrator', 'integrator'], ['relaxation-oscillator', 'oscillator'], ['summing', 'legs']])('%s without %s says how to write all of it', (topology, map) => {
    const bare = stageFile(topology).split('\n').filter((line) => !line.startsWith(`${map}:`)).join('\n');
    const problems = problemsOf(bare);
    expect(problems.map(({ code, place }) => [code, place?.path])).toEqual([['S102', map]]);
    expect(codesOf(`${bare}${problems[0]?.fix ?? ''}\n`)).toEqual([]);
  });

  it('of a field that is not its own hold for every topology, with a reason and something to type', () => {
    for (const { topology } of ALL_TOPOLOGIES) {
      for (const path of OWNED_FIELDS.filter((one) => !belongsTo(one, topology))) {
        const own = FIELDS.find((row) => row.path === path);
        const found = readStage(stageFile(topology), { overrides: [{ path, text: own?.example ?? '', option: `--set ${path}` }] });
        const told = found.ok ? [] : found.problems.filter(({ code, place }) => code === 'S108' && place?.path?.startsWith(`--set ${path}`) === true);
        expect(told, `${topology} ${path}`).toHaveLength(1);
        expect(told[0]?.fix, `${topology} ${path}`).toBeTruthy();
      }
    }
  });
});

describe('any map of fields', () => {
  const rows = FIELDS.map((row) => ({ path: row.path.replace('NAME', 'trim'), example: row.example }));
  const entry = fc.tuple(fc.constantFrom(...rows), fc.oneof(fc.constantFrom(...rows.map(({ example }) => example)), fc.constantFrom('', '0', '-1', '{}', '[]', 'null', '5 V', 'ground')), fc.boolean());
  const nest = (path: string, value: string): string => {
    const [first = '', ...rest] = path.split('.');
    return `${first}: ${rest.reduceRight((inner, key) => `{${key}: ${inner}}`, value)}`;
  };

  it('never throws, and every problem has a place', () => {
    fc.assert(
      fc.property(fc.constantFrom(...TOPOLOGIES), fc.array(entry, { maxLength: 6 }), (topology, entries) => {
        const lines = new Map(entries.map(([row, other, own]) => [row.path.split('.')[0], nest(row.path, own ? row.example : other)]));
        const read = readStage(`topology: ${topology}\n${[...lines].filter(([key]) => key !== 'topology').map(([, line]) => line).join('\n')}\n`, { file: 'stage.yaml' });
        return read.ok ? read.spec.topology === topology : read.problems.every(({ place, message }) => place !== undefined && (place.line !== undefined || place.path !== undefined) && !/undefined|NaN/u.test(message));
      }),
      { numRuns: 500 },
    );
  });
});
