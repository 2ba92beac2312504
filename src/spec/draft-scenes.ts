import type { Scene } from './draft-scene.js';
import { AC_SCENES } from './draft-scenes-ac.js';
import { DC_SCENES } from './draft-scenes-dc.js';
import { TOPOLOGIES, type SignalSpec, type Topology } from './spec.js';

type Coupling = SignalSpec['coupling'];

/** The scene of a topology and coupling; null for AC coupling where there is none. */
export function sceneOf(topology: Topology, coupling: Coupling): Scene | null {
  return coupling === 'dc' ? DC_SCENES[topology] : (AC_SCENES[topology] ?? null);
}

/** Every topology and coupling a draft can be written for. */
export const DRAFTS: readonly { readonly topology: Topology; readonly coupling: Coupling }[] = TOPOLOGIES.flatMap((topology) =>
  (['dc', 'ac'] as const).filter((coupling) => sceneOf(topology, coupling) !== null).map((coupling) => ({ topology, coupling })),
);
