import { Badge } from '@/components/ui/badge';
import { LinkButton } from '@/components/ui/link-button';
import { PageHead } from '@/components/ui/page-head';
import { formatDateTime } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { ReadingPageDto } from '@/lib/schemas/reading-page';

/** Which record this is, and the ones beside it. */
export function ReadingHead({ page }: { page: ReadingPageDto }) {
  const { place, site, machineName, state, takenAt, person, earlierId, laterId } = page;
  return (
    <PageHead
      title={`${place.machineTag} ${place.label}, ${formatDateTime(takenAt, site.timeZone)}`}
      crumbs={[
        { label: site.name },
        { label: `${place.machineTag} ${machineName}`, href: routes.machine(place.machineId) },
        { label: place.label, href: routes.point(place.pointId) },
        { label: 'Reading' },
      ]}
      note={
        <>
          <Badge>{state}</Badge> {page.source === 'waveform' ? 'Waveform' : 'Typed reading'} by{' '}
          {person}, brought in {formatDateTime(page.createdAt, site.timeZone)}
          {page.note !== null && <>. {page.note}</>}
        </>
      }
      actions={
        <>
          {earlierId !== null && (
            <LinkButton href={routes.reading(earlierId)}>Earlier reading</LinkButton>
          )}
          {laterId !== null && (
            <LinkButton href={routes.reading(laterId)}>Later reading</LinkButton>
          )}
        </>
      }
    />
  );
}
