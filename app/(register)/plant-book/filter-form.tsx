import Form from 'next/form';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { routes } from '@/lib/routes';
import type { PlantBookDto } from '@/lib/schemas/register';
import type { PlantBookView } from './search';

type FilterFormProps = { view: PlantBookView; areas: PlantBookDto['areas'] };

/** Narrows the book; what is chosen stands in the address. */
export function FilterForm({ view, areas }: FilterFormProps) {
  return (
    <Form action={routes.plantBook()} className="flex flex-wrap items-end gap-3">
      <input type="hidden" name="state" value={view.state} />
      <input type="hidden" name="layout" value={view.layout} />
      <div className="w-64">
        <Field name="text" kind="search" label="Tag, name or kind" defaultValue={view.text} />
      </div>
      <div className="w-64">
        <SelectField
          name="area"
          label="Area"
          placeholder="all areas"
          defaultValue={view.area}
          options={areas.map(({ siteName, areaName, machines }) => ({
            value: `${siteName} / ${areaName}`,
            label: `${siteName} / ${areaName} (${machines})`,
          }))}
        />
      </div>
      <Button type="submit">Show</Button>
    </Form>
  );
}
