'use client';

import { useActionState } from 'react';
import { Card } from '@/components/ui/card';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { signIn } from './actions';

interface PublicAccount {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly does: string;
}

/** The accounts of the demonstration, each one press away from being signed in. */
export function DemoAccounts({ accounts }: { accounts: readonly PublicAccount[] }) {
  return (
    <Card title="Demonstration accounts" flush>
      <p className="border-b px-4 py-2 text-sm text-ink-2">
        These passwords are public, so anybody who reaches this page can use them.
      </p>
      <ul>
        {accounts.map((account) => (
          <li key={account.email} className="border-b px-4 py-2.5 last:border-b-0">
            <AccountForm {...account} />
          </li>
        ))}
      </ul>
    </Card>
  );
}

function AccountForm({ name, email, password, does }: PublicAccount) {
  const [state, submit] = useActionState(signIn, { status: 'idle' });
  return (
    <form action={submit} className="grid gap-2">
      <FormAlert state={state} />
      <input type="hidden" name="email" value={email} />
      <input type="hidden" name="password" value={password} />
      <div className="flex flex-wrap items-center justify-between gap-x-3 gap-y-1.5">
        <p className="min-w-0 flex-1 basis-52">
          <span className="font-medium">{name}</span> <span className="text-ink-2">{does}</span>
          <span className="num block text-xs break-all text-ink-2">{email}</span>
          <span className="num block text-xs break-all text-ink-2">{password}</span>
        </p>
        <SubmitButton
          variant="secondary"
          size="small"
          pendingLabel="Signing in…"
          aria-label={`Sign in as ${name}`}
        >
          Sign in
        </SubmitButton>
      </div>
    </form>
  );
}
