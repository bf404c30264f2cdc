'use client';

import { useActionState, type ReactNode } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { PersonRow } from '@/lib/schemas/settings';
import {
  closePersonAction,
  editPersonAction,
  reopenPersonAction,
  setPasswordAction,
} from '../actions';
import { RoleAndSites } from '../role-and-sites';

type PersonAction = typeof editPersonAction;
type State = ActionState<{ personId: number }>;

type PersonFormProps = {
  title: string;
  personId: number;
  action: PersonAction;
  button: ReactNode;
  /** What is said after it succeeded on this page. */
  done?: string;
  children: (state: State) => ReactNode;
};

function PersonForm({ title, personId, action, button, done, children }: PersonFormProps) {
  const [state, submit] = useActionState<State, FormData>(action, IDLE);
  return (
    <Panel title={title}>
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        {state.status === 'ok' && done !== undefined && <Notice kind="success">{done}</Notice>}
        <input type="hidden" name="personId" value={personId} />
        {children(state)}
        <div>{button}</div>
      </form>
    </Panel>
  );
}

type EditPersonFormProps = {
  person: PersonRow;
  sites: readonly { id: number; name: string }[];
};

/** Name, role and sites. */
export function EditPersonForm({ person, sites }: EditPersonFormProps) {
  const { id, name, role } = person;
  const given = { name, role, siteIds: person.sites.map((site) => site.id) };
  return (
    <PersonForm
      title="Role and sites"
      personId={id}
      action={editPersonAction}
      button={<SubmitButton>Save</SubmitButton>}
    >
      {(state) => <RoleAndSites state={state} sites={sites} given={given} />}
    </PersonForm>
  );
}

/** A new password, for who forgot it. */
export function PasswordForm({ personId }: { personId: number }) {
  return (
    <PersonForm
      title="New password"
      personId={personId}
      action={setPasswordAction}
      button={<SubmitButton variant="secondary">Set password</SubmitButton>}
      done="The password is set and every session of this person has ended."
    >
      {(state) => (
        <Field
          name="password"
          kind="password"
          label="Password"
          hint="at least 12 characters; it ends every session of this person"
          state={state}
          autoComplete="new-password"
        />
      )}
    </PersonForm>
  );
}

/** Closes an account, or opens it again. */
export function AccountForm({ person }: { person: PersonRow }) {
  const closed = person.state === 'closed';
  return (
    <PersonForm
      title={closed ? 'Open the account again' : 'Close the account'}
      personId={person.id}
      action={closed ? reopenPersonAction : closePersonAction}
      button={
        <SubmitButton variant={closed ? 'secondary' : 'danger'}>
          {closed ? 'Open account' : 'Close account'}
        </SubmitButton>
      }
    >
      {(state) => (
        <Field
          name="reason"
          label="Why?"
          hint="The name stays on everything that was signed."
          state={state}
        />
      )}
    </PersonForm>
  );
}
