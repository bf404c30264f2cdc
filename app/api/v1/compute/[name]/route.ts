import { computeResponse } from '@/lib/server/compute-response';
import { handler, problem } from '@/lib/server/route-handler';
import { COMPUTATIONS, isComputation } from '@/lib/server/workbench/computations';

export const POST = handler((actor, { name }: { name: string }, request) => {
  if (!isComputation(name)) return Promise.resolve(problem(404, 'There is no such computation'));
  switch (name) {
    case 'solve-runs':
      return computeResponse(COMPUTATIONS[name].compute, actor, request);
    case 'tolerance':
      return computeResponse(COMPUTATIONS[name].compute, actor, request);
    case 'split':
      return computeResponse(COMPUTATIONS[name].compute, actor, request);
  }
});
