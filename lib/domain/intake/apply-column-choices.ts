import { fail, ok, type Failure, type Result } from '../result';
import { quantityOfUnit } from './column-name';
import type { ColumnLayout, DecimalMark, LayoutColumn } from './column-layout';
import { isSignalUnit, isTimeUnit } from './signal-scale';

/** What a person chose for one column. */
export type ColumnChoice = {
  readonly role: LayoutColumn['role'];
  readonly unit: LayoutColumn['unit'];
};

/** What a person chose for a file: one choice a column, in the order of the file. */
export type LayoutChoices = {
  readonly columns: readonly ColumnChoice[];
  readonly decimalMark: DecimalMark | null;
  readonly sampleRateHz: number | null;
};

type Wrong = Failure<'COLUMNS' | 'SIGNAL_UNIT' | 'DECIMAL_MARK' | 'SAMPLE_RATE'>;

/**
 * A layout with a person's choices in the place of what was proposed. One column is the vibration
 * and has a unit of it; at most one is the time and at most one the tacho; the decimal mark is
 * decided; a file without a time column has a sample rate in Hz. What is not so fails with the field
 * it belongs to (`columns.0.role`, `columns.0.unit`, `decimalMark`, `sampleRateHz`).
 */
export function applyColumnChoices(
  proposed: ColumnLayout,
  choices: LayoutChoices,
): Result<ColumnLayout, Wrong> {
  const columns = proposed.columns.map((column) => chosen(column, choices.columns[column.index]));
  const wrong = wrongColumns(columns) ?? undecided(choices, columns);
  if (wrong !== null) return wrong;
  const { decimalMark, sampleRateHz } = choices;
  return ok({ ...proposed, columns, decimalMark, sampleRateHz });
}

function chosen(column: LayoutColumn, choice: ColumnChoice | undefined): LayoutColumn {
  if (choice === undefined) return column;
  const { role, unit } = choice;
  if (role === 'signal' && isSignalUnit(unit)) {
    return { ...column, role, unit, quantity: quantityOfUnit(unit) };
  }
  if (role === 'signal') return { ...column, role, unit: null, quantity: null };
  if (role === 'time') {
    return { ...column, role, unit: isTimeUnit(unit) ? unit : 's', quantity: null };
  }
  if (role === 'tacho') return { ...column, role, unit: null, quantity: null };
  return { ...column, role };
}

function wrongColumns(columns: readonly LayoutColumn[]) {
  const signals = columns.filter(({ role }) => role === 'signal');
  const signal = signals[0];
  if (signal === undefined) {
    return fail(
      'COLUMNS',
      'No column is the vibration: choose which one is read.',
      'columns.0.role',
    );
  }
  const second = secondOf(columns, 'signal') ?? secondOf(columns, 'time');
  const doubled = second ?? secondOf(columns, 'tacho');
  if (doubled !== undefined) {
    const word = { signal: 'the vibration', time: 'the time', tacho: 'the tacho', ignore: '' };
    return fail(
      'COLUMNS',
      `Two columns are ${word[doubled.role]}: leave one of them out.`,
      `columns.${doubled.index}.role`,
    );
  }
  if (isSignalUnit(signal.unit)) return null;
  return fail(
    'SIGNAL_UNIT',
    `Column ${signal.index + 1} has no unit yet: choose the unit of the vibration.`,
    `columns.${signal.index}.unit`,
  );
}

function secondOf(columns: readonly LayoutColumn[], wanted: LayoutColumn['role']) {
  return columns.filter(({ role }) => role === wanted)[1];
}

function undecided({ decimalMark, sampleRateHz }: LayoutChoices, columns: readonly LayoutColumn[]) {
  if (decimalMark === null) {
    return fail('DECIMAL_MARK', 'Choose which decimal mark this file uses.', 'decimalMark');
  }
  const timed = columns.some(({ role }) => role === 'time');
  if (timed || sampleRateHz !== null) return null;
  return fail(
    'SAMPLE_RATE',
    'There is no time column: write how many samples a second were taken.',
    'sampleRateHz',
  );
}
