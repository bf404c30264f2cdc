import 'server-only';
import { revalidatePath } from 'next/cache';
import { redirect, unauthorized } from 'next/navigation';
import type { z } from 'zod';
import type { Result } from '@/lib/domain/result';
import type { ActionState } from '@/lib/schemas/action-state';
import { currentActor } from './actor';
import type { Command } from './command';
import type { Computation } from './computation';
import { formToInput, typedValues } from './form-input';

type Work<Schema extends z.ZodType, Value> = Command<Schema, Value> | Computation<Schema, Value>;

/**
 * A server action over a command or a computation, for `useActionState`: finds the actor, reads the
 * form, runs it, and on failure hands back what was typed. Field names are dotted paths (`vectors.0.lag`).
 * With `goTo`, success leads to that address.
 */
export function action<Schema extends z.ZodType, Value>(
  work: Work<Schema, Value>,
  goTo?: (value: Value) => string,
) {
  return async (_previous: ActionState<Value>, form: FormData): Promise<ActionState<Value>> => {
    // Its schema is what checks the form; until then it is text of any shape.
    const result = await call(work, formToInput(form) as z.input<Schema>);
    if (result.ok && goTo) redirect(goTo(result.value));
    if (result.ok && work.kind === 'computation')
      return { status: 'ok', value: result.value, values: typedValues(form) };
    if (result.ok) return { status: 'ok', value: result.value };
    const { failure } = result;
    return {
      status: 'failed',
      failure,
      failures: [failure, ...(failure.more ?? [])],
      values: typedValues(form),
    };
  };
}

async function call<Schema extends z.ZodType, Value>(
  work: Work<Schema, Value>,
  input: z.input<Schema>,
): Promise<Result<Value>> {
  const actor = await currentActor();
  if (!actor) unauthorized();
  const result = await work(actor, input);
  if (result.ok && work.kind === 'command') revalidatePath('/', 'layout');
  return result;
}
