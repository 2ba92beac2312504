/** What `help CODE` tells about a problem of the stage file. */
export interface SpecCode {
  readonly code: string;
  readonly title: string;
  readonly cause: string;
  /** A line that is refused, and how it is written. */
  readonly refused: string;
  readonly accepted: string;
}

/** Every code of this room, in order. */
export const SPEC_CODES: readonly SpecCode[] = [
  { code: 'S100', title: 'not readable as YAML', cause: 'The text breaks a rule of YAML (or JSON), holds several documents, or is not text at all.', refused: 'limits:\\tdcError: 20 mV: 3', accepted: 'limits: {dcError: 20 mV}' },
  { code: 'S101', title: 'unknown field', cause: 'No field of this name exists at this level; a misspelt field would silently not be judged.', refused: 'gian: 8', accepted: 'gain: 8' },
  { code: 'S102', title: 'a field is missing', cause: 'A stage cannot be derived without topology, supply and what it is fed; some maps need all their keys.', refused: 'settling: {within: 20 µs}', accepted: 'settling: {within: 20 µs, to: 0.1 %}' },
  { code: 'S103', title: 'wrong structure', cause: 'A list, a map or nothing stands where one value is expected, or the other way round.', refused: 'supply: [3.0 V, 4.2 V]', accepted: 'supply: 3.0..4.2 V' },
  { code: 'S104', title: 'unknown word', cause: 'The field takes one of a few words.', refused: 'gainErrorKind: magnitud', accepted: 'gainErrorKind: magnitude' },
  { code: 'S107', title: 'AC-coupled difference stage not built yet', cause: 'A difference stage is derived DC-coupled only.', refused: 'signal: {coupling: ac}', accepted: 'signal: {coupling: dc}' },
  { code: 'S108', title: 'the field does not belong here', cause: 'The topology, the coupling or the shape has no such thing, or two fields say the same in two ways.', refused: 'signal: {coupling: ac, input: 0..1 V}', accepted: 'signal: {coupling: ac, amplitude: 500 mVpk}' },
  { code: 'S109', title: 'written twice', cause: 'One field has two values, and neither is obviously the one that is meant.', refused: '{gain: 8, gain: 10}', accepted: '{gain: 8}' },
  { code: 'S110', title: 'not possible', cause: 'No stage can have this figure, whatever the rest of the file says.', refused: 'supply: 0 V', accepted: 'supply: 5 V' },
  { code: 'S111', title: 'anchors, aliases and tags', cause: 'Every value is written where it is used and read as typed, so these marks of YAML have no use.', refused: 'supply: &rail 5 V', accepted: 'supply: 5 V' },
  { code: 'S112', title: 'one figure, or both ends, expected', cause: 'A field that takes one figure was given a range or a tolerance, or a field with two ends was given one of them.', refused: 'supply: min 4.5 V', accepted: 'supply: 4.5..5.5 V' },
  { code: 'S113', title: 'not a name for a leg', cause: 'Legs of a summing stage have names of your own, of letters, digits, - and _; words that mean something else in a stage are taken.', refused: 'legs: {supply: {input: supply, resistance: 100 kΩ}}', accepted: 'legs: {centre: {input: supply, resistance: 100 kΩ}}' },
];
