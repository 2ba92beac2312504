/** The part of the library that is used; it ships without types. */
declare module 'fft.js' {
  export default class FFT {
    constructor(size: number);
    createComplexArray(): number[];
    /** First half of the spectrum of real samples: re, im, re, im … */
    realTransform(out: number[], data: readonly number[]): void;
  }
}
