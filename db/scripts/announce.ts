import { DEMO_ACCOUNTS } from '../demo/people';
import { demoReadToken } from '../demo/laboratory';
import { appUrl, laboratory } from '../entry/settings';
import { newSetUpCode } from '../entry/set-up';

/** Print who may sign in, or how to set the laboratory up. */
export async function announce(): Promise<void> {
  const lab = await laboratory();
  if (!lab) {
    console.info(
      `No laboratory yet. Open ${appUrl()}/set-up and enter this code, good once: ${await newSetUpCode()}`,
    );
    return;
  }
  console.info(lab.name + (lab.demo ? ' (demonstration: everything in it is invented)' : ''));
  if (!lab.demo) return;
  const width = Math.max(...DEMO_ACCOUNTS.map(({ email }) => email.length));
  console.info('Demo accounts; their passwords are public:');
  for (const { email, password, does } of DEMO_ACCOUNTS)
    console.info(`  ${email.padEnd(width)}  ${password.padEnd(24)}  ${does}`);
  const token = demoReadToken();
  if (token) console.info(`Read token for ${appUrl()}/api/v1: ${token}`);
}
