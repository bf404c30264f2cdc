import { Field } from '@/components/ui/field';
import { Button } from '@/components/ui/button';
import { routes } from '@/lib/routes';

type CodeFormProps = { typed: string; refusal: string | null };

/** The code from the foot of the paper; it stands in the address, so that the answer can be sent on. */
export function CodeForm({ typed, refusal }: CodeFormProps) {
  const failure = { code: 'code', message: refusal ?? '', field: 'code' };
  const state =
    refusal === null
      ? undefined
      : { status: 'failed' as const, failure, failures: [failure], values: { code: typed } };
  return (
    <form action={routes.verifyRecord()} className="flex max-w-xl flex-col gap-3">
      <Field
        name="code"
        label="Code or whole hash"
        hint="At the foot of every page: 16 digits in fours after “check it with”, or all 64."
        defaultValue={typed}
        state={state}
        autoCapitalize="none"
        spellCheck={false}
      />
      <div>
        <Button type="submit" variant="primary">
          Check the record
        </Button>
      </div>
    </form>
  );
}
