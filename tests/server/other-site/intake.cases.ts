import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import { keepHeld, lineThrough, rehome } from '@/lib/server/commands/settle-record';
import { reopenUpload, withdrawUpload } from '@/lib/server/commands/settle-upload';
import { dropPoints } from '@/lib/server/queries/drop-points';
import { inTray } from '@/lib/server/queries/in-tray';
import { inTrayCount } from '@/lib/server/queries/in-tray-count';
import { spectrumData, waveformData } from '@/lib/server/queries/reading-data';
import { readingPage } from '@/lib/server/queries/reading-page';
import { uploadedFile, uploadPage, uploadPreview } from '@/lib/server/queries/upload-page';
import type { OtherSiteCase } from '@/tests/support/other-site';
import type { SmallPlant } from '@/tests/support/plant';
import {
  bytesOf,
  ONE_COLUMN_G,
  sineCsv,
  uploadAndConfirm,
  valueOf,
} from '../intake/records-of-test';

let seed = 500;

/** A file of the home site that waits. */
async function waitingAtHome(plant: SmallPlant): Promise<number> {
  seed += 1;
  const received = await receiveUpload(plant.at('technician'), {
    fileName: `home-${seed}.csv`,
    bytes: bytesOf(sineCsv({ hz: 16.5, rms: 0.03, seed })),
    siteId: null,
    pointId: plant.home.pointIds[0],
  });
  return valueOf(received).uploadId;
}

/** A record of the home site, held because its clock is ahead. */
async function heldAtHome(plant: SmallPlant): Promise<number> {
  seed += 1;
  const held = await uploadAndConfirm(plant.at('technician'), {
    name: `home-${seed}.csv`,
    bytes: bytesOf(sineCsv({ hz: 16.5, rms: 0.03, seed })),
    pointId: plant.home.pointIds[0],
    takenAt: new Date(Date.now() + seed * 3_600_000).toISOString(),
    layout: ONE_COLUMN_G,
    speedRpm: '990',
  });
  return held.recordId;
}

const reason = 'from elsewhere';
const all = { from: null, to: null, columns: 10 };

export const cases: OtherSiteCase[] = [
  {
    name: 'receiveUpload',
    expects: 'not-found',
    run: (foreigner, plant) =>
      receiveUpload(foreigner, {
        fileName: 'a.csv',
        bytes: bytesOf('acceleration_g\n1\n'),
        siteId: null,
        pointId: plant.home.pointIds[0],
      }),
  },
  {
    name: 'confirmUpload',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      confirmUpload(foreigner, {
        uploadId: await waitingAtHome(plant),
        pointId: plant.away.pointIds[0],
        takenAt: new Date().toISOString(),
        speedRpm: '',
        layout: ONE_COLUMN_G,
      }),
  },
  {
    name: 'withdrawUpload',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      withdrawUpload(foreigner, { uploadId: await waitingAtHome(plant), reason }),
  },
  {
    name: 'reopenUpload',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      reopenUpload(foreigner, { uploadId: await waitingAtHome(plant), reason }),
  },
  {
    name: 'keepHeld',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      keepHeld(foreigner, { recordId: await heldAtHome(plant), reason }),
  },
  {
    name: 'lineThrough',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      lineThrough(foreigner, { recordId: await heldAtHome(plant), reason }),
  },
  {
    name: 'rehome',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      rehome(foreigner, {
        recordId: await heldAtHome(plant),
        pointId: plant.away.pointIds[0],
        reason,
      }),
  },
  {
    name: 'inTray',
    expects: 'empty',
    run: async (foreigner, plant) => {
      await waitingAtHome(plant);
      return (await inTray(foreigner, { state: 'all' })).rows;
    },
  },
  {
    name: 'inTrayCount',
    expects: 'empty',
    run: async (foreigner, plant) => {
      await waitingAtHome(plant);
      return Array.from({ length: await inTrayCount(foreigner, undefined) });
    },
  },
  {
    name: 'dropPoints',
    expects: 'empty',
    run: async (foreigner, plant) =>
      (await dropPoints(foreigner, undefined)).filter(({ siteId }) => siteId === plant.home.siteId),
  },
  {
    name: 'uploadPage',
    expects: 'null',
    run: async (foreigner, plant) => uploadPage(foreigner, await waitingAtHome(plant)),
  },
  {
    name: 'uploadPreview',
    expects: 'null',
    run: async (foreigner, plant) =>
      uploadPreview(foreigner, { uploadId: await waitingAtHome(plant), choices: null }),
  },
  {
    name: 'uploadedFile',
    expects: 'null',
    run: async (foreigner, plant) => uploadedFile(foreigner, await waitingAtHome(plant)),
  },
  {
    name: 'readingPage',
    expects: 'null',
    run: async (foreigner, plant) => readingPage(foreigner, await heldAtHome(plant)),
  },
  {
    name: 'waveformData',
    expects: 'null',
    run: async (foreigner, plant) =>
      waveformData(foreigner, { recordId: await heldAtHome(plant), ...all }),
  },
  {
    name: 'spectrumData',
    expects: 'null',
    run: async (foreigner, plant) =>
      spectrumData(foreigner, { recordId: await heldAtHome(plant), kind: 'velocity', ...all }),
  },
];
