import { whoAmI } from '@/db/queries/account';
import { route } from '@/app/_server/route';

/** Who is asking: the person behind a token or a session, or a reader with a link. */
export const GET = route({}, (actor) => whoAmI(actor));
