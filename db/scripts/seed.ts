import { laboratory } from '../entry/settings';
import { migrate } from '../migrate';
import { closeDb } from '../sequelize';
import { seedDemo } from '../demo/seed';

/** Load the demonstration laboratory into an empty database; a database in use is left as it is. */
await migrate();
const existing = await laboratory();
if (existing) console.info(`This database already holds ${existing.name}; nothing was changed.`);
else await seedDemo();
await closeDb();
