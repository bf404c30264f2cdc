import 'server-only';
import sharp from 'sharp';
import { fail, ok, type Result } from '@/lib/domain/result';
import { formatBytes } from '@/lib/format';
import { PHOTO_BYTES_MAX } from '@/lib/schemas/photo-input';

/** A photo as it is kept: upright JPEG without any metadata, and a small one of it. */
export type PreparedPhoto = {
  fileName: string;
  picture: Uint8Array;
  thumbnail: Uint8Array;
  widthPx: number;
  heightPx: number;
};

const LONG_SIDE_PX = 2400;
const THUMBNAIL_PX = 320;
/** More than any camera of the trade has; keeps a small file from unpacking into all memory. */
const PIXELS_MAX = 120_000_000;

/**
 * Takes a photo in: told by its first bytes (JPEG, PNG, WebP), turned upright as the camera says, long side
 * at most 2400 px, and written anew as JPEG, which leaves place, camera and everything else of the file behind.
 *
 * @returns the pictures, or a failure that names the file
 */
export async function preparePhoto(file: File): Promise<Result<PreparedPhoto>> {
  if (file.size > PHOTO_BYTES_MAX)
    return fail(
      'too-large',
      `${file.name} has ${formatBytes(file.size)} and a photo may have ${formatBytes(PHOTO_BYTES_MAX)}: take it with a lower resolution.`,
      'photo',
    );
  const bytes = new Uint8Array(await file.arrayBuffer());
  if (!isPhoto(bytes))
    return fail(
      'photo-type',
      `${file.name} is no photo by its content: JPEG, PNG or WebP is expected, whatever the name says. Choose the picture itself.`,
      'photo',
    );
  try {
    return ok({ fileName: file.name.slice(0, 200), ...(await written(bytes)) });
  } catch {
    return fail(
      'photo-broken',
      `${file.name} begins like a photo and cannot be read as one. Take it again, or choose another.`,
      'photo',
    );
  }
}

async function written(bytes: Uint8Array) {
  const { data, info } = await sharp(bytes, { limitInputPixels: PIXELS_MAX })
    .autoOrient()
    .flatten({ background: '#ffffff' })
    .resize(inside(LONG_SIDE_PX))
    .jpeg({ quality: 85 })
    .toBuffer({ resolveWithObject: true });
  const thumbnail = await sharp(data).resize(inside(THUMBNAIL_PX)).jpeg({ quality: 75 }).toBuffer();
  return { picture: data, thumbnail, widthPx: info.width, heightPx: info.height };
}

function inside(px: number) {
  return { width: px, height: px, fit: 'inside', withoutEnlargement: true } as const;
}

/** First bytes of the three kinds. Source: JPEG (ITU-T T.81), PNG (W3C), WebP container (from memory). */
function isPhoto(bytes: Uint8Array): boolean {
  const starts = (at: number, expected: readonly number[]) =>
    expected.every((byte, i) => bytes[at + i] === byte);
  const isJpeg = starts(0, [0xff, 0xd8, 0xff]);
  const isPng = starts(0, [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  const isWebp = starts(0, [0x52, 0x49, 0x46, 0x46]) && starts(8, [0x57, 0x45, 0x42, 0x50]);
  return isJpeg || isPng || isWebp;
}
