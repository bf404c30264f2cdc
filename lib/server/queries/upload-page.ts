import 'server-only';
import type { Loaded } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import { Point } from '@/entities/bearing';
import { MeasuredRecord } from '@/entities/measured-record';
import { Upload } from '@/entities/upload';
import { pointInName } from '@/lib/domain/intake/point-in-name';
import type { PreviewDto, UploadPageDto } from '@/lib/schemas/in-tray';
import type { layoutChoices } from '@/lib/schemas/upload-input';
import { readPreview } from '../intake/read-preview';
import { query, type QueryContext } from '../query';
import { visibleUpload } from '../scope';
import { readStoredFile } from '../store/files';

/** A file with how it reads as proposed, and the points of its site it may belong to. */
export const uploadPage = query(
  'measurement:read',
  async (context, uploadId: number): Promise<UploadPageDto | null> => {
    const { em, siteIds } = context;
    const upload = await em.findOne(
      Upload,
      { id: uploadId, site: { $in: siteIds } },
      { populate: ['site', 'person', 'columnLayout'] },
    );
    if (!upload) return null;
    const points = await pointsOf(context, upload.site.id);
    const bytes = await readStoredFile(upload.sha256);
    const saved = upload.columnLayout?.$;
    return {
      upload: await uploadDto(context, upload),
      layoutName: saved ? `${saved.name}, version ${saved.version}` : null,
      preview: readPreview(bytes, upload, null),
      points: points.map(({ id, tag, name, label }) => ({
        id,
        label: `${tag} ${label}`,
        machine: name,
      })),
      suggestedPointId: pointInName(upload.fileName, points),
    };
  },
);

/** How a file reads with a person's choices: asked again whenever they change. */
export const uploadPreview = query(
  'measurement:read',
  async (
    context,
    args: { uploadId: number; choices: z.output<typeof layoutChoices> | null },
  ): Promise<PreviewDto | null> => {
    const upload = await visibleUpload(context, args.uploadId);
    if (!upload) return null;
    return readPreview(await readStoredFile(upload.sha256), upload, args.choices);
  },
);

/** The bytes of a file as they came in. */
export const uploadedFile = query(
  'measurement:read',
  async (context, uploadId: number): Promise<{ fileName: string; bytes: Buffer } | null> => {
    const upload = await visibleUpload(context, uploadId);
    if (!upload) return null;
    return { fileName: upload.fileName, bytes: await readStoredFile(upload.sha256) };
  },
);

async function uploadDto(
  { em }: QueryContext,
  upload: Loaded<Upload, 'site' | 'person' | 'columnLayout'>,
): Promise<UploadPageDto['upload']> {
  const { id, fileName, sizeBytes, at, state, point } = upload;
  const record = await em.findOne(
    MeasuredRecord,
    { upload: id },
    { orderBy: { id: 'desc' }, fields: ['id'] },
  );
  const { id: siteId, name, timeZone, decimalMark } = upload.site.$;
  return {
    id,
    fileName,
    sizeBytes,
    at: at.toISOString(),
    person: upload.person.$.name,
    state,
    site: { id: siteId, name, timeZone, decimalMark },
    pointId: point?.id ?? null,
    recordId: record?.id ?? null,
  };
}

async function pointsOf({ em }: QueryContext, siteId: number) {
  const points = await em.find(
    Point,
    { machine: { site: siteId, state: 'active' } },
    { populate: ['machine'], orderBy: { machine: { tag: 'asc' }, order: 'asc' } },
  );
  return points.map(({ id, label, machine }) => {
    const { tag, name } = machine.$;
    return { id, tag, name, label };
  });
}
