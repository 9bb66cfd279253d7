'use client';

import { ReasonDialog } from '@/components/batch/reason-dialog';
import { Button } from '@/components/ui/button';
import { declareVoid } from './actions';

export function VoidBatch({ batchId, title }: { batchId: string; title: string }) {
  return (
    <ReasonDialog
      title="Declare this batch void"
      description={`“${title}” stays to be seen with all its samples, takes no more changes, and its numbers are not to be used.`}
      trigger={
        <Button variant="quiet" type="button">
          Declare void
        </Button>
      }
      action={declareVoid}
      hidden={{ batchId }}
      submitLabel="Declare void"
      danger
    />
  );
}
