'use client';

import { useActionState, type ReactNode } from 'react';
import { PointPicker } from '@/components/register/point-picker';
import { Badge } from '@/components/ui/badge';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { DISTANCE_DOUBT_DB } from '@/lib/domain/intake/record-doubts';
import { formatNumber } from '@/lib/format';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { ReadingPageDto } from '@/lib/schemas/reading-page';
import { keepHeldAction, lineThroughAction, rehomeAction } from './actions';

type DecidePanelProps = {
  page: ReadingPageDto;
  /** Which decision stands open: keep, rehome, line. */
  open: string;
};

/** What a person can decide about the record, each with a reason that stays with it. */
export function DecidePanel({ page, open }: DecidePanelProps) {
  return (
    <Panel id="decide" title="Decide" note="each decision stays with its reason and your name">
      <div className="flex flex-col divide-y divide-rule">
        {page.state === 'held' && (
          <Choice title="Keep it" open={open === 'keep'}>
            <KeepForm recordId={page.recordId} />
          </Choice>
        )}
        {page.waveform && (
          <Choice
            title="Re-home it to another point"
            open={open === 'rehome' || likeliest(page) !== null}
          >
            <RehomeForm page={page} />
          </Choice>
        )}
        <Choice title="Line it through" open={open === 'line'}>
          <LineForm recordId={page.recordId} />
        </Choice>
      </div>
    </Panel>
  );
}

function Choice(props: { title: string; open: boolean; children: ReactNode }) {
  return (
    <details open={props.open}>
      <summary className="target flex cursor-pointer items-center font-semibold text-blue">
        {props.title}
      </summary>
      <div className="max-w-2xl pb-4">{props.children}</div>
    </details>
  );
}

type DecisionFormProps<Value> = {
  recordId: number;
  action: (state: ActionState<Value>, form: FormData) => Promise<ActionState<Value>>;
  button: string;
  children?: (state: ActionState) => ReactNode;
};

function DecisionForm<Value>(props: DecisionFormProps<Value>) {
  const { recordId, action, button, children } = props;
  const [state, submit] = useActionState<ActionState<Value>, FormData>(action, IDLE);
  return (
    <form action={submit} className="flex flex-col gap-3">
      <ErrorSummary state={state} />
      <input type="hidden" name="recordId" value={recordId} />
      {children?.(state)}
      <Field name="reason" label="Reason" maxLength={1000} state={state} />
      <div>
        <SubmitButton>{button}</SubmitButton>
      </div>
    </form>
  );
}

function KeepForm({ recordId }: { recordId: number }) {
  return <DecisionForm recordId={recordId} action={keepHeldAction} button="Keep record" />;
}

function LineForm({ recordId }: { recordId: number }) {
  return (
    <DecisionForm recordId={recordId} action={lineThroughAction} button="Line record through" />
  );
}

function RehomeForm({ page }: { page: ReadingPageDto }) {
  const { recordId, suggestions, points, site } = page;
  const { decimalMark } = site;
  return (
    <DecisionForm recordId={recordId} action={rehomeAction} button="Move record">
      {(state) => (
        <>
          {suggestions.length > 0 && (
            <p className="flex flex-wrap items-center gap-2">
              Most like the last record of
              {suggestions.map(({ pointId, label, distanceDb }) => (
                <Badge key={pointId}>
                  {label}, {formatNumber(distanceDb, { decimals: 1, decimalMark })} dB away
                </Badge>
              ))}
            </p>
          )}
          <PointPicker
            points={points}
            pointId={likeliest(page)}
            placeholder="Choose the point"
            state={state}
          />
        </>
      )}
    </DecisionForm>
  );
}

/** The point a record was probably taken at: only one whose last record is not itself doubtful. */
function likeliest({ suggestions }: ReadingPageDto): number | null {
  const [nearest] = suggestions;
  return nearest && nearest.distanceDb < DISTANCE_DOUBT_DB ? nearest.pointId : null;
}
