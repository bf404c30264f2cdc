import { polarPlace, screenDeg, type Place, type Sense } from '@/lib/domain/drawing/face-view';
import { formatNumber, type DecimalMark } from '@/lib/format';
import { HALO } from './face-layout';

type PolarGroundProps = {
  centre: Place;
  radius: number;
  outer: number;
  counts: Sense;
  decimalMark?: DecimalMark;
};

const RINGS = [1 / 3, 2 / 3, 1];
const SPOKES = Array.from({ length: 12 }, (_, i) => i * 30);

/** Rings of size and spokes of lag, the way of counting in words. */
export function PolarGround({ centre, radius, outer, counts, decimalMark }: PolarGroundProps) {
  const turning = counts === 'cw' ? 'ccw' : 'cw';
  return (
    <g>
      {SPOKES.map((lag) => {
        const end = polarPlace(centre, radius, screenDeg(lag, turning));
        const word = polarPlace(centre, radius + 15, screenDeg(lag, turning));
        return (
          <g key={lag}>
            <line x1={centre.x} y1={centre.y} x2={end.x} y2={end.y} className="stroke-rule" />
            <text
              x={word.x}
              y={word.y + 4}
              textAnchor="middle"
              className="figures fill-ink-soft text-[12px]"
            >
              {lag}
            </text>
          </g>
        );
      })}
      {RINGS.map((share) => (
        <g key={share}>
          <circle
            cx={centre.x}
            cy={centre.y}
            r={radius * share}
            fill="none"
            className={share === 1 ? 'stroke-edge' : 'stroke-rule'}
          />
          <text
            x={centre.x}
            y={centre.y + radius * share - 4}
            textAnchor="middle"
            className="figures fill-ink-soft text-[12px]"
            {...HALO}
          >
            {formatNumber(outer * share, { significant: 2, decimalMark })}
          </text>
        </g>
      ))}
      <text x={centre.x} y={316} textAnchor="middle" className="fill-ink-soft text-[12px]">
        degrees of lag, counted {counts === 'cw' ? 'clockwise' : 'counter-clockwise'} from the top
      </text>
    </g>
  );
}
