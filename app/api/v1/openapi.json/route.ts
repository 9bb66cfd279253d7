import { route } from '@/app/_server/route';
import { openApiDocument } from '@/lib/schemas/openapi';

/** The contract of the public calculations, OpenAPI 3.1. */
export const GET = route({}, async () => openApiDocument());
