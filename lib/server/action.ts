import 'server-only';
import { revalidatePath } from 'next/cache';
import { redirect, unauthorized } from 'next/navigation';
import type { z } from 'zod';
import type { Result } from '@/lib/domain/result';
import type { ActionState } from '@/lib/schemas/action-state';
import { currentActor } from './actor';
import type { Command } from './command';
import { formToInput, typedValues } from './form-input';

/**
 * A server action over a command, for `useActionState`: finds the actor, reads the form, runs the
 * command, and on failure hands back what was typed. Field names are dotted paths (`vectors.0.lag`).
 * With `goTo`, success leads to that address.
 */
export function action<Schema extends z.ZodType, Value>(
  command: Command<Schema, Value>,
  goTo?: (value: Value) => string,
) {
  return async (_previous: ActionState<Value>, form: FormData): Promise<ActionState<Value>> => {
    // The command's schema is what checks the form; until then it is text of any shape.
    const result = await call(command, formToInput(form) as z.input<Schema>);
    if (result.ok && goTo) redirect(goTo(result.value));
    if (result.ok) return { status: 'ok', value: result.value };
    const { failure } = result;
    return { status: 'failed', failure, failures: [failure], values: typedValues(form) };
  };
}

/** A server action over a command for code that calls it with plain data. */
export function directAction<Schema extends z.ZodType, Value>(command: Command<Schema, Value>) {
  return (input: z.input<Schema>): Promise<Result<Value>> => call(command, input);
}

async function call<Schema extends z.ZodType, Value>(
  command: Command<Schema, Value>,
  input: z.input<Schema>,
): Promise<Result<Value>> {
  const actor = await currentActor();
  if (!actor) unauthorized();
  const result = await command(actor, input);
  if (result.ok) revalidatePath('/', 'layout');
  return result;
}
