import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { people } from '@/lib/server/queries/people';
import { AccountForm, EditPersonForm, PasswordForm } from './person-forms';

export const metadata: Metadata = { title: 'A person' };

type Props = { params: Promise<{ personId: string }> };

export default async function PersonPage({ params }: Props) {
  const actor = await requireActor();
  if (!allows(actor.role, 'person:edit')) forbidden();
  const personId = idOf((await params).personId);
  const { people: everybody, sites } = await people(actor, undefined);
  const person = everybody.find(({ id }) => id === personId);
  if (!person) notFound();
  const crumbs = [
    { label: 'Settings', href: routes.settings() },
    { label: 'People', href: routes.people() },
    { label: person.name },
  ];
  return (
    <>
      <PageHead title={person.name} crumbs={crumbs} note={person.email} />
      <EditPersonForm person={person} sites={sites} />
      <PasswordForm personId={person.id} />
      {!person.isSelf && <AccountForm person={person} />}
    </>
  );
}
