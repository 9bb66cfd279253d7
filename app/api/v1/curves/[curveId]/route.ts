import { route } from '@/app/_server/route';
import { loadCurve } from '@/db/queries/curves';
import { curveParams } from '@/lib/schemas/curve';

export const GET = route({ params: curveParams }, (actor, { params }) => loadCurve(actor, params.curveId));
