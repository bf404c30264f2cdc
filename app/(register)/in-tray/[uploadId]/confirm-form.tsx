'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { startTransition, useActionState, useState, type SyntheticEvent } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { previewQuery } from '@/lib/client/reading-query';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { UploadPageDto } from '@/lib/schemas/in-tray';
import { confirmUploadAction } from '../actions';
import { choicesOf, columnsFor, type Choices } from './choices';
import { LayoutFields } from './layout-fields';
import { PlaceFields } from './place-fields';
import { PreviewPlot } from './preview-plot';
import { PreviewRows } from './preview-rows';

/** How a file is read, shown as it changes, with where and when it was taken; confirmed in one go. */
export function ConfirmForm({ page }: { page: UploadPageDto }) {
  const { upload, preview: proposed } = page;
  const [state, submit, pending] = useActionState<ActionState<never>, FormData>(
    confirmUploadAction,
    IDLE,
  );
  const [choices, setChoices] = useState(() => choicesOf(proposed));
  const [touched, setTouched] = useState(false);
  const asked = useQuery({
    ...previewQuery(upload.id, choices),
    enabled: touched,
    placeholderData: keepPreviousData,
  });
  const preview = (touched ? asked.data : undefined) ?? proposed;
  const change = (next: Choices) => {
    setTouched(true);
    setChoices(next);
  };
  // Not `action={submit}`: React would reset the choices after a failure.
  const send = (event: SyntheticEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    if (!pending) startTransition(() => submit(form));
  };
  return (
    <form onSubmit={send} className="flex flex-col gap-6">
      <ErrorSummary state={state} />
      <input type="hidden" name="uploadId" value={upload.id} />
      <Questions page={page} touched={touched} />
      <div className="grid gap-6 xl:grid-cols-2">
        <LayoutFields
          state={state}
          columns={columnsFor(preview, choices)}
          rows={preview.rows}
          choices={choices}
          onChange={change}
        />
        <Panel title="How it reads" note={asked.isFetching ? 'reading again' : undefined}>
          {asked.isError && <Notice kind="failure" title={asked.error.message} />}
          <PreviewPlot preview={preview} page={page} stale={asked.isFetching} />
        </Panel>
      </div>
      <PreviewRows preview={preview} choices={choices} />
      <PlaceFields page={page} state={state} />
      <div>
        <Button type="submit" variant="primary" pending={pending}>
          Confirm record
        </Button>
      </div>
    </form>
  );
}

function Questions({ page, touched }: { page: UploadPageDto; touched: boolean }) {
  const { questions } = page.preview;
  if (questions.length === 0 || touched) return null;
  return (
    <Notice kind="caution" title="The file does not say everything">
      <ul className="list-disc pl-4">
        {questions.map(({ field, message }) => (
          <li key={`${field} ${message}`}>{message}</li>
        ))}
      </ul>
    </Notice>
  );
}
