import { useState } from 'react';
import type { DutyModel } from '@/core/duty/model';
import type { UnitSystem } from '@/core/quantity/display';
import { SelectField } from '../ui/Field';
import { Notice } from '../ui/Notice';
import { UnitsProvider } from '../ui/units';
import { DutyForm, type DutyFormProps } from './DutyForm';
import { MODEL_OPTIONS, modelTitle } from './formModel';

type Props = Omit<DutyFormProps, 'model'> & { readonly system: UnitSystem };

/** The form of one duty as an island; a new one chooses its model first. */
export function DutyEditor({ system, ...props }: Props) {
  const { saved } = props;
  const [model, setModel] = useState<DutyModel['model']>(saved?.model ?? 'steamBlancher');
  return (
    <UnitsProvider system={system}>
      {saved ? (
        <p className="mb-5 text-md text-ink-muted">{modelTitle(saved.model)}</p>
      ) : (
        <SelectField
          label="Kind of duty"
          className="mb-2 max-w-md"
          value={model}
          onChange={(event) => setModel(event.target.value as DutyModel['model'])}
          hint="What its form asks for follows from this."
        >
          {MODEL_OPTIONS.map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </SelectField>
      )}
      {saved?.fault ? (
        <Notice look="over" className="mb-5" title="What is stored no longer fits">
          {saved.fault} Enter the figures again; until then its batches keep what they were planned with.
        </Notice>
      ) : null}
      <DutyForm key={model} {...props} model={model} />
    </UnitsProvider>
  );
}
