import { AppError } from '@/lib/errors';
import { openShareLink } from '@/db/entry/share-visits';
import { openShareCookie } from '@/app/_server/session-cookie';

const VISITS_KEPT = 20;

/**
 * Exchange a share link for a cookie limited to that share, and leave the address bar: the secret stands in
 * no later address, no referrer and no history of pages. Open to strangers by its nature.
 */
export async function GET(_request: Request, { params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  try {
    const { visitId, notebookId } = await openShareLink(token);
    const cookie = await openShareCookie();
    cookie.visits = [...(cookie.visits ?? []), visitId].slice(-VISITS_KEPT);
    await cookie.save();
    return leave(`/notebooks/${notebookId}`);
  } catch (error) {
    if (error instanceof AppError) return leave('/link-spent');
    throw error;
  }
}

/** A relative address, so that the browser stays on the host that the cookie belongs to. */
function leave(location: string): Response {
  const headers = {
    location,
    'referrer-policy': 'no-referrer',
    'x-robots-tag': 'noindex, nofollow',
    'cache-control': 'no-store',
  };
  return new Response(null, { status: 303, headers });
}
