'use client';

import { Field } from '@/components/ui/field';
import { Fact, Facts } from '@/components/ui/fact';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { QUALITY_GRADES } from '@/lib/domain/balancing/quality-grades';
import {
  formatExact,
  formatNumber,
  formatQuantity,
  NOT_MEASURED,
  type DecimalMark,
} from '@/lib/format';
import type { SolvedTolerance } from '@/lib/schemas/workbench';
import { toleranceAction } from './actions';
import { ComputedForm } from './computed-form';
import { ResultColumn } from './result-column';
import { useComputation } from './use-computation';

const FIELDS = [
  { name: 'gradeMmS', label: 'Balance quality grade G', unit: 'mm/s' },
  { name: 'massKg', label: 'Rotor mass', unit: 'kg' },
  { name: 'speedRpm', label: 'Highest service speed', unit: 'r/min' },
  { name: 'apartM', label: 'Distance between bearings (optional)', unit: 'm' },
  { name: 'massCentreFromAM', label: 'Mass centre from bearing A (optional)', unit: 'm' },
  { name: 'residualAGmm', label: 'Residual at A (optional)', unit: 'g·mm' },
  { name: 'residualBGmm', label: 'Residual at B (optional)', unit: 'g·mm' },
] as const;

/** What a grade allows a rotor. */
export function ToleranceForm({ decimalMark }: { decimalMark: DecimalMark }) {
  const { form, answer, changed } = useComputation<SolvedTolerance>(toleranceAction);
  const { state } = form;
  return (
    <div className="grid items-start gap-5 xl:grid-cols-2">
      <ComputedForm {...form}>
        <Panel title="The rotor">
          <div className="grid gap-4 sm:grid-cols-2">
            {FIELDS.map((field) => (
              <Field key={field.name} {...field} kind="decimal" state={state} />
            ))}
          </div>
        </Panel>
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer && <Tolerance solved={answer} decimalMark={decimalMark} />}
        <Grades />
      </ResultColumn>
    </div>
  );
}

function Tolerance({ solved, decimalMark }: { solved: SolvedTolerance; decimalMark: DecimalMark }) {
  const { specificUm, totalGmm, bearings, isOverhung } = solved;
  const gmm = (value: number) => formatNumber(value, { significant: 3, decimalMark });
  return (
    <Panel
      title="Permissible residual unbalance"
      note={`G ${formatExact(solved.gradeMmS, '', decimalMark)}`}
    >
      <Facts>
        <Fact label="of the whole rotor, U_per">
          <span className="figures text-lg">
            {formatQuantity(totalGmm, 'g·mm', { decimalMark })}
          </span>
        </Fact>
        <Fact label="per kilogram, e_per">
          <span className="figures text-lg">
            {formatQuantity(specificUm, 'g·mm/kg', { decimalMark })}
          </span>
        </Fact>
      </Facts>
      {bearings && (
        <div className="mt-4">
          <Table caption="At the bearings" captionShown>
            <thead>
              <tr>
                <Th>bearing</Th>
                <Th numeric>allowed, g·mm</Th>
                <Th numeric>residual, g·mm</Th>
                <Th>verdict</Th>
              </tr>
            </thead>
            <tbody>
              {bearings.map(({ name, permissibleGmm, residualGmm, met }) => (
                <tr key={name}>
                  <RowHead>{name}</RowHead>
                  <Td numeric>{gmm(permissibleGmm)}</Td>
                  <Td numeric>{residualGmm === null ? NOT_MEASURED : gmm(residualGmm)}</Td>
                  <Td>{met === null ? '' : met ? 'within' : 'above what is allowed'}</Td>
                </tr>
              ))}
            </tbody>
          </Table>
        </div>
      )}
      <p className="mt-3 text-sm text-ink-soft">
        ISO 21940-11, U_per = 1000·G·m/Ω, shared out by the lever rule
        {isOverhung
          ? ', each 0.3 to 1.3 of the whole for a mass centre outside the bearings'
          : ', each 0.3 to 0.7 of the whole for a mass centre between the bearings'}
        . Limits from memory: compare with your copy before a machine is certified by them.
      </p>
    </Panel>
  );
}

function Grades() {
  return (
    <Panel title="Grades" note="from memory of ISO 21940-11: compare with your copy">
      <Table caption="Balance quality grades with typical machines">
        <thead>
          <tr>
            <Th numeric>G, mm/s</Th>
            <Th>typical of</Th>
          </tr>
        </thead>
        <tbody>
          {QUALITY_GRADES.map(({ gradeMmS, typical }) => (
            <tr key={gradeMmS}>
              <Td numeric>{gradeMmS}</Td>
              <Td>{typical}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Panel>
  );
}
