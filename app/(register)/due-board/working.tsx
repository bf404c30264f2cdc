import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { DUE_WEIGHTS } from '@/lib/domain/due/due-card';
import type { DueFigure, DuePart } from '@/lib/domain/due/due-machine';
import { formatNumber, formatQuantity, NOT_KNOWN, type DecimalMark } from '@/lib/format';
import type { DueBoardCard } from '@/lib/schemas/due-board';

type WorkingProps = { card: DueBoardCard; decimalMark: DecimalMark };

/** How the score came about: every part with what went in, and the sum. */
export function Working({ card, decimalMark }: WorkingProps) {
  const number = (value: number, decimals = 3) => formatNumber(value, { decimals, decimalMark });
  return (
    <details className="min-w-0 grow basis-80">
      <summary className="link w-fit cursor-pointer py-1">
        The working<span className="sr-only"> of {card.tag}</span>
      </summary>
      <div className="mt-2 flex flex-col gap-2">
        <Table caption={`How the score of ${card.tag} came about`}>
          <thead>
            <tr>
              <Th>part</Th>
              <Th>from</Th>
              <Th numeric>0 to 1</Th>
              <Th numeric>weight</Th>
              <Th>why</Th>
            </tr>
          </thead>
          <tbody>
            {card.parts.map((part) => (
              <PartRow key={part.key} part={part} decimalMark={decimalMark} />
            ))}
          </tbody>
        </Table>
        <p>
          Is it unbalance: the four L multiplied, L = {number(card.likelihood)}. How soon: the
          weighted sum of Z, T, G, C and A, {number(card.urgency)}. Score = 100 × L × sum ={' '}
          {number(card.score, 1)}.
        </p>
      </div>
    </details>
  );
}

function PartRow({ part, decimalMark }: { part: DuePart; decimalMark: DecimalMark }) {
  const weights: Readonly<Partial<Record<DuePart['key'], number>>> = DUE_WEIGHTS;
  const weight = weights[part.key];
  return (
    <tr>
      <RowHead>
        {part.key} <span className="figures font-normal text-ink-soft">{part.symbol}</span>
      </RowHead>
      <Td>{part.inputs.map((figure) => figureWords(figure, decimalMark)).join('; ')}</Td>
      <Td numeric>{formatNumber(part.value, { decimals: 3, decimalMark })}</Td>
      <Td numeric>
        {weight === undefined ? 'factor' : formatNumber(weight, { decimals: 2, decimalMark })}
      </Td>
      <Td>{part.because}</Td>
    </tr>
  );
}

function figureWords({ label, value, unit }: DueFigure, decimalMark: DecimalMark): string {
  return `${label} ${value === null ? NOT_KNOWN : formatQuantity(value, unit, { decimalMark })}`;
}
