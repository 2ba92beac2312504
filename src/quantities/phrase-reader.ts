import { refuseApproximate, refuseHyphen, refuseOneSided, refuseRest, refuseSign } from './phrase-refusals.js';
import type { Body, Figure, Segment } from './syntax.js';
import type { LimitWord, Token } from './tokens.js';

/** Walks the tokens of one quantity, a segment at a time. Throws Refusal where the grammar ends. */
export class Reader {
  private index = 0;
  private readonly tokens: readonly Token[];
  private readonly text: string;

  constructor(tokens: readonly Token[], text: string) {
    this.tokens = tokens;
    this.text = text;
  }

  peek(ahead = 0): Token | null {
    return this.tokens[this.index + ahead] ?? null;
  }

  separator(): void {
    const token = this.peek();
    if (token?.type !== 'separator' && !(token?.type === 'slash' && this.index > 0)) return;
    this.index += 1;
    if (this.peek() === null) this.stop(token);
  }

  segment(): Segment {
    this.exact();
    const start = this.peek()?.start ?? 0;
    const before = this.limit();
    this.exact();
    const body = this.body();
    const after = before === null ? this.limit() : null;
    const end = this.tokens[this.index - 1]?.end ?? start;
    return { limit: before ?? after, body, start, end };
  }

  private limit(): LimitWord | null {
    const token = this.peek();
    if (token?.type !== 'limit') return null;
    this.index += 1;
    return token.limit ?? null;
  }

  private exact(): void {
    const token = this.peek();
    if (token?.type === 'approximate') refuseApproximate(token, this.text);
  }

  private body(): Body {
    if (this.take('plus-minus')) return { shape: 'magnitude', figures: [this.figure()] };
    const first = this.figure();
    const next = this.peek();
    if (next?.type === 'plus-minus') return this.symmetric(first);
    if (next?.type === 'range') return this.range(first);
    if (next?.type === 'slash') return this.list(first);
    if (next?.type === 'sign') return this.signAfter(first, next);
    return this.barePercent(first) ?? { shape: 'value', figures: [first] };
  }

  private symmetric(value: Figure): Body {
    this.index += 1;
    const tolerance = this.figure();
    if (tolerance.sign !== '') refuseSign(tolerance);
    return { shape: 'tolerance', figures: [value], tolerance: [tolerance] };
  }

  private range(low: Figure): Body {
    this.index += 1;
    return { shape: 'range', figures: [low, this.figure()] };
  }

  private list(first: Figure): Body {
    const figures = [first];
    while (this.peek()?.type === 'slash' && this.startsFigure(1)) {
      this.index += 1;
      figures.push(this.figure());
    }
    return figures.length === 1 ? { shape: 'value', figures: [first] } : { shape: 'list', figures };
  }

  /** A sign after a figure: `+5/-10 %`, or a hyphen between two unsigned numbers (rule Q-11). */
  private signAfter(value: Figure, sign: Token): Body {
    const offset = this.figure();
    const slashed = this.peek()?.type === 'slash' && this.peek(1)?.type === 'sign';
    if (slashed || this.peek()?.type === 'sign') {
      if (slashed) this.index += 1;
      return this.asymmetric(value, [offset, this.figure()]);
    }
    if (sign.text === '+' || (offset.unit?.text === '%' && value.unit?.text !== '%')) refuseOneSided(value, offset, this.text);
    if (value.sign !== '') refuseHyphen(value, offset);
    const high: Figure = { ...offset, sign: '', start: offset.number.start };
    return { shape: 'range', figures: [value, high] };
  }

  private asymmetric(value: Figure, offsets: readonly [Figure, Figure]): Body {
    const [one, other] = offsets;
    if (one.sign === other.sign) refuseSign(other);
    const tolerance = one.sign === '+' ? [one, other] : [other, one];
    return { shape: 'tolerance', figures: [value], tolerance };
  }

  /** A percentage after a value with a unit is ±. */
  private barePercent(value: Figure): Body | null {
    const [number, unit] = [this.peek(), this.peek(1)];
    if (number?.type !== 'number' || unit?.type !== 'unit' || !/^(?:%|‰|ppm)$/.test(unit.text)) return null;
    return { shape: 'tolerance', figures: [value], tolerance: [this.figure()] };
  }

  private startsFigure(ahead: number): boolean {
    const token = this.peek(ahead);
    const next = token?.type === 'sign' ? this.peek(ahead + 1) : token;
    return next?.type === 'number' || next?.type === 'code';
  }

  private figure(): Figure {
    const first = this.peek();
    // A currency may stand before its number.
    const before = first?.type === 'unit' && this.startsFigure(1) ? this.take('unit') : null;
    if (this.peek()?.type === 'times') this.index += 1;
    const sign = this.take('sign');
    if (this.peek()?.type === 'times') this.index += 1;
    const number = this.take('number') ?? this.take('code') ?? this.stop(first);
    const unit = before ?? this.take('unit');
    const start = Math.min((sign ?? number).start, first?.start ?? number.start);
    const end = Math.max(number.end, unit?.end ?? 0);
    return { sign: sign === null ? '' : sign.text === '-' ? '-' : '+', number, unit, start, end };
  }

  private take(type: Token['type']): Token | null {
    const token = this.peek();
    if (token?.type !== type) return null;
    this.index += 1;
    return token;
  }

  private stop(from: Token | null): never {
    return refuseRest(from?.start ?? this.peek()?.start ?? this.text.length, this.text);
  }
}
