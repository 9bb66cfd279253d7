import { createDemoLaboratory } from './laboratory';

/** Fill an empty database with the invented laboratory, through the queries that a person's work goes through. */
export async function seedDemo(): Promise<void> {
  await createDemoLaboratory();
}
