export { judgePart, judging, rulesFor, verdictsOf, type Judging } from './judge.js';
export { probePart, type Probe, type Probed } from './probe.js';
export type { BatteryLife } from './battery.js';
export type { DynamicRange } from './dynamic-range.js';
export type { PartHazard } from './hazards.js';
export type { Confirmation, JudgedPart, PartOutcome } from './judged-part.js';
export { screen, type Rejection, type Screened } from './screen.js';
export { outlining, type Marked, type Outlined } from './outline.js';
