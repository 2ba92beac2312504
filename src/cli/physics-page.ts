import type { Block } from './help-topics.js';

const text = (words: string): Block => ({ text: words });
const pairs = (...rows: readonly (readonly [string, string])[]): Block => ({ pairs: rows });

/** Worst cases, and how sure a number is. */
const RULES: readonly Block[] = [
  text('What is modelled, how, and from which source. The marks M1, M2, … are the ones that demands and verdicts carry. "From memory" means that author, title and year are cited without a printed copy at hand; "own algebra" that the relation was derived here and is tested by an independent numerical route or by circuit simulation.'),
  text('Worst cases. Every output and input voltage is multilinear in supply, reference, signal and resistor values, or monotone in a resistor ratio, so exact extremes stand at corners: all of them are enumerated. Only gain bandwidth and output current are taken at nominal resistors: at the worst corner they grow by about the tolerance of the resistor ratio, for which margins.gainBandwidth leaves room. What moves together is one corner: a mid-supply reference goes with its supply. Two resistors of tolerance t make a ratio of ρ(1-t)/(1+t) to ρ(1+t)/(1-t). Circuits are taken with one amplifier, in the steady state unless a step is asked.'),
  text('Two readings. Each check is judged on the pessimistic and on the optimistic reading of the figures. A limit counts as it is printed in both; a typical figure is derated in the first (common practice) and taken as printed in the second. Limits before typicals; unknown is never a pass.'),
];

const RANGES: readonly Block[] = [
  text('M1  Ranges at output and inputs'),
  pairs(
    ['follower', 'vo = vi; both inputs move with the signal'],
    ['non-inverting', 'vo = Vref + (1+ρ)(vi - Vref), ρ = Rf/Rg; pins at vi'],
    ['inverting, summing', 'vo = Vref(1+Σρ) - Σρ·v; pins rest at Vref; every leg counts in the noise gain, also a grounded one'],
    ['difference', 'vo = Vref + G(v+ - v-) for matched legs, exact for unmatched ones; pins at (G·v+ + Vref)/(1+G). What the resistors leave of the common-mode rejection, (1+G)/(4t), is listed (Pallas-Areny & Webster, IEEE Trans. Instrum. Meas. 40(4), 1991, from memory)'],
    ['transimpedance', 'vo = Vref ± i·Rf; dark current doubles per 10 K (common practice)'],
    ['low-side-sense', 'non-inverting on I·Rsh; high-side-sense: difference across the shunt, pins at G/(1+G) of the bus'],
    ['sallen-key-low-pass', 'vo = Vref + K(vi - Vref), pins at Vref + (vo - Vref)/K: they move with the signal. multiple-feedback-low-pass: pins rest at Vref'],
    ['peaking', 'a second-order filter with Q above 0.707 swings K·Q/√(1 - 1/(4Q²)) at f0·√(1 - 1/(2Q²)) when the band contains that frequency'],
    ['integrator', 'vo = Vref - (1/RC)·∫(vi - Vref)dt, from reset to reset'],
    ['relaxation-oscillator', 'thresholds (V+/Ra + {VOH or VOL}/Rc)/(1/Ra + 1/Rb + 1/Rc); t_up = RC·ln[(VOH-VTL)/(VOH-VTH)], t_down = RC·ln[(VTH-VOL)/(VTL-VOL)], with VOH and VOL of the part'],
    ['pulses', 'DC-coupled: between the extremes. AC-coupled: (1-D)·Vpp above the bias and D·Vpp below for duty D; a free duty needs up to Vpp on each side'],
  ),
  text('Sources: Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 1-3, 10; Mancini (ed.), Op Amps for Everyone, 2002, ch. 3-4; Graeme, Photodiode Amplifiers, 1996, ch. 2 (all from memory); own algebra.'),
];

const SPEED: readonly Block[] = [
  text('M2  Slew rate, edges and settling'),
  pairs(
    ['sine, band-limited', 'SR ≥ 2π·f·Vp at the output. A sine at the band edge is the exact worst case of any signal limited to f and ±Vp (Bernstein; Boas, Entire Functions, 1954, ch. 11, from memory)'],
    ['edges', 'one pole with a hard slew limit: the output slews while its error exceeds SR·τ, then decays. The 10 % to 90 % time of that exact form is solved for the least SR by bisection, with the τ of the part at hand. It falls from 1.98·ΔV/t with just enough bandwidth to 0.8·ΔV/t with plenty: the latter is the floor, shown before any part is known'],
    ['settling', 't = τ·ln(1/ε), or ΔV/SR - τ + τ·ln[SR·τ/(ε·ΔV)] when it slews first. Adding slew and linear time would count twice (17 to 28 % high). Stages with more poles (filters, transimpedance, feedback capacitor) are walked piece by piece, exactly, with the amplifier at its slew limit while it is there'],
    ['distortion', 'below the slew limit the input pair is already curved: third harmonic NG(f/GBW)·2ρ³/(3r) with the noise gain at the third harmonic, ρ = (1-√(1-r²))/r, r = 2π·f·Vp/SR for a bipolar pair (tanh law); 8.5 dB less for a square-law MOS pair. Beyond the limit the waveform is solved piece by piece'],
  ),
  text('Rule of thumb, shown only: "5 to 10 times the slew rate" is this distortion in disguise. Sources: Franco ch. 6, ex. 6.7, 6.8; Solomon, IEEE J. Solid-State Circuits 9(6), 1974; Gray, Hurst, Lewis & Meyer, Analysis and Design of Analog Integrated Circuits, 5th ed. 2009, ch. 9 (from memory); own algebra, Fourier integrals.'),
  text('M3  Gain bandwidth'),
  pairs(
    ['amplifiers', 'A = GBW/jf; with x = f·NG/GBW the magnitude error is 1 - 1/√(1+x²), the vector error x/√(1+x²). The demand is the exact inverse, on the noise gain, never the signal gain: 7.02·NG·f for 1 % of magnitude, 100·NG·f for 1 % of vector'],
    ['filters', 'the exact cubic with the components as fitted is solved for the least GBW that keeps the chosen error: magnitude up to the top frequency, vector, or the shift of the -3 dB corner. The "100·G·f" rule is shown beside, as an explanation only'],
    ['transimpedance', 'vo/i = Rf/[1 + s(Rf·Cf + 1/ωt) + s²·Rf(Cin+Cf)/ωt], exact. With the feedback capacitor left out, each part is given its own maximally flat one, √[Cin/(π·Rf·GBW) - 1/(2π·Rf·GBW)²]; a fixed one is taken as fitted'],
    ['integrator', '1/|1 + 1/(2πRC·GBW) + jf/GBW|'],
  ),
  text('Sources: Franco ch. 6; Mancini ch. 16.8.4; Budak & Petrela, IEEE Trans. Circuit Theory 19(4), 1972; Karki, Analysis of the Sallen-Key Architecture, 1999; Graeme ch. 3 (from memory); cubics and exact forms own algebra, simulated.'),
];

const NOISE: readonly Block[] = [
  text('M4  Noise'),
  text('All terms, referred to the output and added as squares: voltage noise en²(1 + fce/f), current noise at both pins through what they see, every resistor by √(4kTR) at the hottest temperature, the divider of a bare reference with or without its bypass, shot noise √(2qI) of a photodiode, quantisation LSB/√12 of the converter. They are integrated numerically over the true response of the stage with the part in it and of the filter that follows, from 1/observation (0.1 Hz if not said). More gain bandwidth than needed is more noise. Peak to peak is 6.6 rms (exceeded 0.1 % of the time). SNR and ENOB = (SINAD - 1.7609)/6.0206 take the swing that is really there.'),
  text('Sources: Nyquist, Phys. Rev. 32, 1928; Franco ch. 7; Motchenbacher & Connelly, Low-Noise Electronic System Design, 1993 (from memory); IEEE Std 1241-2010; constants: SI Brochure, 9th ed.'),
];

const ERRORS: readonly Block[] = [
  text('M5  DC error'),
  text('At the output, noise gain times the sum of magnitudes of: offset, drift times the largest distance from 25 °C, bias current through the difference of the source resistances and their tolerance, offset current, movement of common mode, supply and output over CMRR, PSRR and open-loop gain. The sum decides; root-sum-square (JCGM 100:2008) stands beside. FET bias currents double per 10 K. Errors of reference and resistors are listed, not charged to the part. Source: Franco ch. 5 (from memory).'),
  text('M6  Output head-room and current'),
  text("Every head-room point is turned into a current by its own load, connection and supply; between points it is linear in current; below the lightest the lightest holds; beyond the heaviest a straight line up to 1.5 times its current is an estimate, further out is unknown. From another supply: (VS1-0.7)/(VS2-0.7), an estimate (own algebra). Each corner is judged with its own supply and current, feedback network included. A capacitive load's current is at 90° to the resistive one and adds as a phasor. A short-circuit current is never usable current. Clipping has no graceful zone: 0.1 % of distortion at 0.4 % of the peak. The dynamic range lost to head-room is told in dB against an output that reaches both rails."),
];

const STABILITY: readonly Block[] = [
  text('M7  Stability'),
  text("Loop gain A(jf)·β(jf) of the stage's own network, with the load pole 1/(2π(Ro||RL)CL), the isolation resistor's zero, the input capacitance at the inverting pin and the part's own excess phase (f2 = fu·tan PM of its stated unity-gain crossover and margin). The margin is read at the true crossover, where |Aβ| = 1, not at GBW/NG. Where Ro is not known, a stated capacitive-load limit serves. Remedies are computed and tried before they are offered: isolation resistor Riso ≥ Ro/(m-1) holds a margin for any capacitance, PM = 90° - asin[(m-1)/(m+1)]; feedback capacitor Cf = Cin·Rg/Rf. Sources: Franco ch. 8 (from memory); own algebra."),
  text('M8  Heat and battery'),
  text('P = highest supply · quiescent current of all sections + the worst the output can dissipate: a DC-coupled signal may rest at the worst point of its swing, an AC-coupled sine is averaged (largest at 2/π of the swing, not at full swing), plus f·CL·Vpp·VS. TJ = TA + θJA·P. Battery life = usable capacity over the average current. Sources: Gray et al.; Sedra & Smith, Microelectronic Circuits, class B (from memory); JEDEC JESD51 for θJA; own algebra.'),
  text('M9  Input stages'),
  text('Minimum stable gain is held against the noise gain at high frequency: 1 + Cin/Cf with a feedback capacitor, the resistive one without. Where two input pairs hand over, the offset steps; the step dV is bounded by the supply over CMRR. A sine Vp about Vdc that crosses it at Vx twice a period adds a rectangle of duty D = acos((Vx-Vdc)/Vp)/π: harmonics 2·dV·|sin(nπD)|/(nπ), distortion √{dV²·D(1-D) - (2·dV·sin(πD)/π)²/2}/(Vp/√2).'),
  pairs(
    ['phase reversal', 'possible where an input can leave its range: overdrive above 0 V, sequencing signal-first, or neither said. Not where the pins rest at the reference, where overdrive: 0 V and sequencing: supply-first are both written, or where the inputs work that far beyond the rails'],
    ['input clamp', 'diodes between the inputs begin to conduct at 0.5 V and conduct from 0.7 V on (common practice). Voltage between the inputs: ΔVo/NG at a step; up to the whole swing over NG while the part slews; the distance of the thresholds in an oscillator; with the input beyond a rail and the output at its end what the feedback no longer takes up'],
    ['overdrive', 'the part endures the larger of its rating beyond a rail and the rated input current times the resistance in series'],
    ['avoid', 'makes of a hazard a check: what is not stated is then unknown, and undecided. Without it hazards are cautions'],
  ),
  text('Supply ripple at the output (M5): amplitude over PSRR/√(1 + (f/fc)²), times the noise gain |1/(1/A + β)| at its frequency. A corner fc that is not stated is estimated at GBW/PSRR, and at best taken as none. Start-up adds the recovery from overload where the signal is there first. Sources: own algebra; Franco ch. 5 (from memory); common practice.'),
  text('M10  Order of what fits'),
  text('Desirability of Derringer & Suich (J. Quality Technology 12(4), 1980): all margins together, log price and log current, on fixed scales, so that adding or removing a part never reorders the rest and excess never wins.'),
];

const LIMITS: readonly Block[] = [
  text('Not modelled: layout and parasitics that are not written down, electromagnetic interference and rectification of radio signals, long-term drift and ageing, self-heating of the offset, resistors that change with temperature or voltage, complex (inductive) open-loop output impedance: there the stated capacitive-load limit of the part and a measurement decide. One dominant pole with stated excess phase stands for the amplifier; open-loop gain near the rails falls before the swing ends. Distortion by uneven output stages has no figure in a datasheet of limits and is not guessed.'),
  text("The chosen part's datasheet governs; prototypes are measured. Where failure can hurt someone, qualified review and the applicable codes decide."),
];

/** What is modelled, how, from which source, and what is not. */
export const PHYSICS_PAGE: readonly Block[] = [...RULES, ...RANGES, ...SPEED, ...NOISE, ...ERRORS, ...STABILITY, ...LIMITS];
