import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { PageHead } from '@/components/ui/page-head';
import { Tabs } from '@/components/ui/tabs';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { CombineForm } from './combine-form';
import { PiecesForm } from './pieces-form';
import { SixPlacesForm } from './six-places-form';
import { SolveForm } from './solve-form';
import { SplitForm } from './split-form';
import { ToleranceForm } from './tolerance-form';
import { TrialWeightForm } from './trial-weight-form';
import { WithoutPhaseForm } from './without-phase-form';
import { toolFrom, TOOLS, type Tool } from './tools';

export const metadata: Metadata = { title: 'Workbench' };

type Props = { searchParams: Promise<{ tool?: string | string[] }> };

export default async function WorkbenchPage({ searchParams }: Props) {
  const actor = await requireActor();
  if (!allows(actor.role, 'workbench:use')) forbidden();
  const tool = toolFrom((await searchParams).tool);
  const decimalMark = actor.sites[0]?.decimalMark ?? '.';
  return (
    <>
      <PageHead
        title="Workbench"
        note="The computations on their own. Nothing is saved: what hangs on a rotor belongs in a balance job."
        actions={
          <a className="link" href={routes.api.openApi()}>
            The same for programs (OpenAPI)
          </a>
        }
      />
      <Tabs
        label="Computations"
        tabs={TOOLS.map(({ key, label }) => ({
          label,
          href: routes.workbench(key === 'one-plane' ? '' : `?tool=${key}`),
          current: key === tool,
        }))}
      />
      {formOf(tool, decimalMark)}
    </>
  );
}

function formOf(tool: Tool, decimalMark: '.' | ',') {
  switch (tool) {
    case 'one-plane':
      return <SolveForm key={tool} planes={1} decimalMark={decimalMark} />;
    case 'two-planes':
      return <SolveForm key={tool} planes={2} decimalMark={decimalMark} />;
    case 'tolerance':
      return <ToleranceForm decimalMark={decimalMark} />;
    case 'split':
      return <SplitForm decimalMark={decimalMark} />;
    case 'trial-weight':
      return <TrialWeightForm decimalMark={decimalMark} />;
    case 'without-phase':
      return <WithoutPhaseForm decimalMark={decimalMark} />;
    case 'pieces':
      return <PiecesForm decimalMark={decimalMark} />;
    case 'combine':
      return <CombineForm decimalMark={decimalMark} />;
    case 'six-places':
      return <SixPlacesForm decimalMark={decimalMark} />;
  }
}
