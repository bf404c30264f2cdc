import { ok, type Result } from '../result';
import type { VibrationQuantity } from '../signal/quantity';
import { columnOf, type ColumnLayout, type LayoutColumn, type SignalUnit } from './column-layout';
import { detectEncoding, decodeText, singleBytes } from './decode-text';
import { fileFacts, type FileFacts } from './file-facts';
import { headLines, headTable, type HeadTable } from './head-table';
import { intakeFailure, type IntakeFailure } from './intake-failure';
import { printedDecimals } from './printed-decimals';
import { readIrregularColumns } from './read-irregular-columns';
import {
  offsetOfRow,
  readNumberColumns,
  type NumberColumns,
  type TablePlan,
} from './read-number-columns';
import { isSignalUnit, isTimeUnit, secondsPer, signalScale } from './signal-scale';
import { rateOfTimeColumn } from './time-column';

/** Something odd about a file that does not stop it from being read. */
export type IntakeDoubt = { readonly code: 'RATE_DISAGREES'; readonly message: string };

/**
 * A record read from a file. `samples` are as the file gives them, in `unit`; times `scale` they are
 * in the kept unit of `quantity` (m/s², mm/s, µm).
 */
export type WaveformRead = {
  readonly samples: Float64Array;
  readonly tacho: Float64Array | null;
  readonly sampleRateHz: number;
  readonly rateSource: 'time column' | 'stated';
  readonly speedRpm: number | null;
  readonly quantity: VibrationQuantity;
  readonly unit: SignalUnit;
  readonly scale: number;
  readonly n: number;
  readonly doubts: readonly IntakeDoubt[];
};

/** Fewest samples that make a record. */
export const ROWS_MIN = 16;
const RATE_SHARE_MAX = 0.001;
const QUOTE = 34;
const TAIL_BYTES = 8192;

/**
 * Reads a waveform file with a confirmed layout. Regular files go through the single-pass reader,
 * files with quoted cells through papaparse; both give the same. The sample rate is that of the time
 * column; without one, the layout's or the file's own statement. A statement more than 0.1 % from
 * the time column is a doubt, not a failure. Every failure names file, row, column and value.
 */
export function readWaveformCsv(
  bytes: Uint8Array,
  layout: ColumnLayout,
  fileName: string,
): Result<WaveformRead, IntakeFailure> {
  const encoding = detectEncoding(bytes, fileName);
  if (!encoding.ok) return encoding;
  const { decimalMark: mark, delimiter, columns } = layout;
  const unit = columnOf(layout, 'signal')?.unit ?? null;
  if (mark === null || !isSignalUnit(unit)) return undecided(fileName);
  const head = headTable(headLines(bytes, encoding.value), delimiter);
  const plan = { fileName, delimiter, mark, columns, firstRow: firstRowOf(layout, head) };
  const body = singleBytes(bytes, encoding.value);
  const table = readTable(body, plan);
  if (!table.ok) return table;
  if (table.value.rows < ROWS_MIN) return tooFew(fileName, table.value.rows);
  return recordOf({ table: table.value, plan, head, body, layout }, unit);
}

function recordOf(input: TableRead, unit: SignalUnit): Result<WaveformRead, IntakeFailure> {
  const { table, plan, head, layout } = input;
  const facts = fileFacts(head.statements, plan.mark);
  const rate = rateOf(input, layout.sampleRateHz ?? facts.sampleRateHz);
  if (!rate.ok) return rate;
  const { quantity, scale } = signalScale(unit);
  return ok({
    samples: valuesOf(table, layout, 'signal') ?? new Float64Array(0),
    tacho: valuesOf(table, layout, 'tacho'),
    ...rate.value,
    speedRpm: layout.speedRpm ?? facts.speedRpm,
    quantity,
    unit,
    scale,
    n: table.rows,
    doubts: [...rate.value.doubts, ...statementDoubts(layout, facts)],
  });
}

function firstRowOf(layout: ColumnLayout, { header, rows }: HeadTable): number {
  return layout.headerRow && header !== null ? header.row + 1 : (rows[0]?.row ?? 1);
}

function valuesOf(
  table: NumberColumns,
  layout: ColumnLayout,
  role: LayoutColumn['role'],
): Float64Array | null {
  return table.values.get(columnOf(layout, role)?.index ?? -1) ?? null;
}

function readTable(bytes: Uint8Array, plan: TablePlan): Result<NumberColumns, IntakeFailure> {
  const start = offsetOfRow(bytes, plan.firstRow);
  return bytes.includes(QUOTE, start)
    ? readIrregularColumns(decodeText(bytes.subarray(start), 'latin-1'), plan)
    : readNumberColumns(bytes, plan);
}

function undecided(fileName: string): ReturnType<typeof intakeFailure> {
  const sentence =
    'the layout is not decided yet; state the decimal mark and the unit of the signal column.';
  return intakeFailure('LAYOUT_UNDECIDED', fileName, {}, sentence);
}

function tooFew(fileName: string, rows: number): ReturnType<typeof intakeFailure> {
  const sentence = `the file holds ${rows} samples and at least ${ROWS_MIN} are needed; record for longer.`;
  return intakeFailure('TOO_FEW_ROWS', fileName, {}, sentence);
}

type Rate = Pick<WaveformRead, 'sampleRateHz' | 'rateSource' | 'doubts'>;
type TableRead = {
  readonly table: NumberColumns;
  readonly plan: TablePlan;
  readonly head: HeadTable;
  readonly body: Uint8Array;
  readonly layout: ColumnLayout;
};

function rateOf(
  { table, plan, head, body }: TableRead,
  stated: number | null,
): Result<Rate, IntakeFailure> {
  const { fileName } = plan;
  const time = plan.columns.find(({ role }) => role === 'time');
  if (time === undefined) {
    if (stated !== null && stated > 0) {
      return ok({ sampleRateHz: stated, rateSource: 'stated', doubts: [] });
    }
    const sentence = 'the file states no sample rate and has no time column; enter the rate.';
    return intakeFailure('RATE_UNKNOWN', fileName, {}, sentence);
  }
  const rate = rateOfTimeColumn(
    {
      times: table.values.get(time.index) ?? new Float64Array(0),
      secondsPerUnit: isTimeUnit(time.unit) ? secondsPer(time.unit) : 1,
      decimals: coarsestDecimals(time.index, head, tailRows(body, plan)),
      name: nameOf(time),
    },
    fileName,
    (sample) => plan.firstRow + sample,
  );
  if (!rate.ok) return rate;
  const doubts = stated === null ? [] : disagreement(stated, rate.value, 'the time column gives');
  return ok({ sampleRateHz: rate.value, rateSource: 'time column', doubts });
}

// Numbers printed to a number of digits lose decimals as they grow, so the end of the file counts too.
function coarsestDecimals(
  column: number,
  { rows }: HeadTable,
  tail: readonly (readonly string[])[],
): number {
  const atHead = printedDecimals(rows.map(({ cells }) => cells[column] ?? ''));
  return Math.min(atHead, printedDecimals(tail.map((cells) => cells[column] ?? '')));
}

function tailRows(body: Uint8Array, { delimiter }: TablePlan): string[][] {
  const text = decodeText(body.subarray(-TAIL_BYTES), 'latin-1');
  const lines = text.split('\n').slice(body.length > TAIL_BYTES ? 1 : 0);
  return lines.map((line) => line.replaceAll('"', '').split(delimiter ?? '\n'));
}

function nameOf({ name, index }: LayoutColumn): string {
  return name === '' ? String(index + 1) : name;
}

function statementDoubts(layout: ColumnLayout, facts: FileFacts): IntakeDoubt[] {
  if (layout.sampleRateHz === null || facts.sampleRateHz === null) return [];
  return disagreement(layout.sampleRateHz, facts.sampleRateHz, 'the file itself states');
}

function disagreement(stated: number, found: number, source: string): IntakeDoubt[] {
  if (Math.abs(stated / found - 1) <= RATE_SHARE_MAX) return [];
  const message = `A sample rate of ${stated} Hz is stated and ${source} ${Number(found.toPrecision(6))} Hz: find out which is right.`;
  return [{ code: 'RATE_DISAGREES', message }];
}
