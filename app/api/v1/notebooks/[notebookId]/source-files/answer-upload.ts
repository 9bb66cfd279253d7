import 'server-only';
import type { UploadOutcome } from '@/lib/views/source-file';
import { ReaderError } from '@/lib/readers/types';
import { json, problem } from '@/app/_server/route';

/** 201 when it was stored, 200 when it was here already, 409 with the questions when the reader has to ask. */
export async function answerUpload(request: Request, outcome: UploadOutcome): Promise<Response> {
  if (outcome.verdict !== 'asks')
    return json(request, outcome, { status: outcome.verdict === 'stored' ? 201 : 200 });
  const { questions, dialect, shape } = outcome;
  const sentence = questions[0]?.message ?? 'This file can be read in more than one way';
  const document = (await problem(409, 'QUESTION', sentence).json()) as object;
  return Response.json(
    { ...document, dialect, shape, questions },
    { status: 409, headers: { 'content-type': 'application/problem+json', 'cache-control': 'no-store' } },
  );
}

/** What was wrong with the file and where; the pointer names the line. */
export function answerRefusal(error: ReaderError): Response {
  const { code, message, line } = error;
  const where =
    line === undefined ? [] : [{ pointer: `/file/line/${line}`, detail: `Line ${line}: ${message}` }];
  return problem(422, code, message, where);
}
