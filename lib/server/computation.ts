import 'server-only';
import type { z } from 'zod';
import { allows, type Permission } from '@/lib/domain/access/permissions';
import { fail, type Result } from '@/lib/domain/result';
import type { Actor } from '@/lib/schemas/actor';
import { firstIssue } from './first-issue';

export type Computation<Schema extends z.ZodType, Value> = ((
  actor: Actor,
  input: z.input<Schema>,
) => Promise<Result<Value>>) & {
  readonly kind: 'computation';
  readonly permission: Permission;
  readonly schema: Schema;
};

/**
 * Arithmetic on its own: checks permission and input, computes, keeps nothing and reads nothing of any
 * site.
 */
export function computation<Schema extends z.ZodType, Value>(
  definition: { permission: Permission; input: Schema },
  compute: (input: z.output<Schema>) => Result<Value>,
): Computation<Schema, Value> {
  const { permission, input: schema } = definition;
  const run = (actor: Actor, input: z.input<Schema>): Promise<Result<Value>> => {
    if (!allows(actor.role, permission))
      return Promise.resolve(fail('forbidden', `Your role (${actor.role}) does not allow this.`));
    const parsed = schema.safeParse(input);
    return Promise.resolve(
      parsed.success ? compute(parsed.data) : { ok: false, failure: firstIssue(parsed.error) },
    );
  };
  return Object.assign(run, { kind: 'computation' as const, permission, schema });
}
