import type { Metadata } from 'next';
import Link from 'next/link';
import { forbidden } from 'next/navigation';
import { RowKeys } from '@/components/register/row-keys';
import { Badge } from '@/components/ui/badge';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { allows } from '@/lib/domain/access/permissions';
import { formatAge, formatPlural, ROLE_NAMES } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { PersonRow } from '@/lib/schemas/settings';
import { requireActor } from '@/lib/server/actor';
import { people } from '@/lib/server/queries/people';
import { NewPersonForm } from './new-person-form';

export const metadata: Metadata = { title: 'People' };

export default async function PeoplePage() {
  const actor = await requireActor();
  if (!allows(actor.role, 'person:read')) forbidden();
  const { people: everybody, sites } = await people(actor, undefined);
  return (
    <>
      <PageHead
        title="People"
        crumbs={[{ label: 'Settings', href: routes.settings() }, { label: 'People' }]}
      />
      <Panel title="Who signs in" note={formatPlural(everybody.length, 'person', 'people')}>
        <RowKeys>
          <PeopleTable people={everybody} />
        </RowKeys>
      </Panel>
      <NewPersonForm sites={sites} />
    </>
  );
}

function PeopleTable({ people: everybody }: { people: readonly PersonRow[] }) {
  const now = new Date();
  return (
    <Table caption="People with access to your sites">
      <thead>
        <tr>
          <Th>name</Th>
          <Th>e-mail</Th>
          <Th>role</Th>
          <Th>sites</Th>
          <Th>last signed in</Th>
          <Th>account</Th>
        </tr>
      </thead>
      <tbody>
        {everybody.map((person) => (
          <tr key={person.id}>
            <RowHead>
              <Link className="link" href={routes.person(person.id)}>
                {person.name}
              </Link>
              {person.isSelf && <span className="font-normal text-ink-soft"> (you)</span>}
            </RowHead>
            <Td>{person.email}</Td>
            <Td>{ROLE_NAMES[person.role]}</Td>
            <Td>{sitesInWords(person)}</Td>
            <Td>{person.signedInAt === null ? 'never' : formatAge(person.signedInAt, now)}</Td>
            <Td>
              <Badge>{person.state}</Badge>
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function sitesInWords({ sites, otherSites }: PersonRow): string {
  const names = sites.map(({ name }) => name).join(', ');
  return otherSites === 0 ? names : `${names} and ${formatPlural(otherSites, 'further site')}`;
}
