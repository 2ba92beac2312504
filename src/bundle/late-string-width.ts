import type stringWidth from 'string-width';

/**
 * Stands for string-width in the bundle, and loads it when a text is first measured that is not plain. It makes its tables of emoji and of
 * where letters end as it is loaded, which takes 30 ms, and hardly any answer needs them.
 */
export default function lateStringWidth(text: string): number {
  // The bundler takes this for a module of the bundle, and runs it here and not before.
  // eslint-disable-next-line @typescript-eslint/no-require-imports
  return (require('string-width') as { readonly default: typeof stringWidth }).default(text);
}
