import { assumedFigure, figureSlot, hasTwoEnds, limitKindOf, PARAMETERS, withAssumed, type Figure, type LimitKind, type Parameter, type Part, type PartSource } from '../index.js';
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
    parts = parts.map((part) => (part.id === read.part.id ? withAssumed(part, read.figure) : part));
  }
  const origin: PartSource['origin'] = (id, slot) => (assumed.has(`${id} ${slot}`) ? FOR_THIS_RUN : source.origin(id, slot));
  return { source: { ...source, parts, origin }, problems };
}

const FOR_THIS_RUN = { kind: 'assumption', text: 'for this run' } as const;

type Wish = { readonly part: Part; readonly figure: Figure } | { readonly problem: Problem };

function readWish(wish: string, source: PartSource): Wish {
  const equals = wish.indexOf('=');
  const end = /\.(min|max)$/u.exec(wish.slice(0, Math.max(0, equals)))?.[1] as LimitKind | undefined;
  const dot = wish.lastIndexOf('.', equals < 0 ? undefined : equals - (end === undefined ? 0 : end.length + 2));
  if (equals < 0 || dot <= 0) return refuse(wish, 'not PART.figure=VALUE', '--assume PART.offsetDrift=10µV/K');
  const found = findPart(source, wish.slice(0, dot));
  if (!found.ok) return { problem: { ...found.problem, place: { path: `--assume ${wish}` } } };
  const name = wish.slice(dot + 1, equals - (end === undefined ? 0 : end.length + 1));
  if (!(name in PARAMETERS)) return refuse(wish, `no figure called ${name}`, suggest(name, Object.keys(PARAMETERS)).join(', ') || 'railfit help figures');
  const parameter = name as Parameter;
  if (end !== undefined && !hasTwoEnds(parameter)) return refuse(wish, `${name} has one limit, its ${limitKindOf(parameter)}`, `--assume ${wish.replace(`.${end}=`, '=')}`);
  return valueOf({ wish, part: found.part, parameter, kind: end ?? limitKindOf(parameter), text: wish.slice(equals + 1) }, source);
}

interface Asked {
  readonly wish: string;
  readonly part: Part;
  readonly parameter: Parameter;
  readonly kind: LimitKind;
  readonly text: string;
}

function valueOf(asked: Asked, source: PartSource): Wish {
  const { part, parameter, kind, text } = asked;
  if (text === 'class') {
    const value = classValue(asked, source);
    if (value === null) return refuse(asked.wish, `no class of ${part.id} has ${parameter}`, 'write a value instead of class');
    return { part, figure: assumedFigure(parameter, value, kind) };
  }
  const read = parseQuantity(text, PARAMETERS[parameter].field);
  if (!read.ok) {
    const { code, message, fix } = read.problem;
    return { problem: { ...commandProblem(code, message, { path: `--assume ${asked.wish}`, ...(fix === undefined ? {} : { fix }) }), text, span: read.problem.span } };
  }
  const value = read.quantity.nominal ?? read.quantity.max ?? read.quantity.min;
  if (value === undefined) return refuse(asked.wish, 'no value', '--assume PART.offsetDrift=10µV/K');
  return { part, figure: assumedFigure(parameter, value, kind) };
}

/** The worst value printed for the figure in the generic sets of the part's class. */
function classValue({ part, parameter, kind }: Asked, source: PartSource): number | null {
  const sets = source.parts.filter((other) => other.tier === 'generic' && other.class !== null && other.class === part.class);
  const isRange = hasTwoEnds(parameter);
  const values = sets.flatMap((set) => set.figures.filter((figure) => figure.parameter === parameter && (!isRange || figure.kind === kind)).map((figure) => figure.value));
  if (values.length === 0) return null;
  // Of a range the narrower end is the worse one.
  return (kind === 'max') === isRange ? Math.min(...values) : Math.max(...values);
}

function refuse(wish: string, message: string, fix: string): Wish {
  return { problem: commandProblem('C107', `--assume ${wish}: ${message}`, { fix, path: '--assume' }) };
}
