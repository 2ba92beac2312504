import { scalarText } from './scalar-text.js';

/** Fields under a map, by dotted path, as the map in one line; undefined when there is none. */
export function inOneLine(map: string, texts: ReadonlyMap<string, string>): string | undefined {
  const inside = [...texts].filter(([path]) => path.startsWith(`${map}.`));
  if (inside.length === 0) return undefined;
  const keys = [...new Set(inside.map(([path]) => path.slice(map.length + 1).split('.')[0] ?? ''))];
  return `{${keys.map((key) => `${key}: ${valueOf(`${map}.${key}`, texts)}`).join(', ')}}`;
}

function valueOf(path: string, texts: ReadonlyMap<string, string>): string {
  const text = texts.get(path);
  if (text === undefined) return inOneLine(path, texts) ?? '{}';
  const scalar = scalarText(text);
  return scalar === text.trim() && !/^[[{"']/.test(scalar) && /[,[\]{}]/.test(scalar) ? JSON.stringify(scalar) : scalar;
}
