import { SPEC_CODES } from '../index.js';
import { INTAKE_CODES } from '../intake/codes.js';

/** What a message code means, with something that is refused and something that is accepted. */
export interface CodePage {
  readonly code: string;
  readonly title: string;
  readonly why: string;
  readonly refused: string;
  readonly accepted: string;
}

/** Code, title, why, something refused, something accepted. */
const page = (...[code, title, why, [refused, accepted]]: [string, string, string, readonly [string, string]]): CodePage => ({ code, title, why, refused, accepted });

const QUANTITIES: readonly CodePage[] = [
  page('Q001', 'no unit', 'A bare number has no scale; only zero, gains, counts, letter codes and k, meg, p, n, u on resistors and capacitors go without.', ['supply: 5', 'supply: 5 V']),
  page('Q002', 'm or M without a unit', 'SI reads M as mega, circuit simulators read it as milli: a factor of a thousand million.', ['load: 10M', 'load: 10 MΩ, 10meg or 10 mΩ']),
  page('Q003', 'letter case that proves nothing', 'When the unit itself is in the wrong case, m and M cannot be told apart; P is peta.', ['1mhz, 22PF', '1 MHz, 22 pF']),
  page('Q004', 'wrong kind of quantity', 'A current stands where a voltage is expected, or a square root is missing.', ['15 nV/Hz', '15 nV/√Hz or 15 nV/rtHz']),
  page('Q005', 'comma or grouping with two readings', '1,000 is one thousand with grouping and one with a decimal comma.', ['1,000 ohm', '1000 ohm or 1.0 ohm']),
  page('Q006', 'tolerance unit or letter', 'K and M as tolerance letters are too easily read as kilo and mega; other letters mean nothing.', ['4k7K', '4.7 kΩ ±10 %']),
  page('Q007', 'order of a range', 'A range runs upwards; a hyphen after a minus could be a subtraction.', ['4.2..3.0 V', '3.0..4.2 V']),
  page('Q008', 'one prefix for both ends', 'A shared prefixed unit may belong to the second figure only.', ['20..20 kHz', '20 Hz..20 kHz']),
  page('Q009', 'two values with a slash', 'Minimum and maximum, typical and maximum, or two options.', ['2.5/3.6 V', '2.5..3.6 V']),
  page('Q010', 'implausible size', 'The figure is far outside anything this field can be: usually a prefix slip.', ['5 MV', '5 V']),
  page('Q011', 'unknown unit', 'The unit is not one of this field.', ['600 rpm', '10 Hz']),
  page('Q012', 'two scale factors', 'An exponent and a prefix, or a prefix on top of the prefix of the column header.', ['1e-3m', '1 µA']),
  page('Q013', 'not a number, or approximate', 'An approximate figure cannot prove anything.', ['~1 mV', 'typ 1 mV, or 1 mV ± 10 %']),
  page('Q014', 'amplitude of which kind', 'Peak, peak-to-peak and rms differ by up to 2.8.', ['1 V', '1 Vpk, 1 Vpp or 1 Vrms']),
  page('Q015', 'split supply', 'railfit covers one supply and ground.', ['±5 V', '10 V, or the single rail']),
  page('Q016', 'character that does not belong', 'An invisible or foreign character is named by code point and position.', ['5 V with U+200B', '5 V']),
  page('Q017', 'spreadsheet damage', 'A date or a row of hashes was a number once.', ['5-Mar', 'restore the cell as text']),
  page('Q019', 'sign', 'The quantity cannot be negative.', ['-5 V supply', '5 V']),
  page('Q020', 'empty', 'Nothing, or a word for nothing: unknown and not applicable are different.', ['N/A', 'leave the field out']),
  page('Q021', 'tolerance without a value', 'A tolerance belongs to a value.', ['±5 %', '5 V ±5 %']),
];

const CONTRADICTIONS: readonly CodePage[] = [
  page('S201', 'output beyond the supply', 'At nominal values the output is asked to leave the supply: no amplifier does it.', ['gain 8 with 25 mV..1 V on 3.6 V', 'gain 3, or a smaller input']),
  page('S202', 'output does not follow from the rest', 'With a gain, signal.output is a cross-check.', ['gain: 8, input: 0..330 mV, output: 0..2 V', 'output: 0..2.64 V']),
  page('S203', 'gain and resistors disagree', 'They must agree within the resistor tolerance; then the resistors rule.', ['gain: 8 with 80 kΩ and 10 kΩ', 'gain: 9, or 70 kΩ']),
  page('S204', 'input below ground with no reference', 'A ground-referenced stage on one supply cannot put out what lies below ground.', ['input: -100..100 mV, reference: ground', 'reference: mid-supply']),
  page('S205', 'no stage maps the input onto the output', 'The gain or the reference that would be needed cannot be had.', ['input 0..1 V to output 3..2 V, non-inverting', 'topology: inverting']),
  page('S206', 'supply peak below the supply', 'The transient peak is at least the top of the supply.', ['supply: 5 V ±5 %, supplyPeak: 5 V', 'supplyPeak: 5.25 V']),
  page('S207', 'reference outside the supply', 'What a single supply gives lies between ground and that supply.', ['supply: 5 V, reference: 6 V', 'reference: mid-supply']),
  page('S208', 'gain not given', 'Gain, resistors or the wanted output must say it.', ['topology: inverting, nothing else', 'gain: 8']),
  page('S209', 'no resistors for this gain', 'No pair of E96 values with a reasonable feedback path gives it.', ['gain: 1000000', 'resistors: {feedback: 1 MΩ, input: 1 Ω}']),
  page('S210', 'components and frequency disagree', 'Timing or filter components written beside the frequency, corner or Q must give it within their tolerances, and a frequency must be one that preferred values can give.', ['oscillator: {frequency: 2 kHz, resistance: 100 kΩ, capacitance: 1 nF}', 'oscillator: {frequency: 2 kHz, capacitance: 1 nF}']),
  page('S211', 'no such filter', 'The filter is not said, oscillates with its components or at the ends of their tolerances, has a gain its circuit cannot have, or no preferred values give it.', ['filter: {corner: 10 MHz, q: 20}', 'filter: {corner: 10 kHz, q: 0.707}']),
  page('S212', 'nothing bounds the integrator', 'What is added up without an end runs into a rail: a reset, a lowest frequency or a resistor across the capacitor bounds it.', ['integrator: {resistance: 100 kΩ, capacitance: 100 nF}', 'integrator: {resistance: 100 kΩ, capacitance: 100 nF, window: 20 ms}']),
  page('S220', 'duty cycle that leaves no time', 'A stage that is switched off between measurements is on for less than its period, and starts within that time.', ['dutyCycle: {on: 2 s, every: 1 s}', 'dutyCycle: {on: 2 ms, every: 1 s}']),
  page('S221', 'ripple larger than the supply', 'What is left of the ripple behind the supply filter is a small part of the supply.', ['supply: 5 V, supplyRipple: {amplitude: 12 Vpp, frequency: 100 kHz}', 'supplyRipple: {amplitude: 50 mVpp, frequency: 100 kHz}']),
];

const COMMANDS: readonly CodePage[] = [
  page('C100', 'unknown command', 'The first word names what to do.', ['railfit shortlsit', 'railfit shortlist']),
  page('C101', 'unknown option', 'Options are never guessed.', ['--gian 8', '--gain 8']),
  page('C102', 'operands', 'A command was given too few or too many words.', ['railfit explain stage.yaml', 'railfit explain PART stage.yaml']),
  page('C103', 'no stage', 'A stage is a file, - for standard input, or options that say it all.', ['railfit shortlist', 'railfit shortlist stage.yaml']),
  page('C104', 'option without a usable value', 'The value is missing or not one of those listed.', ['--order best', '--order price']),
  page('C105', '--set without field and value', 'The form is path=value.', ['--set dcError', '--set limits.dcError="20 mV"']),
  page('C106', 'options that need or exclude each other', 'A failing check can only be named on a stage; an answer has one form.', ['--failing dc-error', '--failing dc-error --stage stage.yaml']),
  page('C107', '--assume', 'The form is PART.figure=VALUE; figures are named as in railfit help figures.', ['--assume drift=10', '--assume PART.offsetDrift=10µV/K']),
  page('C108', 'no such part', 'Ids are compared exactly; near ones are offered.', ['railfit part ORG-OA-OO12', 'railfit part ORG-OA-0012']),
  page('C109', 'no such help topic', 'Topics, commands and message codes have pages.', ['railfit help figrues', 'railfit help figures']),
  page('C110', 'the file exists', 'A draft is never written over another file unless that is asked for.', ['railfit draft -o stage.yaml, a second time', 'railfit draft -o other.yaml, or --force']),
  page('C111', 'no terminal to ask on', 'Guided entry needs a person at a terminal; everything it asks can be written in a file or given as options.', ['railfit draft --ask < answers.txt', 'railfit draft non-inverting -o stage.yaml']),
  page('C112', 'no such saved stage', 'What is saved is listed by railfit stages.', ['railfit stages remove probe.yml', 'railfit stages remove probe.yaml']),
  page('C113', 'a part that was withdrawn', 'It was on an earlier list and is not on this one. Its versions are kept, so that old reports resolve.', ['railfit explain ORG-OA-0008 stage.yaml', 'railfit part ORG-OA-0008, which shows it as it was last']),
  page('C114', 'what is swept', 'One field at a time, from one value to a larger one. What is swept is a quantity: a word or a count has nothing in between.', ['railfit sweep stage.yaml --over package=SOT-23-5', 'railfit sweep stage.yaml --over supply=2.7V..5.5V']),
  page('C121', 'no report in the file', 'A report carries its answer as a document, and verify judges that again; a page that was saved by a browser in another form, cut off or edited there has none that can be trusted.', ['railfit verify screenshot.html', 'railfit verify review.html, as railfit report wrote it']),
  page('E501', 'the catalog cannot be used', 'The file is locked, unreadable, not a catalog, or from a newer version. It was left as it is.', ['--catalog /etc/hosts', '--catalog team.sqlite']),
  page('E502', 'file cannot be read', 'The path or its permissions.', ['stage.yml for stage.yaml', 'the path as ls shows it']),
  page('E503', 'file cannot be written', 'The folder does not exist or may not be written.', ['--errors /nowhere/e.csv', '--errors e.csv']),
  page('E504', 'the answer cannot be written', 'What the output was sent to takes no more: usually a full disk.', ['railfit shortlist stage.yaml > /full/list.txt', 'railfit shortlist stage.yaml > /elsewhere/list.txt']),
];

/** What a new list may do only when that is said: the guards of an import. */
const GUARDS: readonly CodePage[] = [
  page('I701', 'a large part of the list is gone', 'More than a fifth of the parts in force would be withdrawn: usually a filter was left on, or the wrong sheet was saved.', ['9 of 20 parts missing', 'the whole list; railfit import list.csv --accept removed if they are gone']),
  page('I702', 'lifecycle getting better in bulk', 'Parts seldom come back from the end of their life; many at once are a column that slipped or an old file.', ['obsolete becomes active for 6 of 20 parts', 'the lifecycle the makers publish; --accept lifecycle if it is right']),
  page('I703', 'an older file', 'These very bytes were in force before and another list has replaced them; importing them again would bring old figures back.', ['march.csv after april.csv', 'railfit import --undo takes the last import back; --accept older imports the old file']),
  page('I801', 'no such part in the list', 'A look-up sheet fills cells of parts that are on the list in force; a new part belongs in the list itself.', ['HOUSE-99, which is not on the list', 'HOUSE-09, or the new part in the list']),
  page('I802', 'nothing filled', 'Every cell of the look-up sheet is empty or still holds its question mark.', ['? in every cell', '3.5 in place of the question mark']),
  page('I803', 'known already, and another value', 'A look-up sheet fills gaps. What the list says is corrected in the list, so that one place is right.', ['offset drift max 5 where the list says 4', 'an empty cell in the sheet; the list corrected and imported']),
  page('I804', 'a column of the sheet that is no figure', 'A changed header would lose what was filled in below it.', ['offset drfit max (µV/K)', 'offset drift max (µV/K)']),
  page('I805', 'a look-up sheet is no list', 'Importing it as the list would withdraw every part it does not name.', ['railfit import lookups.csv', 'railfit import lookups.csv --patch']),
  page('I806', 'no list to add to', 'A look-up sheet needs the list it was made for.', ['railfit import lookups.csv --patch on an empty catalog', 'railfit import approved.csv']),
];

/** Every code a message can carry, in order. A test holds this list against the source. */
export const CODE_PAGES: readonly CodePage[] = [
  ...QUANTITIES,
  ...SPEC_CODES.map(({ code, title, cause, refused, accepted }) => ({ code, title, why: cause, refused, accepted })),
  ...CONTRADICTIONS,
  ...Object.entries(INTAKE_CODES).map(([code, { title, why, example, fix }]) => ({ code, title, why, refused: example, accepted: fix })),
  ...GUARDS,
  ...COMMANDS,
];
