import 'server-only';
import type { z } from 'zod';
import type { Failure } from '@/lib/domain/result';
import type { Actor } from '@/lib/schemas/actor';
import type { Computation } from './computation';
import { problem } from './route-handler';

/** Largest body of a computation, bytes: typed runs are a few hundred. */
const BODY_MAX = 100_000;

/**
 * Answers a request for a computation: 200 with what it comes to, 400 where the body is no JSON, 403
 * where the role lacks the permission, 413 where it is too long, 422 in words where the input or what
 * it describes cannot be computed.
 */
export async function computeResponse<Schema extends z.ZodType, Value>(
  compute: Computation<Schema, Value>,
  actor: Actor,
  request: Request,
): Promise<Response> {
  const text = await request.text();
  if (text.length > BODY_MAX) return problem(413, 'Too long', `Send at most ${BODY_MAX} bytes.`);
  const body = parsed(text);
  if (body === undefined)
    return problem(400, 'Not JSON', 'Send one JSON object with content-type application/json.');
  // The computation's schema is what checks the body; until then it is anything.
  const result = await compute(actor, body as z.input<Schema>);
  if (result.ok) return Response.json(result.value, { headers: { 'cache-control': 'no-store' } });
  return refusal(result.failure);
}

function parsed(text: string): unknown {
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === 'object' && value !== null ? value : undefined;
  } catch {
    return undefined;
  }
}

function refusal({ code, field, message }: Failure): Response {
  if (code === 'forbidden') return problem(403, 'Not permitted', message);
  return Response.json(
    {
      type: 'about:blank',
      title: 'Cannot be computed',
      status: 422,
      detail: message,
      code,
      ...(field === undefined ? {} : { field }),
    },
    { status: 422, headers: { 'content-type': 'application/problem+json' } },
  );
}
