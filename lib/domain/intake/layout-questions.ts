import { columnOf, type ColumnLayout } from './column-layout';
import { isSignalUnit } from './signal-scale';
import type { Sniffed } from './sniff-delimiter';

/** Something a file does not say; `blocking` ones must be answered before it can be read. */
export type LayoutQuestion = {
  readonly code:
    | 'COMMA_MEANING'
    | 'DECIMAL_MARK'
    | 'SIGNAL_COLUMN'
    | 'SEVERAL_SIGNALS'
    | 'SIGNAL_UNIT'
    | 'TIME_UNIT'
    | 'SAMPLE_RATE';
  readonly message: string;
  readonly field: string;
  readonly blocking: boolean;
};

/** What must be asked before a layout can be used, most basic first; empty for a complete one. */
export function layoutQuestions(layout: ColumnLayout, sniffed: Sniffed): LayoutQuestion[] {
  return [...markQuestions(layout, sniffed), ...columnQuestions(layout), ...rateQuestions(layout)];
}

function markQuestions({ decimalMark }: ColumnLayout, { comma }: Sniffed): LayoutQuestion[] {
  if (comma === 'undecided') {
    const message = 'Does the comma separate two columns, or is it the decimal mark?';
    return [{ code: 'COMMA_MEANING', message, field: 'delimiter', blocking: true }];
  }
  if (decimalMark !== null) return [];
  const message =
    'Every number has three digits after its mark, so 1,234 may be 1.234 or 1234: which decimal mark does this file use?';
  return [{ code: 'DECIMAL_MARK', message, field: 'decimalMark', blocking: true }];
}

function columnQuestions(layout: ColumnLayout): LayoutQuestion[] {
  const signal = columnOf(layout, 'signal');
  if (signal === undefined) {
    const message = 'Which column holds the vibration?';
    return [{ code: 'SIGNAL_COLUMN', message, field: 'columns', blocking: true }];
  }
  const questions: LayoutQuestion[] = [];
  const others = layout.columns.filter(
    ({ role, quantity }) => role === 'ignore' && quantity !== null,
  );
  if (others.length > 0) {
    const message = `The file holds ${others.length + 1} vibration columns; "${signal.name}" is read here. Is it the right one?`;
    questions.push({ code: 'SEVERAL_SIGNALS', message, field: 'columns', blocking: false });
  }
  if (!isSignalUnit(signal.unit)) {
    const message = `In which unit is column ${signal.index + 1}${signal.name === '' ? '' : ` ("${signal.name}")`}?`;
    questions.push({ code: 'SIGNAL_UNIT', message, field: 'unit', blocking: true });
  }
  return questions;
}

function rateQuestions(layout: ColumnLayout): LayoutQuestion[] {
  const time = columnOf(layout, 'time');
  if (time !== undefined && time.name === '') {
    const message = 'The first column rises evenly and is read as time in seconds. Is that so?';
    return [{ code: 'TIME_UNIT', message, field: 'columns', blocking: false }];
  }
  if (time !== undefined || layout.sampleRateHz !== null) return [];
  const message = 'How many samples a second were taken?';
  return [{ code: 'SAMPLE_RATE', message, field: 'sampleRateHz', blocking: true }];
}
