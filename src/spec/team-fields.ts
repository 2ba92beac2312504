import type { FieldRow } from './field.js';

export const STATUSES = ['approved', 'conditional', 'restricted', 'not-approved'] as const;
export const LIFECYCLES = ['preliminary', 'active', 'nrnd', 'last-time-buy', 'obsolete'] as const;
export const HAZARDS = ['crossover', 'phase-reversal', 'clamp', 'overdrive'] as const;

/** AEC-Q100 Rev-H (2014): grades 0 to 3, a lower number being the wider range. */
export const QUALIFICATIONS = ['none', 'AEC-Q100 grade 0', 'AEC-Q100 grade 1', 'AEC-Q100 grade 2', 'AEC-Q100 grade 3'] as const;

const FACTOR = { above: 0, why: 'a margin is a factor above 0; 1 asks for nothing extra' };

/** What the team wants on top of the physics, and what it would give up. */
export const TEAM_FIELDS: readonly FieldRow[] = [
  { path: 'wishes', shape: 'map', accepted: 'a map: {channels: 1, package: [SOT-23-5], status: [approved]}', example: '{channels: 1, package: [SOT-23-5]}', meaning: 'what the part must be, apart from its figures' },
  { path: 'wishes.channels', shape: 'quantity', kind: 'count', bounds: { from: 1, why: 'a part has one amplifier or more' }, accepted: 'a whole number from 1: 1', example: '1', meaning: 'amplifiers in use; a dual meets 1 with one section idle' },
  { path: 'wishes.package', shape: 'texts', accepted: 'a package or a list of them: [SOT-23-5, SC-70-5]', example: '[SOT-23-5, SC-70-5]', meaning: 'one of these' },
  { path: 'wishes.qualification', shape: 'text', words: QUALIFICATIONS, accepted: 'none, or AEC-Q100 grade 0, 1, 2 or 3', example: 'AEC-Q100 grade 1', meaning: 'a grade at least as good' },
  { path: 'wishes.status', shape: 'choices', words: STATUSES, accepted: STATUSES.join(', '), example: '[approved, conditional]', meaning: "the part's standing in the team's list: one of these" },
  { path: 'wishes.lifecycle', shape: 'choices', words: LIFECYCLES, accepted: LIFECYCLES.join(', '), example: '[active]', meaning: 'how far the part is in its life: one of these' },
  { path: 'wishes.price', shape: 'quantity', kind: 'price', limit: 'max', bounds: { above: 0, why: 'a price is above 0' }, accepted: 'an amount with its currency: 1 EUR', example: '1 EUR', meaning: 'highest price of one part' },
  { path: 'margins', shape: 'map', accepted: 'a map: {slewRate: 1.5, gainBandwidth: 1.0, outputHeadroom: 20 mV}', example: '{slewRate: 1.5}', meaning: 'extra the team asks for on top of the physical need' },
  { path: 'margins.slewRate', shape: 'quantity', kind: 'gain', bounds: FACTOR, accepted: 'a factor: 1.5', example: '1.5', meaning: 'factor on the slew rate needed; default 1' },
  { path: 'margins.gainBandwidth', shape: 'quantity', kind: 'gain', bounds: FACTOR, accepted: 'a factor: 1.5', example: '1.5', meaning: 'factor on the gain bandwidth needed; default 1' },
  { path: 'margins.outputHeadroom', shape: 'quantity', kind: 'voltage', bounds: { from: 0, why: 'extra head-room is never negative (limits.swingLoss gives swing up)' }, accepted: 'a voltage: 20 mV', example: '20 mV', meaning: 'extra distance to each rail at the output; default 0' },
  { path: 'mayChange', shape: 'paths', accepted: 'a list of fields: [limits.dcError, gain]', example: '[limits.dcError, gain]', meaning: 'what "what would let it in" may touch' },
  { path: 'avoid', shape: 'choices', words: HAZARDS, accepted: HAZARDS.join(', '), example: '[crossover]', meaning: 'hazards that fail a part instead of being a caution' },
  { path: 'part', shape: 'text', accepted: 'the id of a part, as railfit parts lists it', example: 'GX-CMOS-1M-RRIO', meaning: 'the part chosen for the stage: railfit check tells whether it still fits' },
];
