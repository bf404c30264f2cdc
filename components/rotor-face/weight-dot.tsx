import type { WeightState } from './face-types';

type WeightDotProps = { at: { x: number; y: number }; radius: number; state: WeightState };

/** A weight; its state is told by outline and sign, so that it can be told in black and white. */
export function WeightDot({ at, radius, state }: WeightDotProps) {
  const circle = { cx: at.x, cy: at.y, r: radius };
  if (state === 'removed') {
    const arm = radius * 0.7;
    return (
      <g className="stroke-ink" strokeWidth={1.25}>
        <circle {...circle} className="fill-sheet" strokeDasharray="2 2" />
        <path
          d={`M ${at.x - arm} ${at.y - arm} l ${2 * arm} ${2 * arm} m 0 ${-2 * arm} l ${-2 * arm} ${2 * arm}`}
        />
      </g>
    );
  }
  if (state === 'proposed') {
    return (
      <g>
        <circle {...circle} className="fill-sheet stroke-ink" strokeWidth={0.75} />
        <circle
          {...circle}
          r={Math.max(2, radius - 1.5)}
          className="fill-brass/25 stroke-brass-line"
          strokeWidth={2.5}
          strokeDasharray="4 2.5"
        />
      </g>
    );
  }
  return (
    <g>
      <circle {...circle} className="fill-brass stroke-ink" strokeWidth={1.25} />
      {state === 'trial' && (
        <circle {...circle} r={radius * 0.5} fill="none" className="stroke-ink" strokeWidth={1.5} />
      )}
    </g>
  );
}
