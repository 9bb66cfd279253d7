import { getSourceFile } from '@/db/queries/source-files';
import { sourceFileParams } from '@/lib/schemas/spectrum-upload';
import { route } from '@/app/_server/route';

export const GET = route({ params: sourceFileParams }, (actor, { params }) =>
  getSourceFile(actor, params.sourceFileId),
);
