import { useEffect, useMemo, useState } from 'react';
import type { Control } from 'react-hook-form';
import { thingSchema } from '../../contracts/plantChecks';
import type { PlantLibraryDto, SavedThingDto, Thing, ThingKind } from '../../contracts/plantLibrary';
import { api } from '../query/api';
import { Button } from '../ui/Button';
import { FormActions } from '../ui/form/FormActions';
import { useSave } from '../ui/form/useSave';
import { useZodForm } from '../ui/form/useZodForm';
import { Notice } from '../ui/Notice';
import { blankOf, SECTIONS, type FormContext, type Raw } from './fields';
import { Follows } from './follows/Follows';
import { FormField } from './FormField';
import { LISTINGS, type Listing } from './listing';
import { wordsOf } from './kinds';
import { PlaceButtons } from './PlaceButtons';
import { RetireButton } from './RetireButton';

export interface ThingFormProps {
  readonly kind: ThingKind;
  readonly library: PlantLibraryDto;
  /** null: a new one. */
  readonly thing: Thing<ThingKind> | null;
  readonly canEdit: boolean;
  readonly onSaved: (saved: SavedThingDto) => void;
  readonly onChanged: (library: PlantLibraryDto) => void;
  readonly onLeave: () => void;
  /** True while something typed is not saved. */
  readonly onTyped: (isTyped: boolean) => void;
  /** Fills the form anew with what is there now. */
  readonly onRenew: () => void;
}

const addressOf = (kind: ThingKind, id: string | null): string =>
  id === null ? `/api/plant/${kind}` : `/api/plant/${kind}/${encodeURIComponent(id)}`;

/** Creates or edits one thing; beside it what follows from it, as it is typed. */
export function ThingForm(props: ThingFormProps) {
  const { kind, library, thing, canEdit, onSaved, onTyped } = props;
  const [filled] = useState<Raw>(() => (thing ? thing.values : blankOf(kind)));
  const id = thing?.id ?? null;
  const schema = useMemo(() => thingSchema(kind, { library, id }), [kind, library, id]);
  const form = useZodForm(schema, filled);
  const typed: Raw = form.watch();
  const context: FormContext = { library, id, typed };
  const save = useSave(
    form,
    () =>
      api<SavedThingDto>(addressOf(kind, id), {
        method: 'POST',
        body: id === null ? { values: form.getValues() } : { values: form.getValues(), was: filled },
      }),
    onSaved,
  );
  const { isDirty } = form.formState;
  useEffect(() => {
    // A fault may hang on two fields: what is marked is judged anew whichever of them changes.
    const { unsubscribe } = form.watch(() => {
      const marked = Object.keys(form.formState.errors);
      if (marked.length > 0) void form.trigger(marked);
    });
    return unsubscribe;
  }, [form]);
  useEffect(() => onTyped(isDirty), [isDirty, onTyped]);
  const control = form.control as unknown as Control<Record<string, unknown>, unknown, unknown>;
  const isBehind = thing !== null && JSON.stringify(thing.values) !== JSON.stringify(filled);
  const listing = LISTINGS[kind] as unknown as Listing<ThingKind>;
  return (
    <form noValidate onSubmit={save.submit} aria-labelledby="thing-form">
      <div className="flex items-start justify-between gap-3">
        <h2 id="thing-form" className="text-xl">
          {thing ? listing.name(thing.values) : `A new ${wordsOf(kind).one}`}
        </h2>
        <Button look="quiet" size="small" onClick={props.onLeave}>
          Close
        </Button>
      </div>
      {isBehind ? <Behind onRenew={props.onRenew} /> : null}
      <div className="mt-4 grid items-start gap-6 xl:grid-cols-[minmax(0,1fr)_17rem]">
        <fieldset disabled={!canEdit} className="min-w-0">
          <legend className="sr-only">{wordsOf(kind).one}</legend>
          {SECTIONS[kind].map(({ title, fields }) => (
            <fieldset key={title} className="mb-4 min-w-0">
              <legend className="mb-2 w-full border-b border-rule pb-1 text-base font-semibold">{title}</legend>
              <div className="grid gap-x-4 gap-y-1 sm:grid-cols-2">
                {fields.map((spec) => (
                  <FormField key={spec.name} {...{ spec, control, context }} />
                ))}
              </div>
            </fieldset>
          ))}
        </fieldset>
        <Follows {...{ kind }} {...context} />
      </div>
      {canEdit ? (
        <FormActions state={save.state} save={thing ? 'Save' : `Add the ${wordsOf(kind).one}`}>
          {thing ? <PlaceButtons {...{ kind, library }} id={thing.id} onChanged={props.onChanged} /> : null}
          {thing ? (
            <RetireButton
              {...{ kind }}
              id={thing.id}
              name={listing.name(thing.values)}
              onRetired={({ library: now }) => {
                props.onChanged(now);
                props.onLeave();
              }}
            />
          ) : null}
        </FormActions>
      ) : null}
    </form>
  );
}

const Behind = ({ onRenew }: { readonly onRenew: () => void }) => (
  <Notice
    look="over"
    live
    className="mt-3"
    title="Somebody changed it while you had it open"
    actions={
      <Button size="small" onClick={onRenew}>
        Show what is there now
      </Button>
    }
  >
    What you have typed can’t be saved over it.
  </Notice>
);
