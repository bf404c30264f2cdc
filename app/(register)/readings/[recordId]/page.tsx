import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { allows } from '@/lib/domain/access/permissions';
import { formatDateTime } from '@/lib/format';
import type { ReadingPageDto } from '@/lib/schemas/reading-page';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { spectrumData, waveformData } from '@/lib/server/queries/reading-data';
import { readingPage } from '@/lib/server/queries/reading-page';
import { Curves } from './curves';
import { DecidePanel } from './decide-panel';
import { MethodPanel } from './method-panel';
import { ReadingHead } from './reading-head';
import { StateNotice } from './state-notice';
import { ValuesPanel } from './values-panel';

type Place = {
  params: Promise<{ recordId: string }>;
  searchParams: Promise<{ decide?: string; spectrum?: string }>;
};

/** Once per request: the title needs it too. */
const pageOf = cache(async (recordId: number) => readingPage(await requireActor(), recordId));

export async function generateMetadata({ params }: Place): Promise<Metadata> {
  const page = await pageOf(idOf((await params).recordId));
  return { title: page ? titleOf(page) : 'Not found' };
}

export default async function ReadingPage({ params, searchParams }: Place) {
  const actor = await requireActor();
  const recordId = idOf((await params).recordId);
  const page = await pageOf(recordId);
  if (!page) notFound();
  const { decide, spectrum } = await searchParams;
  const kind = kindOf(spectrum);
  const whole = { recordId, from: null, to: null, columns: 600 };
  const [waveform, lines] = await Promise.all([
    waveformData(actor, whole),
    spectrumData(actor, { ...whole, kind, columns: 900 }),
  ]);
  return (
    <>
      <ReadingHead page={page} />
      <StateNotice page={page} />
      <ValuesPanel page={page} />
      {page.waveform && waveform && <Curves page={page} kind={kind} first={{ waveform, lines }} />}
      {page.made && <MethodPanel page={page} made={page.made} />}
      {allows(actor.role, 'measurement:decide') && page.state !== 'lined through' && (
        <DecidePanel page={page} open={decide ?? ''} />
      )}
    </>
  );
}

function titleOf({ place, takenAt, site }: ReadingPageDto): string {
  return `${place.machineTag} ${place.label} · ${formatDateTime(takenAt, site.timeZone)}`;
}

function kindOf(text: string | undefined) {
  return text === 'acceleration' || text === 'envelope' ? text : 'velocity';
}
