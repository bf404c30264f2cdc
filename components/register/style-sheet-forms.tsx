import type { ActionState } from '@/lib/schemas/action-state';
import { Button } from '@/components/ui/button';
import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { LinkButton } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextAreaField } from '@/components/ui/text-area-field';
import { routes } from '@/lib/routes';

const MASS_FAILURE = {
  code: 'input',
  field: 'massG',
  message: 'The mass is 0 g: it must be more than 0 g.',
};
const SIDE_FAILURE = {
  code: 'input',
  field: 'sense',
  message: 'Say which way you went from the mark to the weight.',
};
const FAILED: ActionState = {
  status: 'failed',
  failure: MASS_FAILURE,
  failures: [MASS_FAILURE, SIDE_FAILURE],
  values: { massG: '0', point: 'b' },
};
const SENSES = [
  { value: 'against', label: 'Against rotation' },
  { value: 'with', label: 'With rotation', hint: 'Is turned into against rotation for you.' },
];
const POINTS = [
  { value: 'a', label: 'A horizontal' },
  { value: 'b', label: 'B horizontal' },
];

/** Buttons, and a form as it stands at first and after it failed. */
export function StyleSheetForms() {
  return (
    <>
      <Panel title="Buttons">
        <div className="flex flex-wrap gap-3">
          <Button variant="primary">Record trial run</Button>
          <Button>Print weight layout</Button>
          <Button variant="quiet">Show all</Button>
          <Button variant="danger">Line through</Button>
          <Button variant="primary" pending>
            Keep reading
          </Button>
          <Button disabled>Sign</Button>
          <LinkButton href={routes.styleSheet()}>Open the answer card</LinkButton>
        </div>
      </Panel>
      <Panel title="Form, untouched">
        <ExampleForm state={{ status: 'idle' }} />
      </Panel>
      <Panel title="Form, failed">
        <ExampleForm state={FAILED} />
      </Panel>
    </>
  );
}

function ExampleForm({ state }: { state: ActionState }) {
  return (
    <form className="flex flex-col gap-4">
      <ErrorSummary state={state} />
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          name="massG"
          label="Mass"
          kind="decimal"
          unit="g"
          hint="Weighed on a scale"
          state={state}
        />
        <SelectField
          name="point"
          label="Point"
          options={POINTS}
          placeholder="Choose a point"
          state={state}
        />
      </div>
      <RadioField
        name="sense"
        label="Which way from the mark to the weight?"
        choices={SENSES}
        state={state}
      />
      <TextAreaField name="note" label="Note" state={state} />
      <Caution
        code="SAF-01"
        tick={<CheckField name="still" label="It stands still and is locked out" state={state} />}
        name={<Field name="namedPerson" label="Locked out by" state={state} />}
      >
        Hands on the rotor only when it stands still and every energy source is locked out under
        your site’s rules.
      </Caution>
      <div>
        <SubmitButton>Record what was fitted</SubmitButton>
      </div>
    </form>
  );
}
