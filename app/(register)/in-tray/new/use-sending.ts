'use client';

import { useState } from 'react';
import { formatBytes } from '@/lib/format';
import type { UploadOutcome } from '@/lib/schemas/in-tray';
import { UPLOAD_BYTES_MAX } from '@/lib/schemas/upload-input';
import { receiveUploadsAction } from '../actions';

/** A chosen file and what became of it. */
export type ChosenFile = {
  key: string;
  file: File;
  state: 'chosen' | 'sending' | 'done' | 'refused';
  outcome: UploadOutcome | null;
};

export type Target = { siteId: number; pointId: number | null };

/** Files as chosen, sent one by one so that each has its own outcome and a large one blocks no other. */
export function useSending() {
  const [files, setFiles] = useState<ChosenFile[]>([]);
  const [busy, setBusy] = useState(false);

  const add = (chosen: readonly File[]) =>
    setFiles((before) => [
      ...before,
      ...chosen
        .filter((file) => !before.some(({ key }) => key === keyOf(file)))
        .map((file) => startOf(file)),
    ]);

  const update = (key: string, change: Partial<ChosenFile>) =>
    setFiles((before) => before.map((one) => (one.key === key ? { ...one, ...change } : one)));

  const remove = (key: string) => setFiles((before) => before.filter((one) => one.key !== key));

  const send = async (target: Target) => {
    setBusy(true);
    for (const { key, file } of files.filter(({ state }) => state === 'chosen')) {
      update(key, { state: 'sending' });
      const outcome = await sent(file, target);
      update(key, { outcome, state: outcome.received ? 'done' : 'refused' });
    }
    setBusy(false);
  };

  const again = (key: string) =>
    setFiles((before) => before.map((one) => (one.key === key ? startOf(one.file) : one)));

  return { files, busy, add, remove, send, again };
}

function keyOf(file: File): string {
  return `${file.name} ${file.size} ${file.lastModified}`;
}

// Over its limit the server cuts the connection without a word: the size is said here first.
function startOf(file: File): ChosenFile {
  const chosen: ChosenFile = { key: keyOf(file), file, state: 'chosen', outcome: null };
  if (file.size <= UPLOAD_BYTES_MAX) return chosen;
  const message = `${file.name} has ${formatBytes(file.size)} and one file may have ${formatBytes(UPLOAD_BYTES_MAX)}: export a shorter record.`;
  return { ...chosen, state: 'refused', outcome: refused(file, message) };
}

async function sent(file: File, { siteId, pointId }: Target): Promise<UploadOutcome> {
  const form = new FormData();
  form.set('siteId', String(siteId));
  form.set('pointId', pointId === null ? '' : String(pointId));
  form.append('files', file);
  try {
    const [outcome] = await receiveUploadsAction(form);
    return outcome ?? refused(file, `${file.name} did not arrive: send it again.`);
  } catch {
    return refused(
      file,
      `${file.name} did not arrive: check the connection (and that the file was not moved or changed since), then send it again.`,
    );
  }
}

function refused(file: File, message: string): UploadOutcome {
  return { fileName: file.name, received: null, refusal: { message, link: null } };
}
