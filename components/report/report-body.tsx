import { RotorFace } from '@/components/rotor-face/rotor-face';
import { VectorWalk } from '@/components/rotor-face/vector-walk';
import { Fact, Facts } from '@/components/ui/fact';
import { Panel } from '@/components/ui/panel';
import type { Report, ReportBlock } from '@/lib/schemas/report';
import { PrintMarks } from './print-marks';
import { ReportPhotos } from './report-photos';
import { ReportTableView } from './report-table';

/** A report on the screen and in print; the PDF is made of the same report. */
export function ReportBody({ report }: { report: Report }) {
  return (
    <div className="report flex flex-col gap-6 print:block print:space-y-4">
      <PrintMarks report={report} />
      {report.sections.map(({ title, note, blocks }) => (
        <Panel key={title} title={title} note={note}>
          <div className="flex flex-col gap-3">
            {blocks.map((block, index) => (
              // Blocks of a report never move: their place is what tells them apart.
              <Block key={index} block={block} />
            ))}
          </div>
        </Panel>
      ))}
    </div>
  );
}

const LOOKS = {
  plain: 'max-w-[80ch] break-words whitespace-pre-line',
  quiet: 'max-w-[80ch] break-words text-xs text-ink-soft',
  strong: 'max-w-[80ch] break-words font-semibold',
} as const;

function Block({ block }: { block: ReportBlock }) {
  switch (block.kind) {
    case 'table':
      return <ReportTableView table={block} />;
    case 'text':
      return <p className={LOOKS[block.look]}>{block.text}</p>;
    case 'facts':
      return (
        <Facts>
          {block.facts.map(({ label, value }) => (
            <Fact key={label} label={label}>
              {value}
            </Fact>
          ))}
        </Facts>
      );
    case 'faces':
      return (
        <div className="grid gap-6 lg:grid-cols-2 print:grid-cols-2">
          {block.faces.map(({ plane, weights }) => (
            <RotorFace key={plane.name} plane={plane} weights={weights} />
          ))}
        </div>
      );
    case 'photos':
      return <ReportPhotos photos={block.photos} />;
    case 'walks':
      return (
        <div className="grid gap-6 lg:grid-cols-2 print:grid-cols-2">
          {block.walks.map((walk) => (
            <VectorWalk key={walk.title} {...walk} />
          ))}
        </div>
      );
  }
}
