'use client';

import { useId } from 'react';
import { CheckField } from '@/components/ui/check-field';
import { errorOf } from '@/components/ui/field-state';
import { Field } from '@/components/ui/field';
import { FieldError } from '@/components/ui/field-frame';
import { RadioField } from '@/components/ui/radio-field';
import { ROLES, type Role } from '@/lib/domain/access/permissions';
import { ROLE_NAMES } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';

type RoleAndSitesProps = {
  state: ActionState;
  sites: readonly { id: number; name: string }[];
  given?: { name: string; role: Role; siteIds: readonly number[] };
};

const MEANS: Readonly<Record<Role, string>> = {
  reader: 'sees everything of the sites, changes nothing',
  technician: 'uploads, decides on records, carries out and signs balance jobs',
  engineer: 'as a technician; edits machines, set-ups and limit sets, overrides with a reason',
  planner: 'opens balance jobs, records events',
  administrator: 'as an engineer; enters people and closes their accounts',
};

/** Name, role and sites: the same fields whether somebody is entered or edited. */
export function RoleAndSites({ state, sites, given }: RoleAndSitesProps) {
  const problemId = useId();
  const problem = errorOf(state, 'siteIds');
  return (
    <>
      <Field name="name" label="Name" state={state} defaultValue={given?.name} />
      <RadioField
        name="role"
        label="Role"
        state={state}
        defaultValue={given?.role}
        choices={ROLES.map((role) => ({
          value: role,
          label: ROLE_NAMES[role],
          hint: MEANS[role],
        }))}
      />
      <fieldset
        aria-describedby={problem === undefined ? undefined : problemId}
        className={problem === undefined ? '' : 'border-l-4 border-fault pl-3'}
      >
        <legend className="text-sm font-semibold">Sites</legend>
        {sites.map((site) => (
          <CheckField
            key={site.id}
            // Numbered, so that the form brings a list, and each tick survives a failure.
            name={`siteIds.${site.id}`}
            value={site.id}
            label={site.name}
            state={state}
            defaultChecked={given?.siteIds.includes(site.id)}
          />
        ))}
        <FieldError id={problemId} error={problem} />
      </fieldset>
    </>
  );
}
