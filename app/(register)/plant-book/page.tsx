import type { Metadata } from 'next';
import { RowKeys } from '@/components/register/row-keys';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { Tabs } from '@/components/ui/tabs';
import { allows } from '@/lib/domain/access/permissions';
import { formatCount } from '@/lib/format';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { narrowed } from '@/lib/server/chosen-site';
import { plantBook } from '@/lib/server/queries/plant-book';
import { AreaTree } from './area-tree';
import { FilterForm } from './filter-form';
import { MachineTable } from './machine-table';
import { plantBookAddress, viewOf, type PlantBookSearch } from './search';

export const metadata: Metadata = { title: 'Plant book' };

type Props = { searchParams: Promise<PlantBookSearch> };

export default async function PlantBookPage({ searchParams }: Props) {
  const actor = await narrowed(await requireActor());
  const view = viewOf(await searchParams);
  const book = await plantBook(actor, view);
  const mayEdit = allows(actor.role, 'register:edit');
  const tab = (state: 'active' | 'retired', layout: 'table' | 'tree', label: string) => ({
    label,
    href: plantBookAddress({ ...view, state, layout }),
    current: view.state === state && view.layout === layout,
  });
  return (
    <>
      <PageHead
        title="Plant book"
        note="Sites, machines and bearing points, worst first"
        actions={mayEdit && <LinkButton href={routes.newMachine()}>Enter a machine</LinkButton>}
      />
      <Tabs
        label="How the register is shown"
        tabs={[
          tab('active', 'table', 'Table'),
          tab('active', 'tree', 'Tree'),
          tab('retired', 'table', 'Retired'),
        ]}
      />
      <FilterForm view={view} areas={book.areas} />
      {book.all === 0 ? (
        <EmptyState title={view.state === 'retired' ? 'Nothing is retired' : 'No machine yet'}>
          {view.state === 'active' && 'Enter the first machine with its bearings and planes.'}
        </EmptyState>
      ) : book.rows.length === 0 ? (
        <EmptyState
          title="No machine matches"
          action={<LinkButton href={routes.plantBook()}>Show all</LinkButton>}
        >
          {book.all} machines stand in the book; the filter leaves none of them.
        </EmptyState>
      ) : (
        <RowKeys>
          {view.layout === 'tree' ? (
            <AreaTree rows={book.rows} />
          ) : (
            <Panel title="Machines" note={formatCount(book.rows.length, book.all)}>
              <MachineTable rows={book.rows} decimalMark={actor.sites[0]?.decimalMark ?? '.'} />
            </Panel>
          )}
        </RowKeys>
      )}
    </>
  );
}
