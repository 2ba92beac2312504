/** A small nodal analysis in complex numbers: the second route for everything that formulas state in closed form. */
export type Complex = readonly [re: number, im: number];

export type Element =
  | { readonly r: number; readonly between: readonly [string, string] }
  | { readonly c: number; readonly between: readonly [string, string] }
  | { readonly volts: number; readonly at: string }
  /** Current driven from the first node into the second, outside the circuit. */
  | { readonly amps: number; readonly between: readonly [string, string] }
  /** 1/A = 1/openLoopGain + j·f/gainBandwidth; ideal when both are absent. */
  | {
      readonly plus: string;
      readonly minus: string;
      readonly output: string;
      readonly gainBandwidth?: number;
      readonly openLoopGain?: number;
      readonly outputResistance?: number;
    };

export const GROUND = '0';

/** Node voltages at one frequency (Hz). */
export function solve(elements: readonly Element[], frequency: number): (node: string) => Complex {
  const nodes = nodesOf(elements);
  const branches: readonly Element[] = elements.filter((element) => 'at' in element || 'output' in element);
  const size = nodes.length + branches.length;
  const rows: Complex[][] = Array.from({ length: size }, () => Array.from({ length: size + 1 }, (): Complex => [0, 0]));
  const add = (row: number, column: number, value: Complex): void => {
    if (row < 0 || column < 0) return;
    const line = rows[row]!;
    line[column] = plus(line[column]!, value);
  };
  const at = (node: string): number => nodes.indexOf(node);
  for (const element of elements) {
    const branch = nodes.length + branches.indexOf(element);
    if ('r' in element) admittance(add, element.between.map(at), [1 / element.r, 0]);
    else if ('c' in element) admittance(add, element.between.map(at), [0, 2 * Math.PI * frequency * element.c]);
    else if ('amps' in element) {
      add(at(element.between[0]), size, [-element.amps, 0]);
      add(at(element.between[1]), size, [element.amps, 0]);
    } else if ('at' in element) {
      add(branch, at(element.at), [1, 0]);
      add(branch, size, [element.volts, 0]);
      add(at(element.at), branch, [1, 0]);
    } else {
      const { gainBandwidth = Infinity, openLoopGain = Infinity, outputResistance = 0 } = element;
      const inverse: Complex = [1 / openLoopGain, frequency / gainBandwidth];
      add(branch, at(element.output), inverse);
      add(branch, branch, [inverse[0] * -outputResistance, inverse[1] * -outputResistance]);
      add(branch, at(element.plus), [-1, 0]);
      add(branch, at(element.minus), [1, 0]);
      add(at(element.output), branch, [1, 0]);
    }
  }
  const solution = eliminate(rows);
  return (node) => (node === GROUND ? [0, 0] : solution[at(node)]!);
}

export function magnitude([re, im]: Complex): number {
  return Math.hypot(re, im);
}

/** Lowest frequency (Hz) where a falling curve passes a level, by a scan in small steps from `from` and bisection. */
export function fallsThrough(curve: (frequency: number) => number, level: number, from: number): number {
  let high = from;
  while (curve(high) > level) high *= 1.02;
  let low = high / 1.02;
  for (let halving = 0; halving < 100; halving += 1) {
    const middle = (low + high) / 2;
    if (curve(middle) > level) low = middle;
    else high = middle;
  }
  return high;
}

/** Highest value of a curve with one hump between two frequencies. */
export function highest(curve: (frequency: number) => number, from: number, to: number): number {
  return curve(summit(curve, [from, to]));
}

/** Where that highest value stands, by golden section on the logarithm. */
export function summit(curve: (frequency: number) => number, [from, to]: readonly [number, number], steps = 100): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [Math.log(from), Math.log(to)];
  for (let step = 0; step < steps; step += 1) {
    const left = high - golden * (high - low);
    const right = low + golden * (high - low);
    if (curve(Math.exp(left)) > curve(Math.exp(right))) high = right;
    else low = left;
  }
  return Math.exp((low + high) / 2);
}

function nodesOf(elements: readonly Element[]): readonly string[] {
  const all = elements.flatMap((element) => {
    if ('between' in element) return [...element.between];
    return 'at' in element ? [element.at] : [element.plus, element.minus, element.output];
  });
  return [...new Set(all)].filter((node) => node !== GROUND);
}

function admittance(add: (row: number, column: number, value: Complex) => void, nodes: readonly number[], [re, im]: Complex): void {
  const [a, b] = nodes as [number, number];
  add(a, a, [re, im]);
  add(b, b, [re, im]);
  add(a, b, [-re, -im]);
  add(b, a, [-re, -im]);
}

function eliminate(rows: Complex[][]): readonly Complex[] {
  const size = rows.length;
  for (let pivot = 0; pivot < size; pivot += 1) {
    const best = rows.slice(pivot).reduce((index, row, offset) => {
      return magnitude(row[pivot]!) > magnitude(rows[index]![pivot]!) ? pivot + offset : index;
    }, pivot);
    [rows[pivot], rows[best]] = [rows[best]!, rows[pivot]!];
    for (let other = 0; other < size; other += 1) {
      if (other === pivot) continue;
      const factor = over(rows[other]![pivot]!, rows[pivot]![pivot]!);
      rows[other] = rows[other]!.map((value, column) => plus(value, times([-factor[0], -factor[1]], rows[pivot]![column]!)));
    }
  }
  return rows.map((row, index) => over(row[size]!, row[index]!));
}

function plus([a, b]: Complex, [c, d]: Complex): Complex {
  return [a + c, b + d];
}

function times([a, b]: Complex, [c, d]: Complex): Complex {
  return [a * c - b * d, a * d + b * c];
}

function over([a, b]: Complex, [c, d]: Complex): Complex {
  const square = c * c + d * d;
  return [(a * c + b * d) / square, (b * c - a * d) / square];
}
