/** A concentration unit with what it counts: "mg/L as Fe"; the unit alone when no basis was given. */
export function unitWithBasis(unit: string, basis: string): string {
  const named = basis.trim().replace(/^as\s+/i, '');
  return named === '' ? unit : `${unit} as ${named}`;
}
