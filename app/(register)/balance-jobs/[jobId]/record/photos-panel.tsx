import Image from 'next/image';
import { Panel } from '@/components/ui/panel';
import { formatDateTime } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { pictured } from '../pictured';

/** Photos of the job's weights, large enough to print. */
export function PhotosPanel({ job }: { job: BalanceJobDto }) {
  const taken = job.weights.flatMap((weight) =>
    (weight.photos ?? []).map((photo) => ({ weight, photo })),
  );
  if (taken.length === 0) return null;
  return (
    <Panel title="Photos of the weights">
      <div className="grid gap-4 sm:grid-cols-2 print:grid-cols-2">
        {taken.map(({ weight, photo }) => (
          <figure key={photo.id} className="flex flex-col gap-1">
            <Image
              src={routes.api.photo(photo.id)}
              alt={pictured(weight)}
              width={photo.widthPx}
              height={photo.heightPx}
              unoptimized
              // A page that is printed at once has its pictures.
              loading="eager"
              className="h-auto max-h-96 w-auto max-w-full rounded border border-edge"
            />
            <figcaption className="text-xs text-ink-soft">
              {pictured(weight)}. {photo.person}, {formatDateTime(photo.at, job.site.timeZone)}
            </figcaption>
          </figure>
        ))}
      </div>
    </Panel>
  );
}
