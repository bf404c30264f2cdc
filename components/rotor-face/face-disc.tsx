import { polarPlace, screenDeg, type Sense } from '@/lib/domain/drawing/face-view';
import type { NamedPosition } from '@/lib/domain/drawing/rotor-place';
import { shortTurnDeg } from '@/lib/domain/units';
import { FACE, HALO } from './face-layout';

const { centre, rim, degrees } = FACE;
const TENS = Array.from({ length: 36 }, (_, i) => i * 10);

type FaceDiscProps = {
  seen: Sense;
  positions: readonly NamedPosition[];
  /** Rotor angles of the weights, whose own words say the degrees there. */
  weightDegs: readonly number[];
};

/** The disc of layout blue, its scribed lines, the ring of degrees and the mark on top. */
export function FaceDisc({ seen, positions, weightDegs }: FaceDiscProps) {
  const named = positions.length <= 24;
  return (
    <g>
      <circle cx={centre.x} cy={centre.y} r={rim} className="fill-disc stroke-ink" />
      {[0.93, 0.66, 0.33].map((share) => (
        <circle
          key={share}
          cx={centre.x}
          cy={centre.y}
          r={rim * share}
          fill="none"
          className="stroke-scribe/50"
          strokeWidth={0.75}
        />
      ))}
      {TENS.map((deg) => (
        <Degree key={deg} deg={deg} seen={seen} worded={isWorded(deg, weightDegs)} />
      ))}
      {positions.map((position) => (
        <Hole key={position.label} position={position} seen={seen} named={named} />
      ))}
      <Mark />
    </g>
  );
}

const HIDES_WITHIN_DEG = 8;

function isWorded(deg: number, weightDegs: readonly number[]): boolean {
  if (deg === 0 || deg % 30 !== 0) return false;
  return weightDegs.every((weight) => Math.abs(shortTurnDeg(weight, deg)) > HIDES_WITHIN_DEG);
}

function Degree({ deg, seen, worded }: { deg: number; seen: Sense; worded: boolean }) {
  const at = screenDeg(deg, seen);
  const long = deg % 30 === 0;
  const inner = polarPlace(centre, rim * (long ? 0.88 : 0.93), at);
  const outer = polarPlace(centre, rim, at);
  const word = polarPlace(centre, degrees, at);
  return (
    <>
      <line
        x1={inner.x}
        y1={inner.y}
        x2={outer.x}
        y2={outer.y}
        className="stroke-scribe/70"
        strokeWidth={0.75}
      />
      {worded && (
        <text
          x={word.x}
          y={word.y + 4}
          textAnchor="middle"
          className="figures fill-ink-soft text-[12px]"
          {...HALO}
        >
          {deg}
        </text>
      )}
    </>
  );
}

type HoleProps = { position: NamedPosition; seen: Sense; named: boolean };

function Hole({ position, seen, named }: HoleProps) {
  const at = screenDeg(position.angleDeg, seen);
  const hole = polarPlace(centre, rim, at);
  const word = polarPlace(centre, rim - 17, at);
  return (
    <>
      <circle cx={hole.x} cy={hole.y} r={3.5} className="fill-sheet stroke-ink" />
      {named && (
        <text
          x={word.x}
          y={word.y + 4}
          textAnchor="middle"
          className="figures fill-scribe text-[12px] font-bold"
        >
          {shortLabel(position.label)}
        </text>
      )}
    </>
  );
}

function Mark() {
  const { x, y } = centre;
  const tip = y - rim - 2;
  return (
    <>
      <polygon
        points={`${x - 8},${tip - 15} ${x + 8},${tip - 15} ${x},${tip}`}
        className="fill-ink"
      />
      <text
        x={x}
        y={tip - 21}
        textAnchor="middle"
        className="fill-ink text-[13px] font-bold"
        {...HALO}
      >
        mark · 0°
      </text>
    </>
  );
}

/** Inside the disc there is room for a number only: “blade 3” is 3. */
function shortLabel(label: string): string {
  return /^\D+ (\d+)$/.exec(label)?.[1] ?? label;
}
