import 'server-only';
import { notFound } from 'next/navigation';
import { AppError } from '@/lib/errors';

/** Await what a page shows; what the asker may not see is a page that is not there. */
export async function orNotFound<T>(data: Promise<T>): Promise<T> {
  try {
    return await data;
  } catch (error) {
    if (error instanceof AppError && error.code === 'NOT_FOUND') notFound();
    throw error;
  }
}
