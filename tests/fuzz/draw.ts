/** A generator of numbers below a bound, the same for the same seed (Park and Miller, Random number generators: good ones are hard to find, Communications of the ACM 31, 1988; multiplier 48271). */
export function drawing(seed: number): (below: number) => number {
  const MODULUS = 2_147_483_647;
  let state = (Math.abs(Math.trunc(seed)) % (MODULUS - 1)) + 1;
  return (below) => {
    state = (state * 48_271) % MODULUS;
    return Math.floor((state / MODULUS) * below);
  };
}
