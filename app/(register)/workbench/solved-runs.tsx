'use client';

import { AnswerCard } from '@/components/balancing/answer-card';
import { TrialResponses } from '@/components/balancing/trial-responses';
import type { FaceWeight } from '@/components/rotor-face/face-types';
import { RotorFace } from '@/components/rotor-face/rotor-face';
import { Caution } from '@/components/ui/caution';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatQuantity, type DecimalMark } from '@/lib/format';
import type { SolvedRuns } from '@/lib/schemas/workbench';

type SolvedRunsPanelsProps = { solved: SolvedRuns; decimalMark: DecimalMark };

/** The answer with its cautions, and each plane drawn; in words why there is none. */
export function SolvedRunsPanels({ solved, decimalMark }: SolvedRunsPanelsProps) {
  const { answer, refusal } = solved;
  if (!answer)
    return (
      <>
        <Notice kind="failure" title="No answer">
          {refusal}
        </Notice>
        <TrialResponses checks={solved.trialChecks} decimalMark={decimalMark} />
      </>
    );
  const ground = {
    ...solved,
    site: { decimalMark },
    planes: solved.planes.map((plane) => ({ ...plane, positions: [] })),
    setup: { mark: 'angle zero', rotationFromDriveEnd: solved.rotationFromDriveEnd },
  };
  return (
    <>
      <Panel title="Answer">
        <div className="flex flex-col gap-4">
          <TrialResponses checks={solved.trialChecks} decimalMark={decimalMark} />
          <AnswerCard job={ground} answer={answer} />
          <ForceShares solved={solved} decimalMark={decimalMark} />
          <Caution code="SAF-01, SAF-03">
            {CAUTIONS['SAF-01'].text} {CAUTIONS['SAF-03'].text}
          </Caution>
          <Caution code="SAF-06">{CAUTIONS['SAF-06'].text}</Caution>
        </div>
      </Panel>
      {solved.planes.map((plane, index) => (
        <Panel key={plane.id} title={`Plane ${plane.name}`}>
          <RotorFace
            plane={{
              name: `Plane ${plane.name}`,
              radiusMm: plane.radiusMm,
              rotationFromDriveEnd: solved.rotationFromDriveEnd === 'clockwise' ? 'cw' : 'ccw',
              decimalMark,
            }}
            weights={weightsOf(solved, plane.id)}
            readings={{
              unit: solved.unit,
              point: solved.points[index]?.label ?? '',
              vectors: solved.walks[index] ?? [],
            }}
          />
        </Panel>
      ))}
    </>
  );
}

/** A weight pulls at the rotor once a turn: how hard, against what the rotor weighs. */
function ForceShares({ solved, decimalMark }: SolvedRunsPanelsProps) {
  const known = solved.planes.flatMap(({ name }, index) => {
    const pct = solved.forcePctOfRotorWeight[index] ?? null;
    return pct === null ? [] : [`plane ${name}: ${formatQuantity(pct, '%', { decimalMark })}`];
  });
  if (known.length === 0) return null;
  return (
    <p className="text-sm">
      Force at this speed against the weight of the rotor: {known.join(', ')}.
    </p>
  );
}

function weightsOf({ staying, answer }: SolvedRuns, planeId: number): FaceWeight[] {
  const on = staying
    .filter((weight) => weight.planeId === planeId)
    .map(({ massG, angleDeg }): FaceWeight => ({
      id: 'trial',
      massG,
      angleDeg,
      label: 'trial',
      state: 'on',
    }));
  const proposed = (answer?.planes ?? [])
    .filter((plane) => plane.planeId === planeId)
    .map(({ massG, angleDeg }): FaceWeight => ({
      id: 'answer',
      massG,
      angleDeg,
      label: 'answer',
      state: 'proposed',
    }));
  return [...on, ...proposed];
}
