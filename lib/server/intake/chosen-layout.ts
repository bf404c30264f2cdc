import 'server-only';
import type { z } from 'zod';
import type { Upload } from '@/entities/upload';
import { applyColumnChoices } from '@/lib/domain/intake/apply-column-choices';
import type { ColumnLayout } from '@/lib/domain/intake/column-layout';
import { proposeColumnLayout } from '@/lib/domain/intake/propose-column-layout';
import { ok, type Result } from '@/lib/domain/result';
import type { layoutChoices } from '@/lib/schemas/upload-input';
import { keyOfShape, readUploadLayout } from './upload-layout';

type Choices = z.output<typeof layoutChoices>;
export type ChosenLayout = { layout: ColumnLayout; shapeKey: string };

/** The layout a person chose for a file; what they cannot choose (names, encoding) is its own. */
export function chosenLayout(
  bytes: Uint8Array,
  upload: Pick<Upload, 'fileName' | 'layout'>,
  choices: Choices,
): Result<ChosenLayout> {
  const base = baseLayout(bytes, upload, choices.delimiter);
  if (!base.ok) return base;
  const applied = applyColumnChoices(base.value.layout, choices);
  if (applied.ok) return ok({ ...base.value, layout: applied.value });
  const field = `layout.${applied.failure.field ?? 'columns'}`;
  return { ok: false, failure: { ...applied.failure, field } };
}

/** The layout as proposed, or as the file reads with another delimiter. */
export function baseLayout(
  bytes: Uint8Array,
  { fileName, layout }: Pick<Upload, 'fileName' | 'layout'>,
  delimiter: ColumnLayout['delimiter'],
): Result<ChosenLayout> {
  const kept = readUploadLayout(layout);
  if (kept?.layout.delimiter === delimiter)
    return ok({ layout: kept.layout, shapeKey: kept.shapeKey });
  const proposal = proposeColumnLayout(bytes, fileName, delimiter);
  if (!proposal.ok)
    return { ok: false, failure: { ...proposal.failure, field: 'layout.delimiter' } };
  return ok({ layout: proposal.value.layout, shapeKey: keyOfShape(proposal.value) });
}
