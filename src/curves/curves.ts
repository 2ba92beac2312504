/** What a picture of a stage with one part shows: numbers over supply and frequency, no words. SI units. */
export interface Curves {
  /** One window a supply end, lowest first. */
  readonly swing: readonly SwingWindow[];
  /** Null for the oscillator, which closes no loop, and where no gain bandwidth is known. */
  readonly loop: LoopCurves | null;
}

export interface Span {
  readonly min: number;
  readonly max: number;
}

/** Distances the part must keep from V- and V+, V; null: not known there. */
export interface Rails {
  readonly low: number | null;
  readonly high: number | null;
}

/** Room and need at one supply voltage, V against ground. */
export interface SwingWindow {
  readonly supply: number;
  readonly output: {
    readonly signal: Span;
    /** What offset and drift may move the output by, as the checks of the output charge it; null: not known. */
    readonly error: number | null;
    /** Head-room at the load and corner that leave the least: as it must be counted on, and as printed. */
    readonly worst: Rails;
    readonly best: Rails;
  };
  readonly input: {
    readonly signal: Span;
    readonly worst: Rails;
    /** Where one input pair hands over to the other, V against ground; null: none known. */
    readonly crossover: Span | null;
  };
}

/** One open-loop gain with what it makes of the loop. */
export interface OpenLoop {
  /** Hz. */
  readonly gainBandwidth: number;
  /** `limit`: as it must be counted on; `typical`: as printed. */
  readonly kind: 'limit' | 'typical';
  /** What the gain bandwidth was made of: `typical × 0.6`; null: as printed. */
  readonly how: string | null;
  /** V/V at DC; null: not known, then the gain rises without end. */
  readonly direct: number | null;
  /** |A| at every frequency, V/V. */
  readonly gain: readonly number[];
  readonly crossing: Crossing | null;
}

/** Where the open-loop gain meets the noise gain. */
export interface Crossing {
  readonly frequency: number;
  /** V/V. */
  readonly gain: number;
  /** How steeply the two close on each other there, dB per decade. */
  readonly rateOfClosure: number;
  /** Degrees. */
  readonly phaseMargin: number;
}

/** Gain over frequency. All magnitudes in V/V. */
export interface LoopCurves {
  /** Hz, rising, evenly spaced on a logarithmic axis. */
  readonly frequencies: readonly number[];
  /** The limit first; the typical one where it is printed. */
  readonly openLoop: readonly OpenLoop[];
  /** |1/β| with the feedback capacitor, the part's input and the load. */
  readonly noiseGain: readonly number[];
  /** Signal to output with the limit: of a current input over its resistor. */
  readonly closedLoop: readonly number[];
  /** Top of the signal band, Hz; null when not given. */
  readonly band: number | null;
  /** Loop gain |A·β| at the top of the band with the limit, V/V; null without a band. */
  readonly loopGain: number | null;
  /** Whether the second pole of the part and its load behind its output resistance are in the curves. */
  readonly counts: { readonly ownPole: boolean; readonly load: boolean };
}
