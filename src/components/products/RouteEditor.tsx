import { useMemo } from 'react';
import { useFieldArray } from 'react-hook-form';
import type { ProductDto, RouteChoicesDto, RouteRequest } from '@/contracts/products';
import { api } from '../query/api';
import { Button } from '../ui/Button';
import { FormActions } from '../ui/form/FormActions';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { emptyStage, routeFormSchema, routeStart } from './routeForm';
import { StageCard } from './StageCard';

interface Props {
  readonly product: ProductDto;
  readonly choices: RouteChoicesDto;
  readonly mayEdit: boolean;
}

/** The stages of a product in order: on which units, with which duty, and what each draws there. */
export function RouteEditor({ product, choices, mayEdit }: Props) {
  const schema = useMemo(() => routeFormSchema(choices), [choices]);
  const form = useZodForm(schema, routeStart(product));
  const { control } = form;
  const stages = useFieldArray({ control, name: 'stages' });
  const send = (route: RouteRequest) => api(`/api/products/${product.id}/route`, { method: 'POST', body: route });
  const save = useSave(form, send, () => window.location.reload());
  return (
    <form onSubmit={save.submit} noValidate>
      <fieldset disabled={!mayEdit} className="contents">
        {stages.fields.length === 0 ? <p className="mb-4 text-md">No stage has been entered yet.</p> : null}
        <ol className="space-y-6">
          {stages.fields.map((field, index) => (
            <StageCard
              key={field.id}
              {...{ control, choices, index, isLast: index === stages.fields.length - 1 }}
              onUp={() => stages.swap(index, index - 1)}
              onDown={() => stages.swap(index, index + 1)}
              onRemove={() => stages.remove(index)}
            />
          ))}
        </ol>
        {mayEdit ? (
          <Button className="mt-5" onClick={() => stages.append(emptyStage() as never)}>
            Add a stage
          </Button>
        ) : null}
      </fieldset>
      {product.plannedRuns > 0 ? (
        <Notice className="mt-5">
          {product.plannedRuns} planned {product.plannedRuns === 1 ? 'run keeps its' : 'runs keep their'} draws until
          the planner has the week worked out anew.
        </Notice>
      ) : null}
      {mayEdit ? <FormActions state={save.state} save="Save the route" /> : null}
    </form>
  );
}
