import type { ColumnDto, PreviewDto } from '@/lib/schemas/in-tray';
import type { DelimiterName } from '@/lib/schemas/upload-input';

/** What a person chose, as the form holds it. */
export type Choices = {
  delimiter: DelimiterName;
  decimalMark: '' | 'point' | 'comma';
  sampleRateHz: string;
  columns: { role: ColumnDto['role']; unit: NonNullable<ColumnDto['unit']> | '' }[];
};

/** The choices that confirm a proposal as it is. */
export function choicesOf({ layout }: PreviewDto): Choices {
  return {
    delimiter: layout.delimiter,
    decimalMark: layout.decimalMark ?? '',
    sampleRateHz: layout.sampleRateHz === null ? '' : String(layout.sampleRateHz),
    columns: layout.columns.map(({ role, unit }) => ({ role, unit: unit ?? '' })),
  };
}

/**
 * The columns as the file is cut now, with what is chosen for each. Another delimiter cuts other
 * columns: until one of them is touched, what the server proposes for them counts.
 */
export function columnsFor({ layout }: PreviewDto, { columns }: Choices): ColumnDto[] {
  return layout.columns.map((column) => {
    const choice = columns[column.index];
    if (!choice) return column;
    return { ...column, role: choice.role, unit: choice.unit === '' ? null : choice.unit };
  });
}

/** The choices with one column changed; the others stay as they are shown. */
export function withColumn(
  choices: Choices,
  shown: readonly ColumnDto[],
  changed: Pick<ColumnDto, 'index' | 'role' | 'unit'>,
): Choices {
  const columns = shown.map(({ index, role, unit }) => {
    const now = index === changed.index ? changed : { role, unit };
    return { role: now.role, unit: now.unit ?? ('' as const) };
  });
  return { ...choices, columns };
}
