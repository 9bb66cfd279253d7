import { seedIronNotebook } from './iron';
import { inTransaction } from '../sequelize';
import { createDemoLaboratory } from './laboratory';

/**
 * Fill an empty database with the invented laboratory, through the readers, schemas, queries and engine that
 * a person's work goes through.
 */
export function seedDemo(): Promise<void> {
  // all of it or none: a start that was killed half-way finds an empty database again
  return inTransaction(async () => {
    const people = await createDemoLaboratory();
    await seedIronNotebook(people.get('analyst') ?? '', people.get('pi') ?? '');
  });
}
