import { expect } from 'vitest';
import type { WorkingStep } from '@/lib/engine';

/** Every line stands once, after all that it was made from. */
export function expectOrdered(steps: readonly WorkingStep[]): void {
  const seen = new Set<string>();
  for (const step of steps) {
    expect(seen.has(step.id), `${step.id} stands twice`).toBe(false);
    expect(step.inputs.filter((id) => !seen.has(id))).toEqual([]);
    seen.add(step.id);
  }
}
