import { layoutChoices } from '@/lib/schemas/upload-input';
import { idOf } from '@/lib/server/address-numbers';
import { uploadPreview } from '@/lib/server/queries/upload-page';
import { handler, problem } from '@/lib/server/route-handler';

export const GET = handler<{ uploadId: string }>((actor, { uploadId }, request) => {
  const asked = new URL(request.url).searchParams.get('choices');
  if (asked === null) return uploadPreview(actor, { uploadId: idOf(uploadId), choices: null });
  const choices = layoutChoices.safeParse(parsed(asked));
  if (!choices.success) {
    const first = choices.error.issues[0]?.message ?? 'The choices could not be read.';
    return Promise.resolve(problem(422, 'The choices could not be read', first));
  }
  return uploadPreview(actor, { uploadId: idOf(uploadId), choices: choices.data });
});

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
