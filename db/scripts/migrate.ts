import { migrate } from '../migrate';
import { closeDb } from '../sequelize';

const done = await migrate();
console.info(done.length > 0 ? `Ran ${done.join(', ')}.` : 'The database is up to date.');
await closeDb();
