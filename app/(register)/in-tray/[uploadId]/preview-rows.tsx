'use client';

import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { ColumnDto, PreviewDto } from '@/lib/schemas/in-tray';
import { columnsFor, type Choices } from './choices';

const ROLE_WORDS: Readonly<Record<ColumnDto['role'], string>> = {
  signal: 'the vibration',
  time: 'time',
  tacho: 'tacho',
  ignore: 'left out',
};

/** The first rows of the file with their line numbers, cut as chosen. */
export function PreviewRows({ preview, choices }: { preview: PreviewDto; choices: Choices }) {
  const columns = columnsFor(preview, choices);
  if (preview.rows.length === 0) return null;
  return (
    <Panel title="First rows" note="as they stand in the file">
      <div className="max-h-96 max-w-4xl overflow-y-auto">
        <Table caption="The first rows of the file">
          <thead>
            <tr>
              <Th>line</Th>
              {columns.map(({ index, name, role, unit }) => (
                <Th key={index} numeric>
                  {name === '' ? `column ${index + 1}` : name}
                  <span className="block font-normal">
                    {ROLE_WORDS[role]}
                    {unit === null || role === 'ignore' ? '' : `, ${unit}`}
                  </span>
                </Th>
              ))}
            </tr>
          </thead>
          <tbody>
            {preview.rows.map(({ row, cells }) => (
              <tr key={row}>
                <RowHead>{row}</RowHead>
                {columns.map(({ index, role }) => (
                  <Td key={index} numeric className={role === 'ignore' ? 'text-ink-soft' : ''}>
                    {cells[index] ?? ''}
                  </Td>
                ))}
              </tr>
            ))}
          </tbody>
        </Table>
      </div>
    </Panel>
  );
}
