import { ZONE_WORDS, type ZoneLetter } from '@/lib/format';

type ZoneStampProps = {
  /** Null where the reading was not judged. */
  zone: ZoneLetter | null;
  size?: 'small' | 'medium' | 'large';
  /** Writes what the zone means beside the plate. */
  withWord?: boolean;
};

const PLATES: Readonly<Record<ZoneLetter, string>> = {
  A: 'bg-zone-a text-zone-a-on',
  B: 'bg-zone-b text-zone-b-on',
  C: 'bg-zone-c text-zone-c-on',
  D: 'bg-zone-d text-zone-d-on',
};
const PUNCHES: Readonly<Record<ZoneLetter, number>> = { A: 1, B: 2, C: 3, D: 4 };
const SIZES = {
  small: 'h-6 w-5 text-xs',
  medium: 'h-8 w-7 text-sm',
  large: 'h-10 w-9 text-lg',
} as const;

/** A zone as a plate with its letter and one to four punch marks, so that colour never speaks alone. */
export function ZoneStamp({ zone, size = 'medium', withWord = false }: ZoneStampProps) {
  const word = zone === null ? 'not judged' : ZONE_WORDS[zone];
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <span
        className={`inline-flex shrink-0 flex-col items-center justify-center gap-0.5 rounded border font-bold ${SIZES[size]} ${zone === null ? 'border-dashed border-edge text-ink-soft' : `border-ink/70 ${PLATES[zone]}`}`}
      >
        <span className="leading-none">
          <span className="sr-only">zone </span>
          {zone ?? <span aria-hidden="true">–</span>}
        </span>
        {zone !== null && <Punches count={PUNCHES[zone]} />}
      </span>
      {withWord ? <span>{word}</span> : <span className="sr-only">{word}</span>}
    </span>
  );
}

function Punches({ count }: { count: number }) {
  return (
    <svg viewBox={`0 0 ${count * 4 - 1} 3`} className="h-[3px]" aria-hidden="true">
      {Array.from({ length: count }, (_, index) => (
        <rect key={index} x={index * 4} y={0} width={3} height={3} fill="currentColor" />
      ))}
    </svg>
  );
}
