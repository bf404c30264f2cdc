import 'server-only';
import type { z } from 'zod';
import type { Upload } from '@/entities/upload';
import { applyColumnChoices } from '@/lib/domain/intake/apply-column-choices';
import type { ColumnLayout } from '@/lib/domain/intake/column-layout';
import { proposeColumnLayout } from '@/lib/domain/intake/propose-column-layout';
import { readWaveformCsv, type WaveformRead } from '@/lib/domain/intake/read-waveform-csv';
import { downsampleMinMax } from '@/lib/domain/signal/downsample-min-max';
import { tachoEdges } from '@/lib/domain/signal/tacho-edges';
import type { LayoutDto, PlotDto, PreviewDto } from '@/lib/schemas/in-tray';
import { delimiterName, type layoutChoices } from '@/lib/schemas/upload-input';
import { unitWord } from '../measure/unit-word';
import { baseLayout } from './chosen-layout';
import { readUploadLayout } from './upload-layout';

type Choices = z.output<typeof layoutChoices>;

/** Pairs of points a preview is drawn with. */
const BUCKETS = 600;
const TURNS_SENT = 2000;

/** How a file reads with a person's choices, or as proposed where there are none. */
export function readPreview(
  bytes: Uint8Array,
  upload: Pick<Upload, 'fileName' | 'layout'>,
  choices: Choices | null,
): PreviewDto {
  const { delimiter, questions } = startOf(upload, choices);
  const rows = rowsOf(bytes, upload.fileName, delimiter);
  const base = baseLayout(bytes, upload, delimiter);
  if (!base.ok) return { ...NOTHING, rows, problem: base.failure.message };
  const proposed = base.value.layout;
  const chosen = choices?.columns.length ? applyColumnChoices(proposed, choices) : null;
  const layout = chosen?.ok ? chosen.value : proposed;
  const shown = { layout: layoutDto(layout), questions, rows };
  if (chosen?.ok === false) return { ...shown, problem: chosen.failure.message, plot: null };
  const open = chosen === null && questions.some(({ blocking }) => blocking);
  return { ...shown, ...(open ? UNREAD : reading(bytes, layout, upload.fileName)) };
}

/** Which delimiter cuts the file, and what is asked of it then. */
function startOf({ layout }: Pick<Upload, 'layout'>, choices: Choices | null) {
  const kept = readUploadLayout(layout);
  const delimiter = choices ? choices.delimiter : (kept?.layout.delimiter ?? null);
  return { delimiter, questions: kept?.layout.delimiter === delimiter ? [...kept.questions] : [] };
}

const UNREAD = { problem: null, plot: null };

function reading(bytes: Uint8Array, layout: ColumnLayout, fileName: string) {
  const read = readWaveformCsv(bytes, layout, fileName);
  return read.ok
    ? { problem: null, plot: plotOf(read.value) }
    : { problem: read.failure.message, plot: null };
}

/** The first rows as the delimiter cuts them, readable or not. */
function rowsOf(bytes: Uint8Array, fileName: string, delimiter: ColumnLayout['delimiter']) {
  const proposal = proposeColumnLayout(bytes, fileName, delimiter);
  if (!proposal.ok) return [];
  return proposal.value.previewRows.map(({ row, cells }) => ({ row, cells: [...cells] }));
}

const NOTHING: PreviewDto = {
  layout: {
    delimiter: 'none',
    decimalMark: null,
    encoding: 'utf-8',
    headerRow: false,
    columns: [],
    sampleRateHz: null,
    speedRpm: null,
  },
  questions: [],
  rows: [],
  problem: null,
  plot: null,
};

function layoutDto(layout: ColumnLayout): LayoutDto {
  return {
    delimiter: delimiterName(layout.delimiter),
    decimalMark: layout.decimalMark,
    encoding: layout.encoding,
    headerRow: layout.headerRow,
    columns: layout.columns.map(({ index, name, role, unit }) => ({ index, name, role, unit })),
    sampleRateHz: layout.sampleRateHz,
    speedRpm: layout.speedRpm,
  };
}

function plotOf(read: WaveformRead): PlotDto {
  const { samples, sampleRateHz, tacho, quantity, unit, rateSource, n, doubts } = read;
  const { indices, values } = downsampleMinMax(samples, BUCKETS);
  const edges = tacho === null ? null : tachoEdges(tacho, sampleRateHz);
  return {
    seconds: Array.from(indices, (i) => i / sampleRateHz),
    values: Array.from(values),
    sampleCount: n,
    quantity,
    unit: unitWord(unit),
    sampleRateHz,
    rateSource,
    durationS: n / sampleRateHz,
    turns: edges?.ok === true ? Array.from(edges.value.edgesS.slice(0, TURNS_SENT)) : [],
    doubts: doubts.map(({ message }) => message),
  };
}
