import type { Metadata } from 'next';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { readRecordCode } from '@/lib/domain/balance-job/record-code';
import { routes } from '@/lib/routes';
import type { Actor } from '@/lib/schemas/actor';
import { requireActor } from '@/lib/server/actor';
import { checkedRecords } from '@/lib/server/queries/checked-records';
import { CodeForm } from './code-form';
import { CodeVerdict, type CodeAnswer } from './code-verdict';
import { FileCheck } from './file-check';

export const metadata: Metadata = { title: 'Check a job record' };

type Props = { searchParams: Promise<{ code?: string | string[] }> };

export default async function VerifyRecordPage({ searchParams }: Props) {
  const actor = await requireActor();
  const { code } = await searchParams;
  const typed = typeof code === 'string' ? code : '';
  const answer = typed.trim() === '' ? null : await answerTo(actor, typed);
  return (
    <>
      <PageHead
        title="Check a job record"
        crumbs={[
          { label: 'Balance jobs', href: routes.balanceJobs() },
          { label: 'Check a job record' },
        ]}
        note="Computes the hash of the stored record again and says whether it is as it was signed."
      />
      <Panel title="A record on paper">
        <div className="flex flex-col gap-4">
          <CodeForm typed={typed} refusal={answer?.kind === 'refused' ? answer.message : null} />
          {answer && <CodeVerdict answer={answer} />}
        </div>
      </Panel>
      <Panel title="A record kept as a file">
        <FileCheck />
      </Panel>
    </>
  );
}

async function answerTo(actor: Actor, typed: string): Promise<CodeAnswer> {
  const read = readRecordCode(typed);
  if (!read.ok) return { kind: 'refused', message: read.failure.message };
  return { kind: 'looked up', records: await checkedRecords(actor, read.value) };
}
