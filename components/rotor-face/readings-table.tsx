import { formatLag, formatQuantity, type DecimalMark } from '@/lib/format';
import type { FaceReadings } from './face-types';

type ReadingsTableProps = { readings: FaceReadings; decimalMark?: DecimalMark };

/** The vectors of the drawing as a table, for those who do not see it. */
export function ReadingsTable({ readings, decimalMark }: ReadingsTableProps) {
  return (
    <div className="sr-only">
      <table>
        <caption>1x at {readings.point}, in the order of the runs</caption>
        <thead>
          <tr>
            <th scope="col">run</th>
            <th scope="col">size</th>
            <th scope="col">phase</th>
          </tr>
        </thead>
        <tbody>
          {readings.vectors.map((vector) => (
            <tr key={vector.label}>
              <th scope="row">{vector.label}</th>
              <td>{formatQuantity(vector.amplitude, readings.unit, { decimalMark })}</td>
              <td>{formatLag(vector.lagDeg, readings.phaseShown)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
