'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import type { WorkingStep } from '@/lib/engine';
import { WorkingList } from './working-list';

/** A button that opens the working of a calculation. */
export function WorkingDialog({
  title,
  steps,
  prefix,
  behind,
  label = 'Show the working',
}: {
  title: string;
  steps: readonly WorkingStep[];
  prefix: string;
  behind?: readonly WorkingStep[];
  label?: string;
}) {
  return (
    <Dialog wide title={title} trigger={<Button>{label}</Button>}>
      <WorkingList steps={steps} prefix={prefix} behind={behind} />
    </Dialog>
  );
}
