import { handler, problem } from '@/lib/server/route-handler';
import { COMPUTATIONS, isComputation } from '@/lib/server/workbench/computations';

export const POST = handler((actor, { name }: { name: string }, request) => {
  if (!isComputation(name)) return Promise.resolve(problem(404, 'There is no such computation'));
  return COMPUTATIONS[name].answer(actor, request);
});
