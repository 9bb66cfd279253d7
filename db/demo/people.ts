import type { Role } from '@/lib/policies/actor';

export interface DemoAccount {
  readonly key: string;
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly role: Role;
  /** What this person does in the laboratory, in a few words. */
  readonly does: string;
}

/** The people of the invented Larkmoor Reach Laboratory. Their passwords are public. */
export const DEMO_ACCOUNTS: readonly DemoAccount[] = [
  {
    key: 'pi',
    name: 'Maren Oldacre',
    email: 'maren.oldacre@larkmoor.example',
    password: 'larkmoor-maren-pi',
    role: 'pi',
    does: 'technical manager, owns the notebooks',
  },
  {
    key: 'analyst',
    name: 'Tobin Farrow',
    email: 'tobin.farrow@larkmoor.example',
    password: 'larkmoor-tobin-analyst',
    role: 'analyst',
    does: 'analyst, measures and enters',
  },
  {
    key: 'viewer',
    name: 'Isolde Quillan',
    email: 'isolde.quillan@larkmoor.example',
    password: 'larkmoor-isolde-viewer',
    role: 'viewer',
    does: 'second person, reads and checks',
  },
  {
    key: 'student',
    name: 'Juno Ashmere',
    email: 'juno.ashmere@larkmoor.example',
    password: 'larkmoor-juno-student',
    role: 'analyst',
    does: 'student on placement',
  },
  {
    key: 'administrator',
    name: 'Wenna Straik',
    email: 'wenna.straik@larkmoor.example',
    password: 'larkmoor-wenna-admin',
    role: 'administrator',
    does: 'administrator, people and settings',
  },
];
