'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { routes } from '@/lib/routes';
import type { ActionState } from '@/lib/schemas/action-state';
import type { UploadOutcome } from '@/lib/schemas/in-tray';
import { action } from '@/lib/server/action';
import { requireActor } from '@/lib/server/actor';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import { reopenUpload, withdrawUpload } from '@/lib/server/commands/settle-upload';

/** Takes the files of a form in, one command each: one that is refused stops none of the others. */
export async function receiveUploadsAction(form: FormData): Promise<UploadOutcome[]> {
  const actor = await requireActor();
  const [siteId, pointId] = [textOf(form, 'siteId'), textOf(form, 'pointId')];
  const outcomes: UploadOutcome[] = [];
  for (const file of form.getAll('files')) {
    if (typeof file === 'string') continue;
    const bytes = new Uint8Array(await file.arrayBuffer());
    const input = { fileName: file.name, bytes, siteId, pointId };
    outcomes.push(outcomeOf(file.name, await receiveUpload(actor, input)));
  }
  revalidatePath('/', 'layout');
  return outcomes;
}

const confirm = action(confirmUpload);

/** Confirms a file and opens the record made of it. */
export async function confirmUploadAction(
  previous: Awaited<ReturnType<typeof confirm>>,
  form: FormData,
): Promise<ActionState<never>> {
  const state = await confirm(previous, form);
  if (state.status === 'ok') redirect(routes.reading(state.value.recordId));
  return state;
}

export const withdrawUploadAction = action(withdrawUpload);
export const reopenUploadAction = action(reopenUpload);

function textOf(form: FormData, name: string): string {
  const value = form.get(name);
  return typeof value === 'string' ? value : '';
}

function outcomeOf(
  fileName: string,
  result: Awaited<ReturnType<typeof receiveUpload>>,
): UploadOutcome {
  if (result.ok) return { fileName, received: result.value, refusal: null };
  const { failure } = result;
  const link = 'link' in failure && typeof failure.link === 'string' ? failure.link : null;
  return { fileName, received: null, refusal: { message: failure.message, link } };
}
