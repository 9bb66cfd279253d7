/** A calculation that is made when it is first asked for, and not again: the checks of a source share one curve. */
export function once<T>(make: () => T): () => T {
  let made: { readonly value: T } | undefined;
  return () => (made ??= { value: make() }).value;
}
