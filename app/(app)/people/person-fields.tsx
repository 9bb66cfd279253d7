import { Field } from '@/components/ui/field';
import { RadioGroup } from '@/components/ui/radio-group';
import type { FailedForm } from '@/lib/form-state';
import { LIMITS } from '@/lib/limits';
import { ROLES } from '@/lib/policies/actor';
import { ROLE_WORDS } from '@/lib/policies/role-words';
import { ROLE_MAY, type PersonView } from '@/lib/views/person';

const CHOICES = ROLES.map((role) => ({ value: role, label: ROLE_WORDS[role], hint: ROLE_MAY[role] }));

/** Name, address and role, for a new person or one that is there. */
export function PersonFields({ person, failed }: { person?: PersonView; failed?: FailedForm }) {
  return (
    <>
      <Field
        name="name"
        label="Name"
        hint="As it stands in the record beside everything they do"
        initial={person?.name}
        maxLength={LIMITS.name}
        failed={failed}
      />
      <Field
        name="email"
        label="E-mail address"
        type="email"
        hint="They sign in with it"
        initial={person?.email}
        failed={failed}
      />
      <RadioGroup name="role" label="Role" choices={CHOICES} initial={person?.role} failed={failed} />
    </>
  );
}
