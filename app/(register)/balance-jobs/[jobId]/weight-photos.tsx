'use client';

import Image from 'next/image';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { PhotoField } from '@/components/ui/photo-field';
import { formatMass } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { LedgerWeightDto } from '@/lib/schemas/balance-job';
import { pictured } from './pictured';
import { addPhotoAction } from './photo-actions';
import { StepForm } from './step-form';

type WeightPhotosProps = { jobId: number; weight: LedgerWeightDto; mayAdd: boolean };

const SMALL_PX = 72;

/** Thumbnails of a weight's photos, why there is none, and a place to add one. */
export function WeightPhotos({ jobId, weight, mayAdd }: WeightPhotosProps) {
  const photos = weight.photos ?? [];
  const missing = photos.length === 0 ? weight.fixedBy?.noPhotoReason : null;
  return (
    <div className="flex flex-col items-start gap-2 whitespace-nowrap">
      {photos.map((photo) => (
        <a key={photo.id} href={routes.api.photo(photo.id)} target="_blank" rel="noreferrer">
          <Image
            src={routes.api.thumbnail(photo.id)}
            alt={pictured(weight)}
            width={SMALL_PX}
            height={SMALL_PX}
            unoptimized
            className="size-18 rounded border border-edge object-cover"
          />
        </a>
      ))}
      {missing && <span className="text-xs">no photo: {missing}</span>}
      {mayAdd && <AddPhoto jobId={jobId} weight={weight} />}
    </div>
  );
}

function AddPhoto({ jobId, weight }: { jobId: number; weight: LedgerWeightDto }) {
  return (
    <Dialog
      title={`Photo of ${formatMass(weight.massG)} in plane ${weight.planeName}`}
      trigger={<Button variant="quiet">Add photo…</Button>}
    >
      <StepForm jobId={jobId} action={addPhotoAction} button="Add this photo">
        {(state) => (
          <>
            <input type="hidden" name="weightId" value={weight.id} />
            <PhotoField
              name="photo"
              label="Photo of the weight, the mark in the picture"
              hint="Only while the rotor stands still and is locked out."
              state={state}
            />
          </>
        )}
      </StepForm>
    </Dialog>
  );
}
