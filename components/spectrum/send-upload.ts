import type { Question } from '@/lib/readers/types';
import type { UploadOutcome } from '@/lib/views/source-file';
import type { SendUpload, UploadVerdict } from './upload-queue';

/** The members of a problem document (RFC 9457) that are used here. */
interface Problem {
  readonly code: string;
  readonly detail: string;
  readonly errors?: readonly { readonly pointer: string }[];
  readonly shape?: string;
  readonly questions?: readonly Question[];
}

const LOST =
  'The connection was lost before this file arrived. Try again; what is here already is not sent twice';

function lineOf({ errors = [] }: Problem): number | null {
  const line = errors.map(({ pointer }) => /^\/file\/line\/(\d+)$/.exec(pointer)?.[1]).find(Boolean);
  return line === undefined ? null : Number(line);
}

/** An answer of the upload route as a verdict. */
export function verdictOf(status: number, body: unknown): UploadVerdict {
  if (status === 200 || status === 201) return body as Exclude<UploadOutcome, { verdict: 'asks' }>;
  const problem = (body ?? { code: '', detail: '' }) as Problem;
  if (status === 409 && problem.questions)
    return { verdict: 'asks', shape: problem.shape ?? '', questions: problem.questions };
  if (status === 401)
    return { verdict: 'failed', sentence: 'You are signed out. Sign in again, then try again' };
  if (status >= 500 || status === 0 || status === 409)
    return {
      verdict: 'failed',
      sentence: problem.detail || 'The notebook could not take this file. Try again',
    };
  const sentence = problem.detail || 'The notebook did not take this file';
  return { verdict: 'refused', sentence, line: lineOf(problem) };
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null; // a page instead of data: the status speaks
  }
}

/** Sends with XMLHttpRequest: fetch cannot say how much of a body has left. Never rejects. */
export function sendTo(address: string): SendUpload {
  return (file, options, onSent, signal) =>
    new Promise((resolve) => {
      const request = new XMLHttpRequest();
      const form = new FormData();
      form.set('options', JSON.stringify(options));
      form.set('file', file);
      request.upload.onprogress = ({ loaded, total }) => onSent(total > 0 ? loaded / total : 1);
      request.upload.onload = () => onSent(1);
      request.onload = () => resolve(verdictOf(request.status, parsed(request.responseText)));
      request.onerror = () => resolve({ verdict: 'failed', sentence: LOST });
      request.onabort = () => resolve({ verdict: 'cancelled' });
      signal.addEventListener('abort', () => request.abort(), { once: true });
      request.open('POST', address);
      request.setRequestHeader('accept', 'application/json');
      request.send(form);
    });
}
