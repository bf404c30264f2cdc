import { openApiDocument } from '@/lib/server/openapi';
import { handler } from '@/lib/server/route-handler';

export const GET = handler(() => Promise.resolve(openApiDocument()));
