/** Kind of a field: fixes units, plausible range, sign, and whether a bare tolerance is allowed (rule Q-1). */
export const FIELD_KINDS = [
  'supply', 'voltage', 'offset_limit', 'amplitude', 'current', 'resistance', 'capacitance', 'frequency', 'gbw', 'slew',
  'vnoise', 'inoise', 'gain', 'ratio', 'fraction', 'drift', 'tempco', 'temperature', 'thermal', 'time', 'price', 'count', 'angle',
  'charge', 'share', 'number',
] as const;
export type FieldKind = (typeof FIELD_KINDS)[number];
