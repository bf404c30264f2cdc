import 'server-only';
import type { Actor } from '@/lib/schemas/actor';
import { currentActor } from './actor';
import { NotPermitted } from './query';

/** A failure as problem+json (RFC 9457). */
export function problem(status: number, title: string, detail?: string): Response {
  return Response.json(
    { type: 'about:blank', title, status, detail },
    { status, headers: { 'content-type': 'application/problem+json' } },
  );
}

/**
 * A route handler for the pages' own data: signed-in people only, 403 where the role lacks the
 * permission, 404 where `read` finds nothing the actor may see.
 */
export function handler<Params extends Record<string, string>>(
  read: (actor: Actor, params: Params, request: Request) => Promise<unknown>,
) {
  return async (request: Request, context: { params: Promise<Params> }): Promise<Response> => {
    const actor = await currentActor();
    if (!actor) return problem(401, 'Sign in first');
    try {
      const found = await read(actor, await context.params, request);
      if (found instanceof Response) return found;
      if (found === null || found === undefined) return problem(404, 'Not found');
      return Response.json(found, { headers: { 'cache-control': 'private, no-store' } });
    } catch (error) {
      if (error instanceof NotPermitted) return problem(403, 'Not permitted', error.message);
      throw error;
    }
  };
}
