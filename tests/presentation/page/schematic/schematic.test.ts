import { describe, expect, it } from 'vitest';
import { schematicOf, unplacedLabels } from '../../../../src/presentation/page/schematic/index.js';
import { TOPOLOGIES } from '../../../../src/spec/spec.js';
import { buildStage, type Stage } from '../../../../src/stage/index.js';
import { lines } from '../../../support/page.js';
import { specOf } from '../../../support/stage-file.js';
import { BENCHES, built } from '../../../support/twelve.js';

const OSCILLATOR = { topology: 'relaxation-oscillator', name: '1 kHz', stage: stageOf('topology: relaxation-oscillator\nsupply: 3.3 V\noscillator: {frequency: 1 kHz}\nload: {resistance: 1 MΩ, to: ground, capacitance: 15 pF}\n') } as const;
const DRAWN: readonly { readonly topology: Stage['topology']; readonly name: string; readonly stage: Stage }[] = [
  ...BENCHES.map((bench) => ({ topology: bench.topology, name: bench.name, stage: built(bench, '', 'load: {resistance: 10 kΩ, to: ground, capacitance: 100 pF, isolation: 47 Ω}') })),
  OSCILLATOR,
];

function stageOf(text: string): Stage {
  const result = buildStage(specOf(text));
  if (!result.ok) throw new Error(result.problems.map(({ message }) => message).join('\n'));
  return result.stage;
}

const description = (svg: string): string => /<desc>(.*?)<\/desc>/u.exec(svg)?.[1] ?? '';

describe('schematics', () => {
  it('draw every topology there is', () => {
    expect(new Set(DRAWN.map(({ topology }) => topology))).toEqual(new Set(TOPOLOGIES));
  });

  it.each(DRAWN)('$topology ($name): every label has a place, with rectangles and with zigzags', ({ stage }) => {
    expect(unplacedLabels(stage, 'iec')).toEqual([]);
    expect(unplacedLabels(stage, 'ieee')).toEqual([]);
    expect(schematicOf(stage, 'iec')).not.toBe(schematicOf(stage, 'ieee'));
  });

  it.each(DRAWN)('$topology ($name): every resistor and capacitor of its network is drawn with its value', ({ stage }) => {
    const values = [...(stage.network?.plus.elements ?? []), ...(stage.network?.minus.elements ?? [])];
    // Each part stands in the drawing once for its own name; what two networks share (source, reference) is one part.
    const said = description(schematicOf(stage, 'iec'));
    for (const { name, kind, value } of values) {
      if (name === 'source' && stage.topology === 'low-side-sense') continue;
      const digits = Number(value.toPrecision(4));
      const shown = Number((digits / 10 ** (Math.floor(Math.log10(digits) / 3 + 1e-9) * 3)).toPrecision(4));
      expect(said, `${name} ${kind}`).toContain(`${shown}\u00a0`);
    }
    expect(said).toContain(stage.topology === 'relaxation-oscillator' ? 'CL 15\u00a0pF' : 'Riso 47\u00a0Ω');
  });

  it.each(TOPOLOGIES)('%s is drawn as it was', async (topology) => {
    const { stage } = DRAWN.find((one) => one.topology === topology)!;
    await expect(lines(schematicOf(stage, 'iec'))).toMatchFileSnapshot(`golden/${topology}.svg`);
  });

  it('draws a zigzag as it was', async () => {
    await expect(lines(schematicOf(DRAWN[1]!.stage, 'ieee'))).toMatchFileSnapshot('golden/non-inverting-ieee.svg');
  });

  it('keeps the reference where it goes: a load to it, to the supply', () => {
    const text = (to: string): string => `topology: inverting\nsupply: 5 V\ngain: 2\nreference: mid-supply\nsignal: {input: 2..3 V}\nload: {resistance: 10 kΩ, to: ${to}}\n`;
    expect(description(schematicOf(stageOf(text('reference')), 'iec')).match(/mid-supply/gu)).toHaveLength(2);
    expect(description(schematicOf(stageOf(text('supply')), 'iec'))).toContain('; V+');
  });

  it('shows which way a photocurrent goes', () => {
    const text = (direction: string): string => `topology: transimpedance\nsupply: 5 V\nresistors: {feedback: 100 kΩ}\nreference: 2.5 V\nphotodiode: {current: 0..10 µA, direction: ${direction}, capacitance: 50 pF}\nsignal: {frequency: 1 kHz}\n`;
    expect(schematicOf(stageOf(text('into-node')), 'iec')).toContain('>bias</text>');
    expect(schematicOf(stageOf(text('out-of-node')), 'iec')).not.toContain('>bias</text>');
  });

  it('escapes the names of legs, long ones cut', () => {
    const stage = DRAWN.find(({ topology }) => topology === 'summing')!.stage;
    const hostile = '<script>alert(1)</script>'.repeat(9);
    const legs = stage.ends.legs.map((leg, at) => (at === 0 ? { ...leg, name: hostile } : leg));
    const network = { ...stage.network!, minus: { ...stage.network!.minus, elements: stage.network!.minus.elements.map((one) => (one.name === `leg ${stage.ends.legs[0]!.name}` ? { ...one, name: `leg ${hostile}` } : one)) } };
    const svg = schematicOf({ ...stage, ends: { ...stage.ends, legs }, network }, 'iec');
    expect(svg).not.toContain('<script');
    expect(Number(/width="(\d+)"/u.exec(svg)?.[1])).toBeLessThan(900);
  });
});
