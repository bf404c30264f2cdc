'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import { reopenUploadAction, withdrawUploadAction } from '../actions';

const WAYS = {
  withdrawn: {
    action: withdrawUploadAction,
    title: 'Withdraw the file',
    text: 'For a file that does not belong here. It can be taken up again later.',
    button: 'Withdraw file',
  },
  waiting: {
    action: reopenUploadAction,
    title: 'Take the file up again',
    text: 'It waits to be confirmed anew; a record made of it then corrects the one lined through.',
    button: 'Take file up again',
  },
} as const;

/** Sets a waiting file aside, or takes a withdrawn one up again, with a reason. */
export function SettleUpload({ uploadId, to }: { uploadId: number; to: keyof typeof WAYS }) {
  const { action, title, text, button } = WAYS[to];
  const [state, submit] = useActionState<ActionState<{ uploadId: number }>, FormData>(action, IDLE);
  return (
    <Panel title={title}>
      <form action={submit} className="flex max-w-xl flex-col gap-3">
        <p className="text-ink-soft">{text}</p>
        <ErrorSummary state={state} />
        <input type="hidden" name="uploadId" value={uploadId} />
        <Field name="reason" label="Reason" state={state} maxLength={1000} />
        <div>
          <SubmitButton variant="secondary">{button}</SubmitButton>
        </div>
      </form>
    </Panel>
  );
}
