import Image from 'next/image';
import { routes } from '@/lib/routes';
import type { ReportPhoto } from '@/lib/schemas/report';

/** Photos of a report, large enough to print. */
export function ReportPhotos({ photos }: { photos: readonly ReportPhoto[] }) {
  return (
    <div className="grid gap-4 sm:grid-cols-2 print:grid-cols-2">
      {photos.map((photo) => (
        <figure key={photo.id} className="flex flex-col gap-1">
          <Image
            src={routes.api.photo(photo.id)}
            alt={`Photo of ${photo.caption}`}
            width={photo.widthPx}
            height={photo.heightPx}
            unoptimized
            // A page that is printed at once has its pictures.
            loading="eager"
            className="h-auto max-h-96 w-auto max-w-full rounded border border-edge"
          />
          <figcaption className="text-xs text-ink-soft">{photo.caption}</figcaption>
        </figure>
      ))}
    </div>
  );
}
