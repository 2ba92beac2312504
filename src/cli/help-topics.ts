import { CHECKS, PARAMETERS, type Parameter } from '../index.js';
import { EXPLAIN_PAGE, SHORTLIST_PAGE } from './bars-page.js';
import { CODE_PAGES } from './code-pages.js';
import { PHYSICS_PAGE } from './physics-page.js';
import { fieldGroups, TOPOLOGY_PAIRS } from './stage-help.js';

/** A help page: blocks of text, each a paragraph or an indented list of pairs. */
export type Block = { readonly text: string } | { readonly pairs: readonly (readonly [string, string])[] } | { readonly code: readonly string[] };

const EXITS: readonly (readonly [string, string])[] = [
  ['0', 'yes, or done: something fits, imported, shown'],
  ['1', 'answered "no": nothing fits, the part does not fit, nothing matched'],
  ['2', 'the request itself is wrong: option, quantity, stage file, unknown part'],
  ['3', 'data refused: the list was not imported'],
  ['4', 'cannot be decided: nothing fits, but some parts lack a figure'],
  ['5', 'surroundings: file unreadable, disk full, database locked'],
  ['70', 'fault in railfit itself'],
  ['130', 'interrupted'],
];

const CAUTIONS: Block = {
  text: "The chosen part's datasheet governs; prototypes are measured. Where failure can hurt someone (medical, mains-connected, automotive, machinery), qualified review and the applicable codes decide.",
};

const STAGE_EXAMPLE = [
  'topology: non-inverting',
  'supply: 3.0..4.2 V',
  'gain: 8',
  'signal: {input: 25 mV..330 mV, frequency: 2 kHz}',
  'load: {resistance: 10 kΩ, to: ground}',
  'temperature: -20..60 °C',
  'limits: {dcError: 35 mV, supplyCurrent: 90 µA}',
];

/** Long help by topic. */
export const TOPICS: Readonly<Record<string, () => readonly Block[]>> = {
  stage: () => [
    { text: 'The stage file is YAML (JSON is a subset). Values are written as engineers write them, with their unit. What is left out takes its default, and every default is printed as an assumption. Options override the file, so that a what-if is one option.' },
    { code: STAGE_EXAMPLE },
    { text: 'Topologies, and what each needs besides topology and supply. What does not belong to a topology is refused with the reason.' },
    { pairs: TOPOLOGY_PAIRS },
    ...fieldGroups(),
    { text: 'Without signal.frequency, slew rate and gain bandwidth are not asked, and that is said. railfit help TOPOLOGY has a page of each; railfit draft TOPOLOGY prints a file with every field.' },
  ],
  figures: () => [
    { text: 'What is known about a part: a number with a limit kind (min, typ, max) and a condition. Names as --assume and JSON use them, and the words of the canonical CSV header.' },
    { pairs: (Object.keys(PARAMETERS) as Parameter[]).map((name) => [name, `${PARAMETERS[name].words} (${PARAMETERS[name].headerUnit}), ${PARAMETERS[name].kinds.join(', ')}`] as const) },
    { text: 'A limit is never a typical: a typical figure counts after the derating that is printed beside it, and proves nothing by itself.' },
  ],
  checks: () => [
    { text: 'Every check is judged twice, on the pessimistic and on the optimistic reading of the figures it reads. Both pass: pass. Both fail: fail. Otherwise it cannot be decided, and the value at which it turns is told. Unknown is never a pass.' },
    { pairs: CHECKS.map((check) => [check.id, `${check.title}; reads ${check.reads.join(', ')}`] as const) },
    { text: 'crossover, phase-reversal, clamp and overdrive are judged when the stage writes avoid; otherwise they are cautions and decide nothing. railfit help physics tells how each is modelled and from which source.' },
  ],
  physics: () => PHYSICS_PAGE,
  shortlist: () => SHORTLIST_PAGE,
  explain: () => EXPLAIN_PAGE,
  prediction: () => [
    { text: 'railfit predict PART [STAGE] simulates the stage with the figures of one part, in two outcomes: with its typical figures as printed, and with the guaranteed ones as the checks read them pessimistically. It judges nothing and exits 0. --compare PART puts a second part beside it, --csv prints the waveform, --json both waveform and frequency response.' },
    { text: 'The amplifier is an integrator (gain bandwidth) with a finite gain, a hard limit of its slope, a second pole from its phase margin at unity gain, an output resistance that the load and the network stand behind, input capacitance, offset, and ends of its output at the head-room for the current that flows there. Between the moments where a limit takes hold or lets go the stage is linear and carried on by matrix exponentials, exactly; distortion is a Fourier transform of one settled period.' },
    { text: 'A figure that is missing takes away what depends on it, with the reason; the rest is predicted all the same. What was left out, and what the model does not have, is printed.' },
    {
      pairs: [
        ['sine, band', 'peaks, clipped and slewing share, distortion of the largest sine at the top frequency'],
        ['step, pulse', 'the largest step; settling to limits.settling.to, else 0.1 %'],
        ['integrator', 'with a window the ramp from its reset, else a sine'],
        ['oscillator', 'a settled period: frequency, duty, edges, levels'],
      ],
    },
  ],
  'exit-codes': () => [{ text: 'Exit codes are frozen.' }, { pairs: EXITS }],
  quantities: () => [
    { text: 'A quantity is read when it has one reading. It is refused when two readings exist and both are usable; railfit never chooses between milli and mega by what looks likely.' },
    {
      pairs: [
        ['resistance', '4k7, 4.7 kΩ, 4.7 kohm, 10meg; not 10M'],
        ['supply', '5 V, 3V3, 5 V ±5 %, 5 V +5/-10 %, 3.0..4.2 V'],
        ['amplitude', '500 mVpk, 1 Vpp, 70 mVrms (sine)'],
        ['noise', '15 nV/√Hz, 15 nV/rtHz'],
        ['slew rate', '1.5 V/µs, 3 V/ms'],
        ['ratio', '86 dB, 100 V/mV, 50 µV/V'],
        ['temperature', '25 °C, -40..85C'],
        ['limits', '"<5 mV" or max 5mV (in a shell < and > need quotes), typ 1 mV'],
      ],
    },
    { text: 'Signs that are hard to type have word forms: u (micro), ohm, rtHz (root hertz), +/- before a tolerance, .. or to in a range. In batch files % is written twice.' },
  ],
  lists: () => [
    { text: 'railfit import reads the approved list as canonical CSV: one row a part, a figure named by its parameter, limit kind and unit, with conditions behind @. Nothing is stored unless every cell is understood.' },
    { code: ['id,status,package,supply voltage min (V),supply voltage max (V),slew rate min (V/µs),output high headroom max (mV) @ 1 mA', 'ORG-OA-0101,approved,SOT-23-5,1.8,5.5,0.4,60'] },
    { text: 'A list replaces the one before, all or nothing: railfit import tells every figure that changes, parts that are gone are withdrawn and never erased, railfit import --undo goes back, and --dry-run says the same and writes nothing. What looks like a slip of the whole file is held back until it is said:' },
    {
      pairs: [
        ['--accept removed', 'more than a fifth of the parts are gone'],
        ['--accept scaled', 'a whole column is a power of ten off'],
        ['--accept lifecycle', 'many parts come back from the end of their life'],
        ['--accept older', 'the same file was in force before the present one'],
      ],
    },
    { text: 'railfit parts --csv writes the same form; a cell that starts like a formula gets an apostrophe in front, which import takes off again and --raw leaves out. catalog/README.md tells how to read each value out of a datasheet.' },
  ],
  saved: () => [
    { text: "railfit stages add FILE --part ID keeps a stage file by its path, with the part chosen for it; railfit stages lists them, railfit stages remove FILE forgets one. Every import then tells which of them are answered differently: first choice, how many fit, and how the chosen part stands before and after." },
    { text: 'railfit check tells whether the chosen parts still fit, for the stages named or for every saved one. The part is that of --part, else part: in the stage file, else the one saved. --junit FILE writes the same for a build server: a suite for each stage, a case for each check; what cannot be decided is an error there. It exits with the worst of its stages: 2 where the question cannot be asked (no such file, no stage, no such part, no part chosen), 4 where one cannot be decided, 1 where one does not fit or was withdrawn, 0 where all fit.' },
  ],
  sweep: () => [
    { text: 'railfit sweep STAGE --over PATH=A..B tells how many parts fit and which comes first at values from A to B, and the values at which that turns, found by halving to a ten-millionth; turns that come and go between two values alike are not seen, more --steps see more. PATH is a field as --set takes it, or supply, gain, frequency, load, temperature, input. Over a decade or more the values stand in even ratios (--log, --linear).' },
    {
      pairs: [
        ['one figure', 'each value takes its place: gain=1..20, load=1kΩ..100k, limits.dcError="5..50 mV"'],
        ['a tolerance', 'is kept: of 5 V ± 5 % each value has ± 5 %'],
        ['a range', 'each value is the upper end and the lower one stays: temperature, signal.input, signal.frequency'],
        ['a supply range', 'each value is one supply that stands still, in place of the range'],
      ],
    },
    { text: 'Where the stage contradicts itself at a value, the reason stands in its row. One field at a time; --csv and --json carry rows and turns.' },
  ],
  changes: () => [
    { text: 'railfit explain PART STAGE ends with what would let the part in: smallest sets of one, two or three changes, each rounded to the safe side, judged again in full, and printed as a command that pastes back. A shortlist where nothing fits tells which demands together rule everything out, how many parts each alone leaves, and the smallest changes that let parts in.' },
    { text: 'mayChange in the stage file names what may move: fields, or maps with all they hold (mayChange: [limits, gain, signal.frequency]). Without it the limits, the price and the package may. Supply, signal, load, temperature and approval stay fixed unless they are named.' },
    {
      pairs: [
        ['factor', 'how far a field moves, new to old; 20 °C count as twice, a swing given up counts as its share, words not at all. Answers are sorted by the largest of their factors'],
        ['circuit', 'an isolation resistor, a feedback capacitor, other feedback resistors, a moved or buffered reference, the load to the other rail: offered where the stage with it passes'],
        ['or', 'a calibration of the offset, the gain split over two stages: no field of the stage says so; computed beside it, and it says how'],
      ],
    },
    { text: 'A limit moves only as far as it still says something: a phase margin not below 30°, a DC error, a noise or a swing loss not beyond half the swing, an error not beyond 50 %.' },
  ],
  review: () => [
    { text: 'railfit report STAGE... -o review.html writes the design review of one stage or several as one page: it opens in any browser, prints on A4 or Letter, asks for nothing from anywhere, and carries its stage files and its answer. What it is about: the part named with --part, else the one kept with the stage (railfit stages add FILE --part ID), else the first in order; the page says which.' },
    { text: '--format md writes the same for a pull request, --format csv every verdict of every part, --json the document the page embeds. --symbols ieee draws the schematic after IEEE 315 instead of IEC 60617. The time is that of --time, else of SOURCE_DATE_EPOCH, else of the clock: with the same time the same input gives the same bytes.' },
    { text: 'railfit verify review.html judges the embedded stages again with the catalog in force and tells every difference: another list, another first choice, another number. When all answers are the same it compares the page letter by letter. It exits with 0 when nothing differs and with 1 when something does.' },
  ],
  codes: () => [{ pairs: CODE_PAGES.map(({ code, title }) => [code, title] as const) }, { text: 'railfit help CODE shows one of them.' }],
  cautions: () => [CAUTIONS, { text: 'Not modelled: layout, electromagnetic interference, long-term drift, self-heating. Generic sets are invented classes of parts, not something to order.' }],
};

/** Page of one message code; null when there is no such code. */
export function codeBlocks(code: string): readonly Block[] | null {
  const found = CODE_PAGES.find((one) => one.code === code.toUpperCase());
  if (found === undefined) return null;
  return [{ text: `${found.code}: ${found.title}` }, { text: found.why }, { pairs: [['refused', found.refused], ['instead', found.accepted]] }];
}
