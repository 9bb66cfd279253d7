import { loadBatch } from '@/db/queries/batches';
import { batchParams } from '@/lib/schemas/batch';
import { route } from '@/app/_server/route';

export const GET = route({ params: batchParams }, (actor, { params }) => loadBatch(actor, params.batchId));
