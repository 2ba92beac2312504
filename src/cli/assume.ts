import { figureSlot, limitKindOf, PARAMETERS, type Figure, type Parameter, type Part, type PartSource } from '../index.js';
import { parseQuantity } from '../quantities/parse.js';
import type { Problem } from '../quantities/problem.js';
import { suggest } from '../quantities/suggest.js';
import { commandProblem } from './request-error.js';
import { findPart } from './find-part.js';

/** `--assume PART.figure=VALUE` applied to the parts: the figure counts as assumed, in this run only. */
export function assumeFigures(source: PartSource, wishes: readonly string[]): { source: PartSource; problems: Problem[] } {
  const problems: Problem[] = [];
  let parts = source.parts;
  const assumed = new Set<string>();
  for (const wish of wishes) {
    const read = readWish(wish, source);
    if ('problem' in read) {
      problems.push(read.problem);
      continue;
    }
    assumed.add(`${read.part.id} ${figureSlot(read.figure)}`);
    parts = parts.map((part) => (part.id === read.part.id ? withFigure(part, read.figure) : part));
  }
  const origin: PartSource['origin'] = (id, slot) => (assumed.has(`${id} ${slot}`) ? FOR_THIS_RUN : source.origin(id, slot));
  return { source: { ...source, parts, origin }, problems };
}

const FOR_THIS_RUN = { kind: 'assumption', text: 'for this run' } as const;

type Wish = { readonly part: Part; readonly figure: Figure } | { readonly problem: Problem };

function readWish(wish: string, source: PartSource): Wish {
  const equals = wish.indexOf('=');
  const dot = wish.lastIndexOf('.', equals < 0 ? undefined : equals);
  if (equals < 0 || dot <= 0) return refuse(wish, 'not PART.figure=VALUE', '--assume PART.offsetDrift=10µV/K');
  const found = findPart(source.parts, wish.slice(0, dot));
  if (!found.ok) return { problem: { ...found.problem, place: { path: `--assume ${wish}` } } };
  const name = wish.slice(dot + 1, equals);
  if (!(name in PARAMETERS)) return refuse(wish, `no figure called ${name}`, suggest(name, Object.keys(PARAMETERS)).join(', ') || 'railfit help figures');
  return valueOf({ wish, part: found.part, parameter: name as Parameter, text: wish.slice(equals + 1) }, source);
}

interface Asked {
  readonly wish: string;
  readonly part: Part;
  readonly parameter: Parameter;
  readonly text: string;
}

function valueOf(asked: Asked, source: PartSource): Wish {
  const { part, parameter, text } = asked;
  const kind = limitKindOf(parameter);
  if (text === 'class') {
    const value = classValue(asked, source);
    if (value === null) return refuse(asked.wish, `no class of ${part.id} has ${parameter}`, 'write a value instead of class');
    return { part, figure: { parameter, kind, value, condition: {}, assumed: true } };
  }
  const read = parseQuantity(text, PARAMETERS[parameter].field);
  if (!read.ok) {
    const { code, message, fix } = read.problem;
    return { problem: { ...commandProblem(code, message, { path: `--assume ${asked.wish}`, ...(fix === undefined ? {} : { fix }) }), text, span: read.problem.span } };
  }
  const value = read.quantity.nominal ?? read.quantity.max ?? read.quantity.min;
  if (value === undefined) return refuse(asked.wish, 'no value', '--assume PART.offsetDrift=10µV/K');
  return { part, figure: { parameter, kind, value, condition: {}, assumed: true } };
}

/** The worst value printed for the figure in the generic sets of the part's class. */
function classValue({ part, parameter }: Asked, source: PartSource): number | null {
  const sets = source.parts.filter((other) => other.tier === 'generic' && other.class !== null && other.class === part.class);
  const values = sets.flatMap((set) => set.figures.filter((figure) => figure.parameter === parameter).map((figure) => figure.value));
  if (values.length === 0) return null;
  return limitKindOf(parameter) === 'max' ? Math.max(...values) : Math.min(...values);
}

/** An assumed figure takes the place of what the list has for that parameter and limit kind. */
function withFigure(part: Part, figure: Figure): Part {
  return { ...part, figures: [...part.figures.filter((one) => one.parameter !== figure.parameter), figure] };
}

function refuse(wish: string, message: string, fix: string): Wish {
  return { problem: commandProblem('C107', `--assume ${wish}: ${message}`, { fix, path: '--assume' }) };
}
