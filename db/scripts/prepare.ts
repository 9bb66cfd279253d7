import { laboratory } from '../entry/settings';
import { environment } from '../environment';
import { migrate } from '../migrate';
import { closeDb } from '../sequelize';
import { keepDemoSecret } from '../session-secret';
import { seedDemo } from '../demo/seed';
import { refusal } from '../start-checks';
import { announce } from './announce';

/** What `npm start` does before the server: migrate, load the demo into an empty database, say who may sign in. */
async function prepare(): Promise<number> {
  const settings = environment();
  const done = await migrate();
  if (done.length > 0) console.info(`Database brought up to date (${done.length} migrations).`);
  const existing = await laboratory();
  const no = refusal(settings, existing);
  if (no) {
    console.error(no);
    return 1;
  }
  if (!existing && settings.DEMO !== '0') {
    console.info('Loading the demonstration laboratory ...');
    await seedDemo();
  }
  if ((await laboratory())?.demo) keepDemoSecret();
  await announce();
  return 0;
}

try {
  process.exitCode = await prepare();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
} finally {
  await closeDb();
}
