import type { AnyDemand } from '../demands/index.js';
import type { Explanation } from '../report.js';
import type { Verdict } from '../verdicts/verdict.js';
import { checkAmount } from './amounts.js';
import { paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { glued, GLUE } from './spelling.js';
import type { Style } from './style.js';

/** A relation in symbols, and where it is published. */
interface Formula {
  readonly relation: string;
  readonly source: string;
}

const FRANCO = 'S. Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002';
const PRACTICE = 'a comparison of two limits; nothing is derived';
const RANGES: Formula['source'] = `${FRANCO}, ch. 1 (from memory); corners: own algebra`;

const plain = (relation: string): Formula => ({ relation, source: PRACTICE });

/** The relation of every check in numbers, as the help on physics has it. */
const FORMULAS: Readonly<Record<string, Formula>> = {
  'supply-low': plain('VS,min(stage) ≥ VS,min(part)'),
  'supply-high': plain('VS,max(stage) ≤ VS,max(part)'),
  'supply-peak': plain('VS,peak ≤ VS,absolute maximum'),
  'input-low': { relation: 'min(VCM - V-) ≥ headroom to V-, over all corners', source: RANGES },
  'input-high': { relation: 'min(V+ - VCM) ≥ headroom to V+, over all corners', source: RANGES },
  'output-low': { relation: 'VO - V- + swingLoss ≥ headroom(I) + NG·(VOS + drift·ΔT), at every corner with its own supply and current', source: `head-room over current: own algebra; offset: ${FRANCO}, ch. 5 (from memory)` },
  'output-high': { relation: 'V+ - VO + swingLoss ≥ headroom(I) + NG·(VOS + drift·ΔT), at every corner with its own supply and current', source: `head-room over current: own algebra; offset: ${FRANCO}, ch. 5 (from memory)` },
  'output-current': { relation: '|IDC| + √(Ipk² + (2π·f·C·Vp)²) ≤ IO', source: 'own algebra (the current of a capacitance is at 90° to that of a resistance)' },
  'slew-rate': { relation: 'SR ≥ 2π·f·Vp for a sine or a band-limited signal; for edges the 10 % to 90 % time of one pole with a slew limit, solved for SR', source: `R. P. Boas, Entire Functions, 1954, ch. 11 (Bernstein's inequality); ${FRANCO}, ch. 6 (both from memory)` },
  'gain-bandwidth': { relation: 'GBW ≥ NG·f/√((1 - ε)^-2 - 1) for the magnitude, NG·f·√(1 - ε²)/ε for the vector error; filters by their exact cubic', source: `${FRANCO}, ch. 6; A. Budak & D. M. Petrela, Frequency Limitations of Active Filters Using Operational Amplifiers, IEEE Trans. Circuit Theory 19(4), 1972 (from memory); own algebra` },
  'stable-gain': { relation: 'noise gain at high frequency ≥ minimum stable gain', source: `${FRANCO}, ch. 8 (from memory)` },
  'phase-margin': { relation: 'PM = 180° + arg(A·β) where |A·β| = 1, with load, input capacitance and excess phase', source: `${FRANCO}, ch. 8 (from memory); own algebra` },
  noise: { relation: 'en,out = √(Σ ∫ |Hk(f)|²·Sk(f) df): en²(1 + fce/f), in² through each pin, 4kTR of every resistor', source: `H. Nyquist, Thermal Agitation of Electric Charge in Conductors, Phys. Rev. 32, 1928; ${FRANCO}, ch. 7 (from memory)` },
  distortion: { relation: 'HD3 = NG·(f/GBW)·2ρ³/(3r), ρ = (1 - √(1 - r²))/r, r = 2π·f·Vp/SR; clipping added', source: 'J. E. Solomon, The Monolithic Op Amp: A Tutorial Study, IEEE J. Solid-State Circuits 9(6), 1974 (from memory); own algebra' },
  'dc-error': { relation: 'NG·[VOS + drift·ΔT + IB·(|Rp - Rn| + t(Rp + Rn)) + (IOS/2)(Rp + Rn) + ΔVCM/CMRR + ΔVS/PSRR + ΔVO/A0]', source: `${FRANCO}, ch. 5 (from memory)` },
  settling: { relation: 't = τ·ln(1/ε), or ΔV/SR - τ + τ·ln(SR·τ/(ε·ΔV)) when it slews first', source: `${FRANCO}, ch. 6 (from memory); own algebra` },
  'frequency-error': { relation: 't = RC·ln[(VOH - VTL)/(VOH - VTH)] + RC·ln[(VTH - VOL)/(VTL - VOL)], with VOH, VOL and slew rate of the part', source: `${FRANCO}, ch. 10 (from memory)` },
  'supply-current': plain('IQ per amplifier ≤ limits.supplyCurrent'),
  'temperature-low': plain('TA,min ≥ lowest specified temperature'),
  'temperature-high': plain('TA,max ≤ highest specified temperature'),
  'junction-temperature': { relation: 'TJ = TA + θJA·(VS·IQ + worst dissipation of the output)', source: 'P. R. Gray, P. J. Hurst, S. H. Lewis & R. G. Meyer, Analysis and Design of Analog Integrated Circuits, 5th ed. 2009 (from memory); JEDEC JESD51' },
  price: plain('price ≤ wishes.price'),
  channels: plain('channels ≥ wishes.channels'),
};

/** With `--formulas`: per check the relation, its numbers on this stage, and its source. */
export function formulaLines({ judged, demands }: Explanation, style: Style): string[] {
  if (style.formulas !== true) return [];
  const lines = judged.verdicts.flatMap((verdict) => oneFormula(verdict, demands.find(({ check }) => check === verdict.check), style));
  return lines.length === 0 ? [] : ['Formulas', ...lines];
}

/** The same as documents carry it: per check the relation, its numbers on this stage (null where a word is compared), and its source. */
export function formulasJson({ judged, demands }: Explanation): object[] {
  return judged.verdicts.flatMap((verdict) => {
    const formula = FORMULAS[verdict.check];
    if (formula === undefined) return [];
    const numbers = numbersOf(verdict, demands.find(({ check }) => check === verdict.check)).replaceAll(GLUE, ' ');
    return [{ check: verdict.check, relation: formula.relation, numbers: numbers === '' ? null : numbers, source: formula.source }];
  });
}

function oneFormula(verdict: Verdict, demand: AnyDemand | undefined, style: Style): string[] {
  const formula = FORMULAS[verdict.check];
  if (formula === undefined) return [];
  const line = (text: string): string[] => paragraph(glued(text), style, { lead: '      ' });
  const numbers = numbersOf(verdict, demand);
  return [
    ...paragraph(`${verdict.title}: ${formula.relation}`, style, { lead: '  ', indent: 6 }),
    ...(numbers === '' ? [] : line(numbers)),
    ...line(`source: ${formula.source}`),
  ];
}

/** What stands on both sides here; a sum with its terms. */
function numbersOf(verdict: Verdict, demand: AnyDemand | undefined): string {
  const { required, offered, known, terms, unit, termUnit } = verdict;
  if (typeof required !== 'number' || unit === null) return '';
  const value = typeof offered === 'number' ? offered : known;
  const sum = terms.length < 2 || termUnit !== undefined || value === null ? '' : ` = ${verdict.adds === 'squares' ? 'root of the squares of ' : ''}${terms.map((term) => checkAmount(verdict, term.value)).join(' + ')}`;
  const part = value === null ? 'not known' : `${checkAmount(verdict, value)}${sum}`;
  const because = demand !== undefined && 'because' in demand && demand.because !== '' ? ` (${safeLine(demand.because)})` : '';
  return `here: part ${part}; stage ${checkAmount(verdict, required)}${because}`;
}
