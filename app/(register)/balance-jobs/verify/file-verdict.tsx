import { Notice } from '@/components/ui/notice';
import { formatPlural } from '@/lib/format';
import type { RecordFileCheckDto, RecordFileMatchDto } from '@/lib/schemas/record-check';
import { DifferenceTable } from './difference-table';
import { RecordVerdict } from './record-verdict';

type FileVerdictProps = { name: string; checked: RecordFileCheckDto };

/** What a kept file is worth: whole in itself, and the one that was signed here. */
export function FileVerdict({ name, checked }: FileVerdictProps) {
  const { match, statedHash, recomputedHash } = checked;
  return (
    <div className="flex flex-col gap-4">
      {recomputedHash !== statedHash && (
        <Notice kind="failure" title={`${name} was changed after it was written`}>
          <p className="figures text-xs break-all">it states {statedHash}</p>
          <p className="figures text-xs break-all">its content gives {recomputedHash}</p>
        </Notice>
      )}
      {match ? (
        <Matched name={name} match={match} />
      ) : (
        <Notice kind="caution" title="This register holds no record that belongs to it">
          {recomputedHash === statedHash
            ? 'The file’s content gives the hash it states, but whether anybody signed it cannot be said here. A record of a site that you may not see is not found either.'
            : 'A record of a site that you may not see is not found either.'}
        </Notice>
      )}
    </div>
  );
}

function Matched({ name, match }: { name: string; match: RecordFileMatchDto }) {
  const { same, differences, newerAddenda, record } = match;
  const equal = same && differences.length === 0;
  return (
    <>
      <Notice
        kind={equal ? 'success' : 'failure'}
        title={equal ? `${name} is the record that was signed` : `${name} is not what was signed`}
      >
        {newerAddenda > 0 &&
          `The register holds ${formatPlural(newerAddenda, 'addendum', 'addenda')} beyond those in the file.`}
      </Notice>
      {!equal && (
        <DifferenceTable
          caption="Where the file differs from the register"
          sides={['in the file', 'in the register']}
          differences={differences}
          none="Content and signature read the same."
        />
      )}
      <p className="font-semibold">The record in the register itself:</p>
      <RecordVerdict record={record} />
    </>
  );
}
