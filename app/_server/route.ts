import 'server-only';
import { createHash } from 'node:crypto';
import { z } from 'zod';
import { EngineError } from '@/lib/engine';
import { AppError, type ErrorDetail } from '@/lib/errors';
import type { Actor } from '@/lib/policies/actor';
import { ReaderError } from '@/lib/readers/types';
import { issuesOf } from '@/lib/schemas/issues';
import { apiActor } from './current-actor';
import { log } from './log';

/* The one door for route handlers: JSON with an ETag, or application/problem+json (RFC 9457). */

const PROBLEM_BASE = 'https://halflight.invalid/problems/';

export function problem(
  status: number,
  code: string,
  detail: string,
  errors: readonly ErrorDetail[] = [],
): Response {
  const type = PROBLEM_BASE + code.toLowerCase().replaceAll('_', '-');
  return Response.json(
    { type, title: code.toLowerCase().replaceAll('_', ' '), status, detail, code, errors },
    { status, headers: { 'content-type': 'application/problem+json', 'cache-control': 'no-store' } },
  );
}

export function problemOf(error: unknown): Response {
  if (error instanceof AppError) return problem(error.status, error.code, error.message, error.details);
  if (error instanceof EngineError)
    return problem(422, error.code, error.message, [{ pointer: error.pointer ?? '', detail: error.message }]);
  if (error instanceof ReaderError) return problem(422, error.code, error.message);
  if (error instanceof z.ZodError) {
    const errors = issuesOf(error).map((issue) => ({
      pointer: '/' + issue.path.join('/'),
      detail: issue.message,
    }));
    return problem(422, 'INVALID_INPUT', errors[0]?.detail ?? 'Some values need another look', errors);
  }
  log.error({ error }, 'a route handler failed');
  return problem(500, 'FAILED', 'Something went wrong here. It has been written down; try again');
}

/** Cookies travel by themselves, so a write that rests on one must come from our own pages. */
function comesFromElsewhere(request: Request): boolean {
  if (request.method === 'GET' || request.method === 'HEAD' || request.headers.has('authorization'))
    return false;
  const site = request.headers.get('sec-fetch-site');
  if (site) return site !== 'same-origin' && site !== 'none';
  const origin = request.headers.get('origin');
  return origin !== null && new URL(origin).host !== request.headers.get('host');
}

/** JSON with an ETag of its content; a caller who has it already gets 304. */
export function json(request: Request, body: unknown, init: ResponseInit = {}): Response {
  const text = JSON.stringify(body);
  const etag = `"${createHash('sha256').update(text).digest('base64url').slice(0, 27)}"`;
  const headers = new Headers(init.headers);
  headers.set('etag', etag);
  headers.set('cache-control', 'private, no-cache');
  headers.set('content-type', 'application/json');
  if (request.method === 'GET' && request.headers.get('if-none-match')?.includes(etag))
    return new Response(null, { status: 304, headers });
  return new Response(text, { ...init, headers });
}

export interface Call<P, Q, B> {
  readonly request: Request;
  readonly params: P;
  readonly query: Q;
  readonly body: B;
}

interface Shapes<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> {
  readonly params?: P;
  readonly query?: Q;
  /** Left out when the handler reads the request itself (uploads). */
  readonly body?: B;
  /** Status of a plain answer; 200 unless said. */
  readonly status?: number;
}

async function readBody(request: Request): Promise<unknown> {
  try {
    return await request.json();
  } catch (error) {
    throw new AppError(
      'MALFORMED',
      `The body is not JSON: ${error instanceof Error ? error.message : 'unreadable'}`,
    );
  }
}

/**
 * Wrap a route handler. It returns plain data (sent as JSON) or a Response of its own; whatever is thrown
 * becomes a problem document, and a bug is logged and tells nothing.
 */
export function route<
  P extends z.ZodType = z.ZodUnknown,
  Q extends z.ZodType = z.ZodUnknown,
  B extends z.ZodType = z.ZodUnknown,
>(
  shapes: Shapes<P, Q, B>,
  work: (actor: Actor, call: Call<z.output<P>, z.output<Q>, z.output<B>>) => Promise<unknown>,
) {
  return async (request: Request, context: { params: Promise<unknown> }): Promise<Response> => {
    try {
      if (comesFromElsewhere(request)) throw new AppError('NOT_ALLOWED', 'This call came from another site');
      const actor = await apiActor();
      if (!actor) throw new AppError('NOT_SIGNED_IN');
      const params = (shapes.params ?? z.unknown()).parse(await context.params) as z.output<P>;
      const search = Object.fromEntries(new URL(request.url).searchParams);
      const query = (shapes.query ?? z.unknown()).parse(search) as z.output<Q>;
      const body = (shapes.body ? shapes.body.parse(await readBody(request)) : undefined) as z.output<B>;
      const data = await work(actor, { request, params, query, body });
      return data instanceof Response ? data : json(request, data, { status: shapes.status ?? 200 });
    } catch (error) {
      return problemOf(error);
    }
  };
}
