'use client';

import { useState } from 'react';
import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { Field } from '@/components/ui/field';
import { PhotoField } from '@/components/ui/photo-field';
import { SelectField } from '@/components/ui/select-field';
import { CAUTIONS } from '@/lib/domain/cautions';
import type { ActionState } from '@/lib/schemas/action-state';
import { NO_PHOTO_REASONS } from '@/lib/schemas/photo-input';

const KINDS = [
  { value: 'temporary', label: 'temporarily (clamp, wire, magnet)' },
  { value: 'weld', label: 'welded' },
  { value: 'bolt', label: 'bolted' },
  { value: 'rivet', label: 'riveted' },
  { value: 'set screw', label: 'set screw' },
  { value: 'clip', label: 'clip' },
];

const SECURED: Readonly<Record<string, string>> = {
  weld: 'The weld is looked at and free of cracks.',
  bolt: 'The bolt is torqued and locked.',
  rivet: 'The rivet sits tight.',
  'set screw': 'The set screw is torqued and locked.',
  clip: 'The clip is locked and sits where turning seats it.',
};

/**
 * How the weight is held, what that needs, and a photo of it with the mark in the picture. The
 * two choices keep their own value: a failed action resets a form, and the box shows what was typed.
 */
export function FixingFields({ state }: { state: ActionState }) {
  const [kind, setKind] = useState('');
  const [noPhoto, setNoPhoto] = useState('');
  const secured = SECURED[kind];
  return (
    <>
      <SelectField
        name="fixingKind"
        label="How it is held"
        placeholder="Choose how"
        options={KINDS}
        state={state}
        onChange={(event) => setKind(event.target.value)}
      />
      <Field name="fixing" label="Fixed by" state={state} hint="size and piece: M8 bolt, clamp" />
      {secured && <CheckField name="secured" label={secured} state={state} />}
      {kind === 'weld' && (
        <Caution
          code="SAF-10"
          tick={
            <CheckField
              name="earthClamp"
              state={state}
              label="The earth clamp was on the rotor next to the weld."
            />
          }
        >
          {CAUTIONS['SAF-10'].text}
        </Caution>
      )}
      <PhotoField
        name="photo"
        label="Photo of the weight, the mark in the picture"
        hint="JPEG, PNG or WebP. Place and camera are removed from it."
        state={state}
      />
      <SelectField
        name="noPhoto"
        label="or no photo, because"
        placeholder="A photo is taken"
        options={NO_PHOTO_REASONS.map((reason) => ({ value: reason, label: reason }))}
        state={state}
        onChange={(event) => setNoPhoto(event.target.value)}
      />
      {noPhoto === 'other' && (
        <Field name="noPhotoOther" label="Why there is no photo" state={state} />
      )}
    </>
  );
}
