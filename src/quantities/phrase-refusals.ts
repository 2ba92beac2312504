import { Refusal } from './refusal.js';
import type { Figure } from './syntax.js';
import type { Token } from './tokens.js';

/** Refuses what is left of the text from an index on; when nothing is left, the text ends too early. */
export function refuseRest(start: number, text: string): never {
  const rest = text.slice(start).trimEnd();
  const end = text.trimEnd().length;
  if (rest === '') throw new Refusal('Q013', `${text.trim()} ends where a number is expected`, { start: Math.max(0, end - 1), end });
  throw new Refusal('Q013', `${rest} is not a number with a unit`, { start, end });
}

/** `+5/+10 %`, `±-5 %`. */
export function refuseSign(figure: Figure): never {
  const message = `a tolerance has one side up and one side down; ${figure.sign}${figure.number.text} has a sign too many`;
  throw new Refusal('Q019', message, figure);
}

/** `5 V -10 %` may mean +0/-10 % or ±10 %. */
export function refuseOneSided(value: Figure, offset: Figure, text: string): never {
  const typed = text.slice(offset.start, offset.end);
  const unit = offset.unit?.text ?? '';
  const amount = offset.number.text;
  const sides = offset.sign === '+' ? `+${amount}/-0` : `+0/-${amount}`;
  throw new Refusal('Q006', `${typed} is one side of a tolerance; the other side is not given`, {
    start: offset.start,
    end: offset.end,
    fix: `${text.slice(value.start, value.end)} ${sides} ${unit}`.trim(),
  });
}

/** `-40-85 °C`. */
export function refuseHyphen(low: Figure, high: Figure): never {
  const unit = high.unit === null ? '' : ` ${high.unit.text}`;
  const ends = `${low.sign}${low.number.text}..${high.number.text}${unit}`;
  throw new Refusal('Q007', 'a hyphen after a signed number: range or subtraction?', { start: low.start, end: high.end, fix: ends });
}

/** `~5 V`, from the sign on. */
export function refuseApproximate(sign: Token, text: string): never {
  const value = text.slice(sign.end).trim();
  const fix = value === '' ? undefined : `give a value with a tolerance, or mark it typ ${value}`;
  const message = `${text.trim()} is an approximate value: nothing says how far off it may be`;
  throw new Refusal('Q013', message, { start: sign.start, end: sign.end, fix });
}
