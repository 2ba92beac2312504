/** What is made when it is first asked for, and then kept. */
export function once<Made>(make: () => Made): () => Made {
  let made: { readonly value: Made } | null = null;
  return () => (made ??= { value: make() }).value;
}
