import { Notice } from '@/components/ui/notice';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { countedInSense } from '@/lib/domain/balancing/convert-angle';
import {
  formatDegrees,
  formatMass,
  formatQuantity,
  NOT_KNOWN,
  type DecimalMark,
} from '@/lib/format';
import type { AnswerDto } from '@/lib/schemas/balance-job';
import type { AnswerGround } from './answer-ground';
import { Expected } from './expected-readings';
import { PlaceInWords } from './place-in-words';

type AnswerCardProps = { job: AnswerGround; answer: AnswerDto };

/** Where the weight belongs: plane, grams, place in several ways, force, and what to expect after. */
export function AnswerCard({ job, answer }: AnswerCardProps) {
  return (
    <div className="flex flex-col gap-4">
      {answer.warnings.map((warning) => (
        <Notice key={warning} kind="caution">
          {warning}
        </Notice>
      ))}
      <Weights job={job} answer={answer} />
      {answer.planes.map((plane) => (
        <PlaceInWords
          key={plane.planeId}
          plane={job.planes.find(({ id }) => id === plane.planeId)}
          setup={job.setup}
          angleDeg={plane.angleDeg}
          decimalMark={job.site.decimalMark}
        />
      ))}
      <Expected job={job} answer={answer} />
    </div>
  );
}

function Weights({ job, answer }: AnswerCardProps) {
  const mark = job.site.decimalMark;
  const countsWith = job.angleSense === 'with';
  return (
    <Table caption="Add to what is on the rotor now" captionShown roomy>
      <thead>
        <tr>
          <Th>plane</Th>
          <Th numeric>add</Th>
          {countsWith && <Th numeric>at, with rotation, as you count</Th>}
          <Th numeric>at, against rotation</Th>
          <Th numeric>radius</Th>
          <Th numeric>force</Th>
          <Th numeric>uncertainty</Th>
          <Th numeric>total from as found, against rotation</Th>
        </tr>
      </thead>
      <tbody>
        {answer.planes.map((plane) => (
          <tr key={plane.planeId}>
            <RowHead>{plane.planeName}</RowHead>
            <Td numeric className="text-base font-semibold">
              {formatMass(plane.massG, mark)}
            </Td>
            {countsWith && (
              <Td numeric className="text-base font-semibold">
                {formatDegrees(countedInSense(plane.angleDeg, 'with'), 1, mark)}
              </Td>
            )}
            <Td numeric className="text-base font-semibold">
              {formatDegrees(plane.angleDeg, 1, mark)}
            </Td>
            <Td numeric>{formatQuantity(plane.radiusMm, 'mm', { decimalMark: mark })}</Td>
            <Td numeric>{formatQuantity(plane.forceN, 'N', { decimalMark: mark })}</Td>
            <Td numeric className="whitespace-normal!">
              {uncertainty(plane.uncertaintyG, plane.uncertaintyDeg, mark)}
            </Td>
            <Td numeric>
              {formatMass(plane.totalMassG, mark)} at {formatDegrees(plane.totalAngleDeg, 1, mark)}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function uncertainty(grams: number | null, degrees: number | null, mark: DecimalMark): string {
  if (grams === null || degrees === null) return NOT_KNOWN;
  return `± ${formatMass(grams, mark)}, ± ${formatDegrees(degrees, 0, mark)}`;
}
