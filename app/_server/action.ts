import 'server-only';
import { unstable_rethrow, redirect } from 'next/navigation';
import { z } from 'zod';
import { AppError, type AppErrorCode } from '@/lib/errors';
import { EngineError } from '@/lib/engine';
import type { FormState } from '@/lib/form-state';
import type { Actor } from '@/lib/policies/actor';
import { currentActor } from './current-actor';

type Action = (previous: FormState, form: FormData) => Promise<FormState>;

/** Fields that are never sent back to a page. */
const SECRET = /password|secret|code|token/i;

/** The text fields of a form. A field that stands several times, and every name ending in [], is a list. */
function textFields(form: FormData): Record<string, string | string[]> {
  const fields: Record<string, string | string[]> = {};
  for (const name of new Set(form.keys())) {
    if (name.startsWith('$ACTION')) continue;
    const texts = form.getAll(name).filter((value): value is string => typeof value === 'string');
    fields[name] = name.endsWith('[]') || texts.length > 1 ? texts : (texts[0] ?? '');
  }
  return fields;
}

function refill(raw: Record<string, string | string[]>): Record<string, string> {
  const kept = Object.entries(raw).filter(
    (entry): entry is [string, string] => typeof entry[1] === 'string' && !SECRET.test(entry[0]),
  );
  return Object.fromEntries(kept);
}

function failed(
  code: AppErrorCode,
  message: string,
  fields: Record<string, string[]>,
  raw: Record<string, string | string[]>,
): FormState {
  return { status: 'failed', code, message, fields, values: refill(raw) };
}

function fieldsOf(error: AppError): Record<string, string[]> {
  const fields: Record<string, string[]> = {};
  for (const { pointer, detail } of error.details) (fields[pointer.replace(/^\//, '')] ??= []).push(detail);
  return fields;
}

async function answer(
  work: () => Promise<FormState>,
  raw: Record<string, string | string[]>,
): Promise<FormState> {
  try {
    return await work();
  } catch (error) {
    unstable_rethrow(error); // redirect() and notFound() pass through
    if (error instanceof AppError) return failed(error.code, error.message, fieldsOf(error), raw);
    if (error instanceof EngineError) return failed('CALCULATION_REFUSED', error.message, {}, raw);
    throw error; // a bug: the error page and the log
  }
}

function parsed<S extends z.ZodType>(schema: S, raw: Record<string, string | string[]>) {
  const input = schema.safeParse(raw);
  if (input.success) return { input: input.data };
  const fields: Record<string, string[]> = {};
  for (const issue of input.error.issues) (fields[issue.path.join('.')] ??= []).push(issue.message);
  return { refusal: failed('INVALID_INPUT', 'Some entries need another look', fields, raw) };
}

/**
 * The one door for forms. A caller who is nobody is sent to sign in; input that does not fit the schema
 * comes back with its sentence at its field; what was typed is kept, secrets excepted.
 */
export function action<S extends z.ZodType>(
  schema: S,
  work: (actor: Actor, input: z.output<S>) => Promise<FormState>,
): Action {
  return async (_previous, form) => {
    const actor = await currentActor();
    if (!actor) redirect('/sign-in');
    const raw = textFields(form);
    const { input, refusal } = parsed(schema, raw);
    return refusal ?? answer(() => work(actor, input as z.output<S>), raw);
  };
}

/** The door for strangers: sign-in, set-up, setting a password. Each use stands on a list in a test. */
export function openAction<S extends z.ZodType>(
  schema: S,
  work: (input: z.output<S>) => Promise<FormState>,
): Action {
  return async (_previous, form) => {
    const raw = textFields(form);
    const { input, refusal } = parsed(schema, raw);
    return refusal ?? answer(() => work(input as z.output<S>), raw);
  };
}
