import type { z } from 'zod';

type Issue = z.core.$ZodIssue;

export interface FoundIssue {
  readonly path: readonly PropertyKey[];
  readonly message: string;
}

/**
 * What is wrong with a value, member by member. Where a value may have one of several shapes, zod says only that it
 * has none; here the shape it comes nearest to, with the fewest issues, says what is wrong with it.
 */
export function issuesOf(error: z.ZodError): readonly FoundIssue[] {
  return error.issues.flatMap((issue) => within(issue, []));
}

function within(issue: Issue, above: readonly PropertyKey[]): readonly FoundIssue[] {
  const path = [...above, ...issue.path];
  const nearest = issue.code === 'invalid_union' ? nearestOf(issue.errors) : null;
  return nearest ? nearest.flatMap((inner) => within(inner, path)) : [{ path, message: issue.message }];
}

/** The issues of the one shape with the fewest; null when two come equally near. */
function nearestOf(shapes: readonly (readonly Issue[])[]): readonly Issue[] | null {
  const [first, second] = [...shapes].sort((a, b) => a.length - b.length);
  return first && second && first.length < second.length ? first : null;
}
