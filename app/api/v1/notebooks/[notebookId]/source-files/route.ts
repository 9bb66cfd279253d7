import { checkMayUpload, listSourceFiles, uploadSourceFile } from '@/db/queries/source-files';
import { ReaderError } from '@/lib/readers/types';
import { notebookParams } from '@/lib/schemas/notebook';
import { pageQuery } from '@/lib/schemas/page-query';
import { route } from '@/app/_server/route';
import { answerRefusal, answerUpload } from './answer-upload';
import { receiveUpload } from './receive-upload';

export const GET = route({ params: notebookParams, query: pageQuery }, (actor, { params, query }) =>
  listSourceFiles(actor, params.notebookId, query),
);

/** One file a request, as multipart/form-data. Who may not upload is told before a byte is read. */
export const POST = route({ params: notebookParams }, async (actor, { request, params }) => {
  await checkMayUpload(actor, params.notebookId);
  try {
    const outcome = await receiveUpload(request, (upload) =>
      uploadSourceFile(actor, params.notebookId, upload),
    );
    return await answerUpload(request, outcome);
  } catch (error) {
    if (error instanceof ReaderError) return answerRefusal(error);
    throw error;
  }
});
