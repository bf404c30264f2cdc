import type { FoundMachines } from '@/lib/schemas/found-machines';

type FoundListProps = {
  machines: FoundMachines['machines'];
  marked: number;
  onChoose: (machineId: number) => void;
};

/** The machines found, the marked one highlighted; the keyboard stays in the box above. */
export function FoundList({ machines, marked, onChoose }: FoundListProps) {
  return (
    <ul id="found-machines" role="listbox" aria-label="Machines found" className="mt-2">
      {machines.map((machine, index) => (
        <li
          key={machine.id}
          id={`found-${machine.id}`}
          role="option"
          aria-selected={index === marked}
          className="target flex cursor-pointer items-center gap-3 rounded px-3 hover:bg-blue-wash aria-selected:bg-blue-wash"
          onMouseDown={(event) => event.preventDefault()}
          onClick={() => onChoose(machine.id)}
        >
          <span className="figures font-semibold whitespace-nowrap">{machine.tag}</span>
          <span className="min-w-0 truncate">{machine.name}</span>
          <span className="ml-auto text-xs whitespace-nowrap text-ink-soft">
            {machine.siteName}
          </span>
        </li>
      ))}
    </ul>
  );
}
