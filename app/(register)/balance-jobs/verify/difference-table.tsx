import { RowHead, Table, Td, Th } from '@/components/ui/table';
import type { ContentDifference } from '@/lib/domain/balance-job/content-differences';
import { formatCount } from '@/lib/format';

type DifferenceTableProps = {
  caption: string;
  sides: readonly [string, string];
  differences: readonly ContentDifference[];
  /** Said where there is no difference. */
  none: string;
};

const MOST = 40;

/** Each place that differs, with what either side says. */
export function DifferenceTable({ caption, sides, differences, none }: DifferenceTableProps) {
  if (differences.length === 0) return <p>{none}</p>;
  const shown = differences.slice(0, MOST);
  return (
    <>
      <Table caption={caption} captionShown>
        <thead>
          <tr>
            <Th>place</Th>
            <Th>{sides[0]}</Th>
            <Th>{sides[1]}</Th>
          </tr>
        </thead>
        <tbody>
          {shown.map(({ path, one, other }) => (
            <tr key={path}>
              <RowHead>{path}</RowHead>
              <Td className="break-words">{one}</Td>
              <Td className="break-words">{other}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {shown.length < differences.length && (
        <p className="text-sm">
          {formatCount(shown.length, differences.length)} differences shown.
        </p>
      )}
    </>
  );
}
