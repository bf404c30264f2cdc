import { findMachines } from '@/lib/server/queries/find-machines';
import { handler } from '@/lib/server/route-handler';

export const GET = handler((actor, _params: Record<string, string>, request) =>
  findMachines(actor, new URL(request.url).searchParams.get('text') ?? ''),
);
