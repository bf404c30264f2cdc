import type { EntityManager } from '@mikro-orm/postgresql';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { CautionShown } from '@/entities/caution';
import { Photo, WeightFixing } from '@/entities/photo';
import { Weight } from '@/entities/weight';
import type { Result } from '@/lib/domain/result';
import { addPhoto } from '@/lib/server/commands/add-photo';
import { fitWeight } from '@/lib/server/commands/fit-weight';
import { stopJob } from '@/lib/server/commands/stop-job';
import { photoResponse } from '@/lib/server/photo/photo-response';
import { weightPhoto } from '@/lib/server/queries/weight-photo';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from './job-driver';
import { phoneJpeg, pngFile } from './photo-files';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let job: JobDriver;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
  job = await JobDriver.open(plant.at('technician'), plant.home, {
    kind: 'one-plane',
    speedRpm: 990,
  });
  valueOf(await job.run('base', [{ amp: 3.9, deg: 100 }]));
  await job.acceptBase('One base run.');
});

afterAll(() => close());

type More = Partial<Parameters<typeof fitWeight>[1]>;

const fit = (more: More) =>
  fitWeight(plant.at('technician'), {
    jobId: job.jobId,
    purpose: 'trial',
    planeId: plant.home.planeIds[0],
    massG: '20',
    massSource: 'scale',
    radiusMm: '700',
    angleDeg: '30',
    angleSense: 'against',
    arcMm: '',
    fixing: 'clamp',
    fixingKind: 'temporary',
    standingStill: 'on',
    fixingHolds: 'on',
    namedPerson: 'Ida Berg',
    ...more,
  });

const failureOf = (result: Result<unknown>) => (result.ok ? null : result.failure);
const textFile = () => new File(['time,signal\n0,1\n'], 'fan.jpg', { type: 'image/jpeg' });

describe('a fit card without what it needs records nothing', () => {
  it.each<[string, More, string]>([
    ['neither photo nor reason', {}, 'photo-needed'],
    // What a browser sends for a file box that was left alone.
    ['an empty file box', { photo: new File([], 'undefined') }, 'photo-needed'],
    [
      'another reason that is not written',
      { noPhoto: 'other', noPhotoOther: ' ' },
      'reason-needed',
    ],
    ['a bolt that is not locked', { fixingKind: 'bolt', noPhoto: 'later' }, 'not-secured'],
    [
      'a weld without the earth clamp',
      { fixingKind: 'weld', secured: 'on', noPhoto: 'later' },
      'caution',
    ],
    ['no word on how it is held', { fixingKind: undefined, noPhoto: 'later' }, 'input'],
  ])('%s', async (_what, more, code) => {
    const before = await em.fork().count(Weight);
    expect(failureOf(await fit(more))?.code).toBe(code);
    expect(await em.fork().count(Weight)).toBe(before);
  });

  it('a text file with the name of a photo, refused by its name', async () => {
    const failure = failureOf(await fit({ photo: textFile() }));
    expect(failure).toMatchObject({ code: 'photo-type', field: 'photo' });
    expect(failure?.message).toContain('fan.jpg is no photo by its content: JPEG, PNG or WebP');
  });

  it('a photo that ends in the middle, and one of more than 50 MB', async () => {
    const whole = await phoneJpeg('half.jpg', 400, 300);
    const half = new File([(await whole.arrayBuffer()).slice(0, 300)], 'half.jpg');
    expect(failureOf(await fit({ photo: half }))?.message).toContain(
      'half.jpg begins like a photo',
    );
    const huge = new File([new Uint8Array(50_000_001)], 'huge.jpg');
    expect(failureOf(await fit({ photo: huge }))?.code).toBe('too-large');
  });
});

describe('a welded weight with a phone’s photo', () => {
  let weightId: number;
  let original: File;

  beforeAll(async () => {
    original = await phoneJpeg('IMG_1.jpg', 3000, 1500);
    const more = { photo: original, fixingKind: 'weld', secured: 'on', earthClamp: 'on' } as const;
    ({ weightId } = valueOf(await fit(more)));
  });

  it('keeps fixing, caution and audit rows', async () => {
    const fresh = em.fork();
    const fixing = await fresh.findOneOrFail(WeightFixing, { weight: weightId });
    expect(fixing).toMatchObject({ kind: 'weld', secured: true, noPhotoReason: null });
    const step = `fit weight ${weightId}`;
    const shown = await fresh.find(CautionShown, { job: job.jobId, step });
    expect(shown.map(({ cautionId }) => cautionId)).toContain('SAF-10');
    const photo = await fresh.findOneOrFail(Photo, { weight: weightId });
    expect(
      await fresh.count(AuditEvent, { entity: 'Photo', entityId: photo.id, action: 'fitWeight' }),
    ).toBe(1);
    const audited = await fresh.findOneOrFail(AuditEvent, { entity: 'Weight', entityId: weightId });
    expect(audited.after).toMatchObject({ photo: 'IMG_1.jpg', fixingKind: 'weld' });
  });

  it('keeps it upright, at most 2400 px long, without place and name', async () => {
    const sent = Buffer.from(await original.arrayBuffer());
    expect(sent.includes('WGS-84')).toBe(true);
    expect(sent.includes('Ida Berg')).toBe(true);
    const [photo] = (await job.sheet()).weights.at(-1)?.photos ?? [];
    // 3000 × 1500 lying: upright it is 1500 × 3000, and 1200 × 2400 at the size kept.
    expect(photo).toMatchObject({ widthPx: 1200, heightPx: 2400 });
    const kept = await weightPhoto(plant.at('reader'), { photoId: photo!.id, size: 'full' });
    const { exif, xmp, orientation, format, width, height } = await sharp(kept!).metadata();
    expect({ exif, xmp, orientation }).toEqual({});
    expect({ format, width, height }).toEqual({ format: 'jpeg', width: 1200, height: 2400 });
    expect(kept!.includes('WGS-84')).toBe(false);
    expect(kept!.includes('Ida Berg')).toBe(false);
    const small = await weightPhoto(plant.at('reader'), { photoId: photo!.id, size: 'thumbnail' });
    expect(await sharp(small!).metadata()).toMatchObject({ width: 160, height: 320 });
  });

  it('is served so that nothing in it can run and only the asker keeps it', () => {
    const { headers } = photoResponse(new Uint8Array([1]));
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('content-security-policy')).toBe("default-src 'none'; sandbox");
    expect(headers.get('cache-control')).toBe('private, max-age=3600');
    expect(headers.get('content-type')).toBe('image/jpeg');
  });

  it('is not there for a person of another site', async () => {
    const [photo] = (await job.sheet()).weights.at(-1)?.photos ?? [];
    const asked = { photoId: photo!.id, size: 'full' } as const;
    expect(await weightPhoto(plant.foreigner, asked)).toBeNull();
    expect(await weightPhoto(plant.at('technician'), asked)).not.toBeNull();
  });

  it('stays as it is: the database refuses to change or delete it', async () => {
    const connection = em.fork().getConnection();
    const refused = /append-only/;
    await expect(connection.execute(`update photo set file_name = 'x'`)).rejects.toThrow(refused);
    await expect(connection.execute('delete from weight_fixing')).rejects.toThrow(refused);
  });
});

describe('a photo added later', () => {
  const add = (weightId: number, photo: File | '') =>
    addPhoto(plant.at('technician'), { jobId: job.jobId, weightId, photo });

  it('joins the weight with its own audit row, once, while the job is open', async () => {
    const { id } = (await job.sheet()).weights.at(-1)!;
    const later = await pngFile('later.png');
    const { photoId } = valueOf(await add(id, later));
    const photos = (await job.sheet()).weights.at(-1)?.photos ?? [];
    expect(photos.map((photo) => photo.id)).toContain(photoId);
    const rows = { entity: 'Photo', entityId: photoId, action: 'addPhoto' };
    expect(await em.fork().count(AuditEvent, rows)).toBe(1);
    expect(failureOf(await add(id, later))?.message).toContain('later.png is with this weight');
    expect(failureOf(await add(id, ''))?.code).toBe('photo-needed');
    expect(failureOf(await add(id, textFile()))?.code).toBe('photo-type');
    expect(failureOf(await add(999_999, await pngFile('x.png')))?.code).toBe('not-found');
    const reader = await addPhoto(plant.at('reader'), {
      jobId: job.jobId,
      weightId: id,
      photo: later,
    });
    expect(failureOf(reader)?.code).toBe('forbidden');
    valueOf(
      await stopJob(plant.at('technician'), {
        jobId: job.jobId,
        outcome: 'stopped safe',
        reason: 'The bearing is loose.',
        rotorState: '20 g in plane W, welded.',
        safe: 'on',
      }),
    );
    expect(failureOf(await add(id, await pngFile('too late.png', 50)))?.code).toBe('closed');
  });
});
