import { curvedArrow } from '@/lib/domain/drawing/curved-arrow';
import { opposite, type Sense } from '@/lib/domain/drawing/face-view';
import { FACE, HALO } from './face-layout';

const circle = { centre: FACE.centre, radius: FACE.arrow };
const TURN_WORDS = { cw: 'clockwise', ccw: 'counter-clockwise' } as const;

/** The large arrow of rotation and, against it, the dotted way in which degrees count; both in words. */
export function FaceArrows({ seen }: { seen: Sense }) {
  const turns = curvedArrow(
    circle,
    { sense: seen, startDeg: 28, lengthDeg: 84 },
    { length: 18, width: 17 },
  );
  const counts = curvedArrow(
    circle,
    { sense: opposite(seen), startDeg: 28, lengthDeg: 56 },
    { length: 12, width: 10 },
  );
  return (
    <g>
      <path d={turns.shaft} fill="none" className="stroke-ink" strokeWidth={4.5} />
      <polygon points={turns.head} className="fill-ink" />
      <path
        d={counts.shaft}
        fill="none"
        className="stroke-ink-soft"
        strokeWidth={2}
        strokeDasharray="0.1 5"
        strokeLinecap="round"
      />
      <polygon points={counts.head} className="fill-ink-soft" />
      <Words
        side={seen === 'cw' ? 'end' : 'start'}
        bold
        lines={['rotor turns', TURN_WORDS[seen]]}
      />
      <Words side={seen === 'cw' ? 'start' : 'end'} lines={['count degrees', 'this way']} />
    </g>
  );
}

type WordsProps = { side: 'start' | 'end'; bold?: boolean; lines: readonly [string, string] };

function Words({ side, bold = false, lines }: WordsProps) {
  const x = side === 'start' ? 4 : FACE.width - 4;
  const look = bold ? 'fill-ink font-bold' : 'fill-ink-soft';
  return (
    <text textAnchor={side} className={`text-[13px] ${look}`} {...HALO}>
      <tspan x={x} y={60}>
        {lines[0]}
      </tspan>
      <tspan x={x} y={75}>
        {lines[1]}
      </tspan>
    </text>
  );
}
