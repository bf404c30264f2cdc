import { queryOptions } from '@tanstack/react-query';
import { routes } from '@/lib/routes';
import type { PreviewDto } from '@/lib/schemas/in-tray';
import type { SpectrumDataDto, SpectrumKind, WaveformDataDto } from '@/lib/schemas/reading-page';
import type { LayoutChoicesInput } from '@/lib/schemas/upload-input';
import { fetchJson } from './fetch-json';

type Stretch = { from: number; to: number } | null;

/** A stretch of a record for the screen; null for all of it. */
export function waveformQuery(recordId: number, stretch: Stretch) {
  return queryOptions({
    queryKey: ['reading', recordId, 'waveform', stretch],
    queryFn: ({ signal }) =>
      fetchJson<WaveformDataDto>(routes.api.waveform(recordId, search({}, stretch)), signal),
    staleTime: Infinity,
  });
}

/** Lines of a record's spectrum for the screen. */
export function spectrumQuery(recordId: number, kind: SpectrumKind, stretch: Stretch) {
  return queryOptions({
    queryKey: ['reading', recordId, 'spectrum', kind, stretch],
    queryFn: ({ signal }) =>
      fetchJson<SpectrumDataDto>(routes.api.spectrum(recordId, search({ kind }, stretch)), signal),
    staleTime: Infinity,
  });
}

/** How a waiting file reads with these choices. */
export function previewQuery(uploadId: number, choices: LayoutChoicesInput) {
  const asked = JSON.stringify(choices);
  return queryOptions({
    queryKey: ['upload', uploadId, 'preview', asked],
    queryFn: ({ signal }) =>
      fetchJson<PreviewDto>(
        `${routes.api.uploadPreview(uploadId)}?choices=${encodeURIComponent(asked)}`,
        signal,
      ),
    staleTime: Infinity,
  });
}

function search(given: Record<string, string>, stretch: Stretch): string {
  const query = new URLSearchParams(given);
  if (stretch !== null) {
    query.set('from', String(stretch.from));
    query.set('to', String(stretch.to));
  }
  const text = query.toString();
  return text === '' ? '' : `?${text}`;
}
