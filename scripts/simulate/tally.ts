import { TARGET_MM_S, type SimJob } from './draw-job';
import type { Outcome } from './outcome';
import { SLIP_RATES, type Slip } from './slips';

/** One job done both ways. */
export type Pair = {
  readonly job: SimJob;
  readonly textbook: Outcome;
  readonly product: Outcome;
};

/** What a group of jobs came to; shares in per cent. */
export type Tally = {
  readonly firstMetPct: number;
  readonly endMetPct: number;
  readonly rougherPct: number;
  readonly leftRougherPct: number;
  readonly starts: number;
};

/** Counts outcomes. Example: one job from 5 to 1 mm/s in its first check run has 100 % met. */
export function tallyOf(outcomes: readonly Outcome[]): Tally {
  const count = Math.max(1, outcomes.length);
  const share = (test: (outcome: Outcome) => boolean) =>
    (100 * outcomes.filter(test).length) / count;
  const baseOf = ({ worst }: Outcome) => worst[0] ?? 0;
  return {
    firstMetPct: share(({ worst }) => (worst[1] ?? Infinity) <= TARGET_MM_S),
    endMetPct: share(({ atEnd }) => atEnd <= TARGET_MM_S),
    rougherPct: share((one) => Math.max(0, ...one.worst.slice(1)) > baseOf(one)),
    leftRougherPct: share((one) => one.atEnd > baseOf(one)),
    starts: outcomes.reduce((sum, { starts }) => sum + starts, 0) / count,
  };
}

/** The results as a table in Markdown: all jobs, those without a slip, those with, and every slip. */
export function resultsTable(pairs: readonly Pair[]): string {
  const of = (slip: Slip) => pairs.filter(({ job }) => job.slip === slip);
  const rows: [string, readonly Pair[]][] = [
    ['**all jobs**', pairs],
    ['without a slip', of('none')],
    ['with a slip', pairs.filter(({ job }) => job.slip !== 'none')],
    ['planes too close (any slip)', pairs.filter(({ job }) => job.planesTooClose)],
    ...SLIP_RATES.map(([slip]): [string, readonly Pair[]] => [slip, of(slip)]),
  ];
  return markdown(
    [
      'jobs',
      'number',
      'first check run meets the target, % (a) → (b)',
      'target met in the end, % (a) → (b)',
      'starts per job (a) → (b)',
      'rougher than base in a check run, % (a) → (b)',
      'left rougher than base, % (a) → (b)',
    ],
    rows.map(([name, own]) => rowOf(name, own)),
  );
}

/** How the jobs ended under the rules of the product, most frequent first. */
export function reasonsTable(pairs: readonly Pair[]): string {
  const counts = new Map<string, number>();
  for (const { product } of pairs) {
    const end = product.stopped ?? 'readings within the target, signed';
    const how = product.explainedBy ? `${end}; a check run was explained by a slip` : end;
    counts.set(how, (counts.get(how) ?? 0) + 1);
  }
  const rows = [...counts].sort(([, a], [, b]) => b - a);
  return markdown(
    ['end', 'jobs'],
    rows.map(([end, count]) => [end, `${count}`]),
  );
}

function rowOf(name: string, pairs: readonly Pair[]): string[] {
  const a = tallyOf(pairs.map(({ textbook }) => textbook));
  const b = tallyOf(pairs.map(({ product }) => product));
  const both = (key: keyof Tally) => `${a[key].toFixed(1)} → ${b[key].toFixed(1)}`;
  return [
    name,
    `${pairs.length}`,
    both('firstMetPct'),
    both('endMetPct'),
    both('starts'),
    both('rougherPct'),
    both('leftRougherPct'),
  ];
}

function markdown(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const line = (cells: readonly string[]) => `| ${cells.join(' | ')} |`;
  return [line(head), line(head.map((_, i) => (i === 0 ? '---' : '--:'))), ...rows.map(line)].join(
    '\n',
  );
}
