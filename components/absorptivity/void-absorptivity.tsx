import { ReasonDialog } from '@/components/batch/reason-dialog';
import { Button } from '@/components/ui/button';
import type { FormState } from '@/lib/form-state';

/** Declare a version void, with a reason. It stays to be seen. */
export function VoidAbsorptivity({
  id,
  version,
  action,
}: {
  id: string;
  version: number;
  action: (state: FormState, form: FormData) => Promise<FormState>;
}) {
  return (
    <ReasonDialog
      title={`Declare version ${version} void`}
      description="Nothing is deleted. It stays here with your reason, and no new batch can be read on it."
      trigger={<Button variant="danger">Void</Button>}
      action={action}
      hidden={{ absorptivityId: id }}
      submitLabel="Declare it void"
      danger
    />
  );
}
