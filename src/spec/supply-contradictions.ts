import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction, type Written } from './contradiction.js';
import type { StageSpec } from './spec.js';

type Supplies = Written & Partial<Pick<StageSpec, 'supply' | 'supplyPeak' | 'reference'>>;

/** Written fields that contradict the supply; needs no circuit, so it is told beside whatever else is wrong. */
export function supplyContradictions(spec: Supplies): Problem[] {
  return [peakBelowTop(spec), referenceOutside(spec)].filter((found) => found !== null);
}

const volts = (value: number): string => formatQuantity(value, 'V', { digits: 4 });

function peakBelowTop(spec: Supplies): Problem | null {
  const { supply, supplyPeak: peak } = spec;
  if (peak === undefined || supply === undefined || peak.value >= supply.max * (1 - 1e-9)) return null;
  return contradiction(spec, {
    code: 'S206',
    paths: ['supplyPeak', 'supply'],
    message: `supplyPeak ${peak.text} is below the top of the supply, ${volts(supply.max)}`,
    fix: `write supplyPeak: ${volts(supply.max)}, or leave it out`,
  });
}

/** A reference that one supply cannot give at any of its values, at the nominal value of the reference. */
export function referenceIsOutside({ supply, reference }: Pick<Supplies, 'supply' | 'reference'>): boolean {
  if (supply === undefined || reference?.kind !== 'voltage') return false;
  const { nominal } = reference.value;
  return nominal < 0 || nominal > supply.max * (1 + 1e-9);
}

function referenceOutside(spec: Supplies): Problem | null {
  const { supply, reference } = spec;
  if (supply === undefined || reference === undefined || !referenceIsOutside(spec)) return null;
  const side = reference.value.nominal < 0 ? 'below ground' : `above the ${volts(supply.max)} supply`;
  return contradiction(spec, {
    code: 'S207',
    paths: ['reference', 'reference.value', 'supply'].filter((path, at) => at !== 1 || spec.positions['reference'] === undefined),
    message: `the reference of ${reference.value.text} lies ${side}: a single supply cannot give it`,
    fix: `a reference of ${volts(0)}..${volts(supply.max)}, such as mid-supply`,
  });
}
